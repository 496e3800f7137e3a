import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'
import { geometryTables, geometryToColumns, segmentsToRows } from '../geometry-tables'

type Geometry = Record<string, unknown>

export async function createGeometry(
  trx: Knex,
  kind: CatalogueKind,
  itemId: string,
  geometry: Geometry,
): Promise<void> {
  const table = geometryTables[kind]
  await trx(table.name).insert({ item_id: itemId, ...geometryToColumns(table, geometry) })
  await insertSegments(trx, kind, itemId, geometry.segments)
}

/** What is absent is left alone; segments are replaced all together. */
export async function updateGeometry(
  trx: Knex,
  kind: CatalogueKind,
  itemId: string,
  geometry: Geometry,
): Promise<void> {
  const table = geometryTables[kind]
  const columns = geometryToColumns(table, geometry)
  if (Object.keys(columns).length > 0) await trx(table.name).where('item_id', itemId).update(columns)
  if (!table.segments || geometry.segments === undefined) return
  await trx(table.segments.name).where('item_id', itemId).delete()
  await insertSegments(trx, kind, itemId, geometry.segments)
}

async function insertSegments(
  trx: Knex,
  kind: CatalogueKind,
  itemId: string,
  segments: unknown,
): Promise<void> {
  const table = geometryTables[kind]
  if (!table.segments || !Array.isArray(segments)) return
  await trx(table.segments.name).insert(segmentsToRows(table, itemId, segments))
}
