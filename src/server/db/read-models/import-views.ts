import type { Knex } from 'knex'
import type {
  FieldChange,
  ImportListRow,
  ImportResponse,
  ImportRowResponse,
  ImportState,
  RowOutcome,
  RowProblem,
} from '@/schemas/import'
import type { ImportKind } from '@/schemas/import-fields'
import { listedProblems } from '@/schemas/import-limits'
import type { DecimalOrigin, DecimalSign, ImportColumn, ImportDefaults } from '@/schemas/import-mapping'
import type { PageQuery } from '@/schemas/paging'
import { enumFromDb } from '../enum-case'
import { type KeyPage, readKeyPage } from '../key-page'
import type { ImportsRow } from '../row-types'

type JoinedRow = ImportsRow & { created_by_name: string }

function withCreator(db: Knex): Knex.QueryBuilder {
  return db('imports')
    .join('users', 'users.id', 'imports.created_by')
    .select('imports.*', { created_by_name: 'users.name' })
}

/** An import with its columns, its first rejected rows and its first warnings. */
export async function readImportView(db: Knex, id: string): Promise<ImportResponse | null> {
  const row: JoinedRow | undefined = await withCreator(db).where('imports.id', id).first()
  if (!row) return null
  const rejected: { problems: RowProblem[] }[] = await db('import_rows')
    .where({ import_id: id, outcome: 'rejected' })
    .orderBy('line')
    .limit(listedProblems)
    .select('problems')
  return {
    ...listRow(row),
    columns: row.headings === null ? [] : (row.headings as ImportColumn[]),
    defaults: row.defaults as ImportDefaults,
    rejected: row.state === 'reading' ? [] : rejected.flatMap(({ problems }) => rejection(problems)),
    warnings: row.warnings as RowProblem[],
  }
}

function rejection([first, ...further]: RowProblem[]): ImportResponse['rejected'] {
  return first ? [{ ...first, further }] : []
}

/** Imports, newest first. */
export async function readImportPage(
  db: Knex,
  query: PageQuery & { q?: string | undefined },
): Promise<KeyPage & { rows: ImportListRow[] }> {
  const matching = db('imports')
  if (query.q) matching.whereRaw('strpos(lower(imports.file_name), lower(?)) > 0', [query.q])
  const page = await readKeyPage(db, matching, { sql: 'imports.id', isDescending: true }, [], query)
  const rows: JoinedRow[] = await withCreator(db)
    .whereIn('imports.id', page.ids)
    .orderBy('imports.id', 'desc')
  return { ...page, rows: rows.map(listRow) }
}

function listRow(row: JoinedRow): ImportListRow {
  const isRead = row.state !== 'reading'
  return {
    id: row.id,
    kind: enumFromDb(row.kind) as ImportKind,
    state: row.state as ImportState,
    fileName: row.file_name,
    fileSizeBytes: Number(row.file_size_bytes),
    unit: row.unit === 'in' ? 'in' : 'mm',
    decimals: row.decimals as DecimalSign | null,
    decimalsOrigin: row.decimals_origin as DecimalOrigin | null,
    encoding: row.encoding,
    delimiter: row.delimiter,
    rowsRead: row.rows_read,
    rows: row.rows_total,
    added: isRead ? row.added : 0,
    changed: isRead ? row.changed : 0,
    unchanged: isRead ? row.unchanged : 0,
    rejectedCount: isRead ? row.rejected_count : 0,
    warningCount: row.warning_count,
    message: row.error,
    createdByName: row.created_by_name,
    createdAt: row.created_at.toISOString(),
    checkedAt: row.checked_at?.toISOString() ?? null,
    endedAt: row.ended_at?.toISOString() ?? null,
  }
}

interface StagedRow {
  line: number
  outcome: RowOutcome
  item_id: string | null
  field_values: Record<string, unknown> | null
  changes: FieldChange[]
  problems: RowProblem[]
}

/** The rows of an import in the order of its file, all or of one outcome. */
export async function readImportRowPage(
  db: Knex,
  id: string,
  query: PageQuery & { outcome?: RowOutcome | undefined; q?: string | undefined },
): Promise<KeyPage & { rows: ImportRowResponse[] }> {
  const matching = db('import_rows').where('import_rows.import_id', id)
  if (query.outcome) matching.where('import_rows.outcome', query.outcome)
  if (query.q) {
    matching.whereRaw(`strpos(lower(import_rows.field_values ->> 'code'), lower(?)) > 0`, [query.q])
  }
  const page = await readKeyPage(db, matching, { sql: 'import_rows.line' }, [], query)
  const rows: StagedRow[] = await db('import_rows')
    .where('import_id', id)
    .whereIn('line', page.ids)
    .orderBy('line')
    .select('line', 'outcome', 'item_id', 'field_values', 'changes', 'problems')
  return { ...page, rows: rows.map(rowView) }
}

function rowView(row: StagedRow): ImportRowResponse {
  return {
    line: row.line,
    outcome: row.outcome,
    itemId: row.item_id,
    code: textOf(row.field_values?.code),
    description: rowWords(row.field_values ?? {}),
    sizes: row.outcome === 'added' ? sizesOf(row.field_values ?? {}) : [],
    changes: row.changes,
    problems: row.problems,
  }
}

/** What tells a tool apart, in the order a list of tools has it. */
const sizeColumns = [
  'form',
  'cutting_diameter_mm',
  'corner_radius_mm',
  'length_of_cut_mm',
  'shank_diameter_mm',
  'overall_length_mm',
  'taper',
  'gauge_length_mm',
  'series',
  'minimum_mm',
  'maximum_mm',
  'length_mm',
  'projection_mm',
]

function sizesOf(values: Record<string, unknown>): ImportRowResponse['sizes'] {
  return sizeColumns.flatMap((column) => {
    const value = values[column]
    return typeof value === 'number' || typeof value === 'string'
      ? [{ field: enumFromDb(column), value }]
      : []
  })
}

function textOf(value: unknown): string | null {
  return typeof value === 'string' ? value : null
}

/** What a row is about beside its code: the item's words, where opening stock goes, or when it is low in which crib. */
function rowWords(values: Record<string, unknown>): string | null {
  if (typeof values.quantity === 'number') {
    return `${values.quantity} × ${textOf(values.condition) ?? ''} in ${textOf(values.location) ?? '?'}`
  }
  if (typeof values.reorder_point === 'number') {
    return `${textOf(values.crib) ?? '?'}: low at ${values.reorder_point}, order up to ${values.order_up_to}`
  }
  return textOf(values.description) ?? ([values.maker, values.part_number].filter(Boolean).join(' ') || null)
}

export interface RejectedCells {
  line: number
  cells: { line: number; cells: string[] }[]
  problems: RowProblem[]
}

/** Rejected rows after a line, as they stood in the file: for the reject file, piece by piece. */
export function readRejectedCells(
  db: Knex,
  id: string,
  afterLine: number,
  limit: number,
): Promise<RejectedCells[]> {
  return db('import_rows')
    .where({ import_id: id, outcome: 'rejected' })
    .where('line', '>', afterLine)
    .orderBy('line')
    .limit(limit)
    .select('line', 'cells', 'problems')
}
