import type { Knex } from 'knex'

export interface ReorderPointKey {
  /** Null where the row's item is not known. */
  itemId: string | null
  cribCode: string | null
  supplierName: string | null
}

/** A reorder point by the columns of its table, its supplier by name too. */
export interface KeptReorderPoint {
  version: number
  columns: Record<string, string | number | null>
}

export interface ReorderPointMatch {
  /** The crib named, or the only one there is where none is named. */
  crib: { id: string; code: string } | null
  supplier: { id: string; name: string; isArchived: boolean } | null
  /** Null where the item has none in that crib yet. */
  kept: KeptReorderPoint | null
}

/** The cribs and suppliers that rows of reorder points name, and what is set there, one answer a key in the same order. */
export async function findImportReorderPoints(
  db: Knex,
  keys: readonly ReorderPointKey[],
): Promise<ReorderPointMatch[]> {
  const { rows } = await db.raw(
    `with asked as (
        select * from unnest(?::bigint[], ?::text[], ?::text[])
          with ordinality as asked (item_id, crib, supplier, place)
      ), only_crib as (
        select min(id) as id from cribs having count(*) = 1
      )
      select asked.place, cribs.id as crib_id, cribs.code as crib_code, named.id as supplier_id,
        named.name as supplier_name, named.archived_at is not null as is_archived, point.version,
        case when point.item_id is not null then jsonb_build_object('reorder_point', point.reorder_point,
          'order_up_to', point.order_up_to, 'pack_size', point.pack_size, 'minimum_order', point.minimum_order,
          'supplier_id', point.supplier_id::text, 'supplier', of_point.name,
          'supplier_part_number', point.supplier_part_number, 'lead_time_days', point.lead_time_days) end as columns
      from asked
      left join cribs on lower(cribs.code) = lower(asked.crib)
        or (asked.crib is null and cribs.id = (select id from only_crib))
      left join suppliers as named on lower(named.name) = lower(asked.supplier)
      left join reorder_points as point on point.item_id = asked.item_id and point.crib_id = cribs.id
      left join suppliers as of_point on of_point.id = point.supplier_id
      order by asked.place`,
    [texts(keys, 'itemId'), texts(keys, 'cribCode'), texts(keys, 'supplierName')],
  )
  return (rows as MatchRow[]).map((row) => ({
    crib: row.crib_id && row.crib_code ? { id: row.crib_id, code: row.crib_code } : null,
    supplier:
      row.supplier_id && row.supplier_name
        ? { id: row.supplier_id, name: row.supplier_name, isArchived: row.is_archived }
        : null,
    kept: row.columns && row.version ? { version: row.version, columns: row.columns } : null,
  }))
}

/** Knex takes a list of texts for one parameter; that some may be null its types do not know. */
function texts(keys: readonly ReorderPointKey[], member: keyof ReorderPointKey): string[] {
  return keys.map((key) => key[member]) as string[]
}

interface MatchRow {
  place: string
  crib_id: string | null
  crib_code: string | null
  supplier_id: string | null
  supplier_name: string | null
  is_archived: boolean
  version: number | null
  columns: KeptReorderPoint['columns'] | null
}
