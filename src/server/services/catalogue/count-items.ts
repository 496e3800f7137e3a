import type { CatalogueKind } from '@/core/stock/kinds'
import type { CatalogueCounts } from '@/schemas/catalogue-counts'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { readCatalogueCounts } from '../../db/read-models/catalogue-counts'
import { refuseHiddenCosts } from './visible-item'

/** How many items each choice of the filters asked for would leave. */
export async function countItems(
  actor: Actor,
  kind: CatalogueKind,
  query: Record<string, unknown> & { of: readonly string[] },
): Promise<{ counts: CatalogueCounts }> {
  refuseHiddenCosts(actor, query)
  return { counts: await readCatalogueCounts(db(), kind, query) }
}
