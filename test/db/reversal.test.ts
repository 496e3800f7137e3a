import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest'
import {
  type Books,
  balanceAt,
  createBooks,
  createItem,
  onHand,
  type Posting,
  post,
  receive,
} from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase
let books: Books
let issue: string

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())
beforeEach(async () => {
  books = await createBooks(database.db)
  await receive(database.db, books, 5)
  const issued = { kind: 'issue', quantity: 2, from: books.binId, to: books.personId, toCondition: 'used' }
  issue = (await post(database.db, books, issued))[0] ?? ''
})

const mirror = (): Posting => ({
  kind: 'reversal',
  quantity: 2,
  from: books.personId,
  fromCondition: 'used',
  to: books.binId,
  toCondition: 'new',
  reversesId: issue,
})

describe('a reversal', () => {
  test('it puts back what its movement took', async () => {
    await post(database.db, books, mirror())
    expect(await balanceAt(database.db, books, books.binId)).toBe(5)
    expect(await balanceAt(database.db, books, books.personId, 'used')).toBe(0)
    expect(await onHand(database.db, books)).toBe(5)
  })

  test('it happens once', async () => {
    await post(database.db, books, mirror())
    await expectRefusal(post(database.db, books, mirror()), '23505', 'movements_reverses_id_key')
  })

  test('it is never reversed itself', async () => {
    const [reversal] = await post(database.db, books, mirror())
    const again: Posting = {
      kind: 'reversal',
      quantity: 2,
      from: books.binId,
      fromCondition: 'new',
      to: books.personId,
      toCondition: 'used',
      reversesId: reversal ?? '',
    }
    await expectRefusal(post(database.db, books, again), 'LL011')
  })

  test('it swaps exactly the ends, conditions, quantity and item of what it reverses', async () => {
    const otherItem = await createItem(database.db, { code: `OTHER-${books.itemId}` })
    const wrong: Partial<Posting>[] = [
      { quantity: 1 },
      { from: books.secondPersonId },
      { to: books.secondBinId },
      { fromCondition: 'new' },
      { toCondition: 'used' },
      { itemId: otherItem },
      { from: books.binId, fromCondition: 'new', to: books.personId, toCondition: 'used' },
    ]
    for (const change of wrong) {
      await expectRefusal(
        post(database.db, books, { ...mirror(), ...change }),
        'LL011',
        'movements_reversal_mirrors',
      )
    }
  })

  test('it names what it reverses, and nothing else does', async () => {
    const { reversesId: _, ...nameless } = mirror()
    await expectRefusal(post(database.db, books, nameless), '23514', 'movements_reversal_names_what')
    await expectRefusal(
      post(database.db, books, { ...mirror(), kind: 'return' }),
      '23514',
      'movements_reversal_names_what',
    )
  })

  test('it is refused where the pieces have moved on', async () => {
    await post(database.db, books, {
      kind: 'scrap',
      from: books.personId,
      fromCondition: 'used',
      to: books.scrapId,
    })
    await expectRefusal(post(database.db, books, mirror()), 'LL014')
  })

  test('it takes back a receipt, an adjustment and a scrapping as well', async () => {
    const pairs: Posting[] = [
      { kind: 'receipt', from: books.supplierId, to: books.binId },
      { kind: 'adjustment', from: books.countAdjustmentId, to: books.binId },
      { kind: 'scrap', from: books.binId, to: books.scrapId },
    ]
    for (const posting of pairs) {
      const [id] = await post(database.db, books, posting)
      await post(database.db, books, {
        kind: 'reversal',
        from: posting.to,
        to: posting.from,
        reversesId: id ?? '',
      })
    }
    expect(await balanceAt(database.db, books, books.binId)).toBe(3)
  })
})
