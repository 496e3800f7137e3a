import { AppError } from '@/lib/app-error'
import type { Actor } from '../auth/actor'
import { type Database, db } from '../db/connection'
import { claimKey, findKeptAnswer, keepAnswer } from '../db/stores/idempotency-store'
import { inTransaction } from '../db/transaction'

const createdStatus = 201

/** What makes a repeated call recognisable, as the route hands it over. */
export interface RepeatableCall {
  key: string
  route: string
  bodyHash: string
}

/**
 * Does the work of a call once, however often it is sent: the key is claimed first in the work's own transaction, so a
 * twin that runs at the same time waits, and a failure leaves the key free. The same key with the same body gets the
 * first answer again; with another body it is refused.
 */
export async function onceInTransaction<Answer>(
  actor: Actor,
  claim: RepeatableCall,
  work: (trx: Database) => Promise<Answer>,
): Promise<Answer> {
  const call = { actorId: actor.id, route: claim.route, key: claim.key }
  return inTransaction(db(), async (trx) => {
    if (await claimKey(trx, call, claim.bodyHash)) {
      const answer = await work(trx)
      await keepAnswer(trx, call, createdStatus, answer)
      return answer
    }
    const kept = await findKeptAnswer(trx, call)
    if (!kept || kept.bodyHash !== claim.bodyHash) {
      throw new AppError(
        'idempotency-key-reused',
        'This Idempotency-Key was used for another request before.',
      )
    }
    return kept.answer as Answer
  })
}
