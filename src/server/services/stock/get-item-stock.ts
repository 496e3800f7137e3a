import { AppError } from '@/lib/app-error'
import type { ItemStockResponse } from '@/schemas/stock'
import { db } from '../../db/connection'
import { readItemStock } from '../../db/read-models/item-stock'
import { findItem } from '../../db/stores/item-store'

/** An item's stock, over all cribs and by place and condition. */
export async function getItemStock(itemId: string): Promise<ItemStockResponse> {
  if (!(await findItem(db(), itemId))) throw new AppError('not-found', 'There is no such item.')
  return readItemStock(db(), itemId)
}
