import type { Knex } from 'knex'
import type { ShopLocationKind } from '@/core/stock/kinds'
import type { BalanceResponse, ItemStockResponse } from '@/schemas/stock'
import { enumFromDb } from '../enum-case'

/** An item's stock over all cribs, and every place of the shop that holds some of it. */
export async function readItemStock(db: Knex, itemId: string): Promise<ItemStockResponse> {
  const [levels, balances] = await Promise.all([
    db('stock_levels')
      .where('item_id', itemId)
      .first(
        db.raw(`coalesce(sum(on_hand), 0)::int as on_hand, coalesce(sum(reserved), 0)::int as reserved,
          coalesce(sum(coming), 0)::int as coming`),
      ),
    readBalances(db, itemId),
  ])
  return {
    onHand: levels.on_hand,
    reserved: levels.reserved,
    available: levels.on_hand - levels.reserved,
    coming: levels.coming,
    balances,
  }
}

/** What is held of an item at one place, condition by condition. */
export async function readBalancesAt(
  db: Knex,
  itemId: string,
  locationId: string,
): Promise<BalanceResponse[]> {
  const balances = await readBalances(db, itemId)
  return balances.filter((balance) => balance.locationId === locationId)
}

async function readBalances(db: Knex, itemId: string): Promise<BalanceResponse[]> {
  const rows = await db('balances')
    .join('locations', 'locations.id', 'balances.location_id')
    .leftJoin('cribs', 'cribs.id', 'locations.crib_id')
    .where('balances.item_id', itemId)
    .where('balances.is_outside', false)
    .where('balances.quantity', '<>', 0)
    .orderBy(['cribs.code', 'locations.code', 'locations.id', 'balances.condition'])
    .select(
      'balances.location_id',
      'balances.condition',
      'balances.quantity',
      'locations.kind',
      'locations.crib_id',
      {
        code: 'locations.code',
        name: 'locations.name',
        crib_code: 'cribs.code',
      },
    )
  return rows.map((row) => ({
    locationId: row.location_id,
    locationCode: row.code,
    locationName: row.name,
    locationKind: enumFromDb(row.kind) as ShopLocationKind,
    cribId: row.crib_id,
    cribCode: row.crib_code,
    condition: row.condition,
    quantity: row.quantity,
  }))
}
