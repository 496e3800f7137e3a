import { fileLimitText, importLimits } from '@/schemas/import-limits'

export interface PastedBlock {
  rows: number
  /** Of the widest row. */
  columns: number
  /** The first rows as they are read, the headings among them. */
  sample: string[][]
  /** Rows with something beyond the last heading. */
  overlong: number
  /** Why it can't be taken as it is; null where nothing stands against it. */
  fault: string | null
}

const number = /^[ø#]?\s*(?:\d+[ -])?\d*(?:[.,/]\d+)*\s*(?:mm|in|")?$/i

/** Whether the first row is likely one of headings: a row with numbers among its cells is a tool. */
export function startsWithHeadings(text: string): boolean {
  const [first = []] = pastedRecords(text.slice(0, longestFirstRow))
  return !first.some((cell) => /\d/.test(cell) && number.test(cell.trim()))
}

/** Enough to judge a first row by. */
const longestFirstRow = 20_000

const sampledRows = 6

/** What a block copied from a spreadsheet looks like: rows of cells parted by tabs. */
export function pastedBlock(text: string, hasHeadings: boolean): PastedBlock {
  const records = pastedRecords(text).filter((cells) => cells.some((cell) => cell.trim() !== ''))
  const columns = records.reduce((widest, cells) => Math.max(widest, cells.length), 0)
  const rows = records.length - (hasHeadings ? 1 : 0)
  const headings = hasHeadings ? (records[0]?.length ?? 0) : columns
  const isOverlong = (cells: string[]) => cells.slice(headings).some((cell) => cell.trim() !== '')
  return {
    rows: Math.max(0, rows),
    columns,
    sample: records.slice(0, sampledRows),
    overlong: records.filter(isOverlong).length,
    fault: faultOf(text, { records: records.length, columns, rows }),
  }
}

function faultOf(
  text: string,
  { records, columns, rows }: { records: number; columns: number; rows: number },
): string | null {
  if (records === 0) return 'There is nothing here yet. Copy the rows in the spreadsheet and paste them.'
  if (columns > importLimits.columns) {
    return (
      `This block has ${columns.toLocaleString('en')} columns; at most ${importLimits.columns} can be taken. ` +
      'Copy only the columns of the list.'
    )
  }
  if (new Blob([text]).size > importLimits.fileBytes)
    return `This block is larger than ${fileLimitText}. Paste it in parts, or import it as a file.`
  return rows < 1 ? 'There is only a line of headings here. Copy the rows too.' : null
}

/**
 * The cells of a block. A spreadsheet puts quotes round a cell that has a tab, a line or a quote in it, and doubles the
 * quotes within; a quote that is never closed is the cell's own.
 */
export function pastedRecords(text: string): string[][] {
  const records: string[][] = []
  let cells: string[] = []
  let at = 0
  while (at < text.length) {
    const { cell, end } = readCell(text, at)
    cells.push(cell)
    const parting = text[end]
    at = end + 1
    if (parting === '\t') {
      if (at === text.length) cells.push('')
      continue
    }
    records.push(cells)
    cells = []
    if (parting === '\r' && text[at] === '\n') at += 1
  }
  if (cells.length > 0) records.push(cells)
  return records
}

const endOfCell = /[\t\r\n]/g

function readCell(text: string, start: number): { cell: string; end: number } {
  const quoted = text[start] === '"' ? readQuoted(text, start) : null
  if (quoted) return quoted
  endOfCell.lastIndex = start
  const end = endOfCell.exec(text)?.index ?? text.length
  return { cell: text.slice(start, end), end }
}

/** Null where the quote is not closed at a cell's end. */
function readQuoted(text: string, start: number): { cell: string; end: number } | null {
  for (let at = text.indexOf('"', start + 1); at !== -1; at = text.indexOf('"', at + 1)) {
    if (text[at + 1] === '"') at += 1
    else {
      const end = at + 1
      const isEnd = end === text.length || '\t\r\n'.includes(text[end] ?? '')
      return isEnd ? { cell: text.slice(start + 1, at).replaceAll('""', '"'), end } : null
    }
  }
  return null
}

/** The block as a file that the import reads; where it has no headings its columns are numbered, to be named on the next page. */
export function pastedFile(text: string, hasHeadings: boolean): File {
  const { columns } = pastedBlock(text, hasHeadings)
  const headings = Array.from({ length: columns }, (_, index) => `Column ${index + 1}`).join('\t')
  const content = hasHeadings ? text : `${headings}\n${text}`
  return new File([content], 'pasted-rows.tsv', { type: 'text/tab-separated-values' })
}

/** Whether pasted text is a block of cells rather than a word meant for a field. */
export function isBlock(text: string): boolean {
  return text.includes('\t') && text.trim() !== ''
}
