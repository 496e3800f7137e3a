import { usableDepth } from '@/core/catalogue/usable-depth'
import type { FittingCutter, FittingCuttersQuery } from '@/schemas/fits'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { readCatalogueRows } from '../../db/read-models/catalogue-rows'
import { readPocketCutterKeys } from '../../db/read-models/pocket-cutters'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { visibleItem } from './visible-item'

export interface PocketCutterList {
  rows: FittingCutter[]
  nextCursor: string | null
  total?: number
}

/** One block of the cutters a pocket's inside corner and depth leave, with the shop's own shank clearance. */
export async function listPocketCutters(actor: Actor, query: FittingCuttersQuery): Promise<PocketCutterList> {
  const { shankClearanceMm } = (await readShopSettings(db())).reach
  const { ids, ...page } = await readPocketCutterKeys(db(), query, shankClearanceMm)
  const rows = await readCatalogueRows(db(), 'cutter', ids)
  return {
    rows: rows.flatMap((row) => {
      const usable = usableDepth(row, shankClearanceMm)
      if (!usable) return []
      return {
        ...visibleItem<'cutter'>(actor, row),
        usableDepthMm: usable.depthMm,
        usableDepthEndsWith: usable.endsWith,
      }
    }),
    ...page,
  }
}
