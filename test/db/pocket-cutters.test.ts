import fc from 'fast-check'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { usableDepth } from '@/core/catalogue/usable-depth'
import type { FittingCuttersQuery } from '@/schemas/fits'
import { readCatalogueKeys } from '@/server/db/read-models/catalogue-keys'
import { readCatalogueRows } from '@/server/db/read-models/catalogue-rows'
import { readPocketCutterKeys } from '@/server/db/read-models/pocket-cutters'
import { createCutter } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'

let database: TestDatabase
const clearanceMm = 0.025
const made: Record<string, string> = {}

beforeAll(async () => {
  database = await createTestDatabase()
  const { db } = database
  made.stub = await createCutter(db)
  made.long = await createCutter(db, { length_of_cut_mm: 25, flute_length_mm: 25, overall_length_mm: 80 })
  made.necked = await createCutter(db, {
    cutting_diameter_mm: 6,
    length_of_cut_mm: 8,
    flute_length_mm: null,
    neck_diameter_mm: 5.8,
    reach_length_mm: 25,
  })
  made.tightNeck = await createCutter(db, {
    length_of_cut_mm: 8,
    flute_length_mm: 8,
    neck_diameter_mm: 5.99,
    reach_length_mm: 25,
  })
  made.runOut = await createCutter(db, {
    length_of_cut_mm: 8,
    flute_length_mm: 10,
    neck_diameter_mm: 5.8,
    reach_length_mm: 25,
  })
  made.ball = await createCutter(db, {
    form: 'ball',
    corner_radius_mm: 3,
    length_of_cut_mm: 22,
    flute_length_mm: 22,
  })
  made.rounded = await createCutter(db, {
    form: 'corner_radius',
    corner_radius_mm: 0.5,
    length_of_cut_mm: 22,
    flute_length_mm: 22,
  })
  made.thin = await createCutter(db, { cutting_diameter_mm: 4, length_of_cut_mm: 22, flute_length_mm: 22 })
  made.drill = await createCutter(db, {
    form: 'drill',
    point_angle_deg: 118,
    length_of_cut_mm: 30,
    flute_length_mm: 32,
  })
})
afterAll(() => database.drop())

async function found(change: Partial<FittingCuttersQuery> = {}): Promise<string[]> {
  const query = { insideCornerRadiusMm: 3, depthMm: 20, inStock: 'no' as const, limit: 100, ...change }
  const { ids } = await readPocketCutterKeys(database.db, query, clearanceMm)
  const names = new Map(Object.entries(made).map(([name, id]) => [id, name]))
  return ids.map((id) => names.get(id) ?? id)
}

describe('the cutters for a pocket', () => {
  test('they go into its corner and deep enough, the thickest and shortest first', async () => {
    expect(await found()).toEqual(['ball', 'rounded', 'necked', 'long', 'thin'])
  })

  test('a corner just below a cutter’s radius leaves it out, one just at it does not', async () => {
    expect(await found({ insideCornerRadiusMm: 2.999 })).toEqual(['thin'])
    expect(await found({ insideCornerRadiusMm: 2 })).toEqual(['thin'])
  })

  test('a depth just beyond a cutter leaves it out, one just at it does not', async () => {
    expect(await found({ depthMm: 25 })).toEqual(['necked', 'long'])
    expect(await found({ depthMm: 25.001 })).toEqual([])
  })

  test('the floor’s radius leaves out what is rounder, and a square end all that is round', async () => {
    expect(await found({ floorRadiusMm: 0.5 })).toEqual(['rounded', 'necked', 'long', 'thin'])
    expect(await found({ floorRadiusMm: 0 })).toEqual(['necked', 'long', 'thin'])
  })

  test('only those in stock, where so asked', async () => {
    expect(await found({ inStock: 'yes' })).toEqual([])
  })

  test('the cutters list filtered by the same figures shows the same cutters, none more and none less', async () => {
    for (const insideCornerRadiusMm of [2, 3, 100])
      for (const depthMm of [8, 20, 25, 25.001])
        for (const floorRadiusMm of [undefined, 0, 0.5, 3]) {
          const query = { insideCornerRadiusMm, depthMm, inStock: 'no' as const, limit: 100 }
          const asked = floorRadiusMm === undefined ? query : { ...query, floorRadiusMm }
          const { ids } = await readPocketCutterKeys(database.db, asked, clearanceMm)
          const listed = await readCatalogueKeys(database.db, 'cutter', {
            limit: 100,
            archived: 'no',
            'cuttingDiameterMm.max': 2 * insideCornerRadiusMm,
            'usableDepthMm.min': depthMm,
            'endRadiusMm.max': floorRadiusMm,
          })
          expect([...listed.ids].sort(), JSON.stringify(asked)).toEqual([...ids].sort())
        }
  })

  test('the database and the core agree on every cutter and depth', async () => {
    const rows = await readCatalogueRows(database.db, 'cutter', Object.values(made))
    await fc.assert(
      fc.asyncProperty(
        fc.constantFrom(6, 8, 12, 22, 24.9, 25, 30),
        fc.double({ min: 0.1, max: 40, noNaN: true }),
        async (edge, free) => {
          for (const depthMm of [edge, free]) {
            const query = { insideCornerRadiusMm: 100, depthMm, inStock: 'no' as const, limit: 100 }
            const { ids } = await readPocketCutterKeys(database.db, query, clearanceMm)
            const byCore = rows
              .filter((row) => row.form !== 'drill')
              .filter((row) => (usableDepth(row, clearanceMm)?.depthMm ?? 0) >= depthMm - 1e-6)
            expect([...ids].sort()).toEqual(byCore.map((row) => row.id).sort())
          }
        },
      ),
      { numRuns: 30 },
    )
  })
})
