import { canReverseMovement } from '@/core/policies/movement-policy'
import { AppError } from '@/lib/app-error'
import type { MovementResponse } from '@/schemas/movement'
import type { Actor } from '../../auth/actor'
import type { MovementRow } from '../../db/read-models/movement-rows'

/** A movement as this person sees it, with whether they may reverse it now. */
export function visibleMovement(actor: Actor, row: MovementRow | undefined): MovementResponse {
  if (!row) throw new AppError('not-found', 'There is no such movement.')
  const { isOfToday, isOfMerge, ...movement } = row
  const isOpen = movement.reversedById === null && movement.kind !== 'reversal' && !isOfMerge
  return {
    ...movement,
    canReverse: isOpen && canReverseMovement(actor, { actorId: movement.actorId, isOfToday }),
  }
}
