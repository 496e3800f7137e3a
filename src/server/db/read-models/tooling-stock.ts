import type { Knex } from 'knex'
import type { StockSummary } from '@/schemas/item'

/** Pieces that could be fetched now: in bins, not worn, not reserved; of one crib where it is named. */
export async function readAvailability(db: Knex, cribId: string | null): Promise<Map<string, number>> {
  const { rows } = await db.raw(
    `select item_id, sum(on_hand - reserved)::int as available from stock_levels
      where ?::bigint is null or crib_id = ? group by item_id having sum(on_hand - reserved) > 0`,
    [cribId, cribId],
  )
  return new Map(rows.map((row: { item_id: string; available: number }) => [row.item_id, row.available]))
}

/** Unit costs in minor units of the shop's currency, of the items that have one. */
export async function readUnitCosts(db: Knex): Promise<Map<string, number>> {
  const rows = await db('items')
    .whereNotNull('unit_cost_minor')
    .whereNull('archived_at')
    .select('id', 'unit_cost_minor')
  return new Map(rows.map((row) => [row.id, Number(row.unit_cost_minor)]))
}

export interface PiecePlace {
  itemId: string
  tag: string
  /** Scrapped, or never came in: no assembly is made of it. */
  isGone: boolean
  /** One piece where it lies in a bin and is not worn, else none. */
  stock: Pick<StockSummary, 'onHand' | 'available' | 'locations'>
}

/** Where these tagged pieces are; of one crib where it is named. */
export async function readPiecePlaces(
  db: Knex,
  pieceIds: string[],
  cribId: string | null,
): Promise<Map<string, PiecePlace>> {
  if (pieceIds.length === 0) return new Map()
  const rows = await db('pieces')
    .leftJoin('locations', 'locations.id', 'pieces.location_id')
    .leftJoin('cribs', 'cribs.id', 'locations.crib_id')
    .whereRaw('pieces.id = any(?::bigint[])', [pieceIds])
    .select('pieces.id', 'pieces.item_id', 'pieces.tag', 'pieces.condition', 'pieces.location_id', {
      kind: 'locations.kind',
      code: 'locations.code',
      is_outside: 'locations.is_outside',
      crib_id: 'locations.crib_id',
      crib_code: 'cribs.code',
    })
  return new Map(rows.map((row) => [row.id, piecePlace(row, cribId)]))
}

interface PieceRow {
  item_id: string
  tag: string
  condition: string | null
  location_id: string | null
  kind: string | null
  code: string | null
  is_outside: boolean | null
  crib_id: string | null
  crib_code: string | null
}

function piecePlace(row: PieceRow, cribId: string | null): PiecePlace {
  const isThere =
    row.kind === 'bin' && row.condition !== 'worn' && (cribId === null || row.crib_id === cribId)
  const locations =
    isThere && row.location_id !== null
      ? [
          {
            locationId: row.location_id,
            code: row.code ?? '',
            cribId: row.crib_id ?? '',
            cribCode: row.crib_code ?? '',
            quantity: 1,
          },
        ]
      : []
  return {
    itemId: row.item_id,
    tag: row.tag,
    isGone: row.location_id === null || row.is_outside === true,
    stock: { onHand: locations.length, available: locations.length, locations },
  }
}

/** Items this crib keeps: what it ever had in a bin, or has a reorder point for. */
export async function readKeptItems(db: Knex, cribId: string): Promise<Set<string>> {
  const { rows } = await db.raw(
    `select item_id from stock_levels where crib_id = ? union select item_id from reorder_points where crib_id = ?`,
    [cribId, cribId],
  )
  return new Set(rows.map((row: { item_id: string }) => row.item_id))
}
