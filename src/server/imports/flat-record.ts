import type { RowProblem } from '@/schemas/import'
import { type ImportKind, importFields, importKinds } from '@/schemas/import-fields'
import { enumFromDb, enumToDb } from '../db/enum-case'
import type { FlatRecord } from './flat-values'
import { outlineSegments } from './outline-segments'
import type { ImportRow, RowReader, RowValue } from './row-reader'

export interface GivenRecord {
  /** What the rows give; a field that is not given is absent. */
  flat: FlatRecord
  problems: RowProblem[]
  failed: Set<string>
}

const helperFields = new Set([
  'rowUnit',
  'range',
  'segmentPart',
  'segmentNumber',
  'segmentLengthMm',
  'segmentNoseDiameterMm',
  'segmentSpindleDiameterMm',
  'nutDiameterMm',
  'nutLengthMm',
  'noseDiameterMm',
  'noseLengthMm',
  'bodyDiameterMm',
  'bodyLengthMm',
])

/** Fields that stand once an item, whatever number of rows it takes. */
const ownFields = new Map(
  importKinds.map((kind) => [
    kind,
    importFields[kind].map(({ field }) => field).filter((field) => !helperFields.has(field)),
  ]),
)

const enumFields = new Set(['form', 'substrate', 'condition'])

/** The column of the database a field is kept in. */
function columnOf(field: string): string {
  return field === 'unitCost' ? 'unit_cost_minor' : enumToDb(field)
}

/** Asked for every cell of a file, so found once. */
const columns = new Map([...ownFields.values()].flat().map((field) => [field, columnOf(field)]))

/** The field kept in a column of the database. */
export function fieldOf(column: string): string {
  return column === 'unit_cost_minor' ? 'unitCost' : enumFromDb(column)
}

/** What the rows of one item say together. */
export function givenRecord(kind: ImportKind, rows: readonly ImportRow[], reader: RowReader): GivenRecord {
  const given: GivenRecord = {
    flat: {},
    problems: rows.flatMap((row) => row.problems),
    failed: new Set(rows.flatMap((row) => [...row.failed])),
  }
  for (const field of ownFields.get(kind) ?? []) giveOwn(given, field, rows, reader)
  if (kind === 'collets') giveRange(given, rows)
  if (kind === 'holders' || kind === 'extensions') {
    giveBore(given, rows, reader)
    const outline = outlineSegments(rows, reader, given.flat)
    given.problems.push(...outline.problems)
    if (outline.segments.length > 0) given.flat.segments = outline.segments
    const hasFailed = [...given.failed].some((field) => helperFields.has(field))
    if (outline.problems.length > 0 || hasFailed) given.failed.add('segments')
  }
  return given
}

function giveOwn(given: GivenRecord, field: string, rows: readonly ImportRow[], reader: RowReader): void {
  let first: { row: ImportRow; value: RowValue } | undefined
  for (const row of rows) {
    const value = row.values.get(field)
    if (value === undefined) continue
    if (first && first.value !== value) {
      const message = `Line ${first.row.line} says otherwise of the same item.`
      given.problems.push(reader.problemAt(row, [field], message))
      given.failed.add(field)
      return
    }
    first ??= { row, value }
  }
  if (!first || typeof first.value === 'object') return
  given.flat[columns.get(field) ?? field] =
    enumFields.has(field) && typeof first.value === 'string' ? enumToDb(first.value) : first.value
}

function giveRange(given: GivenRecord, rows: readonly ImportRow[]): void {
  const range = rows[0]?.values.get('range')
  if (!Array.isArray(range)) return
  given.flat.minimum_mm ??= range[0]
  given.flat.maximum_mm ??= range[1]
}

/** A collet series or a fixed diameter; giving one takes the place of the other. */
function giveBore(given: GivenRecord, rows: readonly ImportRow[], reader: RowReader): void {
  const { bore_series: series, bore_diameter_mm: diameter } = given.flat
  if (series !== undefined && diameter !== undefined) {
    const row = rows.find((one) => one.values.has('boreDiameterMm')) ?? rows[0]
    if (row) {
      given.problems.push(
        reader.problemAt(row, ['boreDiameterMm'], 'A bore takes a collet or has a fixed diameter, not both.'),
      )
    }
    given.failed.add('bore')
  } else if (series !== undefined) Object.assign(given.flat, { bore_kind: 'collet', bore_diameter_mm: null })
  else if (diameter !== undefined) Object.assign(given.flat, { bore_kind: 'fixed', bore_series: null })
}
