import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, allRows, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, siteDatabase } from '../support/api-stock'

let crib: ApiClient
const db = siteDatabase()

beforeAll(async () => {
  crib = await signedInAs('cribManager')
})
afterAll(() => db.destroy())

describe('what fits a shank, a bore or a series', () => {
  it('finds the collets and chucks of a shank, and where in a collet’s range it sits', async () => {
    const series = uniqueCode('ER').slice(0, 20)
    const collet = { code: uniqueCode('CO'), series, minimumMm: 12.4, maximumMm: 13.4 }
    const colletId = (await crib.post('/api/collets', collet)).body.id
    const chuck = {
      code: uniqueCode('CH'),
      gaugeLengthMm: 100,
      bore: { kind: 'collet', series },
      segments: [{ part: 'nut', lengthMm: 20, noseDiameterMm: 28, spindleDiameterMm: 28 }],
    }
    const chuckId = (await crib.post('/api/holders', chuck)).body.id
    const collets = await allRows(crib, '/api/fits?shankDiameterMm=12.9&kind=collet')
    expect(collets.find(({ id }) => id === colletId)).toMatchObject({ series, placeInRange: 0.5 })
    const holders = await allRows(crib, '/api/fits?shankDiameterMm=12.9&kind=holder')
    expect(holders.map(({ id }) => id)).toContain(chuckId)
    const beyond = await allRows(crib, '/api/fits?shankDiameterMm=13.401&kind=collet')
    expect(beyond.map(({ id }) => id)).not.toContain(colletId)
    const ofSeries = await allRows(crib, `/api/fits?series=${series.toLowerCase()}`)
    expect(ofSeries.map(({ id }) => id)).toContain(colletId)
  })

  it('finds the cutters a fixed bore takes, and never a quarter inch for 6 mm', async () => {
    const fits = await createCutter(crib, { shankDiameterMm: 6 })
    const tooThick = await createCutter(crib, { shankDiameterMm: 6.35 })
    const ids = (await allRows(crib, '/api/fits?boreDiameterMm=6&limit=500')).map(({ id }) => id)
    expect(ids).toContain(fits)
    expect(ids).not.toContain(tooThick)
  })

  it.each([
    ['/api/fits', 'shankDiameterMm'],
    ['/api/fits?shankDiameterMm=6&series=ER20', 'shankDiameterMm'],
    ['/api/fits?shankDiameterMm=0', 'shankDiameterMm'],
    ['/api/fits?shankDiameterMm=six', 'shankDiameterMm'],
    ['/api/fits/cutters?depthMm=10', 'insideCornerRadiusMm'],
    ['/api/fits/cutters?insideCornerRadiusMm=3&depthMm=-1', 'depthMm'],
  ])('refuses %s beside %s', async (path, field) => {
    const answer = await crib.get(path)
    expect(answer.status).toBe(400)
    expect(faultPaths(answer)).toContain(field)
  })
})

describe('the cutters for a pocket', () => {
  it('come with how deep they go, why, and what is on the shelf', async () => {
    const geometry = {
      cuttingDiameterMm: 97.31,
      lengthOfCutMm: 30,
      overallLengthMm: 300,
      shankDiameterMm: 90,
    }
    const stocked = await createCutter(crib, geometry)
    const necked = await createCutter(crib, { ...geometry, neckDiameterMm: 90, reachLengthMm: 120 })
    const shelf = await createShelf(crib)
    await putOnShelf(db, crib, { itemId: stocked, binId: shelf.binId, quantity: 2 })
    const ask = (more: string) => crib.get(`/api/fits/cutters?insideCornerRadiusMm=48.655&limit=500${more}`)
    const shallow = (await ask('&depthMm=30')).body.rows
    expect(shallow.find(({ id }) => id === stocked)).toMatchObject({
      usableDepthMm: 30,
      usableDepthEndsWith: 'lengthOfCut',
      stock: { onHand: 2 },
    })
    const deep = (await ask('&depthMm=100')).body.rows
    expect(deep.find(({ id }) => id === necked)).toMatchObject({
      usableDepthMm: 120,
      usableDepthEndsWith: 'neck',
    })
    expect(deep.map(({ id }) => id)).not.toContain(stocked)
    const inStock = (await ask('&depthMm=30&inStock=yes')).body.rows.map(({ id }) => id)
    expect(inStock).toContain(stocked)
    expect(inStock).not.toContain(necked)
  })

  it('hide costs from those who see none', async () => {
    await createCutter(crib, { unitCost: 1234 })
    const machinist = await signedInAs('machinist')
    const { body } = await machinist.get('/api/fits/cutters?insideCornerRadiusMm=3&depthMm=5')
    expect(body.rows.length).toBeGreaterThan(0)
    expect(body.rows.filter((row) => 'unitCost' in row)).toEqual([])
  })
})
