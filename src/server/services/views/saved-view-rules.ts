import { can } from '@/core/policies/permissions'
import { AppError } from '@/lib/app-error'
import type { SavedViewResponse } from '@/schemas/saved-view'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { isUniqueViolation } from '../../db/database-errors'
import { findSavedView, lockSavedView, type SavedViewRecord } from '../../db/stores/saved-view-store'

export function visibleView(actor: Actor, view: SavedViewRecord): SavedViewResponse {
  const { ownerId, ...rest } = view
  return { ...rest, isMine: ownerId === actor.id }
}

/** A view this person may change, held until the transaction ends; another's private one is not there for them. */
export async function getOwnView(trx: Database, actor: Actor, id: string): Promise<SavedViewRecord> {
  await lockSavedView(trx, id)
  const view = await findSavedView(trx, id)
  if (!view || (view.ownerId !== actor.id && !view.isShared))
    throw new AppError('not-found', 'There is no such view.')
  if (view.ownerId !== actor.id) throw new AppError('not-allowed', `This view is ${view.ownerName}’s.`)
  return view
}

/** A shared view may also be removed by an admin: people leave, and their views stay. */
export async function getRemovableView(trx: Database, actor: Actor, id: string): Promise<SavedViewRecord> {
  const view = await findSavedView(trx, id)
  if (view?.isShared && can(actor.role, 'administer')) return view
  return getOwnView(trx, actor, id)
}

export async function readOwnView(actor: Actor, id: string): Promise<SavedViewResponse> {
  const view = await findSavedView(db(), id)
  if (!view) throw new AppError('not-found', 'There is no such view.')
  return visibleView(actor, view)
}

export async function explainingTakenName<Answer>(
  name: string | undefined,
  work: () => Promise<Answer>,
): Promise<Answer> {
  try {
    return await work()
  } catch (error) {
    if (!isUniqueViolation(error, 'saved_views_name_idx')) throw error
    throw new AppError('name-taken', `You have a view called ${name ?? 'so'} already.`, {
      errors: [{ path: 'name', message: 'You have a view of this name already.' }],
    })
  }
}
