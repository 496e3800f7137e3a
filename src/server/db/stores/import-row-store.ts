import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import type { Knex } from 'knex'
import * as copyStreams from 'pg-copy-streams'
import type { FieldChange, RowOutcome, RowProblem } from '@/schemas/import'
import type { ImportKind } from '@/schemas/import-fields'
import { withRawConnection } from '../raw-connection'
import type { OutcomeCounts } from './import-store'

/** An item of the file as it is staged: what it would do, or why it cannot. */
export interface StagedRow {
  line: number
  outcome: RowOutcome
  itemId: string | null
  itemVersion: number | null
  cells: { line: number; cells: string[] }[]
  fieldValues: object
  changes: FieldChange[]
  problems: RowProblem[]
  /** What is taken, with a word about it. */
  warnings?: RowProblem[]
}

const copyStatement = `copy import_rows
  (import_id, line, outcome, item_id, item_version, cells, field_values, changes, problems) from stdin`

/** Stages rows by COPY in the transaction; the stream waits where the server is slower. */
export async function copyImportRows(trx: Knex, importId: string, rows: readonly StagedRow[]): Promise<void> {
  if (rows.length === 0) return
  await withRawConnection(trx, (connection) =>
    pipeline(Readable.from(copyLines(importId, rows)), connection.query(copyStreams.from(copyStatement))),
  )
}

function* copyLines(importId: string, rows: readonly StagedRow[]): Generator<string> {
  for (const row of rows) {
    const json = [row.cells, row.fieldValues, row.changes, row.problems].map((value) =>
      escapeCopy(JSON.stringify(value)),
    )
    yield `${[importId, row.line, row.outcome, row.itemId ?? '\\N', row.itemVersion ?? '\\N', ...json].join('\t')}\n`
  }
}

/** JSON has its tabs and line ends escaped already; COPY reads backslashes once more. */
function escapeCopy(json: string): string {
  return json.replaceAll('\\', '\\\\')
}

/**
 * Has PostgreSQL look at what was staged. Of rows that came since it last looked it expects one, and would then compare
 * each row of a file with every other.
 */
export async function analyzeImportRows(db: Knex): Promise<void> {
  await db.raw('analyze import_rows')
}

export async function removeImportRows(trx: Knex, importId: string): Promise<void> {
  await trx('import_rows').where('import_id', importId).delete()
}

export async function removeTakenImportRows(trx: Knex, importId: string): Promise<void> {
  await trx('import_rows').where('import_id', importId).whereNot('outcome', 'rejected').delete()
}

export async function replaceImportRows(
  trx: Knex,
  importId: string,
  rows: readonly StagedRow[],
): Promise<void> {
  await trx('import_rows')
    .where('import_id', importId)
    .whereIn(
      'line',
      rows.map((row) => row.line),
    )
    .delete()
  await copyImportRows(trx, importId, rows)
}

export async function countOutcomes(db: Knex, importId: string): Promise<OutcomeCounts> {
  const rows: { outcome: RowOutcome; count: number }[] = await db('import_rows')
    .where('import_id', importId)
    .groupBy('outcome')
    .select('outcome', db.raw('count(*)::int as count'))
  const counts: OutcomeCounts = { added: 0, changed: 0, unchanged: 0, rejected: 0 }
  for (const row of rows) counts[row.outcome] = row.count
  return counts
}

interface DuplicateKey {
  /** What must be equal for two rows to be one thing, over `staged`. */
  equal: string
  /** Which rows it is asked of. */
  where: string
  column: string
  valueField: string
  says: string
}

/**
 * Rejects every row that tells of the same thing as another one of the file, each naming the other's line: which of
 * them is right only a person can say. Rejected rows count too, since a slip in one does not make the other right.
 */
export async function rejectDuplicates(
  trx: Knex,
  importId: string,
  kind: ImportKind,
  headings: { code: string; partNumber: string },
): Promise<void> {
  for (const key of duplicateKeys(kind, headings)) {
    await trx.raw(
      `with staged as (
          select line, ${key.equal} as key from import_rows where import_id = :importId and ${key.where}
        ), doubles as (
          select line, key, min(line) over of_key as first_line,
            lead(line) over (partition by key order by line) as next_line, count(*) over of_key as times
          from staged window of_key as (partition by key)
        )
        update import_rows as row set outcome = 'rejected', changes = '[]',
          problems = row.problems || jsonb_build_array(jsonb_build_object('line', row.line, 'column', :column::text,
            'value', coalesce(row.field_values ->> :valueField, ''),
            'message', 'Line ' || case when doubles.first_line = row.line then doubles.next_line
              else doubles.first_line end || :says::text))
        from doubles
        where doubles.times > 1 and row.import_id = :importId and row.line = doubles.line`,
      { importId, column: key.column, valueField: key.valueField, says: key.says },
    )
  }
}

function duplicateKeys(kind: ImportKind, headings: { code: string; partNumber: string }): DuplicateKey[] {
  if (kind === 'stock') return stockKeys(headings)
  return kind === 'reorderPoints' ? reorderPointKeys(headings) : itemKeys(headings)
}

const codeKey = `lower(field_values ->> 'code')`
const numberKey = `lower(field_values ->> 'maker') || E'\\t' || lower(field_values ->> 'part_number')`

function itemKeys({ code, partNumber }: { code: string; partNumber: string }): DuplicateKey[] {
  return [
    {
      equal: codeKey,
      where: `field_values ->> 'code' is not null`,
      column: code,
      valueField: 'code',
      says: ' gives the same code.',
    },
    {
      // Under another name: those of one code are rejected by now.
      equal: 'item_id',
      where: `item_id is not null and outcome <> 'rejected'`,
      column: code,
      valueField: 'code',
      says: ' means the same item.',
    },
    {
      equal: numberKey,
      where: `outcome = 'added' and ${numberKey} is not null`,
      column: partNumber,
      valueField: 'part_number',
      says: ' gives the same maker and part number.',
    },
  ]
}

function stockKeys({ code }: { code: string }): DuplicateKey[] {
  return [
    {
      equal: `(item_id, field_values ->> 'location_id', field_values ->> 'condition')`,
      where: `item_id is not null and field_values ->> 'location_id' is not null`,
      column: code,
      valueField: 'code',
      says: ' gives the same item, bin and condition.',
    },
  ]
}

function reorderPointKeys({ code }: { code: string }): DuplicateKey[] {
  return [
    {
      equal: `(item_id, field_values ->> 'crib_id')`,
      where: `item_id is not null and field_values ->> 'crib_id' is not null`,
      column: code,
      valueField: 'code',
      says: ' gives the same item and crib.',
    },
  ]
}
