import { AppError } from '@/lib/app-error'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import {
  removeReorderPoint as deleteReorderPoint,
  findLockedReorderPoint,
  type ItemInCrib,
} from '../../db/stores/reorder-point-store'
import { inTransaction } from '../../db/transaction'

/** Watches an item in a crib no longer; an open alert of it closes. */
export async function removeReorderPoint(actor: Actor, pair: ItemInCrib): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const before = await findLockedReorderPoint(trx, pair)
    if (!before) throw new AppError('not-found', 'This item has no reorder point in this crib.')
    await deleteReorderPoint(trx, pair)
    await createAuditEntry(trx, {
      actorId: actor.id,
      action: 'reorder-point-removed',
      entity: 'reorder-point',
      entityId: `${pair.itemId}-${pair.cribId}`,
      before,
    })
  })
}
