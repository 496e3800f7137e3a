import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ledgerFaults } from '@/server/db/ledger-faults'
import { type ApiClient, allRows, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'

let crib: ApiClient
let shelf: Shelf
const db = siteDatabase()

beforeAll(async () => {
  crib = await signedInAs('cribManager')
  shelf = await createShelf(crib)
})
afterAll(() => db.destroy())

let serial = 0

/** Two cutters that measure the same as each other and as nothing else. */
async function twins(change: Record<string, unknown> = {}): Promise<[kept: string, merged: string]> {
  serial += 1
  const overallLengthMm = 300 + serial + Math.floor(Math.random() * 1e6) / 1e5
  const kept = await createCutter(crib, { overallLengthMm, ...change })
  return [kept, await createCutter(crib, { overallLengthMm, ...change })]
}

const merge = (keptItemId: string, mergedItemId: string, key = uniqueCode('merge'), client = crib) =>
  client.post('/api/duplicates/merge', { keptItemId, mergedItemId }, key)

const stockOf = async (id: string) => (await crib.get(`/api/items/${id}/stock`)).body

async function groupOf(id: string): Promise<string[]> {
  const { body } = await crib.get('/api/duplicates?kind=cutter')
  const groups = body.groups as { id: string }[][]
  return groups.find((group) => group.some((item) => item.id === id))?.map((item) => item.id) ?? []
}

describe('duplicates', () => {
  it('are the items of one geometry, whatever their maker; a thousandth makes another', async () => {
    const overallLengthMm = 400 + Math.floor(Math.random() * 1e6) / 1e4
    const first = await createCutter(crib, { overallLengthMm, maker: 'Ostrava Tools' })
    const second = await createCutter(crib, { overallLengthMm, maker: 'Another' })
    const third = await createCutter(crib, { overallLengthMm, maker: 'A third' })
    await createCutter(crib, { overallLengthMm: overallLengthMm + 0.001 })
    expect((await groupOf(first)).sort()).toEqual([first, second, third].sort())
  })

  it('of holders measure the same along their whole outline', async () => {
    const gaugeLengthMm = 150 + Math.floor(Math.random() * 1e6) / 1e5
    const holder = (spindleDiameterMm: number) => ({
      code: uniqueCode('H'),
      gaugeLengthMm,
      bore: { kind: 'fixed', diameterMm: 6 },
      segments: [{ part: 'holder', lengthMm: 40, noseDiameterMm: 20, spindleDiameterMm }],
    })
    const made: string[] = []
    for (const diameter of [30, 30, 31]) {
      made.push((await crib.post('/api/holders', holder(diameter))).body.id)
    }
    const { body } = await crib.get('/api/duplicates?kind=holder')
    const groups = (body.groups as { id: string }[][]).map((group) => group.map(({ id }) => id).sort())
    expect(groups).toContainEqual(made.slice(0, 2).sort())
  })

  it('need a kind', async () => {
    const answer = await crib.get('/api/duplicates')
    expect(answer.status).toBe(400)
    expect(faultPaths(answer)).toEqual(['kind'])
  })
})

describe('a merge', () => {
  it('moves every piece where it lies, archives the other and leaves the books right', async () => {
    const [kept, merged] = await twins()
    await putOnShelf(db, crib, { itemId: kept, binId: shelf.binId, quantity: 1 })
    await putOnShelf(db, crib, { itemId: merged, binId: shelf.binId, quantity: 2 })
    await putOnShelf(db, crib, { itemId: merged, binId: shelf.secondBinId, quantity: 3, condition: 'worn' })
    const answer = await merge(kept, merged)
    expect(answer.status).toBe(201)
    expect((await stockOf(merged)).balances).toEqual([])
    const { balances, onHand } = await stockOf(kept)
    expect(onHand).toBe(3)
    expect(balances).toEqual(
      expect.arrayContaining([
        expect.objectContaining({ locationId: shelf.binId, condition: 'new', quantity: 3 }),
        expect.objectContaining({ locationId: shelf.secondBinId, condition: 'worn', quantity: 3 }),
      ]),
    )
    expect((await crib.get(`/api/cutters/${merged}`)).body.archivedAt).not.toBeNull()
    expect((await ledgerFaults(db)).faults).toEqual([])
    const [entry] = await db('audit_entries').where({ action: 'cutter-merged', entity_id: merged })
    expect(entry).toMatchObject({ actor_id: crib.user.id, after: { keptItemId: kept } })
  })

  it('keeps the history under the old code, which finds the kept item and names it', async () => {
    const [kept, merged] = await twins()
    await putOnShelf(db, crib, { itemId: merged, binId: shelf.binId, quantity: 2 })
    await merge(kept, merged)
    const old = (await crib.get(`/api/cutters/${merged}`)).body
    const movements = (await crib.get(`/api/items/${merged}/movements`)).body.rows
    expect(movements.map(({ note }) => note)).toHaveLength(2)
    const found = await allRows(crib, `/api/cutters?q=${old.code}&limit=50`)
    expect(found.map(({ id }) => id)).toEqual([kept])
    expect((await crib.get(`/api/items/${merged}/merges`)).body).toMatchObject({
      into: { id: kept },
      from: [],
    })
    expect((await crib.get(`/api/items/${kept}/merges`)).body).toMatchObject({
      into: null,
      from: [{ id: merged, code: old.code }],
    })
    const back = await crib.patch(`/api/cutters/${merged}`, { version: old.version, archivedAt: null })
    expect(back.status).toBe(200)
    expect((await crib.get(`/api/items/${merged}/merges`)).body).toEqual({ into: null, from: [] })
  })

  it('sent twice with one key happens once and answers the same', async () => {
    const [kept, merged] = await twins()
    await putOnShelf(db, crib, { itemId: merged, binId: shelf.binId, quantity: 2 })
    const key = uniqueCode('merge')
    const answers = await Promise.all([merge(kept, merged, key), merge(kept, merged, key)])
    expect(answers.map(({ status }) => status)).toEqual([201, 201])
    expect(answers[0]?.body).toEqual(answers[1]?.body)
    expect((await stockOf(kept)).onHand).toBe(2)
    expect(
      (await crib.post('/api/duplicates/merge', { keptItemId: kept, mergedItemId: merged })).status,
    ).toBe(400)
  })

  it('takes over a reorder point where the kept item has none', async () => {
    const [kept, merged] = await twins()
    const point = { crib_id: shelf.cribId, reorder_point: 2, order_up_to: 9 }
    await db('reorder_points').insert({ item_id: merged, ...point })
    await merge(kept, merged)
    expect(
      await db('reorder_points').where('item_id', kept).select('crib_id', 'reorder_point', 'order_up_to'),
    ).toEqual([point])
  })

  it('refuses what measures otherwise, what is archived and what is itself, and changes nothing', async () => {
    const [kept, merged] = await twins()
    const other = await createCutter(crib, { overallLengthMm: 299.5 })
    const archived = (await twins())[0]
    await crib.remove(`/api/cutters/${archived}`)
    for (const [one, two, path] of [
      [kept, other, 'mergedItemId'],
      [archived, merged, 'keptItemId'],
      [kept, '999999999', 'mergedItemId'],
      [kept, kept, 'mergedItemId'],
    ] as const) {
      const answer = await merge(one, two)
      expect(answer.status).toBe(422)
      expect(faultPaths(answer)).toEqual([path])
    }
    expect((await crib.get(`/api/cutters/${other}`)).body.archivedAt).toBeNull()
  })

  it('refuses an item tracked piece by piece', async () => {
    const [kept, merged] = await twins()
    await db('items').where('id', merged).update({ is_tracked_by_piece: true })
    const answer = await merge(kept, merged)
    expect(answer.status).toBe(422)
    expect(faultPaths(answer)).toEqual(['mergedItemId'])
  })

  it('refuses while a piece is in someone’s hands, and says whose', async () => {
    const [kept, merged] = await twins()
    await putOnShelf(db, crib, { itemId: merged, binId: shelf.binId, quantity: 2 })
    const issue = {
      kind: 'issue',
      itemId: merged,
      quantity: 1,
      fromLocationId: shelf.binId,
      fromCondition: 'new',
      toLocationId: crib.user.locationId,
    }
    expect((await crib.post('/api/movements', issue, uniqueCode('issue'))).status).toBe(201)
    const answer = await merge(kept, merged)
    expect(answer.status).toBe(409)
    expect(answer.body.detail).toContain('1 with')
    expect((await stockOf(merged)).onHand).toBe(1)
    expect((await stockOf(kept)).onHand).toBe(0)
  })

  it('and a movement of the same item at one moment leave no piece behind', async () => {
    const [kept, merged] = await twins()
    await putOnShelf(db, crib, { itemId: merged, binId: shelf.binId, quantity: 4 })
    const relocation = {
      kind: 'relocation',
      itemId: merged,
      quantity: 3,
      fromLocationId: shelf.binId,
      fromCondition: 'new',
      toLocationId: shelf.secondBinId,
    }
    const [merging, moving] = await Promise.all([
      merge(kept, merged),
      crib.post('/api/movements', relocation, uniqueCode('move')),
    ])
    expect(merging.status).toBe(201)
    expect([201, 409, 422]).toContain(moving.status)
    expect((await stockOf(kept)).onHand).toBe(4)
    expect((await stockOf(merged)).balances).toEqual([])
  })
})
