import type { Knex } from 'knex'
import type { LengthUnit } from '@/core/units/length-unit'
import type { ImportState, RejectChoice, RowOutcome, RowProblem } from '@/schemas/import'
import type { ImportKind } from '@/schemas/import-fields'
import type {
  DecimalOrigin,
  DecimalSign,
  ImportColumn,
  ImportDefaults,
  ImportMapping,
} from '@/schemas/import-mapping'
import { enumFromDb, enumToDb } from '../enum-case'
import type { ImportsRow } from '../row-types'

/** An import as the services and the worker work with it. */
export interface ImportRecord {
  id: string
  kind: ImportKind
  state: ImportState
  unit: LengthUnit
  /** Null until the file has been looked at, unless they were set. */
  decimals: DecimalSign | null
  decimalsOrigin: DecimalOrigin | null
  mapping: ImportMapping
  defaults: ImportDefaults
  rejects: RejectChoice | null
  fileName: string
  filePath: string | null
  columns: ImportColumn[]
  rejectedCount: number
  createdBy: string
}

export interface NewImport {
  kind: ImportKind
  unit: LengthUnit
  /** As the person set them. */
  decimals?: DecimalSign | undefined
  mapping: ImportMapping
  defaults: ImportDefaults
  fileName: string
  fileSizeBytes: number
  filePath: string
  createdBy: string
}

export async function createImport(trx: Knex, given: NewImport): Promise<string> {
  const [row] = await trx('imports')
    .insert({
      kind: enumToDb(given.kind),
      unit: given.unit,
      ...decimalColumns(given.decimals),
      mapping: JSON.stringify(given.mapping),
      defaults: JSON.stringify(given.defaults),
      file_name: given.fileName,
      file_size_bytes: given.fileSizeBytes,
      file_path: given.filePath,
      created_by: given.createdBy,
    })
    .returning('id')
  return row.id
}

export async function findImport(db: Knex, id: string): Promise<ImportRecord | null> {
  const row = await db('imports').where('id', id).first()
  return row ? fromRow(row) : null
}

/** Reads the row and holds it until the transaction ends: its state cannot change under the one who asks. */
export async function lockImport(trx: Knex, id: string): Promise<ImportRecord | null> {
  const row = await trx('imports').where('id', id).forNoKeyUpdate().first()
  return row ? fromRow(row) : null
}

/** A new run of the worker over an import in this state; any run before it can write nothing more. Null where it is not. */
export async function claimImport(db: Knex, id: string, state: ImportState): Promise<number | null> {
  const [row] = await db('imports')
    .where({ id, state })
    .update({ attempt: db.raw('attempt + 1'), updated_at: db.fn.now() })
    .returning('attempt')
  return row?.attempt ?? null
}

/** Whether a run still holds its import: same state, and no later run. */
export async function isClaimHeld(db: Knex, claim: ImportClaim): Promise<boolean> {
  const row = await db('imports')
    .where({ id: claim.id, state: claim.state, attempt: claim.attempt })
    .first('id')
  return row !== undefined
}

export interface ImportClaim {
  id: string
  state: ImportState
  attempt: number
}

/** Writes while the run holds its import; false where it does not any more and nothing was written. */
async function updateClaimed(
  db: Knex,
  claim: ImportClaim,
  values: Record<string, unknown>,
): Promise<boolean> {
  const count = await db('imports')
    .where({ id: claim.id, state: claim.state, attempt: claim.attempt })
    .update({ ...values, updated_at: db.fn.now() })
  return count === 1
}

export interface SurveyNotes {
  encoding: string
  delimiter: string
  decimals: DecimalSign
  decimalsOrigin: DecimalOrigin
  columns: ImportColumn[]
  headingLine: number
  rows: number
}

export function noteSurvey(db: Knex, claim: ImportClaim, survey: SurveyNotes): Promise<boolean> {
  return updateClaimed(db, claim, {
    encoding: survey.encoding,
    delimiter: survey.delimiter,
    decimals: survey.decimals,
    decimals_origin: survey.decimalsOrigin,
    headings: JSON.stringify(survey.columns),
    heading_line: survey.headingLine,
    rows_total: survey.rows,
    rows_read: 0,
  })
}

export function noteRowsRead(db: Knex, claim: ImportClaim, rowsRead: number): Promise<boolean> {
  return updateClaimed(db, claim, { rows_read: rowsRead })
}

export type OutcomeCounts = Record<RowOutcome, number>

export function markChecked(
  db: Knex,
  claim: ImportClaim,
  counts: OutcomeCounts,
  notes: { warnings?: RowProblem[]; warningCount?: number; message?: string },
): Promise<boolean> {
  return updateClaimed(db, claim, {
    state: 'checked',
    checked_at: db.fn.now(),
    rejects: null,
    error: notes.message ?? null,
    ...countColumns(counts),
    ...(notes.warnings ? { warnings: JSON.stringify(notes.warnings) } : {}),
    ...(notes.warningCount === undefined ? {} : { warning_count: notes.warningCount }),
  })
}

export function markCommitted(db: Knex, claim: ImportClaim, counts: OutcomeCounts): Promise<boolean> {
  return updateClaimed(db, claim, {
    state: 'committed',
    ended_at: db.fn.now(),
    file_path: null,
    error: null,
    ...countColumns(counts),
  })
}

export function markFailed(db: Knex, claim: ImportClaim, message: string): Promise<boolean> {
  return updateClaimed(db, claim, { state: 'failed', ended_at: db.fn.now(), file_path: null, error: message })
}

function countColumns(counts: OutcomeCounts): Record<string, number> {
  return {
    added: counts.added,
    changed: counts.changed,
    unchanged: counts.unchanged,
    rejected_count: counts.rejected,
  }
}

/** Of an import held by `lockImport`. */
export async function markCancelled(trx: Knex, id: string): Promise<void> {
  await trx('imports').where('id', id).update({
    state: 'cancelled',
    ended_at: trx.fn.now(),
    updated_at: trx.fn.now(),
    file_path: null,
    error: null,
    added: 0,
    changed: 0,
    unchanged: 0,
    rejected_count: 0,
    warnings: '[]',
    warning_count: 0,
  })
}

/** Of an import held by `lockImport`: its file is to be read again, and a run that still reads it is fenced off. */
export async function markReading(
  trx: Knex,
  id: string,
  change: {
    unit: LengthUnit
    decimals?: DecimalSign | undefined
    mapping: ImportMapping
    defaults: ImportDefaults
  },
): Promise<void> {
  await trx('imports')
    .where('id', id)
    .update({
      state: 'reading',
      attempt: trx.raw('attempt + 1'),
      unit: change.unit,
      ...decimalColumns(change.decimals),
      mapping: JSON.stringify(change.mapping),
      defaults: JSON.stringify(change.defaults),
      rows_read: 0,
      error: null,
      updated_at: trx.fn.now(),
    })
}

/** Of decimals that are set; nothing where they are not. */
function decimalColumns(decimals: DecimalSign | undefined): Record<string, string> {
  return decimals ? { decimals, decimals_origin: 'set' } : {}
}

/** Of an import held by `lockImport`. */
export async function markCommitting(trx: Knex, id: string, rejects: RejectChoice): Promise<void> {
  await trx('imports')
    .where('id', id)
    .update({ state: 'committing', rejects, error: null, updated_at: trx.fn.now() })
}

/** Imports a worker should be at, and none has touched for a while. */
export async function listStalledImports(
  db: Knex,
  seconds: number,
): Promise<{ id: string; state: ImportState }[]> {
  return db('imports')
    .whereIn('state', ['reading', 'committing'])
    .whereRaw("updated_at < now() - ? * interval '1 second'", [seconds])
    .orderBy('id')
    .select('id', 'state')
}

/** Ended imports that a crash kept from tidying up their rows. Rejected rows of a committed one stay. */
export async function listUntidyImports(db: Knex): Promise<string[]> {
  const rows = await db('imports')
    .whereIn('state', ['cancelled', 'failed'])
    .whereExists(db('import_rows').whereRaw('import_rows.import_id = imports.id'))
    .select('id')
  return rows.map((row) => row.id)
}

/** Files of imports that have not ended. */
export async function listImportFiles(db: Knex): Promise<string[]> {
  const rows = await db('imports').whereNotNull('file_path').select('file_path')
  return rows.map((row) => row.file_path)
}

function fromRow(row: ImportsRow): ImportRecord {
  return {
    id: row.id,
    kind: enumFromDb(row.kind) as ImportKind,
    state: row.state as ImportState,
    unit: row.unit as LengthUnit,
    decimals: row.decimals as DecimalSign | null,
    decimalsOrigin: row.decimals_origin as DecimalOrigin | null,
    mapping: (row.mapping ?? {}) as ImportMapping,
    defaults: row.defaults as ImportDefaults,
    rejects: row.rejects as RejectChoice | null,
    fileName: row.file_name,
    filePath: row.file_path,
    columns: (row.headings ?? []) as ImportColumn[],
    rejectedCount: row.rejected_count,
    createdBy: row.created_by,
  }
}
