import { importLimits } from '@/schemas/import-limits'
import type { DecimalOrigin, DecimalSign, ImportColumn } from '@/schemas/import-mapping'
import { headingRecordIndex, type MappingSources, mapColumns, uniqueHeadings } from './column-mapping'
import { type CsvFormat, detectDelimiter, firstRecords, readRecords } from './csv-file'
import type { CsvRecord } from './csv-reader'
import { SeenSigns } from './decimal-sign'
import { decodeHead, detectEncoding, readHead } from './encoding'
import { groupKey, takesSeveralRows } from './group-rows'
import { ImportFileError } from './import-file-error'
import { type ReadingSettings, RowReader } from './row-reader'

export interface FileSurvey {
  format: CsvFormat
  headingLine: number
  decimals: DecimalSign
  decimalsOrigin: DecimalOrigin
  columns: ImportColumn[]
  rows: number
  /** Of items that take several rows: the line of the last of them, by what names the item. */
  lastLines: Map<string, number>
}

const samplesAColumn = 3
const sampleCharacters = 60

/** The headings of a file as its head tells them, for the upload to answer at once what cannot be. */
export function headingsOfHead(head: Uint8Array, sources: MappingSources): string[] {
  const { records } = firstRecords(head)
  const record = records[headingRecordIndex(records, sources)]
  if (!record) throw new ImportFileError('This file is empty.')
  return headingsOf(record)
}

function headingsOf(record: CsvRecord): string[] {
  if (record.faults.some((fault) => fault.kind === 'tooManyColumns')) {
    throw new ImportFileError(`This file has more than ${importLimits.columns} columns.`)
  }
  const last = record.cells.findLastIndex((cell) => cell.trim() !== '')
  return uniqueHeadings(record.cells.slice(0, last + 1))
}

/** Goes through the whole file once: what it is written in, its columns and their fields, and how many rows it has. */
export async function surveyFile(
  path: string,
  sources: MappingSources,
  settings: ReadingSettings,
  onProgress: () => Promise<void>,
): Promise<FileSurvey> {
  const encoding = await detectEncoding(path)
  const head = await readHead(path)
  const format: CsvFormat = { encoding, delimiter: detectDelimiter(decodeHead(head, encoding)) }
  const { records } = firstRecords(head)
  const headingLine = records[headingRecordIndex(records, sources)]?.line ?? 1
  const survey: FileSurvey = {
    format,
    headingLine,
    ...decimalsOf(settings, null),
    columns: [],
    rows: 0,
    lastLines: new Map(),
  }
  const signs = new SeenSigns()
  let reader: RowReader | undefined
  for await (const batch of readRecords(path, format)) {
    for (const record of batch) {
      if (record.line < headingLine) continue
      if (reader) {
        countRow(survey, record, reader)
        for (const cell of reader.decimalCells(record)) signs.add(cell)
      } else {
        survey.columns = mapColumns(headingsOf(record), sources)
        reader = new RowReader(survey.columns, settings)
      }
    }
    await onProgress()
  }
  if (!reader) throw new ImportFileError('This file is empty.')
  return { ...survey, ...decimalsOf(settings, signs.guess()) }
}

/** What the person set goes before what the numbers tell, and that before what the shop writes. */
function decimalsOf(
  { decimalComma, decimalsOrigin }: ReadingSettings,
  guess: DecimalSign | null,
): Pick<FileSurvey, 'decimals' | 'decimalsOrigin'> {
  if (guess !== null && decimalsOrigin !== 'set') return { decimals: guess, decimalsOrigin: 'guessed' }
  return {
    decimals: decimalComma ? 'comma' : 'point',
    decimalsOrigin: decimalsOrigin === 'set' ? 'set' : 'shop',
  }
}

function countRow(survey: FileSurvey, record: CsvRecord, reader: RowReader): void {
  survey.rows += 1
  for (const [index, column] of survey.columns.entries()) {
    const cell = record.cells[index]?.trim() ?? ''
    if (cell !== '' && column.samples.length < samplesAColumn) addSample(column, cell)
  }
  if (!takesSeveralRows(reader.settings.kind)) return
  const key = groupKey(reader.read(record))
  if (key !== null) survey.lastLines.set(key, record.line)
}

function addSample(column: ImportColumn, cell: string): void {
  const sample = cell.slice(0, sampleCharacters).replace(/\0|\p{Cs}/gu, '')
  if (!column.samples.includes(sample)) column.samples.push(sample)
}
