import { CsvReader, type CsvRecord, isBlankRecord } from './csv-reader'
import { decodeHead, encodingOfHead, readText, type TextEncoding } from './encoding'

export const delimiters = [',', ';', '\t'] as const
export type Delimiter = (typeof delimiters)[number]

export interface CsvFormat {
  encoding: TextEncoding
  delimiter: Delimiter
}

const looked = 50

/**
 * Comma, semicolon or tab: the one that cuts the first records into the same number of cells most often, quotes
 * respected; of equals the one that makes more cells. A line `sep=;` in front decides at once.
 */
export function detectDelimiter(head: string): Delimiter {
  const said = /^\ufeff?"?sep=([,;\t])"?\s*(?:\r|\n)/i.exec(head)?.[1]
  const told = delimiters.find((delimiter) => delimiter === said)
  if (told) return told
  const scores = delimiters.map((delimiter) => ({ delimiter, score: delimiterScore(head, delimiter) }))
  return scores.reduce((best, next) => (next.score > best.score ? next : best)).delimiter
}

function delimiterScore(head: string, delimiter: Delimiter): number {
  // The last record may be cut by the end of the head.
  const records = new CsvReader(delimiter).push(head).filter((record) => !isBlankRecord(record))
  const counted = records.length > 0 ? records.slice(0, looked) : new CsvReader(delimiter).push(`${head}\n`)
  const counts = new Map<number, number>()
  for (const { cells } of counted) counts.set(cells.length, (counts.get(cells.length) ?? 0) + 1)
  let score = 0
  for (const [cells, times] of counts) {
    if (cells > 1) score = Math.max(score, (times / counted.length) * 1000 + Math.min(cells, 100))
  }
  return score
}

/** The first records of a file, as its head tells them. */
export function firstRecords(head: Uint8Array): { format: CsvFormat; records: CsvRecord[] } {
  const encoding = encodingOfHead(head)
  const text = decodeHead(head, encoding)
  const delimiter = detectDelimiter(text)
  const reader = new CsvReader(delimiter)
  const whole = reader.push(text)
  const records = (whole.length > 1 ? whole : [...whole, ...reader.end()]).filter(isData)
  return { format: { encoding, delimiter }, records }
}

/** The records of a file in batches as they come, without blank lines and the `sep=` line. */
export async function* readRecords(path: string, format: CsvFormat): AsyncGenerator<CsvRecord[]> {
  const reader = new CsvReader(format.delimiter)
  for await (const text of readText(path, format.encoding)) {
    const records = reader.push(text).filter(isData)
    if (records.length > 0) yield records
  }
  const last = reader.end().filter(isData)
  if (last.length > 0) yield last
}

function isData(record: CsvRecord): boolean {
  if (isBlankRecord(record)) return false
  return !(record.line === 1 && /^sep=/i.test(record.cells[0] ?? '') && record.cells.length <= 2)
}
