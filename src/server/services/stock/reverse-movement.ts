import { canReverseMovement } from '@/core/policies/movement-policy'
import { AppError } from '@/lib/app-error'
import type { MovementResponse } from '@/schemas/movement'
import type { Actor } from '../../auth/actor'
import type { Database } from '../../db/connection'
import { readMovementRows } from '../../db/read-models/movement-rows'
import { createMovement, findMovement, type MovementRecord } from '../../db/stores/movement-store'
import { onceInTransaction, type RepeatableCall } from '../idempotency'
import { explainingMovementRefusals } from './explain-movement-refusal'
import { visibleMovement } from './visible-movement'

/** Posts the mirror of a movement: what was moved goes back where it came from, in the condition it had. */
export async function reverseMovement(
  actor: Actor,
  movementId: string,
  claim: RepeatableCall,
): Promise<MovementResponse> {
  return explainingMovementRefusals(() =>
    onceInTransaction(actor, claim, async (trx) => {
      const movement = await reversibleMovement(trx, actor, movementId)
      const id = await createMovement(trx, {
        kind: 'reversal',
        itemId: movement.itemId,
        pieceId: movement.pieceId,
        quantity: movement.quantity,
        fromLocationId: movement.toLocationId,
        fromCondition: movement.toCondition,
        toLocationId: movement.fromLocationId,
        toCondition: movement.fromCondition,
        note: '',
        actorId: actor.id,
        reversesId: movement.id,
      })
      const [row] = await readMovementRows(trx, [id])
      return visibleMovement(actor, row)
    }),
  )
}

async function reversibleMovement(trx: Database, actor: Actor, id: string): Promise<MovementRecord> {
  const movement = await findMovement(trx, id)
  const [row] = await readMovementRows(trx, [id])
  if (!movement || !row) throw new AppError('not-found', 'There is no such movement.')
  if (!canReverseMovement(actor, row)) {
    throw new AppError('not-allowed', 'You can reverse only your own movements, and on the same day.', {
      note: `user ${actor.id} (${actor.role}) may not reverse movement ${id}`,
    })
  }
  if (movement.kind === 'reversal') {
    throw new AppError('movement-not-possible', 'A reversal is not reversed: post the movement again.')
  }
  if (movement.isReversed) throw new AppError('already-reversed', 'This movement has been reversed before.')
  return movement
}
