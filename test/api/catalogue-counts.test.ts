import { beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'

/** Three square end mills and a ball: two of the squares lie in bins, one of them low. */
const maker = uniqueCode('Counted')
let crib: ApiClient
let shelf: Shelf
let codes: string[]

beforeAll(async () => {
  crib = await signedInAs('cribManager')
  shelf = await createShelf(crib)
  codes = []
  const ids: string[] = []
  for (const form of ['square', 'square', 'square', 'ball']) {
    const code = uniqueCode('CNT')
    codes.push(code)
    ids.push(await createCutter(crib, { code, maker, form }))
  }
  const db = siteDatabase()
  const [first = '', second = ''] = ids
  await putOnShelf(db, crib, { itemId: first, binId: shelf.binId, quantity: 3 })
  await putOnShelf(db, crib, { itemId: second, binId: shelf.secondBinId, quantity: 1, condition: 'used' })
  await putOnShelf(db, crib, { itemId: second, binId: shelf.binId, quantity: 1, condition: 'worn' })
  await db('reorder_points').insert({
    ...{ item_id: second, crib_id: shelf.cribId, reorder_point: 1, order_up_to: 4 },
  })
  await db.destroy()
})

const narrowing = 'form,substrate,maker,condition,locationId,stockState,cuttingDiameterMm,shankDiameterMm'

type Counts = Record<string, { value: string; label?: string; count: number }[]>
async function countsOf(query: string, of = narrowing): Promise<Counts> {
  const answer = await crib.get(`/api/cutters/counts?of=${of}&maker=${maker}&${query}`)
  expect(answer.status).toBe(200)
  return answer.body.counts as Counts
}
const countOf = (counts: Counts, filter: string, value: string) =>
  counts[filter]?.find((choice) => choice.value === value)?.count ?? 0

/** Every choice of every filter, asked of the list itself. */
async function expectAgreement(query: string) {
  const counts = await countsOf(query)
  for (const [filter, choices] of Object.entries(counts)) {
    for (const { value, count } of choices) {
      const params = new URLSearchParams(`maker=${maker}&${query}`)
      params.set(filter, value)
      const list = await crib.get(`/api/cutters?${params}`)
      expect(list.body.total, `${filter}=${value} under ${query}`).toBe(count)
    }
  }
}

describe('counts beside the choices', () => {
  it('are what the list then answers, with no filter and with several', async () => {
    for (const query of ['', 'form=square', 'condition=used', `locationId=${shelf.binId}`, 'stockState=low'])
      await expectAgreement(query)
    await expectAgreement(`form=square&condition=worn&locationId=${shelf.binId}&cuttingDiameterMm.max=6`)
  })

  it('are of each filter as if it alone were open', async () => {
    const counts = await countsOf('form=ball')
    expect(countOf(counts, 'form', 'square')).toBe(3)
    expect(countOf(counts, 'form', 'ball')).toBe(1)
    expect(countOf(counts, 'stockState', 'out')).toBe(1)
    expect(counts.condition).toEqual([])
  })

  it('count what is in stock, out and low, and what lies in a crib', async () => {
    const counts = await countsOf('')
    const states = ['inStock', 'out', 'low'].map((state) => countOf(counts, 'stockState', state))
    expect(states).toEqual([2, 2, 1])
    expect(countOf(counts, 'locationId', shelf.cribLocationId)).toBe(2)
    expect(counts.condition?.toSorted((a, b) => (a.value < b.value ? -1 : 1))).toEqual([
      { value: 'new', count: 1 },
      { value: 'used', count: 1 },
      { value: 'worn', count: 1 },
    ])
  })

  it('are of the facets asked for alone, and of sizes the commonest, smallest first', async () => {
    await createCutter(crib, { maker, cuttingDiameterMm: 3, shankDiameterMm: 6 })
    const counts = await countsOf('cuttingDiameterMm.max=4', 'cuttingDiameterMm,cribId')
    expect(Object.keys(counts).sort()).toEqual(['cribId', 'cuttingDiameterMm'])
    expect(counts.cuttingDiameterMm).toEqual([
      { value: '3', count: 1 },
      { value: '6', count: 4 },
    ])
    const every = await countsOf('', 'cribId')
    expect(countOf(every, 'cribId', shelf.cribId)).toBe(2)
    expect(every.cribId?.some(({ count }) => count === 0)).toBe(true)
  })

  it('are refused to be told by cost, and of what is no filter', async () => {
    const machinist = await signedInAs('machinist')
    expect((await machinist.get('/api/cutters/counts?of=form&unitCost.min=1')).status).toBe(403)
    expect(faultPaths(await crib.get('/api/cutters/counts?of=form&limit=5'))).toEqual(['limit'])
    expect(faultPaths(await crib.get('/api/cutters/counts'))).toEqual(['of'])
    expect(faultPaths(await crib.get('/api/cutters/counts?of=taper'))).toEqual(['of'])
    for (const [kind, of] of Object.entries({
      holders: 'boreKind,taper,series,gaugeLengthMm,boreDiameterMm,maker,cribId',
      collets: 'series,minimumMm,maximumMm',
      extensions: 'boreKind,series,projectionMm,boreDiameterMm',
    }))
      expect((await crib.get(`/api/${kind}/counts?of=${of}`)).status, kind).toBe(200)
  })

  it('of a taper and a series are what the list then answers', async () => {
    for (const [kind, facet] of [
      ['holders', 'taper'],
      ['holders', 'series'],
      ['collets', 'series'],
    ]) {
      const { counts } = (await crib.get(`/api/${kind}/counts?of=${facet}`)).body as unknown as {
        counts: Counts
      }
      const [most] = counts[facet ?? ''] ?? []
      expect(most?.count).toBeGreaterThan(0)
      const list = await crib.get(`/api/${kind}?${facet}=${encodeURIComponent(most?.value ?? '')}`)
      expect(list.body.total).toBe(most?.count)
    }
  })
})

describe('the filters by pieces', () => {
  it('ask for one piece that is of this condition and in this place', async () => {
    const list = async (query: string) => {
      const { body } = await crib.get(`/api/cutters?maker=${maker}&sort=code&${query}`)
      return body.rows.map((row) => row.code)
    }
    expect(await list(`condition=used&locationId=${shelf.secondBinId}`)).toEqual([codes[1]])
    expect(await list(`condition=used&locationId=${shelf.binId}`)).toEqual([])
    expect(await list(`locationId=${shelf.cribLocationId}`)).toEqual([codes[0], codes[1]].sort())
    expect(await list('condition=new,used')).toEqual([codes[0], codes[1]].sort())
  })
})
