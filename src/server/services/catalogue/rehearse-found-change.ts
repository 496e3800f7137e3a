import type { CatalogueKind } from '@/core/stock/kinds'
import type { FoundRehearsal, FoundRehearsalRequest } from '@/schemas/found-change'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { readFoundVersions } from '../../db/read-models/catalogue-keys'
import { foreseeChange, refuseTooMany, rehearsalOf } from './found-rows'
import { refuseHiddenCosts } from './visible-item'

/** What changing one field of everything a filter finds would do; nothing is changed by asking. */
export async function rehearseFoundChange(
  actor: Actor,
  kind: CatalogueKind,
  { filters, change }: FoundRehearsalRequest,
): Promise<FoundRehearsal> {
  refuseHiddenCosts(actor, filters)
  const found = await readFoundVersions(db(), kind, filters)
  refuseTooMany(kind, found)
  const ids = found.map(({ id }) => id)
  return rehearsalOf(found, await foreseeChange(db(), kind, ids, change))
}
