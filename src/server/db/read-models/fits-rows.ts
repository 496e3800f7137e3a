import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'

export interface FitsRow {
  id: string
  kind: CatalogueKind
  code: string
  maker: string | null
  partNumber: string | null
  description: string
  shankDiameterMm: number | null
  boreDiameterMm: number | null
  minimumMm: number | null
  maximumMm: number | null
  series: string | null
  onHand: number
}

/** What decides the fit of each of these items, with what is on hand of it, in the order of the ids. */
export async function readFitsRows(db: Knex, ids: string[]): Promise<FitsRow[]> {
  const { rows } = await db.raw(
    `select items.id, items.kind, items.code, items.maker, items.part_number as "partNumber", items.description,
        cutters.shank_diameter_mm as "shankDiameterMm",
        coalesce(holders.bore_diameter_mm, extensions.bore_diameter_mm) as "boreDiameterMm",
        collets.minimum_mm as "minimumMm", collets.maximum_mm as "maximumMm",
        coalesce(collets.series, holders.bore_series, extensions.bore_series) as series,
        (select coalesce(sum(on_hand), 0)::int from stock_levels where item_id = items.id) as "onHand"
      from items
      left join cutters on cutters.item_id = items.id
      left join holders on holders.item_id = items.id
      left join collets on collets.item_id = items.id
      left join extensions on extensions.item_id = items.id
      where items.id = any(?::bigint[])`,
    [ids],
  )
  const byId = new Map<string, FitsRow>(rows.map((row: FitsRow) => [row.id, row]))
  return ids.flatMap((id) => byId.get(id) ?? [])
}
