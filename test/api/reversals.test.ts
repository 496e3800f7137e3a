import { randomUUID } from 'node:crypto'
import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { type ApiClient, signedInAs } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'
import { locationOf } from '../support/books'

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

async function issueBy(who: ApiClient, quantity = 3): Promise<string> {
  const body = {
    kind: 'issue',
    itemId,
    quantity,
    fromLocationId: shelf.binId,
    toLocationId: who.user.locationId,
  }
  return (await who.post('/api/movements', body, randomUUID())).body.id
}

/** An issue by the machinist that was recorded before, as a row of the books. */
async function issueRecordedAt(at: Knex.Raw, place: { binId: string } = shelf): Promise<string> {
  const [row] = await db('movements')
    .insert({
      kind: 'issue',
      item_id: itemId,
      quantity: 1,
      from_location_id: place.binId,
      from_condition: 'new',
      to_location_id: machinist.user.locationId,
      to_condition: 'new',
      actor_id: machinist.user.id,
      recorded_at: at,
    })
    .returning('id')
  return row.id
}

const reverse = (who: ApiClient, id: string, key = randomUUID()) =>
  who.send('POST', `/api/movements/${id}/reversal`, { idempotencyKey: key })
const onHand = async () => (await crib.get(`/api/items/${itemId}/stock`)).body.onHand

describe('a reversal', () => {
  it('puts back what was moved, and stands beside it in the books', async () => {
    const id = await issueBy(machinist)
    const answer = await reverse(machinist, id)
    expect(answer.status).toBe(201)
    expect(answer.body).toMatchObject({
      kind: 'reversal',
      quantity: 3,
      reversesId: id,
      fromLocationId: machinist.user.locationId,
      toLocationId: shelf.binId,
      canReverse: false,
    })
    expect(await onHand()).toBe(10)
    const [newest, before] = (await crib.get(`/api/items/${itemId}/movements`)).body.rows
    expect(newest?.id).toBe(answer.body.id)
    expect(before).toMatchObject({ id, reversedById: answer.body.id, canReverse: false })
  })

  it('happens once, also where two ask at the same time', async () => {
    const id = await issueBy(machinist)
    const answers = await Promise.all([1, 2, 3].map(() => reverse(crib, id)))
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409, 409])
    const again = await reverse(crib, id)
    expect([again.status, again.body.code]).toEqual([409, 'already-reversed'])
    expect(await onHand()).toBe(10)
  })

  it('answers the same to the same key', async () => {
    const id = await issueBy(machinist)
    const key = randomUUID()
    const first = await reverse(machinist, id, key)
    const second = await reverse(machinist, id, key)
    expect(second.status).toBe(201)
    expect(second.body).toEqual(first.body)
  })

  it('is not reversed itself', async () => {
    const reversal = await reverse(crib, await issueBy(machinist))
    const answer = await reverse(crib, reversal.body.id)
    expect([answer.status, answer.body.code]).toEqual([422, 'movement-not-possible'])
  })

  it('is refused where the pieces have gone on since', async () => {
    const id = await issueBy(machinist)
    const scrap = { kind: 'scrap', itemId, quantity: 1, fromLocationId: machinist.user.locationId }
    expect((await machinist.post('/api/movements', scrap, randomUUID())).status).toBe(201)
    const answer = await reverse(machinist, id)
    expect([answer.status, answer.body.code]).toEqual([409, 'not-enough-stock'])
    expect(answer.body).toMatchObject({ available: 2, wanted: 3 })
    expect(await onHand()).toBe(7)
  })

  it('of no movement answers 404, and wants a key', async () => {
    expect((await reverse(crib, '999999999')).status).toBe(404)
    const answer = await crib.send('POST', `/api/movements/${await issueBy(machinist)}/reversal`)
    expect([answer.status, answer.body.code]).toEqual([400, 'idempotency-key-missing'])
  })
})

describe('who may reverse', () => {
  it("is a machinist for their own, never for another's", async () => {
    const answer = await reverse(machinist, await issueBy(crib))
    expect([answer.status, answer.body.code]).toEqual([403, 'not-allowed'])
    expect(await onHand()).toBe(7)
  })

  it('is a machinist on the same day, by the time of the crib, and the crib manager on any', async () => {
    // Recorded the second before the day began at this crib, which may be today elsewhere.
    const zone = 'Pacific/Kiritimati'
    const far = await createShelf(crib, zone)
    await putOnShelf(db, crib, { itemId, binId: far.binId, quantity: 5 })
    const dayBegan = "date_trunc('day', now() at time zone ?) at time zone ?"
    const yesterday = await issueRecordedAt(db.raw(`${dayBegan} - interval '1 second'`, [zone, zone]), far)
    const today = await issueRecordedAt(db.raw(dayBegan, [zone, zone]), far)
    expect((await reverse(machinist, yesterday)).status).toBe(403)
    expect((await reverse(machinist, today)).status).toBe(201)
    expect((await reverse(crib, yesterday)).status).toBe(201)
  })

  it('is the crib manager for what came from a document', async () => {
    const [row] = await db('movements')
      .insert({
        kind: 'receipt',
        item_id: itemId,
        quantity: 2,
        from_location_id: await locationOf(db, { kind: 'supplier' }),
        from_condition: 'new',
        to_location_id: shelf.binId,
        to_condition: 'new',
        actor_id: crib.user.id,
      })
      .returning('id')
    expect((await reverse(machinist, row.id)).status).toBe(403)
    const answer = await reverse(crib, row.id)
    expect(answer.status).toBe(201)
    expect(answer.body).toMatchObject({ toLocationId: null, to: { kind: 'supplier' } })
  })
})
