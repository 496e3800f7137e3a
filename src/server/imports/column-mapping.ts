import { AppError } from '@/lib/app-error'
import { hasLengthUnit, type ImportKind, importField, importFields } from '@/schemas/import-fields'
import {
  type ColumnTarget,
  columnTarget,
  type ImportColumn,
  type ImportMapping,
} from '@/schemas/import-mapping'
import type { FieldProblem } from '@/schemas/problem'
import type { CsvRecord } from './csv-reader'
import { fieldNamed, fieldOfSymbol } from './field-names'
import { type HeadingName, headingName } from './heading-name'

export interface MappingSources {
  kind: ImportKind
  /** What the person set for this file. */
  set: ImportMapping
  /** What the shop has kept, by heading as `headingKey` answers it. */
  kept: ReadonlyMap<string, ColumnTarget>
  /** ISO 4217 */
  currency: string
}

/** Under which a heading is remembered. */
export function headingKey(heading: string): string {
  return heading.trim().toLowerCase()
}

/** Headings as they are shown and named in a mapping: none empty, none twice. */
export function uniqueHeadings(cells: readonly string[]): string[] {
  const used = new Set<string>()
  return cells.map((cell, at) => {
    const base = cell.trim().replace(/\s+/g, ' ') || `Column ${at + 1}`
    let heading = base
    for (let count = 2; used.has(headingKey(heading)); count += 1) heading = `${base} (${count})`
    used.add(headingKey(heading))
    return heading
  })
}

const searchedRecords = 10

/**
 * Which of the first records holds the headings: the first, unless none of its cells is known and a later one has two
 * that are, as where a title stands above the table.
 */
export function headingRecordIndex(records: readonly CsvRecord[], sources: MappingSources): number {
  const counts = records.slice(0, searchedRecords).map((record) => knownHeadings(record.cells, sources))
  if ((counts[0] ?? 0) > 0) return 0
  const most = Math.max(0, ...counts)
  return most >= 2 ? counts.indexOf(most) : 0
}

function knownHeadings(cells: readonly string[], sources: MappingSources): number {
  const set = new Set(Object.keys(sources.set).map(headingKey))
  return uniqueHeadings(cells).filter(
    (heading) =>
      set.has(headingKey(heading)) || sources.kept.has(headingKey(heading)) || guess(heading, sources).field,
  ).length
}

/** Gives each column its field: as the person set it, else as the shop kept it, else by its heading. */
export function mapColumns(headings: readonly string[], sources: MappingSources): ImportColumn[] {
  const set = new Map(
    Object.entries(sources.set).map(([heading, value]) => [headingKey(heading), columnTarget(value)]),
  )
  const columns = headings.map((heading): ImportColumn => {
    const key = headingKey(heading)
    const own = set.get(key)
    if (own) return withTarget(heading, own, 'set')
    const kept = sources.kept.get(key)
    if (kept && (kept.field === null || importField(sources.kind, kept.field)))
      return withTarget(heading, kept, 'kept')
    return guess(heading, sources)
  })
  dropDoubles(columns)
  settleSegments(columns)
  return columns
}

function withTarget(heading: string, target: ColumnTarget, origin: 'set' | 'kept'): ImportColumn {
  return {
    heading,
    samples: [],
    field: target.field,
    unit: target.unit ?? headingName(heading).unit,
    origin,
    note: null,
  }
}

function guess(heading: string, { kind, currency }: MappingSources): ImportColumn {
  const name = headingName(heading)
  const symbol = name.inBrackets?.toLowerCase() ?? ''
  const field = fieldNamed(kind, name.name) ?? fieldNamed(kind, symbol) ?? fieldBySymbol(kind, name) ?? null
  const column: ImportColumn = {
    heading,
    samples: [],
    field: null,
    unit: name.unit,
    origin: null,
    note: null,
  }
  if (!field) return column
  const type = importField(kind, field)?.type
  if (type === 'money' && name.currency && name.currency !== currency) {
    return { ...column, note: `This is in ${name.currency}; the shop keeps ${currency}.` }
  }
  if (type === 'days' && name.inBrackets && !/^d(?:ays?)?$/i.test(name.inBrackets)) {
    return { ...column, note: `This is in ${name.inBrackets}; lead times are kept in days.` }
  }
  const unit = type && hasLengthUnit(type) ? name.unit : null
  return { ...column, field, unit, origin: 'known' }
}

/** What a symbol may stand beside without saying anything else. */
const generalWords = new Set(['', 'diameter', 'length', 'radius', 'angle'])

/** `Ø DC`, `Shank Ø DMM`, `OAL Length`: a symbol, as long as the words beside it say nothing else. */
function fieldBySymbol(kind: ImportKind, { capitals }: HeadingName): string | undefined {
  const fields = capitals.flatMap(({ word, rest }) => {
    const field = fieldOfSymbol(kind, word)
    return field && (generalWords.has(rest) || fieldNamed(kind, rest) === field) ? [field] : []
  })
  return new Set(fields).size === 1 ? fields[0] : undefined
}

/** One column a field: what was set wins over what was kept, and that over a guess; of equals the first. */
function dropDoubles(columns: ImportColumn[]): void {
  const ranks = { set: 0, kept: 1, known: 2 }
  const takers = new Map<string, ImportColumn>()
  const ordered = columns
    .filter((column) => column.field !== null && column.origin !== null)
    .sort((a, b) => ranks[a.origin ?? 'known'] - ranks[b.origin ?? 'known'])
  for (const column of ordered) {
    const taker = takers.get(column.field ?? '')
    if (!taker) takers.set(column.field ?? '', column)
    else unset(column, `“${taker.heading}” gives this already.`)
  }
}

function unset(column: ImportColumn, note: string | null): void {
  column.field = null
  column.origin = null
  column.note = note
}

/**
 * `Length` and `Nose diameter` head both the segments of an outline and a shape told in one row. With a length a row
 * they are the segment's; a guessed segment column alone is not believed.
 */
function settleSegments(columns: ImportColumn[]): void {
  const of = (field: string) => columns.find((column) => column.field === field)
  const [length, nose] = [of('segmentLengthMm'), of('noseDiameterMm')]
  if (length && nose?.origin === 'known' && !of('segmentNoseDiameterMm') && !of('noseLengthMm')) {
    nose.field = 'segmentNoseDiameterMm'
  }
  if (length?.origin === 'known' && !of('segmentNoseDiameterMm'))
    unset(length, 'This may be the gauge length or a segment’s.')
}

/** Refuses a mapping that names a field the kind has not, gives one field twice, or names a column the file has not. */
export function checkMapping(kind: ImportKind, mapping: ImportMapping, headings: readonly string[]): void {
  const errors: FieldProblem[] = []
  const keys = new Set(headings.map(headingKey))
  const givers = new Map<string, string>()
  for (const [heading, value] of Object.entries(mapping)) {
    const { field } = columnTarget(value)
    const path = `mapping.${heading}`
    if (!keys.has(headingKey(heading))) errors.push({ path, message: `The file has no column “${heading}”.` })
    if (field === null) continue
    const other = givers.get(field)
    if (!importField(kind, field)) errors.push({ path, message: unknownField(kind, field) })
    else if (other !== undefined) errors.push({ path, message: `“${other}” is given to ${field} already.` })
    givers.set(field, heading)
  }
  if (errors.length > 0) throw new AppError('wrong-shape', errors[0]?.message ?? '', { errors })
}

function unknownField(kind: ImportKind, field: string): string {
  const known = importFields[kind].map((one) => one.field).join(', ')
  return `There is no field “${field}” for ${kind}. There are: ${known}.`
}
