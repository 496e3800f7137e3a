import type { LengthUnit } from '@/core/units/length-unit'
import type { RowProblem } from '@/schemas/import'
import { type ImportField, type ImportKind, importField } from '@/schemas/import-fields'
import { importLimits } from '@/schemas/import-limits'
import type { DecimalOrigin, ImportColumn, ImportDefaults } from '@/schemas/import-mapping'
import { cellValue, unitNamed } from './cell-value'
import type { CsvFault, CsvRecord } from './csv-reader'
import { isDoubtful } from './decimal-sign'

export type RowValue = string | number | readonly [number, number]

/** A row of the file with what its cells say, field by field. */
export interface ImportRow {
  line: number
  cells: string[]
  values: Map<string, RowValue>
  problems: RowProblem[]
  /** Fields whose cell could not be read. */
  failed: Set<string>
}

export interface ReadingSettings {
  kind: ImportKind
  /** Of bare numbers, where neither cell, column nor row says. */
  unit: LengthUnit
  decimalComma: boolean
  /** How that is known. */
  decimalsOrigin: DecimalOrigin
  currencyDecimals: number
  /** For rows that give nothing. */
  defaults: ImportDefaults
}

interface MappedColumn {
  index: number
  heading: string
  unit: LengthUnit | null
  field: ImportField
}

const longestShown = 200

const lengthTypes: ReadonlySet<string> = new Set(['length', 'diameter', 'distance'])
const decimalTypes: ReadonlySet<string> = new Set([...lengthTypes, 'angle', 'money'])
const bareFraction = /^(?:\d+[ -]+)?\d+ ?\/ ?\d+$/
const bareNumber = /^\d*[.,]?\d+$/

/** Without NUL and without the half of a character that a cut left behind: the database keeps neither. */
function withoutBroken(text: string): string {
  return text.replace(/\0|\p{Cs}/gu, '')
}

/** What of a cell is shown where it is refused. */
export function shownCell(cell: string | undefined): string {
  const text = withoutBroken(cell ?? '')
  return text.length > longestShown ? `${withoutBroken(text.slice(0, longestShown))}…` : text
}

/** Reads rows of one file by the columns it has. */
export class RowReader {
  private readonly mapped: MappedColumn[]
  private readonly headings: string[]
  private readonly unitIndex: number | undefined

  constructor(
    columns: readonly ImportColumn[],
    readonly settings: ReadingSettings,
  ) {
    this.headings = columns.map((column) => column.heading)
    this.mapped = columns.flatMap((column, index) => {
      const field = column.field ? importField(settings.kind, column.field) : undefined
      return field ? [{ index, heading: column.heading, unit: column.unit, field }] : []
    })
    this.unitIndex = this.mapped.find(({ field }) => field.type === 'unit')?.index
  }

  read(record: CsvRecord): ImportRow {
    const row: ImportRow = {
      line: record.line,
      cells: record.faults.length > 0 ? record.cells.map(withoutBroken) : record.cells,
      values: new Map(),
      problems: [],
      failed: new Set(),
    }
    // Of a row the reader stumbled over only what names its item counts, so that no part of the item goes in without it.
    const faults = this.faultProblems(record)
    const rowUnit = this.unitIndex === undefined ? undefined : unitNamed(record.cells[this.unitIndex] ?? '')
    for (const column of this.mapped) this.readCell(row, column, rowUnit)
    return faults.length > 0 ? { ...row, problems: faults } : row
  }

  private readCell(row: ImportRow, column: MappedColumn, rowUnit: LengthUnit | undefined): void {
    const cell = row.cells[column.index] ?? ''
    const unit = column.unit ?? rowUnit ?? this.settings.unit
    const read = cellValue(column.field.type, cell, { ...this.settings, unit })
    if (read.kind === 'value') row.values.set(column.field.field, read.value)
    if (read.kind === 'problem') {
      row.failed.add(column.field.field)
      row.problems.push({
        line: row.line,
        column: column.heading,
        value: shownCell(cell),
        message: read.message,
      })
    }
  }

  /** Says something about a field of a row, at the cell it stands in; a field the file has not is named by its label. */
  problemAt(row: ImportRow, fields: readonly string[], message: string): RowProblem {
    const column = this.mapped.find(({ field }) => fields.includes(field.field))
    const label = importField(this.settings.kind, fields[0] ?? '')?.label ?? ''
    return {
      line: row.line,
      column: column?.heading ?? label,
      value: column ? shownCell(row.cells[column.index]) : '',
      message,
    }
  }

  has(field: string): boolean {
    return this.mapped.some((column) => column.field.field === field)
  }

  /** What is taken, with a word about it: bare quotes, and millimetres beside fractions of an inch. */
  warningsOf(record: CsvRecord): RowProblem[] {
    return [...this.quoteWarnings(record), ...this.mixedUnitWarnings(record), ...this.decimalWarnings(record)]
  }

  /** The cells of a row that may hold decimals. */
  decimalCells(record: CsvRecord): string[] {
    return this.decimalColumns().map(({ index }) => record.cells[index] ?? '')
  }

  private decimalColumns(): MappedColumn[] {
    return this.mapped.filter(({ field }) => decimalTypes.has(field.type))
  }

  /** Under a guess `1,234` may still be a thousand: it is read by the guess, and said. */
  private decimalWarnings(record: CsvRecord): RowProblem[] {
    if (this.settings.decimalsOrigin !== 'guessed') return []
    const sign = this.settings.decimalComma ? ',' : '.'
    return this.decimalColumns().flatMap(({ index, heading }) => {
      const cell = record.cells[index] ?? ''
      if (!cell.includes(sign) || !isDoubtful(cell)) return []
      return [
        {
          line: record.line,
          column: heading,
          value: shownCell(cell),
          message: `The “${sign}” is read as the decimal sign, as in the rest of the file. Is it one of thousands?`,
        },
      ]
    })
  }

  /** A bare fraction is inches whatever the unit set: a row that has one was hardly measured in millimetres. */
  private mixedUnitWarnings(record: CsvRecord): RowProblem[] {
    const rowUnit = this.unitIndex === undefined ? undefined : unitNamed(record.cells[this.unitIndex] ?? '')
    if ((rowUnit ?? this.settings.unit) !== 'mm') return []
    const lengths = this.mapped.filter(({ unit, field }) => unit === null && lengthTypes.has(field.type))
    const cellOf = (column: MappedColumn) => (record.cells[column.index] ?? '').trim()
    const bare = lengths.find((column) => bareNumber.test(cellOf(column)))
    if (!bare || !lengths.some((column) => bareFraction.test(cellOf(column)))) return []
    return [
      {
        line: record.line,
        column: bare.heading,
        value: shownCell(cellOf(bare)),
        message: 'This is read in millimetres beside a fraction, which is inches. Is the file in inches?',
      },
    ]
  }

  private quoteWarnings(record: CsvRecord): RowProblem[] {
    return record.faults
      .filter((fault) => fault.kind === 'bareQuote')
      .map((fault) =>
        this.faultProblem(
          record,
          fault,
          'A quote stands inside a cell that is not quoted. It is kept as it is.',
        ),
      )
  }

  private faultProblems(record: CsvRecord): RowProblem[] {
    const problems = record.faults
      .filter((fault) => fault.kind !== 'bareQuote')
      .map((fault) => this.faultProblem(record, fault, faultMessages[fault.kind]))
    const extra = record.cells.slice(this.headings.length)
    if (problems.length === 0 && extra.some((cell) => cell.trim() !== '')) {
      problems.push({
        line: record.line,
        column: '',
        value: shownCell(extra.find((cell) => cell.trim() !== '')),
        message: `This row has ${record.cells.length} cells under ${this.headings.length} headings. Is a quote missing around one?`,
      })
    }
    return problems
  }

  private faultProblem(record: CsvRecord, fault: CsvFault, message: string): RowProblem {
    const column = this.headings[fault.column] ?? ''
    return { line: record.line, column, value: shownCell(record.cells[fault.column]), message }
  }
}

const faultMessages: Readonly<Record<CsvFault['kind'], string>> = {
  bareQuote: '',
  textAfterQuote: 'There is text behind the closing quote. Inside quotes a quote is written twice.',
  quoteNotClosed: 'The quote that opens this cell is never closed.',
  cellTooLong: `This cell is longer than ${importLimits.cellCharacters.toLocaleString('en')} characters, or a quote before it is not closed.`,
  tooManyColumns: `This row has more than ${importLimits.columns} columns.`,
  nul: 'This cell holds a character that no text has.',
}
