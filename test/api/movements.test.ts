import { randomUUID } from 'node:crypto'
import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'

let db: Knex
let crib: ApiClient
let machinist: ApiClient
let shelf: Shelf
let farShelf: Shelf
let itemId: string

beforeAll(async () => {
  db = siteDatabase()
  ;[crib, machinist] = await Promise.all([signedInAs('cribManager'), signedInAs('machinist')])
  ;[shelf, farShelf] = await Promise.all([createShelf(crib), createShelf(crib)])
})
afterAll(() => db.destroy())

beforeEach(async () => {
  itemId = await createCutter(crib)
  await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 10 })
})

const movement = (change: Record<string, unknown> = {}) => ({
  kind: 'issue',
  itemId,
  quantity: 3,
  fromLocationId: shelf.binId,
  fromCondition: 'new',
  toLocationId: machinist.user.locationId,
  ...change,
})
const post = (who: ApiClient, change: Record<string, unknown> = {}) =>
  who.post('/api/movements', movement(change), randomUUID())
const stock = async () => (await crib.get(`/api/items/${itemId}/stock`)).body
const placeApart = async (kind: string) =>
  (await crib.post('/api/locations', { kind, code: uniqueCode(kind), name: 'A place apart' })).body.id

describe('an issue', () => {
  it('takes pieces from a bin into hands, in the condition they were in', async () => {
    const answer = await post(machinist, { note: 'for the fixture plate' })
    expect(answer.status).toBe(201)
    expect(answer.body).toMatchObject({
      kind: 'issue',
      quantity: 3,
      fromLocationId: shelf.binId,
      from: { kind: 'bin', code: 'A-1' },
      toLocationId: machinist.user.locationId,
      toCondition: 'new',
      note: 'for the fixture plate',
      actorId: machinist.user.id,
      reversesId: null,
      canReverse: true,
    })
    const after = await stock()
    expect(after).toMatchObject({ onHand: 7, reserved: 0, available: 7, coming: 0 })
    expect(after.balances).toEqual([
      expect.objectContaining({
        locationId: shelf.binId,
        locationCode: 'A-1',
        condition: 'new',
        quantity: 7,
      }),
      expect.objectContaining({
        locationId: machinist.user.locationId,
        locationKind: 'person',
        condition: 'new',
        quantity: 3,
      }),
    ])
  })

  it('takes the last piece and not one more', async () => {
    expect((await post(machinist, { quantity: 10 })).status).toBe(201)
    const answer = await post(machinist, { quantity: 1 })
    expect(answer.status).toBe(409)
    expect(answer.body.code).toBe('not-enough-stock')
  })

  it('says what is there where it is not enough', async () => {
    await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 4, condition: 'used' })
    const answer = await post(machinist, { quantity: 11 })
    expect(answer.status).toBe(409)
    expect(answer.body).toMatchObject({
      code: 'not-enough-stock',
      available: 10,
      wanted: 11,
      condition: 'new',
    })
    expect(answer.body.balances).toEqual([
      expect.objectContaining({ locationId: shelf.binId, condition: 'new', quantity: 10 }),
      expect.objectContaining({ locationId: shelf.binId, condition: 'used', quantity: 4 }),
    ])
    expect(faultPaths(answer)).toEqual(['quantity'])
    expect(await stock()).toMatchObject({ onHand: 14 })
  })

  it('never leaves less than nothing, however many come at once', async () => {
    const answers = await Promise.all(Array.from({ length: 8 }, () => post(machinist, { quantity: 3 })))
    const statuses = answers.map((answer) => answer.status)
    expect(statuses.filter((status) => status === 201)).toHaveLength(3)
    expect(statuses.filter((status) => status === 409)).toHaveLength(5)
    expect(await stock()).toMatchObject({ onHand: 1 })
  })

  it('goes to no bin and comes from no hands', async () => {
    const toBin = await post(crib, { toLocationId: shelf.secondBinId })
    expect([toBin.status, faultPaths(toBin)]).toEqual([422, ['toLocationId']])
    const fromHands = await post(crib, { fromLocationId: machinist.user.locationId })
    expect([fromHands.status, faultPaths(fromHands)]).toEqual([422, ['fromLocationId']])
    const fromCabinet = await post(crib, { fromLocationId: shelf.cribLocationId })
    expect([fromCabinet.status, faultPaths(fromCabinet)]).toEqual([422, ['fromLocationId']])
  })
})

describe('a return', () => {
  it('brings pieces back in the condition they came to', async () => {
    await post(machinist)
    const answer = await post(machinist, {
      kind: 'return',
      quantity: 2,
      fromLocationId: machinist.user.locationId,
      toLocationId: shelf.binId,
      toCondition: 'worn',
    })
    expect(answer.status).toBe(201)
    expect(await stock()).toMatchObject({ onHand: 7, available: 7 })
    const balances = (await stock()).balances
    expect(balances).toContainEqual(expect.objectContaining({ condition: 'worn', quantity: 2 }))
  })
})

describe('scrap', () => {
  it('is reported by a machinist from their own hands, without naming where it goes', async () => {
    await post(machinist)
    const scrap = {
      kind: 'scrap',
      quantity: 1,
      fromLocationId: machinist.user.locationId,
      toLocationId: undefined,
    }
    const answer = await post(machinist, scrap)
    expect(answer.status).toBe(201)
    expect(answer.body).toMatchObject({ toLocationId: null, to: { kind: 'scrap', code: null } })
    const held = (await stock()).balances
    expect(held).toContainEqual(expect.objectContaining({ locationKind: 'person', quantity: 2 }))
    expect(JSON.stringify(held)).not.toContain('scrap')
  })

  it("is refused to a machinist from a bin and from another's hands", async () => {
    await post(crib, { toLocationId: crib.user.locationId })
    for (const fromLocationId of [shelf.binId, crib.user.locationId]) {
      const answer = await post(machinist, { kind: 'scrap', quantity: 1, fromLocationId, toLocationId: null })
      expect(answer.status).toBe(403)
    }
    const byCrib = await post(crib, {
      kind: 'scrap',
      quantity: 1,
      fromLocationId: shelf.binId,
      toLocationId: null,
    })
    expect(byCrib.status).toBe(201)
  })
})

describe('what only those who keep the crib may move', () => {
  it('is a relocation within the crib', async () => {
    const within = { kind: 'relocation', toLocationId: shelf.secondBinId }
    expect((await post(machinist, within)).status).toBe(403)
    expect((await post(crib, within)).status).toBe(201)
    expect(await stock()).toMatchObject({ onHand: 10 })
    const away = await post(crib, { kind: 'relocation', toLocationId: farShelf.binId })
    expect([away.status, faultPaths(away)]).toEqual([422, ['toLocationId']])
    const nowhere = await post(crib, { kind: 'relocation', toLocationId: shelf.binId })
    expect([nowhere.status, faultPaths(nowhere)]).toEqual([422, ['toLocationId']])
  })

  it('is a transfer, out and in', async () => {
    const transit = await placeApart('inTransit')
    const out = { kind: 'transfer', toLocationId: transit }
    expect((await post(machinist, out)).status).toBe(403)
    expect((await post(crib, out)).status).toBe(201)
    expect(await stock()).toMatchObject({ onHand: 7 })
    const arrival = { kind: 'transfer', fromLocationId: transit, toLocationId: farShelf.binId }
    expect((await post(crib, arrival)).status).toBe(201)
    expect(await stock()).toMatchObject({ onHand: 10 })
  })

  it('is a regrind, out and back reground', async () => {
    const grinder = await placeApart('regrind')
    expect((await post(machinist, { kind: 'regrind', toLocationId: grinder })).status).toBe(403)
    expect((await post(crib, { kind: 'regrind', toLocationId: grinder })).status).toBe(201)
    const back = await post(crib, {
      kind: 'regrind',
      fromLocationId: grinder,
      toLocationId: shelf.binId,
      toCondition: 'reground',
    })
    expect(back.status).toBe(201)
    const balances = (await stock()).balances
    expect(balances).toContainEqual(
      expect.objectContaining({ locationId: shelf.binId, condition: 'reground', quantity: 3 }),
    )
  })
})

describe('a movement that cannot be', () => {
  const refused: [string, Record<string, unknown>, number, string][] = [
    ['none of a piece', { quantity: 0 }, 422, 'quantity'],
    ['less than none', { quantity: -1 }, 422, 'quantity'],
    ['half a piece', { quantity: 1.5 }, 422, 'quantity'],
    ['more than a million', { quantity: 1_000_001 }, 422, 'quantity'],
    ['more than anyone can count', { quantity: 1e300 }, 422, 'quantity'],
    ['a number as text', { quantity: '3' }, 400, 'quantity'],
    ['a condition nobody knows', { fromCondition: 'shiny' }, 400, 'fromCondition'],
    ['a kind nobody knows', { kind: 'loan' }, 400, 'kind'],
    ['no item', { itemId: undefined }, 400, 'itemId'],
    ['an item nobody has', { itemId: '999999999' }, 422, 'itemId'],
    ['a place nobody has', { fromLocationId: '999999999' }, 422, 'fromLocationId'],
    ['no place to go', { toLocationId: undefined }, 422, 'toLocationId'],
    ['a receipt by hand', { kind: 'receipt' }, 422, 'kind'],
    ['an adjustment by hand', { kind: 'adjustment' }, 422, 'kind'],
    ['a reversal by itself', { kind: 'reversal' }, 422, 'kind'],
    ['a job nobody has', { jobId: '1' }, 422, 'jobId'],
    ['a piece of an item without any', { pieceId: '1', quantity: 1 }, 422, 'pieceId'],
    ['a note too long', { note: 'x'.repeat(10_001) }, 400, 'note'],
  ]
  it.each(refused)('is refused beside its field: %s', async (_, change, status, path) => {
    const answer = await post(crib, change)
    expect(answer.status).toBe(status)
    expect(faultPaths(answer)).toEqual([path])
    expect(await stock()).toMatchObject({ onHand: 10 })
  })

  it('is refused at every field that is wrong at once', async () => {
    const answer = await post(crib, { itemId: '999999999', fromLocationId: '999999998', jobId: '7' })
    expect(faultPaths(answer)).toEqual(['itemId', 'fromLocationId', 'jobId'])
  })

  it('is refused of an archived item and into an archived bin', async () => {
    const emptyId = await createCutter(crib)
    await crib.remove(`/api/cutters/${emptyId}`)
    const archived = await post(crib, { itemId: emptyId })
    expect([archived.status, faultPaths(archived)]).toEqual([422, ['itemId']])
    const spare = await createShelf(crib)
    await post(crib)
    await crib.remove(`/api/locations/${spare.binId}`)
    const closed = await post(crib, {
      kind: 'return',
      fromLocationId: machinist.user.locationId,
      toLocationId: spare.binId,
    })
    expect([closed.status, faultPaths(closed)]).toEqual([422, ['toLocationId']])
  })

  it('of a tracked item names its piece, which is where it says', async () => {
    const code = uniqueCode('TAG')
    const trackedId = await createCutter(crib)
    await db('items').where('id', trackedId).update({ is_tracked_by_piece: true })
    const [piece] = await db('pieces').insert({ item_id: trackedId, tag: code }).returning('id')
    await db('movements').insert({
      kind: 'adjustment',
      item_id: trackedId,
      piece_id: piece.id,
      quantity: 1,
      from_location_id: db('locations').where('kind', 'count_adjustment').select('id'),
      from_condition: 'new',
      to_location_id: shelf.binId,
      to_condition: 'new',
      actor_id: crib.user.id,
    })
    const unnamed = await post(crib, { itemId: trackedId, quantity: 1 })
    expect([unnamed.status, faultPaths(unnamed)]).toEqual([422, ['pieceId']])
    const several = await post(crib, { itemId: trackedId, pieceId: piece.id, quantity: 2 })
    expect([several.status, faultPaths(several)]).toEqual([422, ['quantity']])
    const elsewhere = { itemId: trackedId, pieceId: piece.id, quantity: 1, fromLocationId: shelf.secondBinId }
    expect((await post(crib, elsewhere)).status).toBe(409)
    const named = await post(crib, { itemId: trackedId, pieceId: piece.id, quantity: 1 })
    expect(named.status).toBe(201)
    expect(named.body.pieceId).toBe(piece.id)
  })
})

describe('what is in stock', () => {
  it('is not archived, on a shelf or in hands', async () => {
    const onShelf = await crib.remove(`/api/cutters/${itemId}`)
    expect([onShelf.status, onShelf.body.code]).toEqual([409, 'still-in-use'])
    await post(machinist, { quantity: 10 })
    expect((await crib.remove(`/api/cutters/${itemId}`)).status).toBe(409)
    await post(machinist, {
      kind: 'scrap',
      quantity: 10,
      fromLocationId: machinist.user.locationId,
      toLocationId: null,
    })
    expect((await crib.remove(`/api/cutters/${itemId}`)).status).toBe(204)
  })

  it('of no item answers 404', async () => {
    expect((await crib.get('/api/items/999999999/stock')).status).toBe(404)
    expect((await crib.get('/api/items/999999999/movements')).status).toBe(404)
  })
})

describe("an item's movements", () => {
  it('are listed newest first, in blocks, and by kind', async () => {
    await post(machinist, { quantity: 1, note: 'first' })
    await post(machinist, { quantity: 2, note: 'second' })
    const whole = await crib.get(`/api/items/${itemId}/movements`)
    expect(whole.body.total).toBe(3)
    expect(whole.body.rows.map((row) => row.note)).toEqual(['second', 'first', ''])
    expect(whole.body.rows[2]).toMatchObject({
      kind: 'adjustment',
      fromLocationId: null,
      from: { kind: 'countAdjustment', code: null },
    })
    const first = await crib.get(`/api/items/${itemId}/movements?limit=2`)
    const rest = await crib.get(`/api/items/${itemId}/movements?limit=2&cursor=${first.body.nextCursor}`)
    expect([...first.body.rows, ...rest.body.rows]).toEqual(whole.body.rows)
    expect(rest.body.nextCursor).toBeNull()
    expect((await crib.get(`/api/items/${itemId}/movements?kind=issue`)).body.total).toBe(2)
    expect((await crib.get(`/api/items/${itemId}/movements?q=second`)).body.total).toBe(1)
  })
})
