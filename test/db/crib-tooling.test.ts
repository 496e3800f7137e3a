import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest'
import { readCribTooling, readToolingRevision } from '@/server/db/read-models/crib-tooling'
import { readKeptItems, readPiecePlaces } from '@/server/db/read-models/tooling-stock'
import { cribTooling } from '@/server/services/reach-search/crib-tables'
import { type Books, createBooks, post } from '../support/books'
import { createCollet, createCutter, createExtension, createHolder } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'

let database: TestDatabase
let books: Books

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())
beforeEach(async () => {
  books = await createBooks(database.db)
})

async function createPiece(itemId: string, measured: object = {}): Promise<string> {
  const [row] = await database
    .db('pieces')
    .insert({ item_id: itemId, tag: `TAG-${itemId}-${Object.keys(measured).length}`, ...measured })
    .returning('id')
  return row.id
}

async function createTracked(): Promise<string> {
  const itemId = await createCutter(database.db)
  await database.db('items').where('id', itemId).update({ is_tracked_by_piece: true })
  return itemId
}

/** Whether doing this makes what was read before out of date. */
async function outdates(act: () => Promise<unknown>): Promise<boolean> {
  const before = await readToolingRevision(database.db)
  await act()
  return (await readToolingRevision(database.db)) !== before
}

describe('what was read of the crib', () => {
  test('it is out of date once anything that shapes an answer changes', async () => {
    const { db } = database
    const [cutterId, holderId] = [await createCutter(db), await createHolder(db)]
    const pieceId = await createPiece(await createTracked())
    const change = (table: string, id: string, row: object) => () =>
      db(table)
        .where(table === 'items' ? 'id' : 'item_id', id)
        .update(row)
    expect(await outdates(() => createCollet(db))).toBe(true)
    expect(await outdates(change('cutters', cutterId, { overall_length_mm: 70 }))).toBe(true)
    expect(await outdates(change('items', cutterId, { archived_at: db.fn.now() }))).toBe(true)
    const segment = { item_id: holderId, part: 'nut', position: 1, length_mm: 9, nose_diameter_mm: 20 }
    const insertSegment = () => db('holder_segments').insert({ ...segment, spindle_diameter_mm: 20 })
    expect(await outdates(insertSegment)).toBe(true)
    expect(await outdates(() => db('shop_settings').update({ holder_clearance_mm: 0.75 }))).toBe(true)
    const measure = () => db('pieces').where('id', pieceId).update({ overall_length_mm: 55 })
    expect(await outdates(measure)).toBe(true)
  })

  test('it stays while pieces only move', async () => {
    const pieceId = await createPiece(await createTracked(), { overall_length_mm: 55 })
    const itemId = (await database.db('pieces').where('id', pieceId).first('item_id')).item_id
    const arrival = { kind: 'receipt', itemId, pieceId, from: books.supplierId, to: books.binId }
    expect(await outdates(() => post(database.db, books, arrival))).toBe(false)
  })

  test('it holds every kind with its outline, what is archived left out, a measured piece as a cutter of its own', async () => {
    const { db } = database
    const [holderId, extensionId, goneId] = [
      await createHolder(db),
      await createExtension(db),
      await createCutter(db),
    ]
    await db('holder_segments').insert({
      item_id: holderId,
      part: 'nut',
      position: 1,
      length_mm: 18,
      nose_diameter_mm: 28,
      spindle_diameter_mm: 30,
    })
    await db('items').where('id', goneId).update({ archived_at: db.fn.now() })
    const itemId = await createTracked()
    const pieceId = await createPiece(itemId, { length_of_cut_mm: 10 })
    const { tooling, cutterSources } = cribTooling(await readCribTooling(db))
    expect(tooling.cutters.map(({ id }) => id)).not.toContain(goneId)
    expect(tooling.holders.find(({ id }) => id === holderId)).toMatchObject({
      taper: 'BT30',
      bore: { kind: 'collet', series: 'ER16' },
      geometry: { segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 30 }] },
    })
    expect(tooling.extensions.find(({ id }) => id === extensionId)).toMatchObject({
      bore: { kind: 'fixed', diameterMm: 6 },
      shankDiameterMm: null,
    })
    const ofItem = cutterSources.flatMap((source, index) => (source.itemId === itemId ? [index] : []))
    const lengths = ofItem.map((index) => tooling.cutters[index]?.geometry.lengthOfCutMm)
    // The catalogue says 12 of cut and 15 of flutes.
    expect(lengths).toEqual([12, 10])
    expect(tooling.cutters[ofItem[1] ?? 0]?.geometry.fluteLengthMm).toBe(13)
    expect(cutterSources[ofItem[1] ?? 0]?.piece?.id).toBe(pieceId)
  })
})

describe('where it lies', () => {
  test('it counts a piece in a bin of the crib asked for, and calls a scrapped one gone', async () => {
    const { db } = database
    const itemId = await createTracked()
    const pieceId = await createPiece(itemId, { overall_length_mm: 55 })
    const placeOf = async (cribId: string | null) =>
      (await readPiecePlaces(db, [pieceId], cribId)).get(pieceId)
    expect(await placeOf(null)).toMatchObject({ isGone: true, stock: { onHand: 0 } })
    await post(db, books, { kind: 'receipt', itemId, pieceId, from: books.supplierId, to: books.binId })
    expect(await placeOf(books.cribId)).toMatchObject({
      isGone: false,
      stock: { available: 1, locations: [{ code: 'A1', quantity: 1 }] },
    })
    expect(await placeOf(books.secondCribId)).toMatchObject({ isGone: false, stock: { available: 0 } })
    await post(db, books, { kind: 'scrap', itemId, pieceId, from: books.binId, to: books.scrapId })
    expect(await placeOf(null)).toMatchObject({ isGone: true, stock: { onHand: 0 } })
  })

  test('it takes for kept what a crib had in a bin, though it is out, and nothing of another crib', async () => {
    const { db } = database
    await post(db, books, { kind: 'receipt', from: books.supplierId, to: books.binId })
    await post(db, books, { kind: 'issue', from: books.binId, to: books.personId, toCondition: 'used' })
    expect(await readKeptItems(db, books.cribId)).toContain(books.itemId)
    expect(await readKeptItems(db, books.secondCribId)).not.toContain(books.itemId)
  })
})
