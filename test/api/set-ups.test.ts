import { beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'

let crib: ApiClient
let machinist: ApiClient
let machineId: string
let viseId: string

/** Case 1 of test/reference/machine/machine-window.md, the vise being what stands highest. */
const machine = { name: 'Mill', taper: 'CAT40', gaugeLineToTableMm: 600, zTravelMm: 450, maximumRpm: 8000 }
const sound = () => ({
  machineId,
  name: uniqueCode('Vise'),
  highestMm: 100,
  lowestTipMm: 60,
  retractClearanceMm: 25,
  fixtures: [{ itemId: viseId, baseMm: 40 }],
})
const stock = {
  widthMm: 80,
  heightMm: 80,
  offsetXMm: null,
  offsetYMm: null,
  axisHeightMm: 120,
  chuckRadiusMm: null,
  partDiameterMm: 78,
  centringErrorMm: 0.4,
}

beforeAll(async () => {
  crib = await signedInAs('cribManager')
  machinist = await signedInAs('machinist')
  machineId = (await crib.post('/api/machines', { ...machine, code: uniqueCode('M') })).body.id
  viseId = (await crib.post('/api/fixtures', { code: uniqueCode('VISE'), heightMm: 180 })).body.id
})

describe('a set-up', () => {
  it('is added with its window, the fixture’s own height in it, and read by everyone', async () => {
    const added = await crib.post('/api/set-ups', sound())
    expect(added.status).toBe(201)
    expect(added.body).toMatchObject({
      version: 1,
      machineId,
      rotaryStock: null,
      fixtures: [{ itemId: viseId, heightMm: 180, baseMm: 40 }],
      window: { highestMm: 220, gaugeLengthMm: { shortest: 90, longest: 355 }, possible: true },
      windowProblem: null,
      centringMarginMm: null,
    })
    expect((await machinist.get(`/api/set-ups/${added.body.id}`)).body).toEqual(added.body)
    const rows = (await machinist.get(`/api/set-ups?machineId=${machineId}`)).body.rows
    expect(rows.map((row) => row.id)).toContain(added.body.id)
  })

  it('follows its fixture and its machine, and says where no window is left', async () => {
    const vise = await crib.post('/api/fixtures', { code: uniqueCode('VISE'), heightMm: 60 })
    const { body: setUp } = await crib.post('/api/set-ups', {
      ...sound(),
      highestMm: 0,
      fixtures: [{ itemId: vise.body.id, baseMm: 10 }],
    })
    expect(setUp.window).toMatchObject({ highestMm: 70 })
    await crib.patch(`/api/fixtures/${vise.body.id}`, { version: 1, heightMm: 30 })
    const now = await crib.get(`/api/set-ups/${setUp.id}`)
    expect(now.body).toMatchObject({
      window: null,
      windowProblem: expect.stringContaining('above the highest'),
    })
  })

  it('has the swept circle of a rotary stock and what is left to clean up', async () => {
    const added = await crib.post('/api/set-ups', { ...sound(), fixtures: [], rotaryStock: stock })
    expect(added.body).toMatchObject({
      rotaryStock: stock,
      window: { sweptRadiusMm: expect.closeTo(56.569, 3), highestMm: expect.closeTo(176.569, 3) },
      centringMarginMm: expect.closeTo(0.6, 9),
    })
    const plain = await crib.patch(`/api/set-ups/${added.body.id}`, { version: 1, rotaryStock: null })
    expect(plain.body).toMatchObject({ version: 2, rotaryStock: null, centringMarginMm: null })
  })

  it('keeps a window that is none, and says by how much', async () => {
    const added = await crib.post('/api/set-ups', { ...sound(), highestMm: 560 })
    expect(added.status).toBe(201)
    expect(added.body.window).toMatchObject({ shortfallMm: 75, possible: false })
  })

  it('changes what is given and leaves the rest; the same again is no change', async () => {
    const { body: setUp } = await crib.post('/api/set-ups', sound())
    const path = `/api/set-ups/${setUp.id}`
    const changed = await crib.patch(path, { version: 1, retractClearanceMm: 50 })
    expect(changed.body).toMatchObject({ version: 2, lowestTipMm: 60, retractClearanceMm: 50 })
    const fixtures = [{ itemId: viseId, baseMm: 40 }]
    expect((await crib.patch(path, { version: 2, fixtures })).body.version).toBe(2)
    expect((await crib.patch(path, { version: 2, fixtures: [] })).body).toMatchObject({
      version: 3,
      fixtures: [],
    })
    const stale = await crib.patch(path, { version: 1, name: 'Late' })
    expect(stale.status).toBe(409)
    expect(stale.body).toMatchObject({ code: 'stale-version', current: { version: 3 } })
  })

  it.each([
    [{ lowestTipMm: 400 }, 'lowestTipMm', 422],
    [{ highestMm: -1 }, 'highestMm', 422],
    [{ retractClearanceMm: undefined }, 'retractClearanceMm', 400],
    [{ fixtures: [{ itemId: '999999999', baseMm: 0 }] }, 'fixtures', 422],
    [{ machineId: '999999999' }, 'machineId', 422],
    [{ rotaryStock: { ...stock, widthMm: 0 } }, 'rotaryStock.widthMm', 422],
    [{ rotaryStock: { ...stock, axisHeight: 3 } }, 'rotaryStock.axisHeight', 400],
  ])('refuses %j beside its field and keeps nothing', async (change, path, status) => {
    const request = { ...sound(), ...change }
    const answer = await crib.post('/api/set-ups', request)
    expect(answer.status).toBe(status)
    expect(faultPaths(answer)).toEqual([path])
    const rows = (await crib.get('/api/set-ups')).body.rows
    expect(rows.map((row) => row.name)).not.toContain(request.name)
  })

  it('refuses an item that is no fixture, and a name the machine has', async () => {
    const cutterId = (await crib.get('/api/cutters?limit=1')).body.rows[0]?.id
    const answer = await crib.post('/api/set-ups', {
      ...sound(),
      fixtures: [{ itemId: cutterId, baseMm: 0 }],
    })
    expect(answer.status).toBe(422)
    const request = sound()
    await crib.post('/api/set-ups', request)
    const twin = await crib.post('/api/set-ups', { ...request, name: request.name.toUpperCase() })
    expect(twin.status).toBe(409)
    expect(faultPaths(twin)).toEqual(['name'])
  })

  it('is removed', async () => {
    const { body: setUp } = await crib.post('/api/set-ups', sound())
    expect((await crib.remove(`/api/set-ups/${setUp.id}`)).status).toBe(204)
    expect((await crib.get(`/api/set-ups/${setUp.id}`)).status).toBe(404)
  })
})

describe('an assembly in a set-up', () => {
  const holder = (gaugeLengthMm: number, taper: string, series: string) => ({
    code: uniqueCode('H'),
    taper,
    gaugeLengthMm,
    bore: { kind: 'collet', series },
    segments: [{ part: 'holder', lengthMm: 20, noseDiameterMm: 40, spindleDiameterMm: 40 }],
  })

  it('fits, or is told by how much and in which holders of its bore and taper it would', async () => {
    const series = uniqueCode('ER')
    const taper = uniqueCode('T')
    const own = await crib.post('/api/machines', { ...machine, code: uniqueCode('M'), taper })
    const { body: setUp } = await crib.post('/api/set-ups', { ...sound(), machineId: own.body.id })
    const add = async (gaugeLengthMm: number, of = taper, bore = series) =>
      (await crib.post('/api/holders', holder(gaugeLengthMm, of, bore))).body.id
    const long = await add(320)
    const stubby = await add(150, taper.toLowerCase())
    const middle = await add(315)
    await add(150, 'another taper')
    await add(150, taper, 'another bore')
    await add(316)
    const path = `/api/set-ups/${setUp.id}/assembly`
    const answer = await machinist.post(path, { holderId: long, stickOutMm: 40 })
    expect(answer.body).toMatchObject({
      gaugeLengthMm: 360,
      verdict: 'tooLong',
      byMm: 5,
      isTaperRight: true,
      fittingHolders: [
        { id: stubby, gaugeLengthMm: 190, holderGaugeLengthMm: 150, onHand: 0 },
        { id: middle, gaugeLengthMm: 355 },
      ],
    })
    const fits = await machinist.post(path, { holderId: middle, stickOutMm: 40 })
    expect(fits.body).toMatchObject({ verdict: 'fits', byMm: 0, fittingHolders: [] })
  })

  it('refuses a holder that is not there, and no stick-out', async () => {
    const { body: setUp } = await crib.post('/api/set-ups', sound())
    const path = `/api/set-ups/${setUp.id}/assembly`
    const none = await machinist.post(path, { holderId: '999999999', stickOutMm: 40 })
    expect(none.status).toBe(422)
    expect(faultPaths(none)).toEqual(['holderId'])
    const holderId = (await crib.get('/api/holders?limit=1')).body.rows[0]?.id
    const zero = await machinist.post(path, { holderId, stickOutMm: 0 })
    expect(faultPaths(zero)).toEqual(['stickOutMm'])
  })
})
