import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { SearchNearMissResponse, SearchOptionResponse } from '@/schemas/reach-search'
import { type Answer, type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, siteDatabase } from '../support/api-stock'
import { createNeckedTool, type NeckedToolRows } from '../support/shop-rows'

/*
 * A crib of the test's own is asked, so that what it could build is known: the necked end mill of the hand cases of
 * reach in one chuck, and a thicker one that is out of stock there.
 */
let crib: ApiClient
let machinist: ApiClient
let estimator: ApiClient
let rows: NeckedToolRows
let cribId: string
let thickId: string
let thickCode: string
const db = siteDatabase()

beforeAll(async () => {
  ;[crib, machinist, estimator] = await Promise.all([
    signedInAs('cribManager'),
    signedInAs('machinist'),
    signedInAs('estimator'),
  ])
  rows = await createNeckedTool(db, crib)
  cribId = rows.shelf.cribId
  await putOnShelf(db, crib, { itemId: rows.holderId, binId: rows.shelf.secondBinId, quantity: 2 })
  await putOnShelf(db, crib, { itemId: rows.colletId, binId: rows.shelf.binId, quantity: 1 })
  thickCode = uniqueCode('THICK')
  thickId = await createCutter(crib, {
    code: thickCode,
    cuttingDiameterMm: 4,
    lengthOfCutMm: 8,
    fluteLengthMm: 8,
    neckDiameterMm: 3.8,
    reachLengthMm: 40,
    shankDiameterMm: 4,
    overallLengthMm: 76.2,
  })
  const point = await crib.send('PUT', `/api/reorder-points/${thickId}/${cribId}`, {
    body: { reorderPoint: 1, orderUpTo: 2 },
  })
  if (point.status >= 300) throw new Error(`The reorder point was refused: ${JSON.stringify(point.body)}`)
})
afterAll(() => db.destroy())

const wall = (depthMm: number, more: object = {}) => ({ kind: 'wall', depthMm, ...more })

function search(client: ApiClient, body: object, where: object = {}): Promise<Answer> {
  return client.post('/api/reach/search', { ...body, where: { cribId, ...where } })
}

const optionsOf = (answer: Answer) => answer.body.options as unknown as SearchOptionResponse[]
const missesOf = (answer: Answer) => answer.body.nearMisses as unknown as SearchNearMissResponse[]
const cuttersOf = (answer: Answer) => optionsOf(answer).map(({ cutter }) => cutter.id)

describe('what a crib could build', () => {
  it('comes with the stick-out of the hand case, what to fetch and from where', async () => {
    // reach-hand-cases.md: the necked square end mill at depth 25 asks for 39.1875, set to 39.5, and reaches 38.1625.
    const answer = await search(machinist, { feature: wall(25) }, { cutterId: rows.cutterId })
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({ considered: 1, reachable: 1 })
    const [option] = optionsOf(answer)
    expect(option).toMatchObject({
      cutter: { id: rows.cutterId, code: rows.cutterCode, piece: null },
      holder: { id: rows.holderId },
      collet: { id: rows.colletId },
      extension: null,
      reach: { verdict: 'reaches', reachMm: 38.1625, gaugeLengthMm: 139.5 },
      stickOut: { requiredMm: 39.5, usedMm: 39.5, minimumMm: 39.1875, boundBy: 'neck' },
      stiffness: { timesStiffest: 1 },
      reason: 'The only one that reaches.',
    })
    // As many as of the part there is least of: one collet.
    expect(option?.stock).toMatchObject({ onHand: 1, available: 1 })
    expect(option?.stock.locations.map(({ part, code, quantity }) => [part, code, quantity])).toEqual([
      ['cutter', 'A-1', 5],
      ['collet', 'A-1', 1],
      ['holder', 'A-2', 2],
    ])
  })

  it('agrees with the reach check of the same assembly', async () => {
    const feature = wall(30, { openingWidthMm: 12, floorRadiusMm: 0 })
    for (const option of optionsOf(await search(crib, { feature, sideLoadN: 50 }))) {
      const check = await crib.post('/api/reach', {
        feature,
        cutter: { id: option.cutter.id },
        holder: { id: option.holder.id },
        collet: { id: option.collet?.id },
        sideLoadN: 50,
      })
      expect(option.reach).toEqual(check.body)
    }
  })

  it('is ranked by stiffness, each with the reason it stands where it stands', async () => {
    const options = optionsOf(await search(crib, { feature: wall(25) }))
    expect(options.map(({ cutter }) => cutter.id)).toEqual([thickId, rows.cutterId])
    expect(options[0]?.reason).toBe('The stiffest of the 2 that reach.')
    expect(options[1]?.reason).toMatch(
      /^Bends \d\.\d\d times as much as the first: a cutter of 3\.175 mm, not 4 mm/,
    )
    const [first, second] = options.map(({ stiffness }) => stiffness.complianceUmPerN)
    expect(options[1]?.stiffness.timesStiffest).toBeCloseTo((second ?? 0) / (first ?? 1), 9)
  })

  it('is ranked by what is in stock before stiffness, and says what is missing', async () => {
    const options = optionsOf(await search(crib, { feature: wall(25), rankBy: 'stock' }))
    expect(options.map(({ cutter }) => cutter.id)).toEqual([rows.cutterId, thickId])
    expect(options[0]?.reason).toMatch(/^Every part is in stock\./)
    expect(options[1]?.reason).toMatch(new RegExp(`^Not in stock now: cutter ${thickCode}\\.`))
  })

  it('is only what is in stock where that is asked, and nothing another crib keeps', async () => {
    expect(cuttersOf(await search(crib, { feature: wall(25) }, { inStockOnly: true }))).toEqual([
      rows.cutterId,
    ])
    const { cribId: emptyCribId } = await createShelf(crib)
    const elsewhere = await search(crib, { feature: wall(25) }, { cribId: emptyCribId })
    expect(elsewhere.body).toMatchObject({
      considered: 0,
      options: [],
    })
    expect(elsewhere.body.notes).toContainEqual(expect.objectContaining({ code: 'nothing-passes-filters' }))
  })

  it('leaves corner and floor to the finishing cutter where it is to rough, and says so', async () => {
    const feature = wall(25, { insideCornerRadiusMm: 1 })
    const whole = await search(crib, { feature })
    expect(whole.body).toMatchObject({ reachable: 0, options: [] })
    const roughed = await search(crib, { feature, purpose: 'roughing' })
    expect(cuttersOf(roughed)).toEqual([thickId, rows.cutterId])
    expect(roughed.body.notes).toContainEqual({
      code: 'left-to-finishing',
      text: 'For roughing, the inside corner’s radius is left to the finishing cutter.',
    })
  })

  it('leaves out what stands out more than so many diameters, and other forms', async () => {
    // 39.5 of stick-out are 12.4 diameters of 3.175, and at least 41 are 10.25 of 4.
    expect(cuttersOf(await search(crib, { feature: wall(25) }, { longestStickOutToDiameter: 11 }))).toEqual([
      thickId,
    ])
    expect(optionsOf(await search(crib, { feature: wall(25) }, { forms: ['ball'] }))).toEqual([])
    // The material of these was never entered.
    expect(optionsOf(await search(crib, { feature: wall(25) }, { substrates: ['carbide'] }))).toEqual([])
  })

  it('is searched as the catalogue is now', async () => {
    const made = await createCutter(crib, {
      cuttingDiameterMm: 3,
      lengthOfCutMm: 6,
      fluteLengthMm: 6,
      shankDiameterMm: 3,
      overallLengthMm: 76,
    })
    await putOnShelf(db, crib, { itemId: made, binId: rows.shelf.binId, quantity: 1 })
    expect(cuttersOf(await search(crib, { feature: wall(10) }))).not.toContain(made)
    await crib.patch(`/api/cutters/${made}`, { version: 1, lengthOfCutMm: 12, fluteLengthMm: 12 })
    expect(cuttersOf(await search(crib, { feature: wall(10) }))).toContain(made)
    await db('movements').insert({
      kind: 'adjustment',
      item_id: made,
      quantity: 1,
      from_location_id: rows.shelf.binId,
      from_condition: 'new',
      to_location_id: (await db('locations').where('kind', 'count_adjustment').first('id')).id,
      to_condition: 'new',
      actor_id: crib.user.id,
    })
    await crib.remove(`/api/cutters/${made}`)
    expect(cuttersOf(await search(crib, { feature: wall(10) }))).not.toContain(made)
  })
})

describe('an extension', () => {
  const extension = (change: object = {}) => ({
    code: uniqueCode('EXT'),
    projectionMm: 60,
    bore: { kind: 'fixed', diameterMm: 3.175 },
    boreDepthMm: 40,
    minimumGripMm: 15,
    segments: [{ lengthMm: 60, noseDiameterMm: 10, spindleDiameterMm: 16 }],
    ...change,
  })

  it('comes with the collet that holds its own shank, or says that what holds it is not checked', async () => {
    // A crib apart, so that what the rest of this file asks has no extension.
    const own = await createNeckedTool(db, crib)
    const { binId } = own.shelf
    const collet = { code: uniqueCode('CO'), series: 'ER16', minimumMm: 9, maximumMm: 10, lengthMm: 27.5 }
    const { body: wide } = await crib.post('/api/collets', collet)
    const { body: held } = await crib.post('/api/extensions', extension({ shankDiameterMm: 10 }))
    const { body: loose } = await crib.post('/api/extensions', extension())
    for (const itemId of [own.holderId, wide.id, held.id, loose.id])
      await putOnShelf(db, crib, { itemId, binId, quantity: 1 })
    const where = { cribId: own.shelf.cribId }
    const options = optionsOf(await search(crib, { feature: wall(25), limit: 100 }, where))
    const through = (id: string) => options.filter((option) => option.extension?.id === id)
    const [checked] = through(held.id)
    expect(checked).toMatchObject({
      collet: null,
      extensionCollet: { id: wide.id },
      // By hand: 100 of the chuck, 60 of the extension, 39.5 of stick-out.
      reach: { verdict: 'reaches', gaugeLengthMm: 199.5 },
      stickOut: { usedMm: 39.5 },
    })
    expect(checked?.cautions.join(' ')).not.toContain('not checked')
    expect(checked?.stock.locations.map(({ itemId }) => itemId)).toContain(wide.id)
    const [unchecked] = through(loose.id)
    expect(unchecked).toMatchObject({ extensionCollet: null, reach: { gaugeLengthMm: 199.5 } })
    expect(unchecked?.cautions).toContain(
      `The shank of ${loose.code} is not in the catalogue: what holds the extension is not checked.`,
    )
  })
})

describe('a tagged piece with measures of its own', () => {
  it('is a cutter of its own beside the item, with its place; scrapped it is none', async () => {
    const code = uniqueCode('TAGGED')
    const itemId = await createCutter(crib, {
      code,
      cuttingDiameterMm: 3.5,
      lengthOfCutMm: 20,
      fluteLengthMm: 20,
      shankDiameterMm: 3.5,
      overallLengthMm: 76,
    })
    await db('items').where('id', itemId).update({ is_tracked_by_piece: true })
    const tag = uniqueCode('P')
    const [piece] = await db('pieces')
      .insert({ item_id: itemId, tag, length_of_cut_mm: 15, overall_length_mm: 70 })
      .returning('id')
    const kindOf = async (kind: string) => (await db('locations').where('kind', kind).first('id')).id
    const move = (kind: string, from: string, to: string) =>
      db('movements').insert({
        kind,
        item_id: itemId,
        piece_id: piece.id,
        quantity: 1,
        from_location_id: from,
        from_condition: 'new',
        to_location_id: to,
        to_condition: 'new',
        actor_id: crib.user.id,
      })
    await move('adjustment', await kindOf('count_adjustment'), rows.shelf.secondBinId)
    const asked = { feature: wall(14) }
    const options = optionsOf(await search(crib, asked, { cutterId: itemId }))
    const byPiece = options.find(({ cutter }) => cutter.piece !== null)
    expect(byPiece).toMatchObject({
      cutter: { piece: { id: piece.id, tag }, lengthOfCutMm: 15, overallLengthMm: 70 },
      reach: { verdict: 'reaches', reachMm: 15 },
      stock: { available: 1 },
    })
    expect(options.find(({ cutter }) => cutter.piece === null)?.cutter.lengthOfCutMm).toBe(20)
    // The one piece there is has its own figures: nothing as the catalogue says is in stock.
    const inStock = optionsOf(await search(crib, asked, { cutterId: itemId, inStockOnly: true }))
    expect(inStock.map(({ cutter }) => cutter.piece?.tag)).toEqual([tag])
    await move('scrap', rows.shelf.secondBinId, await kindOf('scrap'))
    const left = optionsOf(await search(crib, asked, { cutterId: itemId }))
    expect(left.map(({ cutter }) => cutter.piece)).toEqual([null])
  })
})

describe('what falls short', () => {
  it('is listed with what stops it and by how much', async () => {
    // The neck of the hand case ends the reach at 38.1625: 41 deep, 2.8375 are missing whatever the stick-out.
    const answer = await search(crib, { feature: wall(41) }, { cutterId: rows.cutterId })
    expect(answer.body).toMatchObject({ reachable: 0, options: [] })
    const [miss] = missesOf(answer)
    expect(miss).toMatchObject({
      cutter: { id: rows.cutterId },
      stoppedBy: 'transition',
      reason:
        'The transition of the cutter itself stops it 2.84 mm before the depth, whatever the stick-out.',
    })
    expect(miss?.shortfallMm).toBeCloseTo(41 - 38.1625, 9)
    const codes = (answer.body.notes as { code: string }[]).map(({ code }) => code)
    expect(codes).toContain('nothing-reaches')
  })

  it('says its sentences in inches where they are asked for', async () => {
    const answer = await search(crib, { feature: wall(41), sentenceUnit: 'in' }, { cutterId: rows.cutterId })
    expect(missesOf(answer)[0]?.reason).toContain('stops it 0.112 in before the depth')
    expect(missesOf(answer)[0]?.shortfallMm).toBeCloseTo(41 - 38.1625, 9)
  })
})

describe('many features at once', () => {
  it('are each answered, in their order, with the counts of all together', async () => {
    const features = [wall(25), wall(80), { kind: 'hole', depthMm: 20, diameterMm: 8 }]
    const answer = await search(crib, { features, limit: 1, nearMissLimit: 1 })
    const results = answer.body.results as unknown as { reachable: number; options: unknown[] }[]
    expect(results.map(({ options }) => options.length)).toEqual([1, 0, 1])
    expect(answer.body.reachable).toBe(results.reduce((sum, { reachable }) => sum + reachable, 0))
  })

  it('are refused where one of them cannot be, at that one', async () => {
    const answer = await search(crib, { features: [wall(25), wall(25, { draftDeg: 75 })] })
    expect(answer.status).toBe(422)
    expect(faultPaths(answer)).toEqual(['features.1.draftDeg'])
  })
})

describe('costs', () => {
  it('are seen and ranked by only by those who may', async () => {
    const [unseen] = optionsOf(await search(machinist, { feature: wall(25) }))
    expect(unseen).not.toHaveProperty('cost')
    expect(unseen?.cutter).not.toHaveProperty('unitCost')
    const refused = await search(machinist, { feature: wall(25), rankBy: 'cost' })
    expect(refused.status).toBe(403)
    expect(faultPaths(refused)).toEqual(['rankBy'])

    const unpriced = optionsOf(await search(estimator, { feature: wall(25), rankBy: 'cost' }))
    expect(unpriced.map(({ cost }) => cost?.amount)).toEqual([null, null])
    await crib.patch(`/api/holders/${rows.holderId}`, { version: 1, unitCost: 10_000 })
    await crib.patch(`/api/collets/${rows.colletId}`, { version: 1, unitCost: 500 })
    const priced = optionsOf(await search(estimator, { feature: wall(25), rankBy: 'cost' }))
    // The necked cutter costs 43.21; of the thicker one the cost was never entered.
    expect(priced.map(({ cutter, cost }) => [cutter.id, cost?.amount])).toEqual([
      [rows.cutterId, 14_821],
      [thickId, null],
    ])
    expect(priced[0]?.reason).toBe('The least cost of the 2 that reach.')
  })
})

describe('a question that cannot be asked', () => {
  it.each([
    [422, 'feature', {}],
    [422, 'feature', { feature: wall(5), features: [wall(5)] }],
    [400, 'features', { features: [] }],
    [400, 'features', { features: Array.from({ length: 201 }, () => wall(5)) }],
    [422, 'limit', { features: Array.from({ length: 200 }, () => wall(5)), limit: 50 }],
    [422, 'limit', { feature: wall(5), limit: 0 }],
    [400, 'rankBy', { feature: wall(5), rankBy: 'beauty' }],
    [400, 'purpose', { feature: wall(5), purpose: 'polishing' }],
    [422, 'feature.depthMm', { feature: wall(-5) }],
    [422, 'feature.draftDeg', { feature: wall(5, { draftDeg: 60 }) }],
    [400, 'feature.depthMm', { feature: { kind: 'wall' } }],
    [400, 'feature.deepMm', { feature: wall(5, { deepMm: 3 }) }],
    [422, 'scallop.stepoverMm', { feature: wall(5), scallop: { stepoverMm: 0, maximumHeightMm: 1 } }],
  ])('is answered %i at %s', async (status, path, body) => {
    const answer = await crib.post('/api/reach/search', body)
    expect(answer.status).toBe(status)
    expect(faultPaths(answer)).toContain(path)
  })

  it.each([
    [400, 'where.forms.0', { forms: ['spoon'] }],
    [400, 'where.cribId', { cribId: 'main' }],
    [422, 'where.longestStickOutToDiameter', { longestStickOutToDiameter: 0 }],
    [400, 'where.colour', { colour: 'red' }],
  ])('is answered %i at %s', async (status, path, where) => {
    const answer = await search(crib, { feature: wall(5) }, where)
    expect(answer.status).toBe(status)
    expect(faultPaths(answer)).toContain(path)
  })
})
