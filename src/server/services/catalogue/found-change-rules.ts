import { AppError } from '@/lib/app-error'
import type { FoundChange } from '@/schemas/found-change'
import type { Actor } from '../../auth/actor'
import type { Database } from '../../db/connection'
import { type FoundChangeRecord, findFoundChange } from '../../db/stores/found-change-store'

/** One's own; another's is not there. */
export async function getOwnFoundChange(db: Database, actor: Actor, id: string): Promise<FoundChangeRecord> {
  const change = await findFoundChange(db, id)
  if (!change || change.actorId !== actor.id)
    throw new AppError('not-found', 'There is no such change, or it is too long ago.')
  return change
}

export async function getFoundChange(db: Database, actor: Actor, id: string): Promise<FoundChange> {
  return toldChange(await getOwnFoundChange(db, actor, id))
}

export function toldChange({ actorId: _, isUndone: __, ...change }: FoundChangeRecord): FoundChange {
  return change
}
