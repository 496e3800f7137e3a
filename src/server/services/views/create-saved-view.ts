import type { CreateSavedViewRequest, SavedViewResponse } from '@/schemas/saved-view'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { createSavedView as insertView } from '../../db/stores/saved-view-store'
import { explainingTakenName, readOwnView } from './saved-view-rules'

/** Keeps a view under a name of its owner's choosing. It is a bookmark, not a record: the audit does not hold it. */
export async function createSavedView(
  actor: Actor,
  request: CreateSavedViewRequest,
): Promise<SavedViewResponse> {
  const id = await explainingTakenName(request.name, () =>
    insertView(db(), { ...request, ownerId: actor.id }),
  )
  return readOwnView(actor, id)
}
