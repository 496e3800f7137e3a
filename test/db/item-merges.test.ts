import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { ledgerFaults } from '@/server/db/ledger-faults'
import { readDuplicateGroups } from '@/server/db/read-models/duplicate-groups'
import {
  type Books,
  balanceAt,
  createBooks,
  createItem,
  createPerson,
  createPlaceApart,
  type Posting,
  post,
} from '../support/books'
import { createCutter } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase
let userId: string

beforeAll(async () => {
  database = await createTestDatabase()
  userId = await createPerson(database.db, 'merges@leadline.example')
})
afterAll(() => database.drop())

const archive = (id: string) =>
  database.db('items').where({ id }).update({ archived_at: database.db.fn.now() })
const merge = (itemId: string, keptItemId: string) =>
  database.db('item_merges').insert({ item_id: itemId, kept_item_id: keptItemId, merged_by: userId })

describe('a merge on the books', () => {
  test('it is never of an item with itself, and once only', async () => {
    const [one, other] = [await createCutter(database.db), await createCutter(database.db)]
    await expectRefusal(merge(one, one), '23514', 'item_merges_into_another')
    await merge(one, other)
    await expectRefusal(merge(one, other), '23505', 'item_merges_pkey')
  })

  test('it is forgotten when the item is brought back, and only then', async () => {
    const [one, other] = [await createCutter(database.db), await createCutter(database.db)]
    await archive(one)
    await merge(one, other)
    await database.db('items').where({ id: one }).update({ description: 'was merged' })
    expect(await database.db('item_merges').where({ item_id: one })).toHaveLength(1)
    await database.db('items').where({ id: one }).update({ archived_at: null })
    expect(await database.db('item_merges').where({ item_id: one })).toEqual([])
  })
})

describe('the movements of a merge', () => {
  let books: Books
  let keptId: string

  async function start(isTracked: boolean): Promise<void> {
    const made = await createBooks(database.db)
    const item = (code: string) =>
      createItem(database.db, { code: `${code}-${made.itemId}`, is_tracked_by_piece: isTracked })
    books = { ...made, itemId: await item('GOES') }
    keptId = await item('KEPT')
  }

  /** Out of the merged item's books and into the kept one's, at one place. */
  const pair = (place: string, rest: Partial<Posting> = {}): [Posting, Posting] => {
    const half = { kind: 'adjustment', mergedItemId: books.itemId, ...rest }
    return [
      { ...half, from: place, to: books.countAdjustmentId },
      { ...half, itemId: keptId, from: books.countAdjustmentId, to: place },
    ]
  }
  const arrival = (rest: Partial<Posting> = {}): Posting => ({
    kind: 'receipt',
    from: books.supplierId,
    to: books.binId,
    ...rest,
  })
  const issue = (rest: Partial<Posting> = {}): Posting => ({
    kind: 'issue',
    from: books.binId,
    to: books.personId,
    ...rest,
  })
  const addPiece = async (tag: string): Promise<string> => {
    const [row] = await database.db('pieces').insert({ item_id: books.itemId, tag }).returning('id')
    return row.id
  }
  const itemOfPiece = async (id: string) => (await database.db('pieces').where({ id }).first()).item_id

  test('they reach hands, machines, grinders and what is on its way, which no other adjustment does', async () => {
    await start(false)
    const machine = await createPlaceApart(database.db, 'machine', `MC-${books.itemId}`)
    const regrind = await createPlaceApart(database.db, 'regrind', `RG-${books.itemId}`)
    const transit = await createPlaceApart(database.db, 'in_transit', `TR-${books.itemId}`)
    await post(
      database.db,
      books,
      arrival({ quantity: 10 }),
      issue({ quantity: 2 }),
      issue({ quantity: 1, to: machine }),
      { kind: 'regrind', from: books.binId, to: regrind },
      { kind: 'transfer', from: books.binId, to: transit },
    )
    const places = [books.personId, machine, regrind, transit]
    for (const place of places) {
      const plain = { kind: 'adjustment', from: place, to: books.countAdjustmentId }
      await expectRefusal(post(database.db, books, plain), 'LL010', 'movements_kind_fixes_places')
    }
    await merge(books.itemId, keptId)
    await post(
      database.db,
      books,
      ...pair(books.binId, { quantity: 5 }),
      ...pair(books.personId, { quantity: 2 }),
      ...places.slice(1).flatMap((place) => pair(place)),
    )
    expect(await balanceAt(database.db, { ...books, itemId: keptId }, books.personId)).toBe(2)
    expect(await balanceAt(database.db, books, books.personId)).toBe(0)
    await archive(books.itemId)
    expect((await ledgerFaults(database.db)).faults).toEqual([])
  })

  test('half of a pair is refused, and so is a pair without its merge or in another condition', async () => {
    await start(false)
    await post(database.db, books, arrival({ quantity: 3 }))
    await expectRefusal(post(database.db, books, ...pair(books.binId)), 'LL018', 'movements_merge_in_pairs')
    await merge(books.itemId, keptId)
    const [out, into] = pair(books.binId)
    for (const halves of [
      [out],
      [into],
      [{ ...out, quantity: 2 }, into],
      [out, { ...into, to: books.secondBinId }],
      [out, { ...into, fromCondition: 'used' }],
      [out, { ...into, itemId: books.itemId }],
    ])
      await expectRefusal(post(database.db, books, ...halves), 'LL018', 'movements_merge_in_pairs')
    await expectRefusal(
      post(database.db, books, { ...issue(), mergedItemId: books.itemId }),
      '23514',
      'movements_merge_adjusts',
    )
  })

  test('neither half is reversed', async () => {
    await start(false)
    await post(database.db, books, arrival({ quantity: 3 }))
    await merge(books.itemId, keptId)
    const [, into = ''] = await post(database.db, books, ...pair(books.binId, { quantity: 3 }))
    const reversal = {
      kind: 'reversal',
      itemId: keptId,
      quantity: 3,
      from: books.binId,
      to: books.countAdjustmentId,
      reversesId: into,
    }
    await expectRefusal(post(database.db, books, reversal), 'LL018', 'movements_merge_stays')
  })

  test('a tagged piece goes over where it is, keeps its tag and its movements, and moves on under the kept item', async () => {
    await start(true)
    const pieceId = await addPiece(`TAG-${books.itemId}`)
    await post(database.db, books, arrival({ pieceId }), issue({ pieceId, toCondition: 'used' }))
    await merge(books.itemId, keptId)
    expect(await itemOfPiece(pieceId)).toBe(books.itemId)
    const used = { pieceId, fromCondition: 'used' }
    await post(database.db, books, ...pair(books.personId, used))
    expect(await itemOfPiece(pieceId)).toBe(keptId)
    await archive(books.itemId)
    const back: Posting = { kind: 'return', from: books.personId, to: books.binId, ...used }
    await expectRefusal(post(database.db, books, back), 'LL013')
    await post(database.db, books, { ...back, itemId: keptId })
    const moved = await database.db('movements').where('piece_id', pieceId).orderBy('id')
    expect(moved.map(({ item_id, kind }) => [item_id, kind])).toEqual([
      [books.itemId, 'receipt'],
      [books.itemId, 'issue'],
      [books.itemId, 'adjustment'],
      [keptId, 'adjustment'],
      [keptId, 'return'],
    ])
    expect((await ledgerFaults(database.db)).faults).toEqual([])
  })

  test('a piece that never came in or that a count missed goes over; what is scrapped stays under the old code', async () => {
    await start(true)
    const waiting = await addPiece(`WAITS-${books.itemId}`)
    const missed = await addPiece(`MISSED-${books.itemId}`)
    const broken = await addPiece(`BROKEN-${books.itemId}`)
    await post(
      database.db,
      books,
      arrival({ pieceId: missed }),
      arrival({ pieceId: broken }),
      { kind: 'adjustment', pieceId: missed, from: books.binId, to: books.countAdjustmentId },
      { kind: 'scrap', pieceId: broken, from: books.binId, to: books.scrapId },
    )
    await merge(books.itemId, keptId)
    expect(await itemOfPiece(waiting)).toBe(keptId)
    expect(await itemOfPiece(missed)).toBe(keptId)
    expect(await itemOfPiece(broken)).toBe(books.itemId)
    const found = { kind: 'adjustment', itemId: keptId, pieceId: missed, from: books.countAdjustmentId }
    await post(database.db, books, { ...found, to: books.binId })
    expect((await ledgerFaults(database.db)).faults).toEqual([])
  })

  test('a piece never changes its item by hand, merge or none', async () => {
    await start(true)
    const pieceId = await addPiece(`STAYS-${books.itemId}`)
    await post(database.db, books, arrival({ pieceId }))
    const move = () => database.db('pieces').where('id', pieceId).update({ item_id: keptId })
    await expectRefusal(move(), 'LL002', 'pieces_place_kept_by_movements')
    await merge(books.itemId, keptId)
    await expectRefusal(move(), 'LL002', 'pieces_place_kept_by_movements')
  })
})

describe('duplicates', () => {
  test('they take a length that came by way of inches for the same, and leave out what is archived', async () => {
    const one = await createCutter(database.db, { overall_length_mm: 76.2 })
    const other = await createCutter(database.db, { overall_length_mm: 76.2000000001 })
    const archived = await createCutter(database.db, { overall_length_mm: 76.2 })
    await createCutter(database.db, { overall_length_mm: 76.2001 })
    await archive(archived)
    const { groups } = await readDuplicateGroups(database.db, 'cutter')
    const ids = groups.map(({ items }) => items.map(({ id }) => id).sort())
    expect(ids).toContainEqual([one, other].sort())
  })
})
