import type { CreateMovementRequest, MovementResponse } from '@/schemas/movement'
import type { Actor } from '../../auth/actor'
import { readMovementRows } from '../../db/read-models/movement-rows'
import { createMovement } from '../../db/stores/movement-store'
import { onceInTransaction, type RepeatableCall } from '../idempotency'
import { checkedMovement } from './checked-movement'
import { explainingMovementRefusals } from './explain-movement-refusal'
import { visibleMovement } from './visible-movement'

/** Posts a movement once, however often it is sent. The ledger itself is the record of who moved what. */
export async function postMovement(
  actor: Actor,
  request: CreateMovementRequest,
  claim: RepeatableCall,
): Promise<MovementResponse> {
  return explainingMovementRefusals(() =>
    onceInTransaction(actor, claim, async (trx) => {
      const id = await createMovement(trx, await checkedMovement(trx, actor, request))
      const [row] = await readMovementRows(trx, [id])
      return visibleMovement(actor, row)
    }),
  )
}
