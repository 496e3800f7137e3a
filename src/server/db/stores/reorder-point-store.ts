import type { Knex } from 'knex'
import { reorderPointCaution } from '@/lib/reorder-point-caution'
import type { PutReorderPointRequest, ReorderPointResponse } from '@/schemas/reordering'
import type { ReorderPointsRow } from '../row-types'

export interface ItemInCrib {
  itemId: string
  cribId: string
}

type JoinedRow = ReorderPointsRow & { supplier_name: string | null }

/** While it is held only this transaction changes reorder points; others read them, and stock moves on. */
export async function lockReorderPoints(trx: Knex): Promise<void> {
  await trx.raw('lock table reorder_points in exclusive mode')
}

/** Null where the item has none in this crib; locked until the transaction ends. */
export async function findLockedReorderPoint(
  trx: Knex,
  { itemId, cribId }: ItemInCrib,
): Promise<ReorderPointResponse | null> {
  const row: JoinedRow | undefined = await withSupplier(trx)
    .where({ item_id: itemId, crib_id: cribId })
    .forUpdate('reorder_points')
    .first()
  return row ? reorderPoint(row) : null
}

/** Those of these pairs that are set, by `pairKey`. */
export async function findReorderPoints(
  db: Knex,
  pairs: readonly ItemInCrib[],
): Promise<Map<string, ReorderPointResponse>> {
  const rows: JoinedRow[] = await withSupplier(db).whereIn(
    ['item_id', 'crib_id'],
    pairs.map(({ itemId, cribId }) => [itemId, cribId]),
  )
  return new Map(rows.map(reorderPoint).map((point) => [pairKey(point), point]))
}

export function pairKey({ itemId, cribId }: ItemInCrib): string {
  return `${itemId}-${cribId}`
}

function withSupplier(db: Knex): Knex.QueryBuilder {
  return db('reorder_points')
    .leftJoin('suppliers', 'suppliers.id', 'reorder_points.supplier_id')
    .select('reorder_points.*', { supplier_name: 'suppliers.name' })
}

/** Sets it; of what is absent the former value stays, or the table's default. */
export async function putReorderPoint(
  trx: Knex,
  { itemId, cribId }: ItemInCrib,
  given: PutReorderPointRequest,
): Promise<void> {
  const values = givenColumns(given)
  await trx('reorder_points')
    .insert({ item_id: itemId, crib_id: cribId, ...values })
    .onConflict(['item_id', 'crib_id'])
    .merge(Object.keys(values))
}

/**
 * Sets many with one statement, whose alerts are settled together. The caller holds the lock of all reorder points and
 * says what is there, so that what is absent stays.
 */
export async function putReorderPoints(
  trx: Knex,
  rows: readonly (ItemInCrib & PutReorderPointRequest)[],
  before: ReadonlyMap<string, ReorderPointResponse>,
): Promise<void> {
  const whole = rows.map((row) => ({
    ...{ item_id: row.itemId, crib_id: row.cribId, pack_size: 1, minimum_order: 1 },
    ...{ supplier_id: null, supplier_part_number: null, lead_time_days: null },
    ...givenColumns(before.get(pairKey(row)) ?? {}),
    ...givenColumns(row),
  }))
  await trx('reorder_points').insert(whole).onConflict(['item_id', 'crib_id']).merge()
}

function givenColumns(given: Partial<PutReorderPointRequest>): Record<string, string | number | null> {
  const values = {
    reorder_point: given.reorderPoint,
    order_up_to: given.orderUpTo,
    pack_size: given.packSize,
    minimum_order: given.minimumOrder,
    supplier_id: given.supplierId,
    supplier_part_number: given.supplierPartNumber,
    lead_time_days: given.leadTimeDays,
  }
  return Object.fromEntries(
    Object.entries(values).filter(
      (entry): entry is [string, string | number | null] => entry[1] !== undefined,
    ),
  )
}

export async function removeReorderPoint(trx: Knex, { itemId, cribId }: ItemInCrib): Promise<void> {
  await trx('reorder_points').where({ item_id: itemId, crib_id: cribId }).delete()
}

export function reorderPoint(row: JoinedRow): ReorderPointResponse {
  const figures = { reorderPoint: row.reorder_point, orderUpTo: row.order_up_to }
  return {
    itemId: row.item_id,
    cribId: row.crib_id,
    version: row.version,
    ...figures,
    packSize: row.pack_size,
    minimumOrder: row.minimum_order,
    supplierId: row.supplier_id,
    supplierName: row.supplier_name,
    supplierPartNumber: row.supplier_part_number,
    leadTimeDays: row.lead_time_days,
    caution: reorderPointCaution(figures),
  }
}
