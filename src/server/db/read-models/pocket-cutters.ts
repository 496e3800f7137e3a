import type { Knex } from 'knex'
import { pocketForms, usableDepthRoundingMm } from '@/core/catalogue/usable-depth'
import type { FittingCuttersQuery } from '@/schemas/fits'
import { enumToDb } from '../enum-case'
import { type KeyPage, readKeyPage } from '../key-page'
import { endRadiusSql, usableDepthSql, workingLengthSql } from './pocket-figures'

/**
 * One block of the ids of the cutters that could work a pocket: no thicker than its corners, deep enough before they rub,
 * no rounder than its floor. The thickest come first, and of those the shortest, since they bend least.
 */
export function readPocketCutterKeys(
  db: Knex,
  query: FittingCuttersQuery,
  shankClearanceMm: number,
): Promise<KeyPage> {
  const matching = db('cutters')
    .join('items', 'items.id', 'cutters.item_id')
    .whereNull('items.archived_at')
    .whereIn('cutters.form', pocketForms.map(enumToDb))
    .whereRaw(`cutters.cutting_diameter_mm <= ?::double precision + ${usableDepthRoundingMm}`, [
      2 * query.insideCornerRadiusMm,
    ])
    .whereRaw(`${usableDepthSql('?::double precision')} >= ?::double precision - ${usableDepthRoundingMm}`, [
      shankClearanceMm,
      query.depthMm,
    ])
  if (query.floorRadiusMm !== undefined) {
    matching.whereRaw(`${endRadiusSql} <= ?::double precision + ${usableDepthRoundingMm}`, [
      query.floorRadiusMm,
    ])
  }
  if (query.inStock === 'yes') {
    matching.whereExists(
      db('stock_levels').whereRaw('stock_levels.item_id = items.id').where('stock_levels.on_hand', '>', 0),
    )
  }
  if (query.q) matching.whereRaw('strpos(items.search_text, lower(?)) > 0', [query.q])
  const sort = [
    { sql: 'cutters.cutting_diameter_mm', isNumber: true, isDescending: true },
    { sql: workingLengthSql, isNumber: true, isDescending: false },
    { sql: 'cutters.overall_length_mm', isNumber: true, isDescending: false },
  ]
  return readKeyPage(db, matching, { sql: 'items.id' }, sort, query)
}
