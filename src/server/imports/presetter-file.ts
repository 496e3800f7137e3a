import type { LengthUnit } from '@/core/units/length-unit'
import type { ImportMeasurementsRequest, ImportMeasurementsResponse } from '@/schemas/assembly'
import { cellValue } from './cell-value'
import { headingKey, uniqueHeadings } from './column-mapping'
import { detectDelimiter } from './csv-file'
import { CsvReader, type CsvRecord, isBlankRecord } from './csv-reader'
import { headingName } from './heading-name'

export type PresetterField = 'number' | 'gaugeLength' | 'diameter'
export type PresetterReject = ImportMeasurementsResponse['rejected'][number]

export interface PresetterRow {
  line: number
  number: number
  gaugeLengthMm: number
  diameterMm: number | null
}

export interface PresetterFile {
  headings: string[]
  columns: Record<PresetterField, string | null>
  rows: PresetterRow[]
  rejected: PresetterReject[]
}

/** Headings that say what they hold; anything else is asked. Plain words, common practice. */
const knownNames: Readonly<Record<PresetterField, readonly string[]>> = {
  number: ['assembly', 'assemblynumber', 'assemblyno', 'number', 'no', 'nr'],
  gaugeLength: ['gaugelength', 'gagelength', 'length', 'z', 'l', 'lengthoffset'],
  diameter: ['diameter', 'dia', 'd', 'cuttingdiameter', 'diameteroffset'],
}

const emptyFile: PresetterFile = {
  headings: [],
  columns: { number: null, gaugeLength: null, diameter: null },
  rows: [],
  rejected: [],
}

/** Reads a presetter's file: the first record names the columns, each other one is one measured assembly. */
export function readPresetterFile(
  request: Pick<ImportMeasurementsRequest, 'text' | 'unit' | 'columns'>,
  decimalComma: boolean,
): PresetterFile {
  const records = recordsOf(request.text)
  const [heading, ...data] = records
  if (!heading) return emptyFile
  const headings = uniqueHeadings(heading.cells)
  const columns = mappedColumns(headings, request.columns ?? {})
  const file: PresetterFile = { headings, columns, rows: [], rejected: [] }
  if (columns.number === null || columns.gaugeLength === null) return file
  const seen = new Map<number, number>()
  for (const record of data) readRecord(record, file, { unit: request.unit, decimalComma }, seen)
  return file
}

function recordsOf(text: string): CsvRecord[] {
  const plain = text.replace(/^\ufeff/, '')
  const reader = new CsvReader(detectDelimiter(plain))
  return [...reader.push(plain), ...reader.end()].filter(
    (record) => !isBlankRecord(record) && !/^sep=.?$/i.test(record.cells.join('').trim()),
  )
}

function mappedColumns(
  headings: readonly string[],
  given: NonNullable<ImportMeasurementsRequest['columns']>,
): PresetterFile['columns'] {
  const own = (name: string | null | undefined) =>
    headings.find((heading) => name != null && headingKey(heading) === headingKey(name)) ?? null
  const guessed = (field: PresetterField) =>
    headings.find((heading) => knownNames[field].includes(headingName(heading).name)) ?? null
  const column = (field: PresetterField) => (given[field] === undefined ? guessed(field) : own(given[field]))
  return { number: column('number'), gaugeLength: column('gaugeLength'), diameter: column('diameter') }
}

function readRecord(
  record: CsvRecord,
  file: PresetterFile,
  manner: { unit: LengthUnit; decimalComma: boolean },
  seen: Map<number, number>,
): void {
  const { line } = record
  const rejectedBefore = file.rejected.length
  const read = (field: PresetterField): number | null => {
    const column = file.columns[field]
    const text = column === null ? '' : (record.cells[file.headings.indexOf(column)] ?? '')
    const cell = readCell(field, column, text, manner)
    if (cell.fault === null) return cell.value
    file.rejected.push({ line, column, value: text, message: cell.fault })
    return null
  }
  const [number, gaugeLengthMm, diameterMm] = [read('number'), read('gaugeLength'), read('diameter')]
  const seenOn = number === null ? undefined : seen.get(number)
  if (number !== null && seenOn === undefined) seen.set(number, line)
  if (seenOn !== undefined) {
    const message = `Line ${seenOn} measures this assembly already.`
    file.rejected.push({ line, column: file.columns.number, value: String(number), message })
  }
  if (file.rejected.length > rejectedBefore || number === null || gaugeLengthMm === null) return
  file.rows.push({ line, number, gaugeLengthMm, diameterMm })
}

type ReadCell = { fault: null; value: number | null } | { fault: string }

function readCell(
  field: PresetterField,
  column: string | null,
  text: string,
  { unit, decimalComma }: { unit: LengthUnit; decimalComma: boolean },
): ReadCell {
  const own = column === null ? null : headingName(column).unit
  const context = { unit: own ?? unit, decimalComma, currencyDecimals: 2 }
  const cell = cellValue(field === 'number' ? 'count' : 'length', text, context)
  if (cell.kind === 'problem') return { fault: cell.message }
  if (cell.kind === 'value' && typeof cell.value === 'number') return { fault: null, value: cell.value }
  if (field === 'diameter') return { fault: null, value: null }
  return {
    fault: field === 'number' ? 'The assembly’s number is missing.' : 'The gauge length is missing.',
  }
}
