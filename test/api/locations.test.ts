import { randomUUID } from 'node:crypto'
import type { Knex } from 'knex'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, allRows, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'

let db: Knex
let crib: ApiClient
let machinist: ApiClient
let shelf: Shelf

beforeAll(async () => {
  db = siteDatabase()
  ;[crib, machinist] = await Promise.all([signedInAs('cribManager'), signedInAs('machinist')])
  shelf = await createShelf(crib)
})
afterAll(() => db.destroy())

const place = (kind: string, code: string, parentId: string) => ({
  kind,
  code,
  name: `${kind} ${code}`,
  parentId,
})

describe('a crib', () => {
  it('is added with its root, its time zone and its place in the list', async () => {
    const code = uniqueCode('CRIB')
    const made = await crib.post('/api/locations', {
      kind: 'crib',
      code,
      name: 'By the saws',
      timeZone: 'America/Chicago',
    })
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({
      kind: 'crib',
      code,
      cribCode: code,
      parentId: null,
      name: 'By the saws',
    })
    const cribs = (await machinist.get('/api/cribs')).body.rows
    expect(cribs.find((one) => one.code === code)).toEqual({
      id: made.body.cribId,
      code,
      members: 0,
      name: 'By the saws',
      timeZone: 'America/Chicago',
      locationId: made.body.id,
    })
  })

  it('is refused with a taken code, without a time zone and with one that is none', async () => {
    const code = uniqueCode('CRIB')
    const given = { kind: 'crib', code, name: 'Twice', timeZone: 'UTC' }
    await crib.post('/api/locations', given)
    const twice = await crib.post('/api/locations', { ...given, code: code.toLowerCase() })
    expect([twice.status, faultPaths(twice)]).toEqual([409, ['code']])
    const none = await crib.post('/api/locations', { ...given, code: uniqueCode('C'), timeZone: undefined })
    expect([none.status, faultPaths(none)]).toEqual([400, ['timeZone']])
    const wrong = await crib.post('/api/locations', {
      ...given,
      code: uniqueCode('C'),
      timeZone: 'Mars/Olympus',
    })
    expect([wrong.status, faultPaths(wrong)]).toEqual([422, ['timeZone']])
  })
})

describe('a place in a crib', () => {
  it('stands in what is of a higher rank', async () => {
    const cabinet = await crib.post('/api/locations', place('cabinet', 'K1', shelf.cribLocationId))
    const drawer = await crib.post('/api/locations', place('drawer', 'K1-D1', cabinet.body.id))
    const bin = await crib.post('/api/locations', place('bin', 'K1-D1-B1', drawer.body.id))
    expect([cabinet.status, drawer.status, bin.status]).toEqual([201, 201, 201])
    expect(bin.body).toMatchObject({ kind: 'bin', cribId: shelf.cribId, parentId: drawer.body.id })
    const turned = await crib.post('/api/locations', place('cabinet', 'K2', drawer.body.id))
    expect([turned.status, faultPaths(turned)]).toEqual([422, ['parentId']])
    const inHands = await crib.post('/api/locations', place('bin', 'B9', machinist.user.locationId))
    expect([inHands.status, faultPaths(inHands)]).toEqual([422, ['parentId']])
    const nowhere = await crib.post('/api/locations', place('bin', 'B9', '999999999'))
    expect([nowhere.status, faultPaths(nowhere)]).toEqual([422, ['parentId']])
  })

  it('has a code of its own in its crib, and may share it with another crib', async () => {
    const again = await crib.post('/api/locations', place('bin', 'a-1', shelf.cribLocationId))
    expect([again.status, again.body.code]).toEqual([409, 'code-taken'])
    const elsewhere = await createShelf(crib)
    expect(elsewhere.binId).not.toBe(shelf.binId)
  })

  it('is renamed and moved within its crib, and not by a stale version', async () => {
    const made = await crib.post('/api/locations', place('bin', 'M1', shelf.cribLocationId))
    const cabinet = await crib.post('/api/locations', place('cabinet', 'M-K', shelf.cribLocationId))
    const path = `/api/locations/${made.body.id}`
    const moved = await crib.patch(path, { version: 1, name: 'Small drills', parentId: cabinet.body.id })
    expect(moved.body).toMatchObject({ code: 'M1', name: 'Small drills', parentId: cabinet.body.id })
    const stale = await crib.patch(path, { version: 1, name: 'Late' })
    expect([stale.status, stale.body.current]).toEqual([409, moved.body])
    const other = await createShelf(crib)
    const away = await crib.patch(path, { version: moved.body.version, parentId: other.cribLocationId })
    expect([away.status, faultPaths(away)]).toEqual([422, ['parentId']])
  })

  it('gives a crib its new name everywhere', async () => {
    const own = await createShelf(crib)
    const code = uniqueCode('NEW')
    const renamed = await crib.patch(`/api/locations/${own.cribLocationId}`, {
      version: 1,
      code,
      name: 'New',
    })
    expect(renamed.body).toMatchObject({ code, cribCode: code, name: 'New' })
  })
})

describe('archiving a place', () => {
  it('is refused while it holds stock, and done once it is empty', async () => {
    const itemId = await createCutter(crib)
    await putOnShelf(db, crib, { itemId, binId: shelf.secondBinId, quantity: 1 })
    const full = await crib.remove(`/api/locations/${shelf.secondBinId}`)
    expect([full.status, full.body.code]).toEqual([409, 'still-in-use'])
    const issue = {
      kind: 'issue',
      itemId,
      quantity: 1,
      fromLocationId: shelf.secondBinId,
      toLocationId: crib.user.locationId,
    }
    await crib.post('/api/movements', issue, randomUUID())
    expect((await crib.remove(`/api/locations/${shelf.secondBinId}`)).status).toBe(204)
    expect((await crib.remove(`/api/locations/${shelf.secondBinId}`)).status).toBe(204)
    const codes = async (archived: string) =>
      (await crib.get(`/api/locations?cribId=${shelf.cribId}&kind=bin&archived=${archived}`)).body.rows.map(
        (row) => row.code,
      )
    expect(await codes('no')).not.toContain('A-2')
    expect(await codes('only')).toEqual(['A-2'])
  })

  it('is refused for a crib with anything in it, for hands and for the far ends of the books', async () => {
    expect((await crib.remove(`/api/locations/${shelf.cribLocationId}`)).status).toBe(409)
    expect((await crib.remove(`/api/locations/${machinist.user.locationId}`)).status).toBe(422)
    const scrap = await db('locations').where('kind', 'scrap').first('id')
    expect((await crib.remove(`/api/locations/${scrap.id}`)).status).toBe(404)
    expect((await crib.patch(`/api/locations/${scrap.id}`, { version: 1, name: 'x' })).status).toBe(404)
  })
})

describe('bringing an archived place back', () => {
  const added = async (kind: string, parentId: string): Promise<string> =>
    (await crib.post('/api/locations', place(kind, uniqueCode(kind), parentId))).body.id

  it('gives it its code, name and place again, and is written down', async () => {
    const drawerId = await added('drawer', shelf.cribLocationId)
    expect((await crib.remove(`/api/locations/${drawerId}`)).status).toBe(204)
    const [before] = await allRows(crib, `/api/locations?archived=only&cribId=${shelf.cribId}&kind=drawer`)
    const answer = await crib.patch(`/api/locations/${drawerId}`, {
      version: before?.version,
      archivedAt: null,
    })
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({
      code: before?.code,
      parentId: shelf.cribLocationId,
      archivedAt: null,
    })
    const entry = { action: 'location-restored', entity_id: drawerId, actor_id: crib.user.id }
    expect(await db('audit_entries').where(entry)).toHaveLength(1)
    expect((await crib.get(`/api/locations/${await added('bin', drawerId)}/contents`)).status).toBe(200)
  })

  it('is refused while what it stands in is archived', async () => {
    const drawerId = await added('drawer', shelf.cribLocationId)
    const binId = await added('bin', drawerId)
    await crib.remove(`/api/locations/${binId}`)
    await crib.remove(`/api/locations/${drawerId}`)
    const rows = await allRows(crib, `/api/locations?archived=only&cribId=${shelf.cribId}`)
    const version = (id: string) => rows.find((row) => row.id === id)?.version
    const back = (id: string) =>
      crib.patch(`/api/locations/${id}`, { version: version(id), archivedAt: null })
    const refused = await back(binId)
    expect(refused.status).toBe(422)
    expect(refused.body.detail).toContain('bring that back first')
    expect((await back(drawerId)).status).toBe(200)
    expect((await back(binId)).status).toBe(200)
  })
})

describe('the list of locations', () => {
  it('shows those of a kind and a crib, and never the far ends of the books', async () => {
    const bins = await machinist.get(`/api/locations?kind=bin&cribId=${shelf.cribId}&code=A-`)
    expect(bins.body.rows[0]).toMatchObject({
      id: shelf.binId,
      code: 'A-1',
      kind: 'bin',
      cribId: shelf.cribId,
      name: 'Bin A-1',
    })
    const people = await machinist.get('/api/locations?kind=person,machine&limit=500')
    expect(people.body.rows.map((row) => row.id)).toContain(machinist.user.locationId)
    expect((await machinist.get('/api/locations?kind=scrap')).status).toBe(400)
    const kinds = (await allRows(machinist, '/api/locations?limit=500')).map((row) => row.kind)
    for (const kind of ['supplier', 'scrap', 'countAdjustment']) expect(kinds).not.toContain(kind)
  })
})
