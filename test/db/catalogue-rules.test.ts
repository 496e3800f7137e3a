import fc from 'fast-check'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { cutterProblems } from '@/core/catalogue/cutter-problems'
import { locationKinds } from '@/core/stock/kinds'
import { movementProblem, type PostedMovementKind } from '@/core/stock/movement-problems'
import { type CutterGeometry, cutterForms } from '@/core/tooling'
import { enumToDb } from '@/server/db/enum-case'
import { geometryTables, geometryToColumns } from '@/server/db/geometry-tables'
import { createItem } from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'

let database: TestDatabase
beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())

/** Sizes that crowd round each other's limits. */
const size = fc.constantFrom(0.5, 1, 2, 3, 5, 6, 6.5, 10, 12, 15, 20, 30, 57)
const maybe = <Value>(value: fc.Arbitrary<Value>) => fc.option(value, { nil: null })
const cutter: fc.Arbitrary<CutterGeometry> = fc.record({
  form: fc.constantFrom(...cutterForms),
  cuttingDiameterMm: size,
  cornerRadiusMm: maybe(fc.oneof(fc.constant(0), size)),
  taperHalfAngleDeg: maybe(fc.constantFrom(0, 3, 45)),
  pointAngleDeg: maybe(fc.constantFrom(60, 90, 140, 180)),
  tipDiameterMm: maybe(fc.oneof(fc.constant(0), size)),
  lengthOfCutMm: maybe(size),
  fluteLengthMm: maybe(size),
  neckDiameterMm: maybe(size),
  reachLengthMm: maybe(size),
  shankDiameterMm: size,
  overallLengthMm: size,
})

const isPossible = (geometry: CutterGeometry) => cutterProblems(geometry).length === 0

/** Whether the database takes a cutter; nothing of it stays. */
async function isTaken(itemId: string, geometry: CutterGeometry): Promise<boolean> {
  const trx = await database.db.transaction()
  const columns = geometryToColumns(geometryTables.cutter, { ...geometry })
  const taken = await trx('cutters')
    .insert({ item_id: itemId, ...columns })
    .then(
      () => true,
      () => false,
    )
  await trx.rollback()
  return taken
}

describe('the rules of a cutter', () => {
  let itemId: string
  beforeAll(async () => {
    itemId = await createItem(database.db, { kind: 'cutter', code: 'RULES' })
  })

  it('let through nothing that the database then refuses', async () => {
    await fc.assert(
      fc.asyncProperty(cutter.filter(isPossible), async (geometry) => {
        expect(await isTaken(itemId, geometry)).toBe(true)
      }),
      { numRuns: 400 },
    )
  })

  it('have something against all that the database refuses', async () => {
    let refused = 0
    await fc.assert(
      fc.asyncProperty(cutter, async (geometry) => {
        if (await isTaken(itemId, geometry)) return
        refused += 1
        expect(isPossible(geometry)).toBe(false)
      }),
      { numRuns: 400 },
    )
    expect(refused).toBeGreaterThan(100)
  })
})

describe('the rules of a movement', () => {
  it('say of every kind and pair of places what the database says', async () => {
    const kinds: PostedMovementKind[] = ['issue', 'return', 'relocation', 'transfer', 'regrind', 'scrap']
    for (const kind of kinds) {
      for (const fromKind of locationKinds) {
        for (const toKind of locationKinds) {
          for (const toCrib of ['1', '2']) {
            const { rows } = await database.db.raw('select movement_runs_between(?, ?, ?, 1, ?) as runs', [
              kind,
              enumToDb(fromKind),
              enumToDb(toKind),
              toCrib,
            ])
            const problem = movementProblem(
              kind,
              { kind: fromKind, cribId: '1' },
              { kind: toKind, cribId: toCrib },
            )
            expect(problem === null, `${kind} ${fromKind} ${toKind} ${toCrib}`).toBe(rows[0].runs)
          }
        }
      }
    }
  })
})
