import type { Knex } from 'knex'
import type { StockSummary } from '@/schemas/item'

/**
 * Whether an item is low in any crib, or in the one asked for (bind it twice; null for any): its position, available
 * and coming, at or below the reorder point. An item that never came to a crib has a position of nothing there; an
 * archived one is never low.
 */
export function isLowSql(itemId: string): string {
  return `exists (
    select from reorder_points as point
    join items as kept on kept.id = point.item_id and kept.archived_at is null
    left join stock_levels as here on here.item_id = point.item_id and here.crib_id = point.crib_id
    where point.item_id = ${itemId} and (?::bigint is null or point.crib_id = ?)
      and coalesce(here.on_hand - here.reserved + here.coming, 0) <= point.reorder_point)`
}

/** What lists show of the stock of these items, over all cribs or in one. */
export async function readStockSummaries(
  db: Knex,
  itemIds: string[],
  cribId: string | null,
): Promise<Map<string, StockSummary>> {
  const levels = await readLevels(db, itemIds, cribId)
  const places = await readPlaces(db, itemIds, cribId)
  const summaries = new Map<string, StockSummary>()
  for (const level of levels) {
    summaries.set(level.id, {
      onHand: level.on_hand,
      available: level.available,
      isLow: level.is_low,
      locations: places.get(level.id) ?? [],
    })
  }
  return summaries
}

async function readLevels(
  db: Knex,
  itemIds: string[],
  cribId: string | null,
): Promise<{ id: string; on_hand: number; available: number; is_low: boolean }[]> {
  const { rows } = await db.raw(
    `select items.id, coalesce(sum(level.on_hand), 0)::int as on_hand,
        coalesce(sum(level.on_hand - level.reserved), 0)::int as available, ${isLowSql('items.id')} as is_low
      from items
      left join stock_levels as level on level.item_id = items.id and (?::bigint is null or level.crib_id = ?)
      where items.id = any(?::bigint[])
      group by items.id`,
    [cribId, cribId, cribId, cribId, itemIds],
  )
  return rows
}

async function readPlaces(
  db: Knex,
  itemIds: string[],
  cribId: string | null,
): Promise<Map<string, StockSummary['locations']>> {
  const { rows } = await db.raw(
    `select balance.item_id, place.id, place.code, place.crib_id, cribs.code as crib_code,
        sum(balance.quantity)::int as quantity
      from balances as balance
      join locations as place on place.id = balance.location_id and place.kind = 'bin'
      join cribs on cribs.id = place.crib_id
      where balance.item_id = any(?::bigint[]) and balance.quantity > 0 and balance.condition <> 'worn'
        and (?::bigint is null or place.crib_id = ?)
      group by balance.item_id, place.id, cribs.code
      order by balance.item_id, quantity desc, place.code, place.id`,
    [itemIds, cribId, cribId],
  )
  const places = new Map<string, StockSummary['locations']>()
  for (const row of rows) {
    const place = {
      locationId: row.id,
      code: row.code,
      cribId: row.crib_id,
      cribCode: row.crib_code,
      quantity: row.quantity,
    }
    places.set(row.item_id, [...(places.get(row.item_id) ?? []), place])
  }
  return places
}
