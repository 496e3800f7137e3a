import type { Knex } from 'knex'
import {
  type CatalogueKind,
  type Condition,
  type ShopLocationKind,
  type ToolingKind,
  toolingKinds,
} from '@/core/stock/kinds'
import type { ItemMerges } from '@/schemas/duplicate'
import { enumFromDb } from '../enum-case'

export interface MergedItem {
  id: string
  kind: ToolingKind
  code: string
  isTrackedByPiece: boolean
  isArchived: boolean
}

/** Holds both items against everything, movements too, in the order of their ids. */
export async function lockItemsForMerge(trx: Knex, ids: readonly [string, string]): Promise<void> {
  await trx('items')
    .whereRaw('id = any(?::bigint[])', [[...ids]])
    .orderBy('id')
    .forUpdate()
    .select('id')
}

/** The items by their ids; those that are not there are left out. */
export async function findItemsOfMerge(
  db: Knex,
  ids: readonly [string, string],
): Promise<Map<string, MergedItem>> {
  const rows = await db('items')
    .whereRaw('id = any(?::bigint[])', [[...ids]])
    .whereIn('kind', [...toolingKinds])
    .select('id', 'kind', 'code', 'is_tracked_by_piece', 'archived_at')
  return new Map(
    rows.map((row) => [
      row.id,
      {
        id: row.id,
        kind: row.kind as ToolingKind,
        code: row.code,
        isTrackedByPiece: row.is_tracked_by_piece,
        isArchived: row.archived_at !== null,
      },
    ]),
  )
}

export interface HeldPieces {
  locationId: string
  locationKind: ShopLocationKind
  locationCode: string
  locationName: string
  cribCode: string | null
  condition: Condition
  quantity: number
  /** The tags, where the item is tracked piece by piece. */
  tags: string[]
}

/** Where in the shop pieces of an item are, by place and condition. */
export async function listHeldPieces(db: Knex, itemId: string): Promise<HeldPieces[]> {
  const { rows } = await db.raw<{ rows: (Omit<HeldPieces, 'locationKind'> & { locationKind: string })[] }>(
    `select balances.location_id as "locationId", locations.kind as "locationKind", locations.code as "locationCode",
        locations.name as "locationName", cribs.code as "cribCode", balances.condition, balances.quantity,
        array(select tag from pieces
          where (pieces.item_id, pieces.location_id, pieces.condition)
            = (balances.item_id, balances.location_id, balances.condition) order by lower(tag)) as tags
      from balances
      join locations on locations.id = balances.location_id
      left join cribs on cribs.id = locations.crib_id
      where balances.item_id = ? and not balances.is_outside and balances.quantity <> 0
      order by cribs.code nulls last, locations.kind, lower(locations.code), balances.condition`,
    [itemId],
  )
  return rows.map((row) => ({ ...row, locationKind: enumFromDb(row.locationKind) as ShopLocationKind }))
}

/** Tagged pieces that are nowhere in the shop: those never come in and those a count missed. Scrap does not count. */
export async function listPiecesNowhere(db: Knex, itemId: string): Promise<string[]> {
  const rows = await db('pieces')
    .leftJoin('locations', 'locations.id', 'pieces.location_id')
    .where('pieces.item_id', itemId)
    .where((any) => any.whereNull('pieces.location_id').orWhere('locations.kind', 'count_adjustment'))
    .orderByRaw('lower(pieces.tag)')
    .select('pieces.tag')
  return rows.map(({ tag }) => tag)
}

export interface OpenPromises {
  reserved: number
  /** Coming from outside: what a transfer carries is held already, and goes over with the rest. */
  ordered: number
}

export async function readOpenPromises(db: Knex, itemId: string): Promise<OpenPromises> {
  const { rows } = await db.raw<{ rows: OpenPromises[] }>(
    `select coalesce(sum(reserved), 0)::int as reserved,
        greatest(0, coalesce(sum(coming), 0) - (
          select coalesce(sum(balances.quantity), 0) from balances join locations on locations.id = location_id
          where item_id = ? and locations.kind = 'in_transit'))::int as ordered
      from stock_levels where item_id = ?`,
    [itemId, itemId],
  )
  return rows[0] ?? { reserved: 0, ordered: 0 }
}

export interface MergeMovements {
  mergedItem: { id: string; code: string }
  keptItem: { id: string; code: string }
  actorId: string
}

/**
 * For each place, condition and tagged piece two adjustments: out of the one item's books, into the other's, where the
 * pieces lie. All in one statement, since half of a merge is refused, and each out before its in.
 */
export async function createMergeMovements(trx: Knex, merge: MergeMovements): Promise<void> {
  const { mergedItem, keptItem, actorId } = merge
  await trx.raw(
    `insert into movements (kind, merged_item_id, item_id, piece_id, quantity, from_location_id, from_condition,
        to_location_id, to_condition, actor_id, note)
      select 'adjustment', :merged, side.item_id, held.piece_id, held.quantity,
        case when side.is_out then held.location_id else outside.id end, held.condition,
        case when side.is_out then outside.id else held.location_id end, held.condition, :actor, side.note
      from (
        select balances.location_id, balances.condition, pieces.id as piece_id,
          case when pieces.id is null then balances.quantity else 1 end as quantity
        from balances
        left join pieces on (pieces.item_id, pieces.location_id, pieces.condition)
          = (balances.item_id, balances.location_id, balances.condition)
        where balances.item_id = :merged and not balances.is_outside and balances.quantity <> 0
      ) as held
      cross join (select id from locations where kind = 'count_adjustment') as outside
      cross join (values (true, cast(:merged as bigint), :into), (false, cast(:kept as bigint), :from))
        as side (is_out, item_id, note)
      order by held.location_id, held.condition, held.piece_id, side.is_out desc`,
    {
      merged: mergedItem.id,
      kept: keptItem.id,
      actor: actorId,
      into: `Merged into ${keptItem.code}`,
      from: `Merged from ${mergedItem.code}`,
    },
  )
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

/** The item that took in the one whose code was exactly this, however many merges lie between. */
export async function findKeptOfCode(db: Knex, kind: CatalogueKind, code: string): Promise<string[]> {
  const { rows } = await db.raw<{ rows: { id: string }[] }>(
    `with recursive kept as (
        select item_merges.kept_item_id as id from items join item_merges on item_merges.item_id = items.id
        where items.kind = ? and lower(items.code) = lower(?)
        union
        select item_merges.kept_item_id from kept join item_merges on item_merges.item_id = kept.id)
      select id from kept where not exists (select from item_merges where item_id = kept.id)`,
    [kind, code],
  )
  return rows.map(({ id }) => id)
}
