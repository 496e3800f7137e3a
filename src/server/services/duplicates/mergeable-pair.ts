import { AppError } from '@/lib/app-error'
import type { MergeItemsRequest } from '@/schemas/duplicate'
import type { Database } from '../../db/connection'
import { haveSameGeometry } from '../../db/read-models/duplicate-groups'
import {
  findItemsOfMerge,
  type HeldPieces,
  listHeldPieces,
  listPiecesNowhere,
  type MergedItem,
  readOpenPromises,
} from '../../db/stores/merge-store'
import { kindWords } from '../catalogue/kind-words'

export interface MergeablePair {
  kept: MergedItem
  merged: MergedItem
  /** What goes over, by place and condition. */
  held: HeldPieces[]
  /** Tags of pieces that are nowhere in the shop, and go over as well. */
  tagsNowhere: string[]
}

/** Both items of a merge and what goes over, or the reason why it cannot be made. */
export async function mergeablePair(
  trx: Database,
  { keptItemId, mergedItemId }: MergeItemsRequest,
): Promise<MergeablePair> {
  const found = await findItemsOfMerge(trx, [keptItemId, mergedItemId])
  const kept = usable(found.get(keptItemId), 'keptItemId')
  const merged = usable(found.get(mergedItemId), 'mergedItemId')
  if (kept.kind !== merged.kind || !(await haveSameGeometry(trx, kept.kind, [kept.id, merged.id]))) {
    throw notMergeable(
      'mergedItemId',
      `${merged.code} does not measure the same as ${kept.code}: only the same ${kindWords[kept.kind].one} is merged.`,
    )
  }
  await refuseOpenPromises(trx, merged)
  const held = await listHeldPieces(trx, merged.id)
  const tagsNowhere = await listPiecesNowhere(trx, merged.id)
  if (kept.isTrackedByPiece !== merged.isTrackedByPiece && held.length + tagsNowhere.length > 0) {
    throw notMergeable('mergedItemId', otherTracking(kept, merged))
  }
  return { kept, merged, held, tagsNowhere }
}

function usable(item: MergedItem | undefined, path: string): MergedItem {
  if (!item) throw notMergeable(path, 'There is no such item.')
  if (item.isArchived) throw notMergeable(path, `${item.code} is archived.`)
  return item
}

/** A piece with a tag keeps it, and one without has none to be told by. */
function otherTracking(kept: MergedItem, merged: MergedItem): string {
  const [tracked, other] = kept.isTrackedByPiece ? [kept, merged] : [merged, kept]
  return `${tracked.code} is tracked piece by piece and ${other.code} is not, so the pieces of ${merged.code} cannot go over. An item without any pieces can be merged.`
}

async function refuseOpenPromises(trx: Database, merged: MergedItem): Promise<void> {
  const { reserved, ordered } = await readOpenPromises(trx, merged.id)
  if (reserved === 0 && ordered === 0) return
  const open = [reserved > 0 ? `${reserved} promised to jobs` : '', ordered > 0 ? `${ordered} on order` : '']
  throw new AppError(
    'still-in-use',
    `Of ${merged.code}, ${open.filter(Boolean).join(' and ')}: settle these first, then merge.`,
  )
}

function notMergeable(path: string, message: string): AppError {
  return new AppError('impossible', message, { errors: [{ path, message }] })
}
