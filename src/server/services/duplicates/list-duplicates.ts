import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import type { DuplicatesResponse, ItemMerges } from '@/schemas/duplicate'
import { db } from '../../db/connection'
import { readDuplicateGroups } from '../../db/read-models/duplicate-groups'
import { findItem } from '../../db/stores/item-store'
import { readItemMerges } from '../../db/stores/merge-store'

/** Items in use that measure the same and have different codes. */
export function listDuplicates(kind: CatalogueKind): Promise<DuplicatesResponse> {
  return readDuplicateGroups(db(), kind)
}

/** What an item was merged into, and what was merged into it. */
export async function getItemMerges(itemId: string): Promise<ItemMerges> {
  if (!(await findItem(db(), itemId))) throw new AppError('not-found', 'There is no such item.')
  return readItemMerges(db(), itemId)
}
