import type { Knex } from 'knex'
import type { Bore } from '@/core/tooling'

export interface HolderOfBore {
  id: string
  code: string
  description: string
  gaugeLengthMm: number
  onHand: number
}

/** Capitals, spaces and hyphens of a series or a taper do not count. */
const plainSql = (column: string) => `upper(regexp_replace(${column}, '[\\s-]', '', 'g'))`

/**
 * Holders in use whose bore takes what another's takes, of one taper, in a range of gauge length; the stubbiest first.
 * `toleranceMm` is how far two fixed bores may differ and still be one size.
 */
export async function readHoldersOfBore(
  db: Knex,
  bore: Bore,
  within: { taper: string; shortestMm: number; longestMm: number; toleranceMm: number; limit: number },
): Promise<HolderOfBore[]> {
  const query = db('holders')
    .join('items', 'items.id', 'holders.item_id')
    .whereNull('items.archived_at')
    .whereRaw(`${plainSql('holders.taper')} = ${plainSql('?::text')}`, [within.taper])
    .whereBetween('holders.gauge_length_mm', [within.shortestMm, within.longestMm])
    .orderByRaw('holders.gauge_length_mm, lower(items.code), items.id')
    .limit(within.limit)
    .select('items.id', 'items.code', 'items.description', 'holders.gauge_length_mm')
    .select(
      db.raw(`(select coalesce(sum(on_hand), 0)::int from stock_levels where item_id = items.id) as on_hand`),
    )
  if (bore.kind === 'collet') {
    query.whereRaw(`${plainSql('holders.bore_series')} = ${plainSql('?::text')}`, [bore.series])
  } else {
    query.whereRaw('abs(holders.bore_diameter_mm - ?::double precision) <= ?', [
      bore.diameterMm,
      within.toleranceMm,
    ])
  }
  const rows = await query
  return rows.map((row) => ({
    id: row.id,
    code: row.code,
    description: row.description,
    gaugeLengthMm: row.gauge_length_mm,
    onHand: row.on_hand,
  }))
}
