import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest'
import { findStockShortage } from '@/server/db/database-errors'
import {
  type Books,
  balanceAt,
  createBooks,
  createPlace,
  createPlaceApart,
  onHand,
  post,
  receive,
} from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase
let books: Books

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())
beforeEach(async () => {
  books = await createBooks(database.db)
})

describe('a movement', () => {
  test('it takes from one place what it brings to the other', async () => {
    await receive(database.db, books, 5)
    await post(database.db, books, { kind: 'issue', quantity: 2, from: books.binId, to: books.personId })
    expect(await balanceAt(database.db, books, books.supplierId)).toBe(-5)
    expect(await balanceAt(database.db, books, books.binId)).toBe(3)
    expect(await balanceAt(database.db, books, books.personId)).toBe(2)
  })

  test('it keeps conditions apart', async () => {
    await receive(database.db, books, 3)
    await post(database.db, books, { kind: 'issue', quantity: 3, from: books.binId, to: books.personId })
    await post(database.db, books, {
      kind: 'return',
      quantity: 2,
      from: books.personId,
      to: books.binId,
      toCondition: 'used',
    })
    expect(await balanceAt(database.db, books, books.binId, 'new')).toBe(0)
    expect(await balanceAt(database.db, books, books.binId, 'used')).toBe(2)
    expect(await balanceAt(database.db, books, books.personId, 'new')).toBe(1)
  })

  test('it refuses to leave less than nothing, says what is there, and changes nothing', async () => {
    await receive(database.db, books, 2)
    const taking = post(database.db, books, {
      kind: 'issue',
      quantity: 3,
      from: books.binId,
      to: books.personId,
    })
    const error: unknown = await taking.catch((thrown: unknown) => thrown)
    expect(findStockShortage(error)).toEqual({
      itemId: books.itemId,
      locationId: books.binId,
      condition: 'new',
      held: 2,
      wanted: 3,
    })
    expect(await balanceAt(database.db, books, books.binId)).toBe(2)
    expect(await onHand(database.db, books)).toBe(2)
    const count = await database
      .db('movements')
      .where('item_id', books.itemId)
      .count('id as movements')
      .first()
    expect(count).toEqual({ movements: '1' })
  })

  test('it refuses pieces of a condition that is not there', async () => {
    await receive(database.db, books, 2)
    const worn = { kind: 'issue', from: books.binId, to: books.personId, fromCondition: 'worn' }
    await expectRefusal(post(database.db, books, worn), 'LL014', 'balances_not_below_zero')
  })

  test('it refuses nothing at all, less than nothing, and a million and one', async () => {
    for (const quantity of [0, -1, 1_000_001]) {
      await expectRefusal(receive(database.db, books, quantity), '23514', 'movements_quantity_check')
    }
  })

  test('it refuses to move a piece to where it is already', async () => {
    await receive(database.db, books, 1)
    const standing = post(database.db, books, { kind: 'relocation', from: books.binId, to: books.binId })
    await expectRefusal(standing, '23514', 'movements_somewhere_else')
  })

  test('it is never edited and never removed', async () => {
    const [id] = await receive(database.db, books, 1)
    const row = () => database.db('movements').where('id', id)
    await expectRefusal(row().update({ quantity: 2 }), 'LL001')
    await expectRefusal(row().delete(), 'LL001')
    await expectRefusal(database.db.raw('truncate movements cascade'), 'LL001')
  })

  test('it posts many at once, and all of them or none', async () => {
    const six = Array.from({ length: 6 }, () => ({ kind: 'issue', from: books.binId, to: books.personId }))
    await receive(database.db, books, 5)
    await expectRefusal(post(database.db, books, ...six), 'LL014')
    expect(await balanceAt(database.db, books, books.binId)).toBe(5)
    await post(database.db, books, ...six.slice(1))
    expect(await balanceAt(database.db, books, books.personId)).toBe(5)
  })

  test('it refuses a place that is archived, and an item that is', async () => {
    await database.db('locations').where('id', books.binId).update({ archived_at: new Date() })
    await expectRefusal(receive(database.db, books, 1), 'LL013')
    await database.db('items').where('id', books.itemId).update({ archived_at: new Date() })
    await expectRefusal(receive(database.db, books, 1, books.secondBinId), 'LL013')
  })
})

describe('the kind of a movement', () => {
  const places = async () => ({
    supplier: books.supplierId,
    scrap: books.scrapId,
    count_adjustment: books.countAdjustmentId,
    bin: books.binId,
    second_bin: books.secondBinId,
    far_bin: books.farBinId,
    person: books.personId,
    machine: await createPlaceApart(database.db, 'machine', `M-${books.itemId}`),
    regrind: await createPlaceApart(database.db, 'regrind', `G-${books.itemId}`),
    in_transit: await createPlaceApart(database.db, 'in_transit', `T-${books.itemId}`),
    crib: (await database.db('locations').where({ kind: 'crib', crib_id: books.cribId }).first('id')).id,
    cabinet: await createPlace(database.db, { kind: 'cabinet', code: 'C1', cribId: books.cribId }),
    drawer: await createPlace(database.db, { kind: 'drawer', code: 'D1', cribId: books.cribId }),
  })

  /** stock.md, the table of movements, written out again by hand. `bin` stands for any bin. */
  const allowed: Record<string, string[]> = {
    receipt: ['supplier>bin'],
    issue: ['bin>person', 'bin>machine'],
    return: ['person>bin', 'machine>bin'],
    relocation: ['bin>second_bin'],
    transfer: ['bin>in_transit', 'in_transit>bin'],
    regrind: ['bin>regrind', 'regrind>bin'],
    scrap: ['bin>scrap', 'person>scrap', 'machine>scrap', 'regrind>scrap', 'in_transit>scrap'],
    adjustment: ['bin>count_adjustment', 'count_adjustment>bin'],
  }
  const anyBin = (way: string) => way.replace(/second_bin|far_bin/g, 'bin')
  const isAllowed = (kind: string, way: string) =>
    kind === 'relocation'
      ? ['bin>second_bin', 'second_bin>bin'].includes(way)
      : (allowed[kind] ?? []).includes(anyBin(way))

  test('it fixes between which kinds of place it runs', async () => {
    const ids = Object.entries(await places())
    const taken: string[] = []
    for (const kind of Object.keys(allowed)) {
      for (const [fromName, from] of ids) {
        for (const [toName, to] of ids) {
          if (from === to) continue
          const way = `${fromName}>${toName}`
          // Rolled back each time: the ends are what is asked, not the stock, so a missing piece is no refusal here.
          const outcome = await database.db
            .transaction(async (trx) => {
              await post(trx, books, { kind, from, to })
              await trx.rollback(new Error('posted'))
            })
            .catch((error: { code?: string }) => error.code ?? 'posted')
          const wrongPlaces = outcome === 'LL010'
          if (!wrongPlaces) taken.push(`${kind} ${way}`)
          expect(wrongPlaces, `${kind} ${way}: ${outcome}`).toBe(!isAllowed(kind, way))
        }
      }
    }
    expect(taken.length).toBeGreaterThan(20)
  })
})

describe('a level', () => {
  test('it counts the pieces in bins of the crib that are not worn', async () => {
    await receive(database.db, books, 4)
    await receive(database.db, books, 2, books.secondBinId)
    await receive(database.db, books, 7, books.farBinId)
    expect(await onHand(database.db, books)).toBe(6)
    expect(await onHand(database.db, books, books.secondCribId)).toBe(7)

    await post(database.db, books, { kind: 'issue', quantity: 3, from: books.binId, to: books.personId })
    expect(await onHand(database.db, books)).toBe(3)
    const back = { kind: 'return', from: books.personId, to: books.binId }
    await post(database.db, books, { ...back, toCondition: 'used' }, { ...back, toCondition: 'worn' })
    expect(await onHand(database.db, books)).toBe(4)
    expect(await balanceAt(database.db, books, books.binId, 'worn')).toBe(1)
  })

  test('it falls when a piece in its bin wears out', async () => {
    await receive(database.db, books, 2)
    await post(database.db, books, {
      kind: 'relocation',
      from: books.binId,
      to: books.secondBinId,
      toCondition: 'worn',
    })
    expect(await onHand(database.db, books)).toBe(1)
  })

  test('it stays as it is when pieces change bins in their crib', async () => {
    await receive(database.db, books, 2)
    await post(database.db, books, { kind: 'relocation', from: books.binId, to: books.secondBinId })
    expect(await onHand(database.db, books)).toBe(2)
  })
})

describe('balances and levels', () => {
  test('they are written by movements alone', async () => {
    await receive(database.db, books, 2)
    const own = { item_id: books.itemId }
    await expectRefusal(database.db('balances').where(own).update({ quantity: 9 }), 'LL002')
    await expectRefusal(database.db('balances').where(own).delete(), 'LL002')
    await expectRefusal(database.db('stock_levels').where(own).update({ on_hand: 9 }), 'LL002')
    const made = { ...own, crib_id: books.secondCribId, on_hand: 1 }
    await expectRefusal(database.db('stock_levels').insert(made), 'LL002')
  })

  test('they refuse less than nothing even with the trigger that asks first out of the way', async () => {
    await receive(database.db, books, 2)
    const forced = database.db.transaction(async (trx) => {
      await trx.raw('alter table balances disable trigger balances_guarded')
      await trx('balances')
        .where({ item_id: books.itemId, location_id: books.binId })
        .update({ quantity: -1 })
    })
    await expectRefusal(forced, '23514', 'balances_not_below_zero')
  })

  test('they cannot call a place of the shop an outside one', async () => {
    await receive(database.db, books, 2)
    const forced = database.db.transaction(async (trx) => {
      await trx.raw('alter table balances disable trigger balances_guarded')
      await trx('balances')
        .where({ item_id: books.itemId, location_id: books.binId })
        .update({ is_outside: true })
    })
    await expectRefusal(forced, '23503')
  })
})
