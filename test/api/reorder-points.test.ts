import type { Knex } from 'knex'
import Papa from 'papaparse'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { type Answer, type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { checkedImport, importIn } from '../support/api-imports'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'

let db: Knex
let crib: ApiClient
let machinist: ApiClient
let shelf: Shelf
let itemIds: string[]
let codes: string[]

beforeAll(async () => {
  db = siteDatabase()
  ;[crib, machinist] = await Promise.all([signedInAs('cribManager'), signedInAs('machinist')])
})
afterAll(() => db.destroy())
beforeEach(async () => {
  shelf = await createShelf(crib)
  const mark = uniqueCode('MANY')
  codes = ['c', 'a', 'b'].map((suffix) => `${mark}-${suffix}`)
  itemIds = []
  for (const code of codes) itemIds.push(await createCutter(crib, { code }))
})

const put = (rows: object[]) =>
  crib.send('PUT', '/api/reorder-points', {
    body: { rows: rows.map((row, at) => ({ itemId: itemIds[at], cribId: shelf.cribId, ...row })) },
  })
const listed = async (query = '') => {
  const { body } = await machinist.get(`/api/reorder-points?cribId=${shelf.cribId}${query}`)
  return body.rows
}
const listedCodes = async (query = '') => (await listed(query)).map(({ itemCode }) => itemCode)
const pairs = (answer: Answer) =>
  ((answer.body.errors ?? []) as { path: string; message: string }[]).map(({ path, message }) => [
    path,
    message,
  ])

describe('many reorder points at once', () => {
  it('are set together, in the order they were sent, and what is absent stays', async () => {
    const made = await put([
      { reorderPoint: 1, orderUpTo: 5, packSize: 5, leadTimeDays: 4 },
      { reorderPoint: 2, orderUpTo: 2 },
      { reorderPoint: 3, orderUpTo: 7 },
    ])
    expect(made.status).toBe(200)
    expect(made.body.rows).toMatchObject([
      { itemId: itemIds[0], packSize: 5, version: 1, caution: null },
      { itemId: itemIds[1], packSize: 1, version: 1, caution: expect.stringContaining('stays open') },
      { itemId: itemIds[2], reorderPoint: 3, version: 1 },
    ])
    const changed = await put([
      { reorderPoint: 2, orderUpTo: 5, version: 1 },
      { reorderPoint: 2, orderUpTo: 2, version: 1 },
    ])
    expect(changed.body.rows).toMatchObject([
      { reorderPoint: 2, packSize: 5, leadTimeDays: 4, version: 2 },
      { version: 1 },
    ])
    const entries = await db('audit_entries')
      .where('entity', 'reorder-point')
      .whereIn(
        'entity_id',
        itemIds.map((id) => `${id}-${shelf.cribId}`),
      )
    expect(entries).toHaveLength(4)
  })

  it('are refused all, each at its own row, and nothing is changed', async () => {
    const impossible = await put([
      { reorderPoint: 9, orderUpTo: 3 },
      { reorderPoint: 1, orderUpTo: 3 },
      { reorderPoint: 1.5, orderUpTo: 2_000_000 },
    ])
    expect([impossible.status, faultPaths(impossible)]).toEqual([
      422,
      ['rows.0.reorderPoint', 'rows.2.reorderPoint', 'rows.2.orderUpTo'],
    ])
    const unknown = await put([
      { reorderPoint: 1, orderUpTo: 3, supplierId: '999999999' },
      { reorderPoint: 1, orderUpTo: 3, itemId: '999999999' },
      { reorderPoint: 1, orderUpTo: 3, cribId: '999999999' },
    ])
    expect([unknown.status, pairs(unknown)]).toEqual([
      422,
      [
        ['rows.0.supplierId', 'There is no such supplier.'],
        ['rows.1.itemId', 'There is no such item in use.'],
        ['rows.2.cribId', 'There is no such crib.'],
      ],
    ])
    const twice = await put([
      { reorderPoint: 1, orderUpTo: 3 },
      { reorderPoint: 1, orderUpTo: 3, itemId: itemIds[0] },
    ])
    expect(twice.status).toBe(422)
    expect((await put([])).status).toBe(400)
    expect(await listed()).toEqual([])
  })

  it('are refused all where one was changed meanwhile, with what is there', async () => {
    await put([
      { reorderPoint: 1, orderUpTo: 5 },
      { reorderPoint: 1, orderUpTo: 5 },
    ])
    await put([{ reorderPoint: 2, orderUpTo: 5 }])
    const late = await put([
      { reorderPoint: 4, orderUpTo: 5, version: 1 },
      { reorderPoint: 4, orderUpTo: 5, version: 1 },
    ])
    expect([late.status, late.body.code, faultPaths(late)]).toEqual([
      409,
      'stale-version',
      ['rows.0.version'],
    ])
    expect(late.body.current).toMatchObject([{ itemId: itemIds[0], reorderPoint: 2, version: 2 }])
    expect((await listed()).map(({ reorderPoint }) => reorderPoint).sort()).toEqual([1, 2])
  })

  it('write one mail of all that is low with them', async () => {
    await put(itemIds.map(() => ({ reorderPoint: 1, orderUpTo: 5 })))
    const mails = await db('outbox').where('crib_id', shelf.cribId)
    expect(new Set(mails.map(({ event_id }) => event_id)).size).toBe(1)
    expect(new Set(mails.map(({ user_id }) => user_id)).size).toBe(mails.length)
  })

  it('and single ones wait for each other, and the last of each row stands whole', async () => {
    await put(itemIds.map(() => ({ reorderPoint: 1, orderUpTo: 50 })))
    const answers = await Promise.all(
      Array.from({ length: 12 }, (_, at) =>
        at % 2 === 0
          ? put(itemIds.map(() => ({ reorderPoint: at, orderUpTo: 50 + at })))
          : crib.send('PUT', `/api/reorder-points/${itemIds[at % 3]}/${shelf.cribId}`, {
              body: { reorderPoint: at, orderUpTo: 50 + at },
            }),
      ),
    )
    expect(answers.map(({ status }) => status)).toEqual(answers.map(() => 200))
    for (const row of await listed()) expect(Number(row.orderUpTo) - Number(row.reorderPoint)).toBe(50)
  })
})

describe('the list', () => {
  beforeEach(async () => {
    await putOnShelf(db, crib, { itemId: String(itemIds[0]), binId: shelf.binId, quantity: 9 })
    const supplier = await crib.post('/api/suppliers', { name: uniqueCode('Zed') })
    await put([
      { reorderPoint: 3, orderUpTo: 9 },
      {
        reorderPoint: 2,
        orderUpTo: 20,
        supplierId: supplier.body.id,
        supplierPartNumber: 'Z-1',
        leadTimeDays: 9,
      },
      { reorderPoint: 1, orderUpTo: 4, leadTimeDays: 3 },
    ])
  })

  it('is sorted by any of its columns, by code and crib where they are alike', async () => {
    const [c, a, b] = codes
    expect(await listedCodes()).toEqual([a, b, c])
    expect(await listedCodes('&sort=-reorderPoint')).toEqual([c, a, b])
    expect(await listedCodes('&sort=leadTimeDays')).toEqual([b, a, c])
    expect(await listedCodes('&sort=position,-itemCode')).toEqual([b, a, c])
    expect(await listedCodes('&sort=supplierId')).toEqual([a, b, c])
    expect(await listedCodes('&sort=-orderUpTo&limit=1&offset=1')).toEqual([c])
    const wrong = await machinist.get('/api/reorder-points?sort=colour')
    expect([wrong.status, faultPaths(wrong)]).toEqual([400, ['sort']])
  })

  it('is narrowed by what is low and by supplier, and counts what each choice would leave', async () => {
    const [c, a, b] = codes
    expect(await listedCodes('&stockState=low')).toEqual([a, b])
    expect(await listedCodes('&stockState=above')).toEqual([c])
    expect(await listedCodes('&stockState=above,out')).toEqual([a, b, c])
    expect(await listedCodes('&supplierId=none')).toEqual([b, c])
    const named = (await listed('&sort=supplierId'))[0]
    expect(await listedCodes(`&supplierId=${named?.supplierId}`)).toEqual([a])
    const { counts } = (
      await machinist.get(`/api/reorder-points/counts?cribId=${shelf.cribId}&stockState=low`)
    ).body
    expect(counts).toMatchObject({
      supplierId: [
        { value: 'none', label: 'None named', count: 1 },
        { value: named?.supplierId, label: named?.supplierName, count: 1 },
      ],
      stockState: [
        { value: 'low', count: 2 },
        { value: 'above', count: 1 },
        { value: 'out', count: 2 },
      ],
    })
    const here = (counts as Record<string, { value: string; count: number }[]>).cribId
    expect(here?.find(({ value }) => value === shelf.cribId)?.count).toBe(2)
  })
})

describe('the file', () => {
  it('holds what the list shows, safe in a spreadsheet, and changes nothing when it is brought again', async () => {
    const supplier = await crib.post('/api/suppliers', { name: uniqueCode('=Sum') })
    await put([
      {
        reorderPoint: 3,
        orderUpTo: 9,
        supplierId: supplier.body.id,
        supplierPartNumber: '-7',
        leadTimeDays: 0,
      },
      { reorderPoint: 2, orderUpTo: 20, packSize: 10, minimumOrder: 20 },
      { reorderPoint: 1, orderUpTo: 1 },
    ])
    const answer = await machinist.getText(
      `/api/reorder-points/export?cribId=${shelf.cribId}&sort=-reorderPoint`,
    )
    expect(answer.status).toBe(200)
    const { data } = Papa.parse<string[]>(answer.text.replace(/^\ufeff/, ''), { skipEmptyLines: true })
    expect(data.map((row) => row[0])).toEqual(['Own code', ...codes])
    expect(data[1]?.slice(5)).toEqual(['3', '9', '1', '1', `'${supplier.body.name}`, "'-7", '0'])
    const again = await checkedImport(crib, { kind: 'reorderPoints' }, answer.text)
    expect(again).toMatchObject({ state: 'checked', added: 0, changed: 0, unchanged: 3, rejectedCount: 0 })
    const edited = await checkedImport(
      crib,
      { kind: 'reorderPoints' },
      answer.text.replace(',2,20,10,20,', ',4,20,10,20,'),
    )
    expect(edited).toMatchObject({ changed: 1, unchanged: 2 })
    await crib.post(`/api/imports/${edited.id}/commit`, {})
    await importIn(crib, edited.id, 'committed')
    expect((await listed('&sort=-reorderPoint')).map(({ reorderPoint }) => reorderPoint)).toEqual([4, 3, 1])
  })
})
