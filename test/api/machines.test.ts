import { beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { siteDatabase } from '../support/api-stock'

let crib: ApiClient
let machinist: ApiClient

beforeAll(async () => {
  crib = await signedInAs('cribManager')
  machinist = await signedInAs('machinist')
})

const sound = () => ({
  code: uniqueCode('M'),
  name: 'Vertical mill',
  taper: 'CAT40',
  gaugeLineToTableMm: 600,
  zTravelMm: 450,
  longestToolMm: 300,
  minimumRpm: 50,
  maximumRpm: 8000,
  spindlePoints: [
    { rpm: 8000, powerKw: 11 },
    { rpm: 1500, torqueNm: 70 },
  ],
})

describe('a machine', () => {
  it('is added with its curve in order and a place of its own, and read back by everyone', async () => {
    const request = sound()
    const added = await crib.post('/api/machines', request)
    expect(added.status).toBe(201)
    expect(added.body).toMatchObject({
      code: request.code,
      efficiency: 0.8,
      xTravelMm: null,
      version: 1,
      archivedAt: null,
      spindlePoints: [
        { rpm: 1500, powerKw: null, torqueNm: 70 },
        { rpm: 8000, powerKw: 11, torqueNm: null },
      ],
    })
    expect((await machinist.get(`/api/machines/${added.body.id}`)).body).toEqual(added.body)
    const rows = (await machinist.get('/api/machines')).body.rows
    expect(rows.map((row) => row.id)).toContain(added.body.id)
    const locations = await crib.get(`/api/locations?kind=machine&code=${request.code}`)
    expect(locations.body.rows).toMatchObject([{ id: added.body.locationId, name: 'Vertical mill' }])
  })

  it('takes over the place that stood for it before it was entered', async () => {
    const db = siteDatabase()
    const request = sound()
    const [place] = await db('locations')
      .insert({ kind: 'machine', code: request.code.toLowerCase(), name: 'Old mill' })
      .returning('id')
    await db.destroy()
    const added = await crib.post('/api/machines', request)
    expect(added.body.locationId).toBe(place.id)
    const locations = await crib.get(`/api/locations?kind=machine&code=${request.code}`)
    expect(locations.body.rows).toMatchObject([{ id: place.id, code: request.code, name: 'Vertical mill' }])
  })

  it('keeps its place’s name, raises its version with its curve, and is written down', async () => {
    const { body: machine } = await crib.post('/api/machines', sound())
    const renamed = await crib.patch(`/api/machines/${machine.id}`, { version: 1, name: 'Corner mill' })
    expect(renamed.body).toMatchObject({ version: 2, name: 'Corner mill', longestToolMm: 300 })
    const locations = await crib.get(`/api/locations?kind=machine&code=${machine.code}`)
    expect(locations.body.rows).toMatchObject([{ name: 'Corner mill' }])
    const curve = await crib.patch(`/api/machines/${machine.id}`, {
      version: 2,
      longestToolMm: null,
      spindlePoints: [{ rpm: 6000, powerKw: 7.5 }],
    })
    expect(curve.body).toMatchObject({
      version: 3,
      longestToolMm: null,
      spindlePoints: [{ rpm: 6000, powerKw: 7.5, torqueNm: null }],
    })
    const same = await crib.patch(`/api/machines/${machine.id}`, { version: 3, name: 'Corner mill' })
    expect(same.body.version).toBe(3)
    const db = siteDatabase()
    const entries = await db('audit_entries')
      .where({ entity: 'machine', entity_id: machine.id })
      .orderBy('id')
      .pluck('action')
    await db.destroy()
    expect(entries).toEqual(['machine-added', 'machine-changed', 'machine-changed'])
  })

  it('refuses a stale version and answers what it is now', async () => {
    const { body: machine } = await crib.post('/api/machines', sound())
    const answer = await crib.patch(`/api/machines/${machine.id}`, { version: 7, name: 'Late' })
    expect(answer.status).toBe(409)
    expect(answer.body).toMatchObject({ code: 'stale-version', current: { name: 'Vertical mill' } })
  })

  it('refuses a code that another machine or location has', async () => {
    const request = sound()
    await crib.post('/api/machines', request)
    const twin = await crib.post('/api/machines', { ...sound(), code: request.code.toLowerCase() })
    expect(twin.status).toBe(409)
    expect(twin.body.code).toBe('code-taken')
    expect(faultPaths(twin)).toEqual(['code'])
    const grinder = await crib.post('/api/locations', {
      kind: 'regrind',
      code: uniqueCode('G'),
      name: 'Grinder',
    })
    const clash = await crib.post('/api/machines', { ...sound(), code: grinder.body.code })
    expect(clash.body.code).toBe('code-taken')
  })

  it.each([
    [{ gaugeLineToTableMm: undefined }, 'gaugeLineToTableMm', 400],
    [{ zTravelMm: '450' }, 'zTravelMm', 400],
    [{ gaugeLineToTableMm: -1 }, 'gaugeLineToTableMm', 422],
    [{ efficiency: 1.1 }, 'efficiency', 422],
    [{ minimumRpm: 9000 }, 'minimumRpm', 422],
    [{ minimumRpm: null, maximumRpm: 0 }, 'maximumRpm', 422],
    [{ spindlePoints: [{ rpm: 1000 }] }, 'spindlePoints.0.powerKw', 422],
    [
      {
        spindlePoints: [
          { rpm: 1000, powerKw: 1 },
          { rpm: 1000, powerKw: 2 },
        ],
      },
      'spindlePoints.1.rpm',
      422,
    ],
    [{ spindlePoints: [{ rpm: 1000, powerKw: -5 }] }, 'spindlePoints.0.powerKw', 422],
  ])('refuses %j beside its field', async (change, path, status) => {
    const answer = await crib.post('/api/machines', { ...sound(), ...change })
    expect(answer.status).toBe(status)
    expect(faultPaths(answer)).toEqual([path])
  })

  it('refuses a change that puts the slowest speed above the fastest', async () => {
    const { body: machine } = await crib.post('/api/machines', sound())
    const answer = await crib.patch(`/api/machines/${machine.id}`, { version: 1, maximumRpm: 40 })
    expect(answer.status).toBe(422)
    expect(faultPaths(answer)).toEqual(['minimumRpm'])
    expect((await crib.get(`/api/machines/${machine.id}`)).body.version).toBe(1)
  })

  it('is archived with its place, leaves the list, and comes back', async () => {
    const { body: machine } = await crib.post('/api/machines', sound())
    const path = `/api/machines/${machine.id}`
    expect((await crib.remove(path)).status).toBe(204)
    expect((await crib.remove(path)).status).toBe(204)
    const ids = async (archived: string) =>
      (await crib.get(`/api/machines?archived=${archived}`)).body.rows.map((row) => row.id)
    expect(await ids('no')).not.toContain(machine.id)
    expect(await ids('only')).toContain(machine.id)
    const place = await crib.get(`/api/locations?kind=machine&code=${machine.code}&archived=all`)
    expect(place.body.rows[0]?.archivedAt).not.toBeNull()
    const back = await crib.patch(path, { version: 2, archivedAt: null })
    expect(back.body.archivedAt).toBeNull()
    expect(await ids('no')).toContain(machine.id)
  })

  it('is not there where there is none', async () => {
    expect((await machinist.get('/api/machines/999999999')).status).toBe(404)
    expect((await crib.patch('/api/machines/999999999', { version: 1 })).status).toBe(404)
    expect((await crib.remove('/api/machines/999999999')).status).toBe(404)
  })
})
