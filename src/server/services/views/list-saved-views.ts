import type { CatalogueKind } from '@/core/stock/kinds'
import type { SavedViewResponse } from '@/schemas/saved-view'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { listSavedViews as readViews } from '../../db/stores/saved-view-store'
import { visibleView } from './saved-view-rules'

/** One's own views of a list and those others share. */
export async function listSavedViews(
  actor: Actor,
  kind: CatalogueKind,
): Promise<{ rows: SavedViewResponse[] }> {
  const views = await readViews(db(), actor.id, kind)
  return { rows: views.map((view) => visibleView(actor, view)) }
}
