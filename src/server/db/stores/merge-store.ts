import type { Knex } from 'knex'
import { type CatalogueKind, type Condition, toolingKinds } from '@/core/stock/kinds'
import type { ItemMerges } from '@/schemas/duplicate'

export interface MergedItem {
  id: string
  kind: CatalogueKind
  code: string
  isTrackedByPiece: boolean
  isArchived: boolean
}

/** Both items held against everything, movements too, in the order of their ids; those that are not there are left out. */
export async function lockItemsForMerge(
  trx: Knex,
  ids: readonly [string, string],
): Promise<Map<string, MergedItem>> {
  const rows = await trx('items')
    .whereRaw('id = any(?::bigint[])', [[...ids]])
    .whereIn('kind', [...toolingKinds])
    .orderBy('id')
    .forUpdate()
    .select('id', 'kind', 'code', 'is_tracked_by_piece', 'archived_at')
  return new Map(
    rows.map((row) => [
      row.id,
      {
        id: row.id,
        kind: row.kind as CatalogueKind,
        code: row.code,
        isTrackedByPiece: row.is_tracked_by_piece,
        isArchived: row.archived_at !== null,
      },
    ]),
  )
}

export interface HeldPieces {
  locationId: string
  locationKind: string
  locationName: string
  condition: Condition
  quantity: number
}

/** Where in the shop pieces of an item are, by place and condition. */
export async function listHeldPieces(trx: Knex, itemId: string): Promise<HeldPieces[]> {
  const rows = await trx('balances')
    .join('locations', 'locations.id', 'balances.location_id')
    .where({ 'balances.item_id': itemId, 'balances.is_outside': false })
    .whereNot('balances.quantity', 0)
    .orderBy(['balances.location_id', 'balances.condition'])
    .select(
      'balances.location_id',
      'balances.condition',
      'balances.quantity',
      'locations.kind',
      'locations.name',
    )
  return rows.map((row) => ({
    locationId: row.location_id,
    locationKind: row.kind,
    locationName: row.name,
    condition: row.condition as Condition,
    quantity: row.quantity,
  }))
}

/** Whether pieces of the item are promised or on their way. */
export async function hasOpenPromises(trx: Knex, itemId: string): Promise<boolean> {
  const row = await trx('stock_levels')
    .where('item_id', itemId)
    .where((any) => any.whereNot('reserved', 0).orWhereNot('coming', 0))
    .first('item_id')
  return row !== undefined
}

export interface MergeMovements {
  mergedItem: { id: string; code: string }
  keptItem: { id: string; code: string }
  actorId: string
  held: readonly HeldPieces[]
}

/** For each place and condition two adjustments: out of the one item's books, into the other's, where the pieces lie. */
export async function createMergeMovements(trx: Knex, merge: MergeMovements): Promise<void> {
  const { mergedItem, keptItem, actorId, held } = merge
  const { id: outsideId } = await trx('locations').where('kind', 'count_adjustment').first('id')
  const rows = held.flatMap(({ locationId, condition, quantity }) => {
    const common = {
      kind: 'adjustment',
      quantity,
      from_condition: condition,
      to_condition: condition,
      actor_id: actorId,
    }
    return [
      {
        ...common,
        item_id: mergedItem.id,
        from_location_id: locationId,
        to_location_id: outsideId,
        note: `Merged into ${keptItem.code}`,
      },
      {
        ...common,
        item_id: keptItem.id,
        from_location_id: outsideId,
        to_location_id: locationId,
        note: `Merged from ${mergedItem.code}`,
      },
    ]
  })
  if (rows.length > 0) await trx('movements').insert(rows)
}

/** The kept item is reordered as the other was, in the cribs where nothing was said of it yet. */
export async function takeOverReorderPoints(
  trx: Knex,
  keptItemId: string,
  mergedItemId: string,
): Promise<void> {
  await trx.raw(
    `insert into reorder_points (item_id, crib_id, reorder_point, order_up_to, pack_size, minimum_order, supplier_id,
        supplier_part_number, lead_time_days)
      select ?, crib_id, reorder_point, order_up_to, pack_size, minimum_order, supplier_id, supplier_part_number,
        lead_time_days
      from reorder_points where item_id = ? order by crib_id
      on conflict (item_id, crib_id) do nothing`,
    [keptItemId, mergedItemId],
  )
}

export async function createItemMerge(
  trx: Knex,
  merge: { itemId: string; keptItemId: string; actorId: string },
): Promise<void> {
  await trx('item_merges').insert({
    item_id: merge.itemId,
    kept_item_id: merge.keptItemId,
    merged_by: merge.actorId,
  })
}

export async function readItemMerges(db: Knex, itemId: string): Promise<ItemMerges> {
  const named = (column: 'kept_item_id' | 'item_id', where: Record<string, string>) =>
    db('item_merges')
      .join('items', 'items.id', `item_merges.${column}`)
      .where(where)
      .orderBy('items.code')
      .select('items.id', 'items.kind', 'items.code')
  const [into] = await named('kept_item_id', { 'item_merges.item_id': itemId })
  return { into: into ?? null, from: await named('item_id', { 'item_merges.kept_item_id': itemId }) }
}

/** The items that took in one whose code was exactly this. */
export async function findKeptOfCode(db: Knex, kind: CatalogueKind, code: string): Promise<string[]> {
  const rows = await db('items')
    .join('item_merges', 'item_merges.item_id', 'items.id')
    .where('items.kind', kind)
    .whereRaw('lower(items.code) = lower(?)', [code])
    .select('item_merges.kept_item_id')
  return rows.map((row) => row.kept_item_id)
}
