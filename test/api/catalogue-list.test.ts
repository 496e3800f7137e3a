import { beforeAll, describe, expect, it } from 'vitest'
import { type AnswerBody, type ApiClient, allRows, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'

/** Seven cutters under one maker of the test's own, so that a list of that maker is theirs alone. */
const maker = uniqueCode('Maker')
const mark = uniqueCode('zirconal').replace(/[^a-z]/g, '')
const diametersMm = [1, 2, 3, 3, 4, 6, 8]
let crib: ApiClient
let shelf: Shelf
let ids: string[]

beforeAll(async () => {
  crib = await signedInAs('cribManager')
  shelf = await createShelf(crib)
  ids = []
  for (const [index, cuttingDiameterMm] of diametersMm.entries()) {
    ids.push(
      await createCutter(crib, {
        code: uniqueCode(`L${index}`),
        maker,
        form: index % 2 === 0 ? 'square' : 'ball',
        cuttingDiameterMm,
        partNumber: index < 3 ? `PN-${index}` : null,
        description: index === 4 ? `${mark} finisher 50%_off` : 'plain',
      }),
    )
  }
  const db = siteDatabase()
  await putOnShelf(db, crib, { itemId: ids[1] ?? '', binId: shelf.binId, quantity: 5 })
  await putOnShelf(db, crib, {
    itemId: ids[1] ?? '',
    binId: shelf.secondBinId,
    quantity: 2,
    condition: 'used',
  })
  await putOnShelf(db, crib, { itemId: ids[2] ?? '', binId: shelf.binId, quantity: 3, condition: 'worn' })
  await putOnShelf(db, crib, { itemId: ids[3] ?? '', binId: shelf.binId, quantity: 1 })
  await db('reorder_points').insert({
    item_id: ids[3],
    crib_id: shelf.cribId,
    reorder_point: 1,
    order_up_to: 5,
  })
  await db('reorder_points').insert({
    item_id: ids[1],
    crib_id: shelf.cribId,
    reorder_point: 6,
    order_up_to: 9,
  })
  await db.destroy()
})

const list = (query: string) => crib.get(`/api/cutters?maker=${maker}&${query}`)
const idsOf = (body: AnswerBody): string[] => body.rows.map((row) => row.id)
const at = (...indexes: number[]) => indexes.map((index) => ids[index])

describe('sorting', () => {
  it('follows the fields asked for and ends in the id', async () => {
    expect(idsOf((await list('sort=cuttingDiameterMm')).body)).toEqual(ids)
    expect(idsOf((await list('sort=-cuttingDiameterMm')).body)).toEqual(at(6, 5, 4, 2, 3, 1, 0))
    expect(idsOf((await list('sort=form,-cuttingDiameterMm')).body)).toEqual(at(5, 3, 1, 6, 4, 2, 0))
  })

  it('puts what is not given last, either way', async () => {
    expect(idsOf((await list('sort=partNumber')).body)).toEqual(ids)
    expect(idsOf((await list('sort=-partNumber')).body)).toEqual(at(2, 1, 0, 3, 4, 5, 6))
  })

  it('goes by stock, where worn pieces do not count', async () => {
    expect(idsOf((await list('sort=-onHand')).body)).toEqual(at(1, 3, 0, 2, 4, 5, 6))
  })

  it('refuses a field that is not there, and a query member that is not there', async () => {
    const sorted = await list('sort=passwordHash')
    expect(sorted.status).toBe(400)
    expect(faultPaths(sorted)).toEqual(['sort'])
    const filtered = await list('colour=red')
    expect(filtered.status).toBe(400)
    expect(faultPaths(filtered)).toEqual(['colour'])
    const ofNoForm = await list('form=ball,round')
    expect(ofNoForm.status).toBe(400)
    expect(faultPaths(ofNoForm)).toEqual(['form'])
  })
})

describe('filters', () => {
  it('keep what lies in a range, its ends included', async () => {
    const answer = await list('cuttingDiameterMm.min=2&cuttingDiameterMm.max=4&sort=cuttingDiameterMm')
    expect(idsOf(answer.body)).toEqual(at(1, 2, 3, 4))
    expect(answer.body.total).toBe(4)
    expect(idsOf((await list('cuttingDiameterMm=3&sort=cuttingDiameterMm')).body)).toEqual(at(2, 3))
  })

  it('take several values of a set', async () => {
    expect((await list('form=ball')).body.total).toBe(3)
    expect((await list('form=ball,square')).body.total).toBe(7)
    expect((await list('form=drill')).body.total).toBe(0)
    expect((await list('form=spiral')).status).toBe(400)
  })

  it('tell what is in stock, low and out; worn pieces are none', async () => {
    const byState = async (state: string) =>
      idsOf((await list(`stockState=${state}&sort=cuttingDiameterMm`)).body)
    expect(await byState('inStock')).toEqual(at(1, 3))
    expect(await byState('low')).toEqual(at(3))
    expect(await byState('out')).toEqual(at(0, 2, 4, 5, 6))
    expect(await byState('low,out')).toEqual(at(0, 2, 3, 4, 5, 6))
  })

  it('count stock in one crib where one is asked for', async () => {
    const elsewhere = await createShelf(crib)
    const here = await list(`cribId=${shelf.cribId}&stockState=inStock&sort=cuttingDiameterMm`)
    expect(idsOf(here.body)).toEqual(at(1, 3))
    expect(here.body.rows[0]?.stock).toEqual({
      onHand: 7,
      available: 7,
      isLow: false,
      locations: [
        {
          locationId: shelf.binId,
          code: 'A-1',
          cribId: shelf.cribId,
          cribCode: expect.any(String),
          quantity: 5,
        },
        {
          locationId: shelf.secondBinId,
          code: 'A-2',
          cribId: shelf.cribId,
          cribCode: expect.any(String),
          quantity: 2,
        },
      ],
    })
    expect((await list(`cribId=${elsewhere.cribId}&stockState=inStock`)).body.total).toBe(0)
    const one = await crib.get(`/api/cutters/${ids[1]}?cribId=${elsewhere.cribId}`)
    expect(one.body.stock).toEqual({ onHand: 0, available: 0, isLow: false, locations: [] })
  })
})

describe('search', () => {
  it('forgives one letter in a long word, and no digit', async () => {
    const wrong = `${mark.slice(0, 2)}q${mark.slice(3)}`
    const swapped = `${mark[0]}${mark[2]}${mark[1]}${mark.slice(3)}`
    for (const term of [mark, mark.toUpperCase(), wrong, swapped, mark.slice(1), `${mark}s`]) {
      expect(idsOf((await list(`q=${term}`)).body), term).toEqual(at(4))
    }
    expect((await list('q=PN-1')).body.total).toBe(1)
    expect((await list('q=PN-9')).body.total).toBe(0)
  })

  it('wants every word, and takes a percent sign for what it is', async () => {
    expect((await list(`q=${mark}%20finisher`)).body.total).toBe(1)
    expect((await list(`q=${mark}%20plain`)).body.total).toBe(0)
    expect((await list(`q=${encodeURIComponent('50%_off')}`)).body.total).toBe(1)
    expect((await list(`q=${encodeURIComponent('5%off')}`)).body.total).toBe(0)
  })

  it('takes a quote for a letter like any other', async () => {
    const answer = await list(`q=${encodeURIComponent(`'; drop table items; --`)}`)
    expect(answer.status).toBe(200)
    expect(answer.body.total).toBe(0)
  })
})

describe('blocks', () => {
  it('by offset join up to the whole list, the total on the first alone', async () => {
    const blocks = await Promise.all(
      [0, 3, 6, 9].map((offset) => list(`sort=-cuttingDiameterMm&limit=3&offset=${offset}`)),
    )
    expect(blocks.flatMap((block) => idsOf(block.body))).toEqual(at(6, 5, 4, 2, 3, 1, 0))
    expect(blocks.map((block) => block.body.total)).toEqual([7, undefined, undefined, undefined])
  })

  it.each(['sort=-cuttingDiameterMm', 'sort=partNumber', 'sort=-partNumber,form', 'sort=onHand', ''])(
    'by cursor join up to the whole list: %s',
    async (sort) => {
      const whole = idsOf((await list(sort)).body)
      const walked = (await allRows(crib, `/api/cutters?maker=${maker}&${sort}&limit=2`)).map((row) => row.id)
      expect(walked).toEqual(whole)
      expect(new Set(walked).size).toBe(7)
    },
  )

  it('refuse a cursor of another sorting, a broken one and limits that are none', async () => {
    const { nextCursor } = (await list('sort=code&limit=2')).body
    for (const query of [
      `sort=maker&cursor=${nextCursor}`,
      'cursor=abc',
      'limit=0',
      'limit=501',
      'limit=x',
      'offset=-1',
    ]) {
      const answer = await list(query)
      expect(answer.status, query).toBe(400)
      expect(faultPaths(answer)).toHaveLength(1)
    }
  })
})

describe('makers', () => {
  it('are listed once each, by kind', async () => {
    const cutters = (await crib.get('/api/makers?kind=cutter')).body.rows
    expect(cutters.filter((one: unknown) => one === maker)).toHaveLength(1)
    expect((await crib.get('/api/makers?kind=holder')).body.rows).not.toContain(maker)
    expect((await crib.get('/api/makers')).body.rows).toContain(maker)
  })
})
