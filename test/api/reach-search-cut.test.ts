import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { MillingAnswer } from '@/core/cutting/cut-answer'
import type { SearchOptionResponse } from '@/schemas/reach-search'
import { type Answer, type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, putOnShelf, siteDatabase } from '../support/api-stock'
import { createNeckedTool, type NeckedToolRows } from '../support/shop-rows'

/* A 4 mm end mill with four flutes, 25 deep, in the chuck and collet of the hand cases of reach. */
let crib: ApiClient
let rows: NeckedToolRows
let cutterId: string
let taper: string
const db = siteDatabase()

beforeAll(async () => {
  crib = await signedInAs('cribManager')
  rows = await createNeckedTool(db, crib)
  for (const itemId of [rows.holderId, rows.colletId])
    await putOnShelf(db, crib, { itemId, binId: rows.shelf.binId, quantity: 1 })
  taper = uniqueCode('BT')
  await crib.patch(`/api/holders/${rows.holderId}`, { version: 1, taper })
  cutterId = await createCutter(crib, {
    code: uniqueCode('CUT'),
    cuttingDiameterMm: 4,
    fluteCount: 4,
    substrate: 'carbide',
    lengthOfCutMm: 8,
    fluteLengthMm: 8,
    neckDiameterMm: 3.8,
    reachLengthMm: 40,
    shankDiameterMm: 4,
    overallLengthMm: 76.2,
  })
  const point = await crib.send('PUT', `/api/reorder-points/${cutterId}/${rows.shelf.cribId}`, {
    body: { reorderPoint: 1, orderUpTo: 2 },
  })
  if (point.status >= 300) throw new Error(`The reorder point was refused: ${JSON.stringify(point.body)}`)
})
afterAll(() => db.destroy())

/** Hardened wrought aluminium, a quarter of the diameter wide. */
const cut = { materialNumber: 22, feedMm: 0.04, depthOfCutMm: 2, stepoverMm: 1, cuttingSpeedMPerMin: 100 }

function search(asked: object | null, where: object = {}): Promise<Answer> {
  return crib.post('/api/reach/search', {
    feature: { kind: 'wall', depthMm: 25 },
    cut: asked,
    where: { cribId: rows.shelf.cribId, cutterId, ...where },
  })
}

function optionOf(answer: Answer): SearchOptionResponse {
  const [option] = answer.body.options as unknown as SearchOptionResponse[]
  if (!option) throw new Error(`There is no option: ${JSON.stringify(answer.body)}`)
  return option
}

function millingOf({ estimate }: SearchOptionResponse): MillingAnswer {
  if (estimate?.answer?.kind !== 'milling') throw new Error(`No estimate: ${JSON.stringify(estimate)}`)
  return estimate.answer
}

async function machineWith(spindlePoints: object[], change: object = {}): Promise<string> {
  const made = await crib.post('/api/machines', {
    code: uniqueCode('M'),
    name: 'Vertical mill',
    taper,
    gaugeLineToTableMm: 600,
    zTravelMm: 450,
    maximumRpm: 12_000,
    efficiency: 0.8,
    spindlePoints,
    ...change,
  })
  if (made.status !== 201) throw new Error(`The machine was refused: ${JSON.stringify(made.body)}`)
  return String(made.body.id)
}

describe('a cut asked of every option', () => {
  it('is estimated with its speed, thinned chip, load, bending and power, and named an estimate', async () => {
    const option = optionOf(await search(cut))
    const answer = millingOf(option)
    // n = 1000·vc/(π·DC); thinning 1/√(1 − (1 − 2·ae/DC)²) = 1/√0.75: common practice.
    expect(answer.spindleRpm).toBeCloseTo(100_000 / (Math.PI * 4), 6)
    expect(answer.chipThinningFactor).toBeCloseTo(1.154_700_5, 6)
    expect(answer.feedMmPerMin).toBeCloseTo(answer.spindleRpm * 4 * 0.04 * 1.154_700_5, 3)
    expect(answer.deflectionUm).toBeCloseTo(answer.sideLoadN * option.stiffness.complianceUmPerN, 9)
    // Pc = ap·ae·vf·kc/(60·10⁶): test/reference/cutting/cutting-force.md.
    const powerKw = (2 * 1 * answer.feedMmPerMin * answer.specificForceNPerMm2) / 60e6
    expect(answer.powerKw / powerKw).toBeCloseTo(1, 3)
    expect(answer.assumptions).toEqual(expect.arrayContaining(['estimate', 'tip-load', 'spindle-unknown']))
    expect(answer.drive).toBeNull()
  })

  it('is none where none was asked for, and the load that was given stays what bends the reach check', async () => {
    expect(optionOf(await search(null)).estimate).toBeNull()
    const loaded = await crib.post('/api/reach/search', {
      feature: { kind: 'wall', depthMm: 25 },
      cut,
      sideLoadN: 50,
      where: { cribId: rows.shelf.cribId, cutterId },
    })
    const { stiffness } = optionOf(loaded)
    expect(stiffness.deflectionUm).toBeCloseTo(50 * stiffness.complianceUmPerN, 9)
  })

  it('says whether the spindle of the machine drives it; one that does not stays listed, with a caution', async () => {
    const strong = optionOf(
      await search(cut, { machineId: await machineWith([{ rpm: 12_000, powerKw: 11 }]) }),
    )
    expect(millingOf(strong).drive?.drives).toBe(true)
    expect(strong.cautions.join(' ')).not.toContain('does not drive')
    const weak = optionOf(
      await search(cut, { machineId: await machineWith([{ rpm: 12_000, torqueNm: 0.01 }]) }),
    )
    const { drive, motorPowerKw, powerKw } = millingOf(weak)
    expect(drive?.drives).toBe(false)
    expect(drive?.torqueShare).toBeGreaterThan(1)
    expect(motorPowerKw).toBeCloseTo(powerKw / 0.8, 9)
    expect(weak.cautions[0]).toMatch(/^Estimated: The spindle does not drive it at /)
  })

  it('is held to what the spindle turns, and says where its curve ends below', async () => {
    const machineId = await machineWith([{ rpm: 3000, powerKw: 5 }], { maximumRpm: 5000 })
    const option = optionOf(await search(cut, { machineId }))
    const answer = millingOf(option)
    expect(answer.spindleRpm).toBe(5000)
    expect(answer.assumptions).toEqual(expect.arrayContaining(['speed-limited', 'speed-off-curve']))
    expect(option.cautions.join(' ')).toContain('faster than the spindle’s curve goes')
  })

  it('says in words what keeps it from being estimated, and where it cuts shorter than the depth of cut', async () => {
    const wide = optionOf(await search({ ...cut, stepoverMm: 4.5 }))
    expect(wide.estimate).toMatchObject({ answer: null, sentence: expect.stringContaining('stepover') })
    const deep = optionOf(await search({ ...cut, depthOfCutMm: 9 }))
    expect(deep.cautions.join(' ')).toContain('It cuts on 8 mm of its length')
  })

  it('starts at the slow end of the shop’s speeds for the group where none is given', async () => {
    const { cuttingSpeedMPerMin: _, ...without } = cut
    const { rows: speeds } = (await crib.get('/api/starting-speeds')).body as unknown as {
      rows: { isoGroup: string; substrate: string; lowMPerMin: number }[]
    }
    const slowest = Math.min(
      ...speeds
        .filter(({ isoGroup, substrate }) => isoGroup === 'N' && substrate === 'carbide')
        .map(({ lowMPerMin }) => lowMPerMin),
    )
    expect(millingOf(optionOf(await search(without))).cuttingSpeedMPerMin).toBeCloseTo(slowest, 6)
  })

  it('refuses a material the table has not, and what is not more than 0, at its place', async () => {
    const unknown = await search({ ...cut, materialNumber: 29 })
    expect([unknown.status, faultPaths(unknown)]).toEqual([422, ['cut.materialNumber']])
    const nothing = await search({ ...cut, feedMm: 0, stepoverMm: -1 })
    expect(faultPaths(nothing)).toEqual(['cut.feedMm', 'cut.stepoverMm'])
  })
})
