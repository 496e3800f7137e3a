import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'
import { enumToDb } from '../enum-case'
import { type GeometryTable, geometryTables } from '../geometry-tables'

/**
 * Puts staged rows into the catalogue, set by set. Everything runs in one transaction of the caller, who holds the lock
 * that keeps the rows true: nobody else adds or changes items meanwhile, while movements go on.
 */

const itemColumns = ['code', 'maker', 'part_number', 'description', 'unit_cost_minor'] as const

/** Others may read and move; whoever adds or changes an item waits until this transaction ends. */
export async function lockCatalogue(trx: Knex): Promise<void> {
  await trx.raw('lock table items in share row exclusive mode')
}

/** Holds the items of an opening stock against movements, in key order like all who lock several. */
export async function lockStagedItems(trx: Knex, importId: string): Promise<void> {
  await trx.raw(
    `select from items where id in (select item_id from import_rows where import_id = ? and item_id is not null)
      order by id for update`,
    [importId],
  )
}

/** Lines whose verdict is no longer certain: their item was changed since, or what they name now means another. */
export async function listStaleLines(trx: Knex, importId: string): Promise<number[]> {
  const { rows } = await trx.raw(
    `select row.line from import_rows as row
        left join items on items.id = row.item_id
        left join items as of_code on lower(of_code.code) = lower(row.field_values ->> 'code')
      where row.import_id = :importId and row.outcome <> 'rejected' and (
        items.version <> row.item_version
        or of_code.id <> coalesce(row.item_id, 0)
        or row.outcome = 'added' and row.item_id is null and exists (
          select from items as of_number where lower(of_number.maker) = lower(row.field_values ->> 'maker')
            and lower(of_number.part_number) = lower(row.field_values ->> 'part_number')
            and of_number.maker is not null and of_number.part_number is not null
            and of_number.archived_at is null))
      order by row.line`,
    { importId },
  )
  return lines(rows)
}

/** Lines of opening stock whose item has movements by now, or whose item or bin is not in use any more. */
export async function listStaleStockLines(trx: Knex, importId: string): Promise<number[]> {
  const { rows } = await trx.raw(
    `select row.line from import_rows as row
        join items on items.id = row.item_id
        join locations on locations.id = (row.field_values ->> 'location_id')::bigint
      where row.import_id = ? and row.outcome <> 'rejected' and (
        items.archived_at is not null or items.is_tracked_by_piece or locations.archived_at is not null
        or exists (select from movements where movements.item_id = row.item_id))
      order by row.line`,
    [importId],
  )
  return lines(rows)
}

/** Lines of reorder points whose point was set or changed since, or whose item, crib or supplier means another by now. */
export async function listStaleReorderPointLines(trx: Knex, importId: string): Promise<number[]> {
  const { rows } = await trx.raw(
    `select row.line from import_rows as row
        join items on items.id = row.item_id
        join cribs on cribs.id = (row.field_values ->> 'crib_id')::bigint
        left join items as of_code on lower(of_code.code) = lower(row.field_values ->> 'code')
        left join reorder_points as point on point.item_id = row.item_id and point.crib_id = cribs.id
        left join suppliers on suppliers.id = (row.field_values ->> 'supplier_id')::bigint
      where row.import_id = ? and row.outcome <> 'rejected' and (
        items.archived_at is not null
        or of_code.id is distinct from row.item_id
        or cribs.code is distinct from row.field_values ->> 'crib'
        or point.version is distinct from row.item_version
        or suppliers.archived_at is not null
        or suppliers.name is distinct from row.field_values ->> 'supplier')
      order by row.line`,
    [importId],
  )
  return lines(rows)
}

function lines(rows: { line: number }[]): number[] {
  return rows.map((row) => row.line)
}

export async function readStagedCells(
  trx: Knex,
  importId: string,
  ofLines: readonly number[],
): Promise<{ line: number; cells: string[] }[][]> {
  const rows = await trx('import_rows')
    .where('import_id', importId)
    .whereIn('line', ofLines)
    .orderBy('line')
    .select('cells')
  return rows.map((row) => row.cells)
}

/** Adds and changes the items of a kind; rows that are rejected or as the catalogue has them already are left. */
export async function applyItems(trx: Knex, importId: string, kind: CatalogueKind): Promise<void> {
  const table = geometryTables[kind]
  await trx.raw(
    `insert into items (kind, ${itemColumns.join(', ')})
      select '${kind}', given.code, given.maker, given.part_number, coalesce(given.description, ''), given.unit_cost_minor
      from ${stagedAs('items')} where row.import_id = ? and row.outcome = 'added' order by row.line`,
    [importId],
  )
  await insertGeometry(trx, importId, table)
  await updateFrom(trx, importId, 'items', 'id', itemColumns)
  await updateFrom(trx, importId, table.name, 'item_id', geometryNames(table))
  if (table.segments) await applySegments(trx, importId, table.segments)
}

function geometryNames(table: GeometryTable): string[] {
  const bore = table.hasBore ? ['bore_kind', 'bore_series', 'bore_diameter_mm'] : []
  return [...table.fields.map(enumToDb), ...bore]
}

/** Staged rows with what they give as columns of a table. */
function stagedAs(table: string): string {
  return `import_rows as row cross join lateral jsonb_populate_record(null::${table}, row.field_values) as given`
}

function list(prefix: string, columns: readonly string[]): string {
  return columns.map((column) => `${prefix}.${column}`).join(', ')
}

async function insertGeometry(trx: Knex, importId: string, table: GeometryTable): Promise<void> {
  const columns = geometryNames(table)
  await trx.raw(
    `insert into ${table.name} (item_id, ${columns.join(', ')})
      select items.id, ${list('given', columns)}
      from ${stagedAs(table.name)} join items on lower(items.code) = lower(row.field_values ->> 'code')
      where row.import_id = ? and row.outcome = 'added'`,
    [importId],
  )
}

/** Only rows that differ, so that the version of no other is raised. */
async function updateFrom(
  trx: Knex,
  importId: string,
  table: string,
  key: string,
  columns: readonly string[],
): Promise<void> {
  await trx.raw(
    `update ${table} as kept set ${columns.map((column) => `${column} = given.${column}`).join(', ')}
      from ${stagedAs(table)}
      where row.import_id = ? and row.outcome = 'changed' and kept.${key} = row.item_id
        and (${list('kept', columns)}) is distinct from (${list('given', columns)})`,
    [importId],
  )
}

/** An outline is replaced as a whole, where the row changes it. */
async function applySegments(
  trx: Knex,
  importId: string,
  segments: { name: string; fields: readonly string[] },
): Promise<void> {
  const columns = segments.fields.map(enumToDb)
  await trx.raw(
    `delete from ${segments.name} using import_rows as row
      where row.import_id = ? and row.outcome = 'changed' and ${segments.name}.item_id = row.item_id
        and row.changes @> '[{"field": "segments"}]'`,
    [importId],
  )
  await trx.raw(
    `insert into ${segments.name} (item_id, position, ${columns.join(', ')})
      select items.id, piece.position, ${list('given', columns)}
      from import_rows as row join items on lower(items.code) = lower(row.field_values ->> 'code')
        cross join lateral jsonb_array_elements(row.field_values -> 'segments') with ordinality as piece (given, position)
        cross join lateral jsonb_populate_record(null::${segments.name}, piece.given) as given
      where row.import_id = ?
        and (row.outcome = 'added' or row.outcome = 'changed' and row.changes @> '[{"field": "segments"}]')`,
    [importId],
  )
}

/** Posts opening stock as adjustments, from the far end of the books to the bins. */
export async function applyOpeningStock(
  trx: Knex,
  importId: string,
  posting: { actorId: string; note: string },
): Promise<void> {
  await trx.raw(
    `insert into movements (kind, item_id, quantity, from_location_id, from_condition, to_location_id, to_condition,
        note, actor_id)
      select 'adjustment', row.item_id, (row.field_values ->> 'quantity')::int, outside.id,
        row.field_values ->> 'condition', (row.field_values ->> 'location_id')::bigint,
        row.field_values ->> 'condition', :note, :actorId
      from import_rows as row cross join locations as outside
      where row.import_id = :importId and row.outcome = 'added' and outside.kind = 'count_adjustment'
      order by row.item_id, row.line`,
    { importId, ...posting },
  )
}

const reorderPointColumns = [
  'reorder_point',
  'order_up_to',
  'pack_size',
  'minimum_order',
  'supplier_id',
  'supplier_part_number',
  'lead_time_days',
] as const

/** Sets and changes reorder points; alerts and mails follow once a statement, and are one event of this transaction. */
export async function applyReorderPoints(trx: Knex, importId: string): Promise<void> {
  await trx.raw(
    `insert into reorder_points (item_id, crib_id, ${reorderPointColumns.join(', ')})
      select row.item_id, given.crib_id, ${list('given', reorderPointColumns)}
      from ${stagedAs('reorder_points')} where row.import_id = ? and row.outcome = 'added'
      order by row.item_id, given.crib_id`,
    [importId],
  )
  await trx.raw(
    `update reorder_points as kept
      set ${reorderPointColumns.map((column) => `${column} = given.${column}`).join(', ')}
      from ${stagedAs('reorder_points')}
      where row.import_id = ? and row.outcome = 'changed'
        and kept.item_id = row.item_id and kept.crib_id = given.crib_id`,
    [importId],
  )
}
