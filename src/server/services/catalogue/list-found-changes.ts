import type { CatalogueKind } from '@/core/stock/kinds'
import type { FoundChange } from '@/schemas/found-change'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { listFoundChanges as readChanges } from '../../db/stores/found-change-store'
import { toldChange } from './found-change-rules'

const shownChanges = 5

/** One's own last changes of everything found, of those that were not taken back yet. */
export async function listFoundChanges(actor: Actor, kind: CatalogueKind): Promise<{ rows: FoundChange[] }> {
  return { rows: (await readChanges(db(), actor.id, kind, shownChanges)).map(toldChange) }
}
