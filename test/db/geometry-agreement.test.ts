import fc from 'fast-check'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { cutterProblems } from '@/core/catalogue/cutter-problems'
import { fluteEndDiameterMm } from '@/core/catalogue/flute-end-diameter'
import { type CutterGeometry, cutterForms } from '@/core/tooling'
import { brokenConstraint, databaseErrorCode } from '@/server/db/database-errors'
import { geometryTables, geometryToColumns } from '@/server/db/geometry-tables'
import { createItem } from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'

let database: TestDatabase

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())

const lengthMm = fc.integer({ min: 1, max: 24 }).map((quarters) => quarters / 4)
const maybe = <Value>(arbitrary: fc.Arbitrary<Value>) => fc.option(arbitrary, { freq: 3 })

/** Sizes on a coarse grid, so that equal ones, which are the borders of the rules, come up often. */
const anyCutter: fc.Arbitrary<CutterGeometry> = fc.record({
  form: fc.constantFrom(...cutterForms),
  cuttingDiameterMm: lengthMm,
  cornerRadiusMm: maybe(fc.integer({ min: 0, max: 13 }).map((eighths) => eighths / 4)),
  taperHalfAngleDeg: maybe(fc.constantFrom(0, 1, 5, 30, 45)),
  pointAngleDeg: maybe(fc.constantFrom(60, 90, 118, 140, 180)),
  tipDiameterMm: maybe(fc.integer({ min: 0, max: 24 }).map((quarters) => quarters / 4)),
  lengthOfCutMm: maybe(lengthMm),
  fluteLengthMm: maybe(lengthMm),
  neckDiameterMm: maybe(lengthMm),
  reachLengthMm: maybe(lengthMm),
  shankDiameterMm: lengthMm,
  overallLengthMm: fc.integer({ min: 8, max: 30 }).map((quarters) => quarters / 4),
})

/** Mostly without the figures its form has no use for, since any of them alone is a problem to the core. */
const cutter = fc.tuple(anyCutter, fc.nat(3)).map(([drawn, luck]): CutterGeometry => {
  if (luck === 0) return drawn
  const isPointed = ['drill', 'reamer', 'tap', 'chamfer'].includes(drawn.form)
  return {
    ...drawn,
    cornerRadiusMm: ['square', 'ball'].includes(drawn.form) ? null : drawn.cornerRadiusMm,
    taperHalfAngleDeg: drawn.form === 'tapered' ? (drawn.taperHalfAngleDeg ?? 5) : null,
    pointAngleDeg: isPointed ? drawn.pointAngleDeg : null,
    tipDiameterMm: drawn.form === 'chamfer' ? drawn.tipDiameterMm : null,
    overallLengthMm: drawn.overallLengthMm + 4,
  }
})

test('a cutter that the core has nothing against is one the database takes', async () => {
  const counts = { taken: 0, refusedByBoth: 0 }
  let serial = 0
  const property = fc.asyncProperty(cutter, async (geometry) => {
    const trx = await database.db.transaction()
    try {
      serial += 1
      const itemId = await createItem(trx, { code: `C-${serial}` })
      const columns = geometryToColumns(geometryTables.cutter, { ...geometry })
      const refusal = await trx('cutters')
        .insert({ item_id: itemId, ...columns })
        .then(
          () => null,
          (error: unknown) => `${databaseErrorCode(error)} ${brokenConstraint(error)}`,
        )
      const problems = cutterProblems(geometry)
      if (problems.length === 0) {
        expect(refusal).toBe(null)
        counts.taken += 1
      } else if (refusal) {
        expect(refusal).toMatch(/^23514 cutters_/)
        counts.refusedByBoth += 1
      }
    } finally {
      await trx.rollback()
    }
  })
  await fc.assert(property, { numRuns: 1500 })
  expect(counts.taken).toBeGreaterThan(150)
  expect(counts.refusedByBoth).toBeGreaterThan(100)
})

test('the core and the database see the same width at the end of the flutes', async () => {
  const lengths = fc
    .tuple(lengthMm, lengthMm)
    .map(([one, other]) => [Math.min(one, other), Math.max(one, other)])
  const property = fc.asyncProperty(
    cutter,
    lengths,
    async (drawn, [lengthOfCutMm = 1, fluteLengthMm = 1]) => {
      const cornerRadiusMm = Math.min(drawn.cornerRadiusMm ?? 0, drawn.cuttingDiameterMm / 2)
      const taperHalfAngleDeg = drawn.taperHalfAngleDeg ?? 3
      const geometry = { ...drawn, cornerRadiusMm, taperHalfAngleDeg, lengthOfCutMm, fluteLengthMm }
      const { rows } = await database.db.raw('select flute_end_diameter_mm(?, ?, ?, ?, ?, ?, ?, ?) as mm', [
        geometryToColumns(geometryTables.cutter, { form: geometry.form }).form as string,
        geometry.cuttingDiameterMm,
        cornerRadiusMm,
        taperHalfAngleDeg,
        geometry.pointAngleDeg ?? null,
        geometry.tipDiameterMm ?? null,
        lengthOfCutMm,
        fluteLengthMm,
      ])
      expect(rows[0].mm).toBeCloseTo(fluteEndDiameterMm(geometry), 9)
    },
  )
  await fc.assert(property, { numRuns: 500 })
})
