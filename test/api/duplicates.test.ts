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

const preview = async (keptItemId: string, mergedItemId: string) =>
  (await crib.get(`/api/duplicates/merge?keptItemId=${keptItemId}&mergedItemId=${mergedItemId}`)).body

async function placeApart(kind: string): Promise<string> {
  const code = uniqueCode(kind.toUpperCase())
  return (await crib.post('/api/locations', { kind, code, name: `Place ${code}` })).body.id
}

/** Two cutters tracked piece by piece, the second with one tagged piece on the shelf. */
async function taggedTwins() {
  const [kept, merged] = await twins()
  await db('items').whereIn('id', [kept, merged]).update({ is_tracked_by_piece: true })
  const tag = uniqueCode('TAG')
  const [piece] = await db('pieces').insert({ item_id: merged, tag }).returning('id')
  const { id: outside } = await db('locations').where('kind', 'count_adjustment').first('id')
  await db('movements').insert({
    kind: 'adjustment',
    item_id: merged,
    piece_id: piece.id,
    quantity: 1,
    from_location_id: outside,
    from_condition: 'new',
    to_location_id: shelf.binId,
    to_condition: 'new',
    actor_id: crib.user.id,
  })
  return { kept, merged, pieceId: String(piece.id), tag }
}

/** Reservations and orders keep these by triggers; here the levels are told by hand, past the guard. */
const promise = (itemId: string, level: { reserved: number; coming: number }) =>
  db.transaction(async (trx) => {
    await trx.raw('set local session_replication_role = replica')
    await trx('stock_levels').where('item_id', itemId).update(level)
  })

const stockOf = async (id: string) => (await crib.get(`/api/items/${id}/stock`)).body

async function groupOf(id: string): Promise<string[]> {
  const { body } = await crib.get('/api/duplicates?kind=cutter')
  const groups = body.groups as { items: { id: string }[] }[]
  const group = groups.find(({ items }) => items.some((item) => item.id === id))
  return group?.items.map((item) => item.id) ?? []
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

  it('stand with the one first that the shop lives with: pieces before a reorder point before age', async () => {
    const overallLengthMm = 600 + Math.floor(Math.random() * 1e6) / 1e4
    const made: string[] = []
    for (const _ of [1, 2, 3, 4]) made.push(await createCutter(crib, { overallLengthMm }))
    const [oldest, second, pointed, stocked] = made as [string, string, string, string]
    await putOnShelf(db, crib, { itemId: stocked, binId: shelf.binId, quantity: 1 })
    await crib.send('PUT', `/api/reorder-points/${pointed}/${shelf.cribId}`, {
      body: { reorderPoint: 1, orderUpTo: 3 },
    })
    expect(await groupOf(oldest)).toEqual([stocked, pointed, oldest, second])
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
    const groups = (body.groups as { items: { id: string }[] }[]).map(({ items }) =>
      items.map(({ id }) => id).sort(),
    )
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

  it('takes along what is in hands, on its way and out for regrinding, where it is', async () => {
    const [kept, merged] = await twins()
    await putOnShelf(db, crib, { itemId: merged, binId: shelf.binId, quantity: 5 })
    const [regrindId, transitId] = [await placeApart('regrind'), await placeApart('inTransit')]
    for (const [kind, toLocationId, quantity] of [
      ['issue', crib.user.locationId, 2],
      ['regrind', regrindId, 1],
      ['transfer', transitId, 1],
    ] as const) {
      const moving = { kind, itemId: merged, quantity, fromLocationId: shelf.binId, toLocationId }
      expect((await crib.post('/api/movements', moving, uniqueCode(kind))).status).toBe(201)
    }
    expect((await merge(kept, merged)).status).toBe(201)
    expect((await stockOf(merged)).balances).toEqual([])
    const { balances, onHand } = await stockOf(kept)
    expect(onHand).toBe(1)
    expect(balances).toHaveLength(4)
    for (const [locationId, quantity] of [
      [shelf.binId, 1],
      [crib.user.locationId, 2],
      [regrindId, 1],
      [transitId, 1],
    ])
      expect(balances).toContainEqual(expect.objectContaining({ locationId, quantity }))
    const back = {
      kind: 'return',
      itemId: kept,
      quantity: 2,
      fromLocationId: crib.user.locationId,
      toLocationId: shelf.secondBinId,
    }
    expect((await crib.post('/api/movements', back, uniqueCode('back'))).status).toBe(201)
    expect((await ledgerFaults(db)).faults).toEqual([])
  })

  it('takes tagged pieces along, and what each went through stays under the code it had then', async () => {
    const { kept, merged, pieceId, tag } = await taggedTwins()
    expect((await preview(kept, merged)).held).toMatchObject([
      { locationCode: 'A-1', quantity: 1, condition: 'new', tags: [tag] },
    ])
    expect((await merge(kept, merged)).status).toBe(201)
    expect((await db('pieces').where('id', pieceId).first()).item_id).toBe(kept)
    const [entry] = await db('audit_entries').where({ action: 'cutter-merged', entity_id: merged })
    expect(entry.after.tags).toEqual([tag])
    const issue = {
      kind: 'issue',
      itemId: kept,
      pieceId,
      quantity: 1,
      fromLocationId: shelf.binId,
      toLocationId: crib.user.locationId,
    }
    expect((await crib.post('/api/movements', issue, uniqueCode('issue'))).status).toBe(201)
    const old = (await crib.get(`/api/items/${merged}/movements`)).body.rows
    expect(old).toMatchObject([{ pieceId }, { pieceId }])
    expect((await ledgerFaults(db)).faults).toEqual([])
  })

  it('refuses where pieces would lose or need a tag, and takes an item without pieces', async () => {
    const { kept, merged } = await taggedTwins()
    await db('items').where('id', kept).update({ is_tracked_by_piece: false })
    const answer = await merge(kept, merged)
    expect(answer.status).toBe(422)
    expect(faultPaths(answer)).toEqual(['mergedItemId'])
    expect((await preview(kept, merged)).refusal).toBe(answer.body.detail)
    expect((await merge(merged, kept)).status).toBe(201)
  })

  it('is not reversed by its halves, whatever became of the items', async () => {
    const { kept, merged } = await taggedTwins()
    expect((await merge(kept, merged)).status).toBe(201)
    const [into] = (await crib.get(`/api/items/${kept}/movements`)).body.rows
    expect(into).toMatchObject({ kind: 'adjustment', canReverse: false })
    const reversal = await crib.post(`/api/movements/${into?.id}/reversal`, {}, uniqueCode('back'))
    expect(reversal.status).toBe(422)
    expect(reversal.body.detail).toContain('half of a merge')

    const old = (await crib.get(`/api/cutters/${merged}`)).body
    await crib.patch(`/api/cutters/${merged}`, { version: old.version, archivedAt: null })
    const arrival = (await crib.get(`/api/items/${merged}/movements`)).body.rows.at(-1)
    const early = await crib.post(`/api/movements/${arrival?.id}/reversal`, {}, uniqueCode('back'))
    expect(early.status).toBe(422)
    expect(early.body.detail).toContain('another item since a merge')
  })

  it('refuses while pieces are promised or on order, and says how many', async () => {
    const [kept, merged] = await twins()
    await putOnShelf(db, crib, { itemId: merged, binId: shelf.binId, quantity: 3 })
    await promise(merged, { reserved: 2, coming: 4 })
    const answer = await merge(kept, merged)
    expect(answer.status).toBe(409)
    expect(answer.body.detail).toContain('2 promised to jobs and 4 on order')
    await promise(merged, { reserved: 0, coming: 0 })
  })

  it('is previewed: what moves, which reorder point stays, which alert closes; and nothing is changed', async () => {
    const [kept, merged] = await twins()
    const other = await createShelf(crib)
    await putOnShelf(db, crib, { itemId: merged, binId: shelf.binId, quantity: 3 })
    const point = (itemId: string, cribId: string, reorderPoint: number) =>
      db('reorder_points').insert({
        item_id: itemId,
        crib_id: cribId,
        reorder_point: reorderPoint,
        order_up_to: 9,
      })
    await point(kept, shelf.cribId, 2)
    await point(merged, shelf.cribId, 5)
    await point(merged, other.cribId, 1)
    const before = await preview(kept, merged)
    expect(before).toMatchObject({ refusal: null, tagsNowhere: [], earlierCodes: [] })
    expect(before.held).toMatchObject([{ locationId: shelf.binId, quantity: 3, tags: [] }])
    const codeOf = async (cribId: string) => (await db('cribs').where('id', cribId).first()).code
    expect(before.cribs).toHaveLength(2)
    expect(before.cribs).toContainEqual({
      cribCode: await codeOf(shelf.cribId),
      kept: { reorderPoint: 2, orderUpTo: 9 },
      merged: { reorderPoint: 5, orderUpTo: 9 },
      closesAlert: true,
      positionAfter: 3,
      isLowBefore: true,
      isLowAfter: false,
    })
    expect(before.cribs).toContainEqual({
      cribCode: await codeOf(other.cribId),
      kept: null,
      merged: { reorderPoint: 1, orderUpTo: 9 },
      closesAlert: true,
      positionAfter: 0,
      isLowBefore: false,
      isLowAfter: true,
    })
    expect((await stockOf(merged)).onHand).toBe(3)

    expect((await merge(kept, merged)).status).toBe(201)
    const open = await db('alerts').whereIn('item_id', [kept, merged]).whereNull('closed_at')
    expect(open).toMatchObject([{ item_id: kept, crib_id: other.cribId }])
    expect((await ledgerFaults(db)).faults).toEqual([])
  })

  it('found by its old code through every merge that followed', async () => {
    const overallLengthMm = 500 + Math.floor(Math.random() * 1e7) / 1e5
    const [first, second, third] = [
      await createCutter(crib, { overallLengthMm }),
      await createCutter(crib, { overallLengthMm }),
      await createCutter(crib, { overallLengthMm }),
    ]
    const { code } = (await crib.get(`/api/cutters/${first}`)).body
    await merge(second, first)
    expect((await preview(third, second)).earlierCodes).toEqual([code])
    await merge(third, second)
    const found = await allRows(crib, `/api/cutters?q=${code}&limit=50`)
    expect(found.map(({ id }) => id)).toEqual([third])
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
