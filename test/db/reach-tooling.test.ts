import { afterAll, beforeAll, expect, test } from 'vitest'
import type { ReachRequestBody } from '@/schemas/reach'
import { findReachTooling } from '@/server/services/reach/find-reach-tooling'
import { createCutter } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'

let database: TestDatabase

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())

const holder = { gaugeLengthMm: 60, boreDepthMm: 40, minimumGripMm: 20, segments: [] }

function body(cutter: ReachRequestBody['cutter']): ReachRequestBody {
  return { feature: { kind: 'wall', depthMm: 5 }, cutter, holder }
}

async function createPiece(itemId: string, measured: Record<string, number>): Promise<string> {
  const [row] = await database
    .db('pieces')
    .insert({ item_id: itemId, tag: `TAG-${itemId}-${Object.keys(measured).length}`, ...measured })
    .returning('id')
  return row.id
}

test('it takes what was measured on a tagged piece before the catalogue, and the catalogue where nothing was', async () => {
  const itemId = await createCutter(database.db)
  const ground = await createPiece(itemId, { cutting_diameter_mm: 5.9, length_of_cut_mm: 10 })
  const tooling = await findReachTooling(database.db, body({ pieceId: ground }))
  // The catalogue says 6 mm, 12 of cut, 15 of flutes, 60 over all.
  expect(tooling.cutter).toMatchObject({
    cuttingDiameterMm: 5.9,
    lengthOfCutMm: 10,
    fluteLengthMm: 13,
    shankDiameterMm: 6,
    overallLengthMm: 60,
  })
  const untouched = await createPiece(itemId, {})
  const [ofPiece, ofItem] = await Promise.all([
    findReachTooling(database.db, body({ pieceId: untouched })),
    findReachTooling(database.db, body({ id: itemId })),
  ])
  expect(ofPiece.cutter).toEqual(ofItem.cutter)
})

test('it refuses a holder’s id where a cutter is asked for, at that place', async () => {
  const [row] = await database.db('items').insert({ kind: 'holder', code: 'NOT-A-CUTTER' }).returning('id')
  await expect(findReachTooling(database.db, body({ id: row.id }))).rejects.toMatchObject({
    code: 'not-found',
    options: { errors: [{ path: 'cutter.id' }] },
  })
})
