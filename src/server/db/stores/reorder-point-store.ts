import type { Knex } from 'knex'
import type { PutReorderPointRequest, ReorderPointResponse } from '@/schemas/reordering'
import type { ReorderPointsRow } from '../row-types'

export interface ItemInCrib {
  itemId: string
  cribId: string
}

/** Null where the item has none in this crib; locked until the transaction ends. */
export async function findLockedReorderPoint(
  trx: Knex,
  { itemId, cribId }: ItemInCrib,
): Promise<ReorderPointResponse | null> {
  const row: (ReorderPointsRow & { supplier_name: string | null }) | undefined = await trx('reorder_points')
    .leftJoin('suppliers', 'suppliers.id', 'reorder_points.supplier_id')
    .where({ item_id: itemId, crib_id: cribId })
    .forUpdate('reorder_points')
    .first('reorder_points.*', { supplier_name: 'suppliers.name' })
  return row ? reorderPoint(row) : null
}

/** Sets it; of what is absent the former value stays, or the table's default. */
export async function putReorderPoint(
  trx: Knex,
  { itemId, cribId }: ItemInCrib,
  given: PutReorderPointRequest,
): Promise<void> {
  const values = Object.fromEntries(
    Object.entries({
      reorder_point: given.reorderPoint,
      order_up_to: given.orderUpTo,
      pack_size: given.packSize,
      minimum_order: given.minimumOrder,
      supplier_id: given.supplierId,
      supplier_part_number: given.supplierPartNumber,
      lead_time_days: given.leadTimeDays,
    }).filter(([, value]) => value !== undefined),
  )
  await trx('reorder_points')
    .insert({ item_id: itemId, crib_id: cribId, ...values })
    .onConflict(['item_id', 'crib_id'])
    .merge(Object.keys(values))
}

export async function removeReorderPoint(trx: Knex, { itemId, cribId }: ItemInCrib): Promise<void> {
  await trx('reorder_points').where({ item_id: itemId, crib_id: cribId }).delete()
}

export function reorderPoint(row: ReorderPointsRow & { supplier_name: string | null }): ReorderPointResponse {
  return {
    itemId: row.item_id,
    cribId: row.crib_id,
    version: row.version,
    reorderPoint: row.reorder_point,
    orderUpTo: row.order_up_to,
    packSize: row.pack_size,
    minimumOrder: row.minimum_order,
    supplierId: row.supplier_id,
    supplierName: row.supplier_name,
    supplierPartNumber: row.supplier_part_number,
    leadTimeDays: row.lead_time_days,
  }
}
