import type { MergeItemsRequest, MergeItemsResponse } from '@/schemas/duplicate'
import type { Actor } from '../../auth/actor'
import { createAuditEntry } from '../../db/stores/audit-store'
import { archiveItem } from '../../db/stores/item-store'
import {
  createItemMerge,
  createMergeMovements,
  lockItemsForMerge,
  takeOverReorderPoints,
} from '../../db/stores/merge-store'
import { onceInTransaction, type RepeatableCall } from '../idempotency'
import { mergeablePair } from './mergeable-pair'

/**
 * Makes one item of two that measure the same, once, however often it is sent: the pieces of the one go over where they
 * are, tags and all, it is archived, and what happened to it stays under its old code.
 */
export function mergeItems(
  actor: Actor,
  request: MergeItemsRequest,
  claim: RepeatableCall,
): Promise<MergeItemsResponse> {
  return onceInTransaction(actor, claim, async (trx) => {
    await lockItemsForMerge(trx, [request.keptItemId, request.mergedItemId])
    const { kept, merged, held, tagsNowhere } = await mergeablePair(trx, request)
    await takeOverReorderPoints(trx, kept.id, merged.id)
    // The books ask for the merge before they let pieces go over.
    await createItemMerge(trx, { itemId: merged.id, keptItemId: kept.id, actorId: actor.id })
    await createMergeMovements(trx, { mergedItem: merged, keptItem: kept, actorId: actor.id })
    await archiveItem(trx, merged.id)
    const moved = held.map(({ locationId, condition, quantity }) => ({ locationId, condition, quantity }))
    const tags = [...held.flatMap((place) => place.tags), ...tagsNowhere]
    await createAuditEntry(trx, {
      actorId: actor.id,
      action: `${merged.kind}-merged`,
      entity: 'item',
      entityId: merged.id,
      before: { code: merged.code, archived: false },
      after: { archived: true, keptItemId: kept.id, keptCode: kept.code, moved, tags },
    })
    return { keptItemId: kept.id, mergedItemId: merged.id, moved }
  })
}
