import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { SearchNearMissResponse, SearchOptionResponse } from '@/schemas/reach-search'
import { type Answer, type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { siteDatabase } from '../support/api-stock'
import {
  type AssemblyRows,
  buildAssembly,
  createAssemblyRows,
  keepAssembly,
} from '../support/kept-assemblies'

/* The necked end mill of the hand cases of reach: 25 deep it needs 39.5 of stick-out, 139.5 of gauge length. */
let crib: ApiClient
let rows: AssemblyRows
let taper: string
const db = siteDatabase()

beforeAll(async () => {
  crib = await signedInAs('cribManager')
  rows = await createAssemblyRows(db, crib)
  taper = uniqueCode('BT')
})
afterAll(() => db.destroy())

const machine = (change: object = {}) => ({
  code: uniqueCode('M'),
  name: 'Vertical mill',
  taper,
  gaugeLineToTableMm: 600,
  zTravelMm: 450,
  maximumRpm: 12_000,
  ...change,
})

/** By hand: gauge lengths from 600 − 450 − 20 = 130 to 600 − 430 − 25 = 145. */
const setUp = (change: object = {}) => ({
  gaugeLineToTableMm: 600,
  zTravelMm: 450,
  highestMm: 430,
  lowestTipMm: 20,
  retractClearanceMm: 25,
  ...change,
})

const search = (where: object, more: object = {}): Promise<Answer> =>
  crib.post('/api/reach/search', {
    feature: { kind: 'wall', depthMm: 25 },
    where: { cribId: rows.shelf.cribId, ...where },
    ...more,
  })
const optionsOf = (answer: Answer) => answer.body.options as unknown as SearchOptionResponse[]
const missesOf = (answer: Answer) => answer.body.nearMisses as unknown as SearchNearMissResponse[]

describe('a search for a machine', () => {
  it('offers holders of its taper alone, however that is written; one whose taper is not known, never', async () => {
    const { body: mill } = await crib.post('/api/machines', machine({ spindleNoseDiameterMm: 80 }))
    const before = await search({ machineId: mill.id })
    expect(before.body).toMatchObject({ considered: 0 })
    expect(before.body.notes).toContainEqual(expect.objectContaining({ code: 'nothing-passes-filters' }))
    await crib.patch(`/api/holders/${rows.holderId}`, { version: 1, taper: taper.toLowerCase() })
    const [option] = optionsOf(await search({ machineId: mill.id }))
    expect(option?.holder.id).toBe(rows.holderId)
    const codes = option?.reach.messages.map(({ code }) => code)
    expect(codes).not.toContain('spindle-width-unknown')
    const { body: other } = await crib.post('/api/machines', machine({ taper: uniqueCode('CAT') }))
    expect(optionsOf(await search({ machineId: other.id }))).toEqual([])
  })

  it('leaves out what is too wide or too long for the changer', async () => {
    const add = async (change: object) => (await crib.post('/api/machines', machine(change))).body.id
    // The nut is 28 across, the whole 139.5 long.
    expect(optionsOf(await search({ machineId: await add({ widestToolMm: 28 }) }))).toHaveLength(1)
    expect(optionsOf(await search({ machineId: await add({ widestToolMm: 27.9 }) }))).toEqual([])
    expect(optionsOf(await search({ machineId: await add({ longestToolMm: 139.5 }) }))).toHaveLength(1)
    const long = await search({ machineId: await add({ longestToolMm: 139 }) })
    expect(optionsOf(long)).toEqual([])
    expect(missesOf(long)[0]).toMatchObject({
      stoppedBy: 'gaugeLength',
      shortfallMm: 0.5,
      reason: 'Its gauge length is 0.5 mm outside what the machine takes.',
    })
  })
})

describe('a search for a set-up', () => {
  it('offers what its window takes, by hand 130 to 145 of gauge length', async () => {
    const [option] = optionsOf(await search({ setup: setUp() }))
    // 39.5 of 3.175 are 12.4 diameters.
    expect(option?.cautions.join(' ')).toContain('12.4 × diameter')
    expect(optionsOf(await search({ setup: setUp({ highestMm: 435.5 }) }))).toHaveLength(1)
    expect(optionsOf(await search({ setup: setUp({ highestMm: 436 }) }))).toEqual([])
  })

  it('says a longer stick-out where the assembly is too short to get down', async () => {
    // Down to 8 above the table takes 142, so 42 of stick-out, 2.5 more than the depth alone.
    const answer = await search({ setup: setUp({ lowestTipMm: 8 }) })
    const [miss] = missesOf(answer)
    expect(miss).toMatchObject({ stoppedBy: 'gaugeLength', shortfallMm: 2.5 })
    expect(miss?.changes.map(({ text }) => text)).toContain(
      'Reaches with 42 mm of stick-out, which the machine asks for.',
    )
  })

  it('takes a set-up of the shop’s, with the machine it is on', async () => {
    const { body: mill } = await crib.post('/api/machines', machine())
    const { gaugeLineToTableMm: _, zTravelMm: __, ...heights } = setUp()
    const { body: kept } = await crib.post('/api/set-ups', { machineId: mill.id, name: 'Vise', ...heights })
    expect(optionsOf(await search({ setUpId: kept.id }))).toHaveLength(1)
    const { body: other } = await crib.post('/api/machines', machine())
    const crossed = await search({ setUpId: kept.id, machineId: other.id })
    expect([crossed.status, faultPaths(crossed)]).toEqual([422, ['where.setUpId']])
  })

  it.each([
    ['where.setup', 'no room for any tool', { setup: setUp({ highestMm: 580 }) }],
    [
      'where.setup',
      'too near to the table',
      { setup: setUp({ rotaryStock: { widthMm: 100, heightMm: 100, axisHeightMm: 80 } }) },
    ],
    ['where.setup.zTravelMm', '', { setup: setUp({ zTravelMm: -1 }) }],
    ['where.setUpId', 'no such set-up', { setUpId: '999999999' }],
    ['where.machineId', 'no such machine', { machineId: '999999999' }],
  ])('is refused at %s: %s', async (path, words, where) => {
    const answer = await search(where)
    expect([answer.status, faultPaths(answer)]).toEqual([422, [path]])
    expect(answer.body.detail).toContain(words)
  })
})

describe('a search in a material', () => {
  it('says where to start, where the shop has a speed for the tool in it, and leaves nothing out', async () => {
    const admin = await signedInAs('admin')
    const material = uniqueCode('Alloy')
    const row = { isoGroup: 'P', material, substrate: 'carbide', lowMPerMin: 50, highMPerMin: 100 }
    expect((await admin.post('/api/starting-speeds', row)).status).toBe(201)
    // The cutter's own material was never entered: it counts as carbide, as in its stiffness.
    const [option] = optionsOf(await search({ material: material.toLowerCase() }))
    // By hand: 1000·50/(π·3.175) = 5012.7 rpm.
    expect(option?.speed).toMatchObject({ lowMPerMin: 50, highMPerMin: 100, limited: 'no' })
    expect(option?.speed?.lowRpm).toBeCloseTo(5012.74, 1)
    expect(optionsOf(await search({}))[0]?.speed).toBeNull()

    const softer = uniqueCode('Alloy')
    await admin.post('/api/starting-speeds', { ...row, material: softer, substrate: 'hss' })
    expect(optionsOf(await search({ material: softer })).map(({ speed }) => speed)).toEqual([null])
    const unknown = await search({ material: uniqueCode('Alloy') })
    expect([unknown.status, faultPaths(unknown)]).toEqual([422, ['where.material']])
  })

  it('holds the speed to the machine’s fastest', async () => {
    const admin = await signedInAs('admin')
    const material = uniqueCode('Alloy')
    const row = { isoGroup: 'P', material, substrate: 'carbide', lowMPerMin: 50, highMPerMin: 300 }
    await admin.post('/api/starting-speeds', row)
    const { body: mill } = await crib.post('/api/machines', machine({ maximumRpm: 8000 }))
    const [option] = optionsOf(await search({ material, machineId: mill.id }))
    expect(option?.speed).toMatchObject({ highRpm: 8000, limited: 'high' })
  })
})

describe('what stands ready', () => {
  it('comes first where that is asked, at the stick-out it was built with, while it reaches', async () => {
    const { body: kept } = await keepAssembly(crib, rows, { stickOutMm: 42 })
    const built = await buildAssembly(crib, rows, kept)
    expect(built.status).toBe(200)
    const [ready, anew] = optionsOf(await search({}, { rankBy: 'built' }))
    expect(ready).toMatchObject({
      cutter: { id: rows.cutterId },
      stickOut: { usedMm: 42 },
      reach: { verdict: 'reaches', gaugeLengthMm: 142 },
      builtAs: { id: kept.id, number: kept.number },
    })
    expect(ready?.reason).toContain(`Stands ready as assembly ${kept.number}, with `)
    expect(anew).toMatchObject({ stickOut: { usedMm: 39.5 }, builtAs: null })
    const deeper = await search({}, { rankBy: 'built', feature: { kind: 'wall', depthMm: 39 } })
    expect(optionsOf(deeper)).toEqual([])
    const others = await search({ forms: ['ball'] }, { rankBy: 'built' })
    expect(optionsOf(others)).toEqual([])
  })
})
