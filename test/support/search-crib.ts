import type { Knex } from 'knex'
import { type ApiClient, uniqueCode } from './api'
import { createCutter, putOnShelf, type Shelf } from './api-stock'
import { createNamedShelf, createNeckedTool, type NeckedToolRows } from './shop-rows'

export interface SearchCrib extends Shelf {
  cribCode: string
  necked: NeckedToolRows
  thickCode: string
  drillCode: string
  drillColletCode: string
}

/**
 * A crib of the test's own with everything for three features: the necked end mill of the hand cases of reach, a thicker
 * one, and a 6.5 mm drill; one chuck, and a collet for each shank. All in bin A-1 but the chuck, which is in A-2.
 */
export async function createSearchCrib(db: Knex, crib: ApiClient): Promise<SearchCrib> {
  const shelf = await createNamedShelf(crib)
  const necked = await createNeckedTool(db, crib)
  const [thickCode, drillCode, drillColletCode] = [
    uniqueCode('THICK'),
    uniqueCode('DRILL'),
    uniqueCode('COL'),
  ]
  const thickId = await createCutter(crib, {
    code: thickCode,
    cuttingDiameterMm: 4,
    fluteCount: 4,
    lengthOfCutMm: 8,
    fluteLengthMm: 8,
    neckDiameterMm: 3.8,
    reachLengthMm: 40,
    shankDiameterMm: 4,
    overallLengthMm: 76.2,
    unitCost: 5000,
  })
  const drillId = await createCutter(crib, {
    code: drillCode,
    form: 'drill',
    cuttingDiameterMm: 6.5,
    pointAngleDeg: 140,
    lengthOfCutMm: 40,
    fluteLengthMm: 40,
    shankDiameterMm: 6.5,
    overallLengthMm: 91,
  })
  const drillCollet = await crib.post('/api/collets', {
    code: drillColletCode,
    series: 'ER16',
    minimumMm: 6,
    maximumMm: 7,
    lengthMm: 27.5,
    minimumGripMm: 10,
  })
  const inFirstBin = [
    [necked.cutterId, 5],
    [necked.colletId, 1],
    [thickId, 2],
    [drillId, 3],
    [drillCollet.body.id, 1],
  ] as const
  for (const [itemId, quantity] of inFirstBin)
    await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity })
  await putOnShelf(db, crib, { itemId: necked.holderId, binId: shelf.secondBinId, quantity: 1 })
  return { ...shelf, necked, thickCode, drillCode, drillColletCode }
}
