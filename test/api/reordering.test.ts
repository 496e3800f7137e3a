import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'

let db: Knex
let crib: ApiClient
let machinist: ApiClient
let shelf: Shelf
let itemId: string

beforeAll(async () => {
  db = siteDatabase()
  ;[crib, machinist] = await Promise.all([signedInAs('cribManager'), signedInAs('machinist')])
  shelf = await createShelf(crib)
})
afterAll(() => db.destroy())
beforeEach(async () => {
  itemId = await createCutter(crib)
  await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 8 })
})

const address = () => `/api/reorder-points/${itemId}/${shelf.cribId}`
const put = (body: unknown, by = crib) => by.send('PUT', address(), { body })
const alerts = async (state = '') =>
  (await machinist.get(`/api/alerts?itemId=${itemId}${state}`)).body.rows as Record<string, unknown>[]

describe('a reorder point', () => {
  it('is set, answered, and changed with what is absent left as it was', async () => {
    const supplier = await crib.post('/api/suppliers', { name: uniqueCode('Supplier'), leadTimeDays: 6 })
    const made = await put({ reorderPoint: 3, orderUpTo: 9, packSize: 5, supplierId: supplier.body.id })
    expect([made.status, made.body]).toMatchObject([
      200,
      {
        itemId,
        cribId: shelf.cribId,
        reorderPoint: 3,
        orderUpTo: 9,
        packSize: 5,
        minimumOrder: 1,
        version: 1,
      },
    ])
    const changed = await put({ reorderPoint: 2, orderUpTo: 9, version: 1 })
    expect(changed.body).toMatchObject({
      packSize: 5,
      supplierId: supplier.body.id,
      reorderPoint: 2,
      version: 2,
    })
    const listed = await machinist.get(`/api/reorder-points?itemId=${itemId}`)
    expect(listed.body).toMatchObject({
      total: 1,
      nextCursor: null,
      rows: [{ position: 8, reorderPoint: 2 }],
    })
  })

  it('is refused beside its field where it cannot be', async () => {
    for (const [body, status, path] of [
      [{ reorderPoint: 9, orderUpTo: 3 }, 422, 'reorderPoint'],
      [{ reorderPoint: -1, orderUpTo: 3 }, 422, 'reorderPoint'],
      [{ reorderPoint: 1, orderUpTo: 2_000_000 }, 422, 'orderUpTo'],
      [{ reorderPoint: 1.5, orderUpTo: 3 }, 422, 'reorderPoint'],
      [{ orderUpTo: 3 }, 400, 'reorderPoint'],
      [{ reorderPoint: 1, orderUpTo: 3, packSize: 0 }, 422, 'packSize'],
      [{ reorderPoint: 1, orderUpTo: 3, leadTimeDays: 5000 }, 422, 'leadTimeDays'],
      [{ reorderPoint: 1, orderUpTo: 3, supplierId: '999999999' }, 422, 'supplierId'],
    ] as const) {
      const refused = await put(body)
      expect([refused.status, faultPaths(refused)], JSON.stringify(body)).toEqual([status, [path]])
    }
    expect((await machinist.get(`/api/reorder-points?itemId=${itemId}`)).body.total).toBe(0)
    const nowhere = await crib.send('PUT', `/api/reorder-points/${itemId}/999999999`, {
      body: { reorderPoint: 1, orderUpTo: 2 },
    })
    expect(nowhere.status).toBe(404)
  })

  it('is refused to the second of two who changed the same one, who gets what is there', async () => {
    await put({ reorderPoint: 1, orderUpTo: 9 })
    await put({ reorderPoint: 2, orderUpTo: 9, version: 1 })
    const late = await put({ reorderPoint: 3, orderUpTo: 9, version: 1 })
    expect([late.status, late.body.current]).toMatchObject([409, { reorderPoint: 2, version: 2 }])
  })
})

describe('an alert', () => {
  it('opens with the point, tells what to order, closes with it and stays in the list', async () => {
    await put({ reorderPoint: 8, orderUpTo: 12, packSize: 5, minimumOrder: 6 })
    expect(await alerts()).toMatchObject([
      {
        itemId,
        cribId: shelf.cribId,
        closedAt: null,
        position: 8,
        onHand: 8,
        reorderPoint: 8,
        suggestedQuantity: 10,
        places: ['A-1'],
        size: { kind: 'cutter', form: 'square' },
      },
    ])
    await put({ reorderPoint: 7, orderUpTo: 12 })
    expect(await alerts('&state=open')).toEqual([])
    const [closed] = await alerts()
    expect(Date.parse(String(closed?.closedAt))).toBeGreaterThanOrEqual(Date.parse(String(closed?.openedAt)))
  })

  it('opens with an issue and closes when the point is taken away', async () => {
    await put({ reorderPoint: 6, orderUpTo: 12 })
    expect(await alerts()).toEqual([])
    await machinist.post(
      '/api/movements',
      {
        kind: 'issue',
        itemId,
        quantity: 2,
        fromLocationId: shelf.binId,
        fromCondition: 'new',
        toLocationId: machinist.user.locationId,
      },
      uniqueCode('key'),
    )
    expect(await alerts('&state=open')).toMatchObject([{ position: 6 }])
    expect((await crib.remove(address())).status).toBe(204)
    expect(await alerts('&state=open')).toEqual([])
    expect((await crib.remove(address())).status).toBe(404)
  })
})
