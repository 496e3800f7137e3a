import { randomUUID } from 'node:crypto'
import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { type ApiClient, signedInAs } from '../support/api'
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
  await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 10 })
})

const issue = (quantity: number) => ({
  kind: 'issue',
  itemId,
  quantity,
  fromLocationId: shelf.binId,
  fromCondition: 'new',
  toLocationId: machinist.user.locationId,
})
const onHand = async () => (await crib.get(`/api/items/${itemId}/stock`)).body.onHand

describe('an idempotency key', () => {
  it('is asked for, and refused where it cannot be one', async () => {
    for (const key of [undefined, 'x'.repeat(201), 'with space']) {
      const answer = await machinist.post('/api/movements', issue(1), key)
      expect([answer.status, answer.body.code]).toEqual([400, 'idempotency-key-missing'])
    }
    expect(await onHand()).toBe(10)
  })

  it('makes a call sent twice happen once and answer the same', async () => {
    const key = randomUUID()
    const first = await machinist.post('/api/movements', issue(2), key)
    const second = await machinist.post('/api/movements', issue(2), key)
    expect(first.status).toBe(201)
    expect(second.status).toBe(201)
    expect(second.body).toEqual(first.body)
    expect(await onHand()).toBe(8)
  })

  it('makes twins that come at the same time happen once and answer the same', async () => {
    const key = randomUUID()
    const answers = await Promise.all(
      Array.from({ length: 6 }, () => machinist.post('/api/movements', issue(2), key)),
    )
    expect(answers.map((answer) => answer.status)).toEqual([201, 201, 201, 201, 201, 201])
    expect(new Set(answers.map((answer) => answer.body.id)).size).toBe(1)
    expect(await onHand()).toBe(8)
  })

  it('is refused with another body', async () => {
    const key = randomUUID()
    await machinist.post('/api/movements', issue(2), key)
    const other = await machinist.post('/api/movements', issue(3), key)
    expect([other.status, other.body.code]).toEqual([409, 'idempotency-key-reused'])
    expect(await onHand()).toBe(8)
  })

  it('is free again after a refusal', async () => {
    const key = randomUUID()
    expect((await machinist.post('/api/movements', issue(11), key)).status).toBe(409)
    await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 1 })
    expect((await machinist.post('/api/movements', issue(11), key)).status).toBe(201)
    expect(await onHand()).toBe(0)
  })

  it("is each person's own", async () => {
    const key = randomUUID()
    const one = await machinist.post('/api/movements', issue(2), key)
    const other = await crib.post('/api/movements', issue(2), key)
    expect(other.status).toBe(201)
    expect(other.body.id).not.toBe(one.body.id)
    expect(await onHand()).toBe(6)
  })
})
