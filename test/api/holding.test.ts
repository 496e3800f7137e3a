import { beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, allRows, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter } from '../support/api-stock'

let crib: ApiClient
let estimator: ApiClient

beforeAll(async () => {
  ;[crib, estimator] = await Promise.all([signedInAs('cribManager'), signedInAs('estimator')])
})

const nut = { part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 28 }
const body = { part: 'holder', lengthMm: 30, noseDiameterMm: 30, spindleDiameterMm: 40 }
const holder = (change: Record<string, unknown> = {}) => ({
  code: uniqueCode('H'),
  taper: 'BT30',
  gaugeLengthMm: 60,
  bore: { kind: 'collet', series: 'ER20' },
  boreDepthMm: 40,
  segments: [nut, body],
  ...change,
})
const extension = (change: Record<string, unknown> = {}) => ({
  code: uniqueCode('X'),
  projectionMm: 80,
  bore: { kind: 'fixed', diameterMm: 6 },
  boreDepthMm: 30,
  minimumGripMm: 18,
  segments: [{ lengthMm: 80, noseDiameterMm: 10, spindleDiameterMm: 14 }],
  ...change,
})
const collet = (change: Record<string, unknown> = {}) => ({
  code: uniqueCode('C'),
  series: 'ER20',
  minimumMm: 5,
  maximumMm: 6,
  lengthMm: 31.5,
  ...change,
})

type Case = [string, Record<string, unknown>, string[]]

describe('a holder', () => {
  it('is added with its segments in their order and read back', async () => {
    const given = holder()
    const made = await crib.post('/api/holders', given)
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({ ...given, kind: 'holder', version: 1, sideLockInsertionMm: null })
    expect((await crib.get(`/api/holders/${made.body.id}`)).body).toEqual(made.body)
  })

  it('changes its segments all together, and keeps them where they are not named', async () => {
    const made = await crib.post('/api/holders', holder())
    const path = `/api/holders/${made.body.id}`
    const shorter = await crib.patch(path, { version: 1, segments: [{ ...body, lengthMm: 20 }] })
    expect(shorter.body.segments).toEqual([{ ...body, lengthMm: 20 }])
    const renamed = await crib.patch(path, { version: shorter.body.version, taper: null })
    expect(renamed.body).toMatchObject({ taper: null, segments: [{ ...body, lengthMm: 20 }] })
    const fixed = await crib.patch(path, {
      version: renamed.body.version,
      bore: { kind: 'fixed', diameterMm: 10 },
    })
    expect(fixed.body.bore).toEqual({ kind: 'fixed', diameterMm: 10 })
    expect((await crib.patch(path, fixed.body)).body).toEqual(fixed.body)
  })

  const refused: Case[] = [
    ['segments longer than the gauge length', { gaugeLengthMm: 47.9 }, ['segments.1.lengthMm']],
    ['a nut behind the body', { segments: [body, nut] }, ['segments.1.part']],
    ['a grip longer than the bore', { minimumGripMm: 41 }, ['minimumGripMm']],
    ['a grip that begins too deep', { minimumGripMm: 30, gripStartMm: 10.1 }, ['gripStartMm']],
    ['a side-lock with a collet', { sideLockInsertionMm: 20 }, ['sideLockInsertionMm']],
    [
      'a side-lock deeper than its bore',
      { bore: { kind: 'fixed', diameterMm: 6 }, sideLockInsertionMm: 41 },
      ['sideLockInsertionMm'],
    ],
    ['a segment without length', { segments: [{ ...body, lengthMm: 0 }] }, ['segments.0.lengthMm']],
  ]
  it.each(refused)('is refused beside its field: %s', async (_, change, paths) => {
    const answer = await crib.post('/api/holders', holder(change))
    expect(answer.status).toBe(422)
    expect(faultPaths(answer)).toEqual(paths)
  })

  const misshapen: Case[] = [
    ['no segments', { segments: [] }, ['segments']],
    ['no bore', { bore: undefined }, ['bore']],
    ['a bore of no kind', { bore: { kind: 'magnet' } }, ['bore.kind']],
    ['a collet bore without series', { bore: { kind: 'collet' } }, ['bore.series']],
    ['a fixed bore without diameter', { bore: { kind: 'fixed' } }, ['bore.diameterMm']],
  ]
  it.each(misshapen)('is refused as misshapen: %s', async (_, change, paths) => {
    const answer = await crib.post('/api/holders', holder(change))
    expect(answer.status).toBe(400)
    expect(faultPaths(answer)).toEqual(paths)
  })

  it('asks the rules of the holder as it will be', async () => {
    const made = await crib.post('/api/holders', holder())
    const answer = await crib.patch(`/api/holders/${made.body.id}`, { version: 1, gaugeLengthMm: 40 })
    expect([answer.status, faultPaths(answer)]).toEqual([422, ['segments.1.lengthMm']])
    expect((await crib.get(`/api/holders/${made.body.id}`)).body).toEqual(made.body)
  })

  it('is found by taper, series and bore', async () => {
    const taper = uniqueCode('T')
    await crib.post('/api/holders', holder({ taper, bore: { kind: 'collet', series: 'ER32' } }))
    await crib.post('/api/holders', holder({ taper, bore: { kind: 'fixed', diameterMm: 12 } }))
    const total = async (query: string) => (await crib.get(`/api/holders?taper=${taper}&${query}`)).body.total
    expect(await total('')).toBe(2)
    expect(await total('series=er32,ER40')).toBe(1)
    expect(await total('boreKind=fixed&boreDiameterMm.min=11')).toBe(1)
    expect(await total('boreKind=collet&boreDiameterMm.min=11')).toBe(0)
    expect(
      (await crib.get(`/api/holders?taper=${taper}&sort=-boreDiameterMm,series`)).body.rows,
    ).toHaveLength(2)
  })
})

describe('an extension', () => {
  it('is added, changed, archived and refused where it cannot be', async () => {
    const given = extension()
    const made = await crib.post('/api/extensions', given)
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({ ...given, kind: 'extension' })
    const path = `/api/extensions/${made.body.id}`
    const short = await crib.patch(path, { version: 1, projectionMm: 79 })
    expect([short.status, faultPaths(short)]).toEqual([422, ['segments.0.lengthMm']])
    const longer = await crib.patch(path, { version: 1, projectionMm: 90 })
    expect(longer.body.projectionMm).toBe(90)
    expect((await crib.get('/api/extensions?sort=-projectionMm&projectionMm.min=90')).status).toBe(200)
    expect(longer.body.shankDiameterMm).toBeNull()
    const shank = await crib.patch(path, { version: 2, shankDiameterMm: 20 })
    expect(shank.body).toMatchObject({ version: 3, shankDiameterMm: 20 })
    const none = await crib.patch(path, { version: 3, shankDiameterMm: 0 })
    expect([none.status, faultPaths(none)]).toEqual([422, ['shankDiameterMm']])
    expect((await crib.remove(path)).status).toBe(204)
  })
})

describe('a collet', () => {
  it('is added, changed, archived and refused where it cannot be', async () => {
    const made = await crib.post('/api/collets', collet())
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({ minimumMm: 5, maximumMm: 6, minimumGripMm: null })
    const path = `/api/collets/${made.body.id}`
    const turned = await crib.patch(path, { version: 1, minimumMm: 6.1 })
    expect([turned.status, faultPaths(turned)]).toEqual([422, ['maximumMm']])
    const grip = await crib.patch(path, { version: 1, minimumGripMm: 31.6 })
    expect([grip.status, faultPaths(grip)]).toEqual([422, ['minimumGripMm']])
    const single = await crib.patch(path, { version: 1, minimumMm: 6 })
    expect(single.status).toBe(200)
    expect((await crib.get('/api/collets?series=ER20&maximumMm.max=6&sort=maximumMm')).status).toBe(200)
    expect((await crib.remove(path)).status).toBe(204)
  })
})

describe('what fits', () => {
  /** A series of the test's own, so that nothing else is in it. */
  const series = uniqueCode('ser')
  let cutterId: string
  let thickId: string
  let tightId: string
  let colletId: string
  let holderId: string
  let fixedId: string
  let extensionId: string

  beforeAll(async () => {
    // 6.35 mm is 1/4 in: a 6 mm bore never takes it.
    cutterId = await createCutter(crib, { shankDiameterMm: 6 })
    thickId = await createCutter(crib, { shankDiameterMm: 6.35 })
    tightId = await createCutter(crib, { shankDiameterMm: 6.03 })
    colletId = (await crib.post('/api/collets', collet({ series, minimumMm: 5, maximumMm: 6 }))).body.id
    const spaced = ` ${series.toUpperCase().replaceAll('-', ' ')}`
    holderId = (await crib.post('/api/holders', holder({ bore: { kind: 'collet', series: spaced } }))).body.id
    fixedId = (await crib.post('/api/holders', holder({ bore: { kind: 'fixed', diameterMm: 6 } }))).body.id
    extensionId = (await crib.post('/api/extensions', extension())).body.id
  })

  async function fits(itemId: string, kind: string): Promise<string[]> {
    const rows = await allRows(estimator, `/api/items/${itemId}/fits?kind=${kind}&limit=500`)
    return rows.map((row) => row.id)
  }

  it('a cutter: the collets of its range, the bores of its shank, the chucks of such collets', async () => {
    expect(await fits(cutterId, 'collet')).toContain(colletId)
    expect(await fits(cutterId, 'holder')).toEqual(expect.arrayContaining([holderId, fixedId]))
    expect(await fits(cutterId, 'extension')).toContain(extensionId)
    expect(await fits(cutterId, 'cutter')).toEqual([])
  })

  it('a quarter inch shank: no 6 mm bore and no 5 to 6 mm collet', async () => {
    expect(await fits(thickId, 'collet')).not.toContain(colletId)
    const holders = await fits(thickId, 'holder')
    expect(holders).not.toContain(holderId)
    expect(holders).not.toContain(fixedId)
    expect(await fits(thickId, 'extension')).not.toContain(extensionId)
  })

  it('a shank three hundredths over: the bore, not the collet', async () => {
    expect(await fits(tightId, 'holder')).toContain(fixedId)
    expect(await fits(tightId, 'collet')).not.toContain(colletId)
  })

  it('the other way round too', async () => {
    expect(await fits(colletId, 'holder')).toEqual([holderId])
    const ofCollet = await fits(colletId, 'cutter')
    expect(ofCollet).toContain(cutterId)
    expect(ofCollet).not.toContain(thickId)
    expect(await fits(holderId, 'collet')).toEqual([colletId])
    expect(await fits(holderId, 'cutter')).toContain(cutterId)
    expect(await fits(holderId, 'cutter')).not.toContain(tightId)
    expect(await fits(fixedId, 'cutter')).toEqual(expect.arrayContaining([cutterId, tightId]))
    expect(await fits(extensionId, 'cutter')).toContain(cutterId)
    expect(await fits(fixedId, 'collet')).toEqual([])
  })

  it('shows where in the range the shank sits', async () => {
    const halfway = await createCutter(crib, { shankDiameterMm: 5.25 })
    const rows = (await crib.get(`/api/items/${colletId}/fits?kind=cutter&limit=500`)).body.rows
    expect(rows.find((row) => row.id === halfway)?.placeInRange).toBeCloseTo(0.25, 9)
  })

  it('leaves out what is archived, and answers 404 for no item', async () => {
    await crib.remove(`/api/collets/${colletId}`)
    expect(await fits(holderId, 'collet')).toEqual([])
    expect(await fits(cutterId, 'holder')).not.toContain(holderId)
    expect((await crib.get('/api/items/999999999/fits')).status).toBe(404)
  })
})
