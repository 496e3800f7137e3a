import type { Knex } from 'knex'
import type { CatalogueKind, Condition } from '@/core/stock/kinds'
import type { LocationContents } from '@/schemas/location'
import { enumFromDb } from '../enum-case'

interface ContentsRow {
  item_id: string
  kind: string
  code: string
  description: string
  location_id: string
  location_code: string
  condition: string
  quantity: number
}

/** What lies in a location and below it, by place and code; null where there is no such location of the shop. */
export async function findLocationContents(db: Knex, id: string): Promise<LocationContents | null> {
  const location = await db('locations').where({ id, is_outside: false }).first('id')
  if (!location) return null
  const { rows } = await db.raw<{ rows: ContentsRow[] }>(
    `WITH RECURSIVE inside AS (
       SELECT id, code FROM locations WHERE id = ?
       UNION ALL
       SELECT locations.id, locations.code FROM locations JOIN inside ON locations.parent_id = inside.id
     )
     SELECT items.id AS item_id, items.kind, items.code, items.description,
       inside.id AS location_id, inside.code AS location_code, balances.condition, balances.quantity
     FROM inside
     JOIN balances ON balances.location_id = inside.id AND balances.quantity <> 0
     JOIN items ON items.id = balances.item_id
     ORDER BY lower(inside.code), lower(items.code), balances.condition`,
    [id],
  )
  return {
    rows: rows.map((row) => ({
      itemId: row.item_id,
      itemKind: enumFromDb(row.kind) as CatalogueKind,
      code: row.code,
      description: row.description,
      locationId: row.location_id,
      locationCode: row.location_code,
      condition: row.condition as Condition,
      quantity: row.quantity,
    })),
  }
}
