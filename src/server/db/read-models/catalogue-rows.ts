import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'
import type { CatalogueTypes } from '@/schemas/catalogue'
import { enumToDb } from '../enum-case'
import { geometryColumns, geometryFromRow, geometryTables, segmentFromRow } from '../geometry-tables'
import { readStockSummaries } from './stock-summaries'

const itemColumns = [
  'items.id',
  'items.kind',
  'items.version',
  'items.code',
  'items.maker',
  'items.part_number',
  'items.description',
  'items.unit_cost_minor',
  'items.archived_at',
  'items.created_at',
  'items.updated_at',
]

/** The rows of these ids with their geometry and stock, in the order of the ids; ids of another kind are left out. */
export async function readCatalogueRows<Kind extends CatalogueKind>(
  db: Knex,
  kind: Kind,
  ids: string[],
  cribId: string | null = null,
): Promise<CatalogueTypes[Kind]['row'][]> {
  if (ids.length === 0) return []
  const table = geometryTables[kind]
  // One after another: within a transaction there is one connection.
  const rows = await db('items')
    .join(table.name, `${table.name}.item_id`, 'items.id')
    .crossJoin(db.raw('shop_settings'))
    .whereRaw('items.id = any(?::bigint[])', [ids])
    .select(...itemColumns, ...geometryColumns(table), 'shop_settings.currency')
  const segments = await readSegments(db, kind, ids)
  const stocks = await readStockSummaries(db, ids, cribId)
  const byId = new Map<string, CatalogueTypes[Kind]['row']>()
  for (const row of rows) {
    // Spreading several objects of so many members into one takes twenty-five times as long, and half of a list's time.
    const whole = Object.assign(itemFromRow(row), geometryFromRow(table, row), { stock: stocks.get(row.id) })
    if (table.segments) Object.assign(whole, { segments: segments.get(row.id) ?? [] })
    byId.set(row.id, whole as CatalogueTypes[Kind]['row'])
  }
  return ids.flatMap((id) => byId.get(id) ?? [])
}

function itemFromRow(row: Record<string, unknown>) {
  return {
    id: row.id,
    kind: row.kind,
    version: row.version,
    code: row.code,
    maker: row.maker,
    partNumber: row.part_number,
    description: row.description,
    unitCost: row.unit_cost_minor === null ? null : Number(row.unit_cost_minor),
    currency: row.currency,
    archivedAt: instant(row.archived_at),
    createdAt: instant(row.created_at),
    updatedAt: instant(row.updated_at),
  }
}

function instant(value: unknown): string | null {
  return value instanceof Date ? value.toISOString() : null
}

async function readSegments(db: Knex, kind: CatalogueKind, ids: string[]): Promise<Map<string, object[]>> {
  const table = geometryTables[kind]
  const segments = new Map<string, object[]>()
  if (!table.segments) return segments
  const rows = await db(table.segments.name)
    .whereRaw('item_id = any(?::bigint[])', [ids])
    .orderBy(['item_id', 'position'])
    .select('item_id', ...table.segments.fields.map(enumToDb))
  for (const row of rows) {
    segments.set(row.item_id, [...(segments.get(row.item_id) ?? []), segmentFromRow(table, row)])
  }
  return segments
}
