import { AppError } from '@/lib/app-error'
import type { MergeItemsRequest, MergeItemsResponse } from '@/schemas/duplicate'
import type { Actor } from '../../auth/actor'
import type { Database } from '../../db/connection'
import { haveSameGeometry } from '../../db/read-models/duplicate-groups'
import { createAuditEntry } from '../../db/stores/audit-store'
import { archiveItem } from '../../db/stores/item-store'
import {
  createItemMerge,
  createMergeMovements,
  type HeldPieces,
  hasOpenPromises,
  listHeldPieces,
  lockItemsForMerge,
  type MergedItem,
  takeOverReorderPoints,
} from '../../db/stores/merge-store'
import { kindWords } from '../catalogue/kind-words'
import { onceInTransaction, type RepeatableCall } from '../idempotency'

interface Pair {
  kept: MergedItem
  merged: MergedItem
}

/**
 * Makes one item of two that measure the same, once, however often it is sent: the pieces of the one go over where they
 * lie, it is archived, and what happened to it stays under its old code.
 */
export function mergeItems(
  actor: Actor,
  request: MergeItemsRequest,
  claim: RepeatableCall,
): Promise<MergeItemsResponse> {
  return onceInTransaction(actor, claim, async (trx) => {
    const { kept, merged } = await mergeablePair(trx, request)
    const held = await listHeldPieces(trx, merged.id)
    refusePiecesElsewhere(merged, held)
    await takeOverReorderPoints(trx, kept.id, merged.id)
    await createMergeMovements(trx, { mergedItem: merged, keptItem: kept, actorId: actor.id, held })
    await archiveItem(trx, merged.id)
    await createItemMerge(trx, { itemId: merged.id, keptItemId: kept.id, actorId: actor.id })
    const moved = held.map(({ locationId, condition, quantity }) => ({ locationId, condition, quantity }))
    await createAuditEntry(trx, {
      actorId: actor.id,
      action: `${merged.kind}-merged`,
      entity: 'item',
      entityId: merged.id,
      before: { code: merged.code, archived: false },
      after: { archived: true, keptItemId: kept.id, keptCode: kept.code, moved },
    })
    return { keptItemId: kept.id, mergedItemId: merged.id, moved }
  })
}

async function mergeablePair(trx: Database, request: MergeItemsRequest): Promise<Pair> {
  const { keptItemId, mergedItemId } = request
  const found = await lockItemsForMerge(trx, [keptItemId, mergedItemId])
  const kept = usable(found.get(keptItemId), 'keptItemId')
  const merged = usable(found.get(mergedItemId), 'mergedItemId')
  if (kept.kind !== merged.kind || !(await haveSameGeometry(trx, kept.kind, [kept.id, merged.id]))) {
    throw notMergeable(
      'mergedItemId',
      `${merged.code} does not measure the same as ${kept.code}: only the same ${kindWords[kept.kind].one} is merged.`,
    )
  }
  if (await hasOpenPromises(trx, merged.id)) {
    throw new AppError(
      'still-in-use',
      `Pieces of ${merged.code} are promised or on their way: settle these first.`,
    )
  }
  return { kept, merged }
}

function usable(item: MergedItem | undefined, path: string): MergedItem {
  if (!item) throw notMergeable(path, 'There is no such item.')
  if (item.isArchived) throw notMergeable(path, `${item.code} is archived.`)
  if (item.isTrackedByPiece) {
    throw notMergeable(path, `${item.code} is tracked piece by piece, and a tagged piece stays of its item.`)
  }
  return item
}

/** An adjustment reaches bins alone; what is in hands, in a machine, ground or on its way comes back first. */
function refusePiecesElsewhere(merged: MergedItem, held: readonly HeldPieces[]): void {
  const elsewhere = held.filter(({ locationKind }) => locationKind !== 'bin')
  if (elsewhere.length === 0) return
  const places = elsewhere.map(({ quantity, locationName }) => `${quantity} with ${locationName}`).join(', ')
  throw new AppError(
    'still-in-use',
    `Pieces of ${merged.code} are not in a bin: ${places}. Take them back first.`,
  )
}

function notMergeable(path: string, message: string): AppError {
  return new AppError('impossible', message, { errors: [{ path, message }] })
}
