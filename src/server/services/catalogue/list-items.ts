import type { CatalogueKind } from '@/core/stock/kinds'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { readCatalogueKeys } from '../../db/read-models/catalogue-keys'
import { readCatalogueRows } from '../../db/read-models/catalogue-rows'
import { refuseHiddenCosts, visibleItem } from './visible-item'

export interface ItemList<Kind extends CatalogueKind> {
  rows: CatalogueTypes[Kind]['row'][]
  nextCursor: string | null
  total?: number
}

/** One block of the items of a kind, searched, filtered and sorted. */
export async function listItems<Kind extends CatalogueKind>(
  actor: Actor,
  kind: Kind,
  query: CatalogueTypes[Kind]['query'],
): Promise<ItemList<Kind>> {
  refuseHiddenCosts(actor, { ...query })
  const { ids, ...page } = await readCatalogueKeys(db(), kind, { ...query })
  const rows = await readCatalogueRows(db(), kind, ids, query.cribId ?? null)
  return { rows: rows.map((row) => visibleItem<Kind>(actor, row)), ...page }
}
