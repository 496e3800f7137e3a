import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'
import { enumToDb } from '../enum-case'
import { geometryTables } from '../geometry-tables'

type FoundValue = string | number | null

export interface FoundChangeRecord {
  id: string
  actorId: string
  kind: CatalogueKind
  field: string
  value: FoundValue
  count: number
  changedAt: string
  isUndone: boolean
}

/** Writes down what stands in a field of these items; `noteFoundVersions` follows once they are changed. */
export async function createFoundChange(
  trx: Knex,
  change: {
    actorId: string
    kind: CatalogueKind
    field: string
    value: unknown
    itemIds: readonly string[]
  },
): Promise<string> {
  const { table, column, key } = fieldColumn(change.kind, change.field)
  const [made] = await trx('found_changes')
    .insert({
      actor_id: change.actorId,
      kind: change.kind,
      field: change.field,
      value: JSON.stringify(change.value ?? null),
    })
    .returning('id')
  await trx.raw(
    `insert into found_change_rows (found_change_id, item_id, before, version)
      select ?, items.id, coalesce(to_jsonb(kept.??), 'null'), items.version
      from items join ?? as kept on kept.?? = items.id
      where items.id = any(?::bigint[])`,
    [made.id, column, table, key, [...change.itemIds]],
  )
  return made.id
}

/** The versions the change itself brought about: an item that has another was changed by someone since. */
export async function noteFoundVersions(trx: Knex, id: string): Promise<void> {
  await trx.raw(
    `update found_change_rows as was set version = items.version
      from items where was.found_change_id = ? and items.id = was.item_id`,
    [id],
  )
}

/** The newest first, of what can still be taken back. */
export async function listFoundChanges(
  db: Knex,
  actorId: string,
  kind: CatalogueKind,
  limit: number,
): Promise<FoundChangeRecord[]> {
  const rows = await changes(db)
    .where({ actor_id: actorId, kind })
    .whereNull('undone_at')
    .orderBy('id', 'desc')
    .limit(limit)
  return rows.map(fromRow)
}

export async function findFoundChange(db: Knex, id: string): Promise<FoundChangeRecord | null> {
  const row = await changes(db).where('found_changes.id', id).first()
  return row ? fromRow(row) : null
}

/** Holds the change until the transaction ends, so that it is taken back once. */
export async function lockFoundChange(trx: Knex, id: string): Promise<void> {
  await trx('found_changes').where({ id }).forUpdate().first('id')
}

export async function markFoundChangeUndone(trx: Knex, id: string): Promise<void> {
  await trx('found_changes').where({ id }).update({ undone_at: trx.fn.now() })
}

export async function removeFoundChangesBefore(trx: Knex, days: number): Promise<void> {
  await trx('found_changes').whereRaw('changed_at < now() - make_interval(days => ?)', [days]).delete()
}

/** The ids it changed, and of those the codes that someone changed since. */
export async function readFoundChangeRows(
  trx: Knex,
  id: string,
): Promise<{ ids: string[]; changedSince: string[] }> {
  const rows: { item_id: string; code: string; is_stale: boolean }[] = await trx('found_change_rows as was')
    .join('items', 'items.id', 'was.item_id')
    .where('was.found_change_id', id)
    .orderBy('was.item_id')
    .select('was.item_id', 'items.code', trx.raw('items.version <> was.version as is_stale'))
  return {
    ids: rows.map((row) => row.item_id),
    changedSince: rows.filter((row) => row.is_stale).map((row) => row.code),
  }
}

/** One value into one field of many items. */
export async function writeFieldOfMany(
  trx: Knex,
  kind: CatalogueKind,
  ids: readonly string[],
  field: string,
  value: unknown,
): Promise<void> {
  const { table, column, key, isEnum } = fieldColumn(kind, field)
  const kept = isEnum && typeof value === 'string' ? enumToDb(value) : (value ?? null)
  await trx(table)
    .whereRaw(`${key} = any(?::bigint[])`, [[...ids]])
    .update({ [column]: kept })
}

/** Into each item what stood there before a change; a JSON null comes back as none. */
export async function restoreFoundRows(
  trx: Knex,
  { id, kind, field }: Pick<FoundChangeRecord, 'id' | 'kind' | 'field'>,
): Promise<void> {
  const { table, column, key } = fieldColumn(kind, field)
  await trx.raw(
    `update ?? as kept
      set ?? = (jsonb_populate_record(null::??, jsonb_build_object(?::text, was.before))).??
      from found_change_rows as was
      where was.found_change_id = ? and was.item_id = kept.??`,
    [table, column, table, column, column, id, key],
  )
}

const itemColumns: Readonly<Record<string, string>> = {
  maker: 'maker',
  partNumber: 'part_number',
  description: 'description',
  unitCost: 'unit_cost_minor',
}

/** Where a field is kept. */
function fieldColumn(kind: CatalogueKind, field: string) {
  const column = itemColumns[field]
  if (column) return { table: 'items', key: 'id', column, isEnum: false }
  const { name, enums } = geometryTables[kind]
  return { table: name, key: 'item_id', column: enumToDb(field), isEnum: enums.includes(field) }
}

function changes(db: Knex) {
  return db('found_changes').select(
    'found_changes.*',
    db('found_change_rows').count('*').whereRaw('found_change_id = found_changes.id').as('count'),
  )
}

function fromRow(row: {
  id: string
  actor_id: string
  kind: CatalogueKind
  field: string
  value: FoundValue
  count: string
  changed_at: Date
  undone_at: Date | null
}): FoundChangeRecord {
  return {
    id: row.id,
    actorId: row.actor_id,
    kind: row.kind,
    field: row.field,
    value: row.value,
    count: Number(row.count),
    changedAt: row.changed_at.toISOString(),
    isUndone: row.undone_at !== null,
  }
}
