import { AppError } from '@/lib/app-error'
import type { PutReorderPointRequest, ReorderPointResponse } from '@/schemas/reordering'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { findCrib } from '../../db/stores/crib-store'
import { findItem } from '../../db/stores/item-store'
import {
  findLockedReorderPoint,
  type ItemInCrib,
  putReorderPoint as writeReorderPoint,
} from '../../db/stores/reorder-point-store'
import { findUsableSuppliers } from '../../db/stores/supplier-store'
import { inTransaction } from '../../db/transaction'

/** Sets when an item is low in a crib. Alerts and their mails follow in the same transaction, by the database itself. */
export async function putReorderPoint(
  actor: Actor,
  pair: ItemInCrib,
  request: PutReorderPointRequest,
): Promise<ReorderPointResponse> {
  return inTransaction(db(), async (trx) => {
    await refuseUnknown(trx, pair, request.supplierId)
    const before = await findLockedReorderPoint(trx, pair)
    if (request.version !== undefined && request.version !== before?.version) {
      throw new AppError('stale-version', 'Someone changed this reorder point meanwhile.', {
        extra: { current: before },
      })
    }
    await writeReorderPoint(trx, pair, request)
    const after = await findLockedReorderPoint(trx, pair)
    if (!after) throw new Error('a reorder point that was set is not there')
    await createAuditEntry(trx, {
      actorId: actor.id,
      action: before ? 'reorder-point-changed' : 'reorder-point-set',
      entity: 'reorder-point',
      entityId: `${pair.itemId}-${pair.cribId}`,
      before: before ?? undefined,
      after,
    })
    return after
  })
}

async function refuseUnknown(
  trx: Database,
  { itemId, cribId }: ItemInCrib,
  supplierId: string | null | undefined,
): Promise<void> {
  const item = await findItem(trx, itemId)
  if (!item || item.isArchived) throw new AppError('not-found', 'There is no such item in use.')
  if (!(await findCrib(trx, cribId))) throw new AppError('not-found', 'There is no such crib.')
  if (supplierId && !(await findUsableSuppliers(trx, [supplierId])).has(supplierId)) {
    const message = 'There is no such supplier.'
    throw new AppError('impossible', message, { errors: [{ path: 'supplierId', message }] })
  }
}
