import { beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createShelf, putOnShelf, siteDatabase } from '../support/api-stock'

let crib: ApiClient
let machinist: ApiClient

beforeAll(async () => {
  ;[crib, machinist] = await Promise.all([signedInAs('cribManager'), signedInAs('machinist')])
})

const vise = (change: Record<string, unknown> = {}) => ({
  code: uniqueCode('VISE'),
  description: 'Vise, 125 mm jaws',
  heightMm: 98.4,
  ...change,
})

describe('a fixture', () => {
  it('is added with its height, read back, and found in its list', async () => {
    const given = vise()
    const made = await crib.post('/api/fixtures', given)
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({ ...given, kind: 'fixture', version: 1, stock: { onHand: 0 } })
    expect((await machinist.get(`/api/fixtures/${made.body.id}`)).body).toMatchObject(given)
    const found = await machinist.get(`/api/fixtures?code=${given.code}&heightMm.min=98&sort=-heightMm`)
    expect(found.body.rows).toMatchObject([{ id: made.body.id }])
  })

  it('raises its version with its height, and refuses a stale one', async () => {
    const made = await crib.post('/api/fixtures', vise())
    const path = `/api/fixtures/${made.body.id}`
    expect((await crib.patch(path, { version: 1, heightMm: 100 })).body).toMatchObject({
      version: 2,
      heightMm: 100,
    })
    expect((await crib.patch(path, { version: 1, heightMm: 90 })).status).toBe(409)
  })

  it.each([
    [{ heightMm: 0 }, 422],
    [{ heightMm: -5 }, 422],
    [{ heightMm: '98' }, 400],
    [{ heightMm: undefined }, 400],
  ])('refuses %j at the height', async (change, status) => {
    const answer = await crib.post('/api/fixtures', vise(change))
    expect(answer.status).toBe(status)
    expect(faultPaths(answer)).toEqual(['heightMm'])
  })

  it('lies in a bin and is taken to a machine like any item', async () => {
    const db = siteDatabase()
    const shelf = await createShelf(crib)
    const { body: fixture } = await crib.post('/api/fixtures', vise())
    await putOnShelf(db, crib, { itemId: fixture.id, binId: shelf.binId, quantity: 1 })
    await db.destroy()
    const machine = await crib.post('/api/machines', {
      ...{ code: uniqueCode('M'), name: 'Mill', taper: 'BT30', gaugeLineToTableMm: 500, zTravelMm: 400 },
      maximumRpm: 12_000,
    })
    const moved = await crib.post(
      '/api/movements',
      {
        ...{ kind: 'issue', itemId: fixture.id, quantity: 1, fromLocationId: shelf.binId },
        ...{ fromCondition: 'new', toLocationId: machine.body.locationId },
      },
      uniqueCode('key'),
    )
    expect(moved.status).toBe(201)
    const refused = await crib.remove(`/api/machines/${machine.body.id}`)
    expect(refused.status).toBe(409)
    expect(refused.body.code).toBe('still-in-use')
    expect((await crib.get(`/api/machines/${machine.body.id}`)).body.archivedAt).toBeNull()
  })

  it('is exported with its height in the reader’s unit', async () => {
    const given = vise()
    await crib.post('/api/fixtures', given)
    const file = await crib.getText(`/api/fixtures/export?code=${given.code}&columns=code,heightMm`)
    expect(file.text).toContain(`Own code,Height above what it stands on (mm)\r\n${given.code},98.4\r\n`)
  })

  it('is counted by its filters, changed with others, and archived', async () => {
    const { body: fixture } = await crib.post('/api/fixtures', vise())
    const { body: counted } = await crib.get('/api/fixtures/counts?of=maker,heightMm')
    expect(counted.counts).toMatchObject({ maker: expect.any(Array), heightMm: expect.any(Array) })
    const bulk = await crib.post('/api/fixtures/bulk', {
      changes: [{ id: fixture.id, version: 1, maker: 'Arkwell' }],
    })
    expect(bulk.body.rows).toMatchObject([{ id: fixture.id, maker: 'Arkwell', version: 2 }])
    expect((await crib.remove(`/api/fixtures/${fixture.id}`)).status).toBe(204)
  })
})
