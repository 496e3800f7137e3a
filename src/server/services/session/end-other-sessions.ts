import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { endSessionsOfUser } from '../../db/stores/session-store'

/** Signs a person out everywhere but here. */
export function endOtherSessions(actor: Actor, keptTokenHash: string | null): Promise<void> {
  return endSessionsOfUser(db(), actor.id, keptTokenHash)
}
