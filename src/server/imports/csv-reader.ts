import { importLimits } from '@/schemas/import-limits'

/** What RFC 4180 does not allow, or the limits don't, at one cell (column counts from 0). */
export interface CsvFault {
  kind: 'bareQuote' | 'textAfterQuote' | 'quoteNotClosed' | 'cellTooLong' | 'tooManyColumns' | 'nul'
  column: number
}

export interface CsvRecord {
  /** The line of the file on which the record begins, the first being 1, as an editor counts. */
  line: number
  cells: string[]
  faults: CsvFault[]
}

type State = 'cellStart' | 'plain' | 'quoted' | 'quoteSeen'

const [lineFeed, carriageReturn, quote] = [10, 13, 34]

/**
 * Reads RFC 4180 text pushed in pieces of any size, and cuts it into records.
 *
 * It keeps one record at a time and looks at each character once, so a quote that is never closed costs no more than
 * any other text. Records end with CRLF, LF or CR. A quote inside an unquoted cell is kept as it is (`1/2"`) and noted;
 * blanks behind a closing quote are passed over, anything else there is kept and noted. A cell beyond the limit is cut
 * and noted. Lines without anything on them come out as a record of one empty cell.
 */
export class CsvReader {
  private readonly delimiter: number
  private records: CsvRecord[] = []
  private cells: string[] = []
  private faults: CsvFault[] = []
  private cell = ''
  private state: State = 'cellStart'
  private line = 1
  private recordLine = 1
  private columnCount = 0
  /** The last character was a CR: an LF that follows belongs to it. */
  private isAfterReturn = false
  /** Something of the present record has been read, if only a delimiter. */
  private isBegun = false

  constructor(delimiter: string) {
    this.delimiter = delimiter.charCodeAt(0)
  }

  /** The records that are complete with this piece of text. */
  push(text: string): CsvRecord[] {
    this.records = []
    let at = 0
    while (at < text.length) {
      at = this.state === 'quoted' ? this.readQuoted(text, at) : this.readOne(text, at)
    }
    return this.records
  }

  /** The last record, where the file does not end with a line end. */
  end(): CsvRecord[] {
    this.records = []
    if (this.state === 'quoted') this.fault('quoteNotClosed')
    if (this.isBegun) this.endRecord()
    return this.records
  }

  private readQuoted(text: string, start: number): number {
    let at = start
    while (at < text.length) {
      const code = text.charCodeAt(at)
      if (code === quote) break
      this.countLine(code)
      at += 1
    }
    this.append(text, start, at)
    if (at < text.length) {
      this.isAfterReturn = false
      this.state = 'quoteSeen'
      at += 1
    }
    return at
  }

  /** One special character, or a run of plain ones. */
  private readOne(text: string, at: number): number {
    const code = text.charCodeAt(at)
    if (code === lineFeed && this.isAfterReturn) {
      this.isAfterReturn = false
      return at + 1
    }
    this.isAfterReturn = false
    if (code === this.delimiter) this.endCell()
    else if (code === lineFeed || code === carriageReturn) this.endLine(code)
    else if (code === quote) this.readQuote()
    else return this.readPlain(text, at)
    return at + 1
  }

  private endLine(code: number): void {
    this.endRecord()
    this.line += 1
    this.recordLine = this.line
    this.isAfterReturn = code === carriageReturn
  }

  private readQuote(): void {
    this.isBegun = true
    if (this.state === 'cellStart') this.state = 'quoted'
    else if (this.state === 'quoteSeen') {
      this.append('"', 0, 1)
      this.state = 'quoted'
    } else {
      this.fault('bareQuote')
      this.append('"', 0, 1)
    }
  }

  private readPlain(text: string, start: number): number {
    this.isBegun = true
    let at = start
    while (at < text.length && !this.isSpecial(text.charCodeAt(at))) at += 1
    if (this.state === 'quoteSeen') this.readAfterQuote(text, start, at)
    else {
      this.state = 'plain'
      this.append(text, start, at)
    }
    return at
  }

  private readAfterQuote(text: string, start: number, end: number): void {
    const isBlank = /^[ \t]*$/.test(text.slice(start, end))
    if (isBlank) return
    this.fault('textAfterQuote')
    this.state = 'plain'
    this.append(text, start, end)
  }

  private isSpecial(code: number): boolean {
    return code === this.delimiter || code === quote || code === lineFeed || code === carriageReturn
  }

  private append(text: string, start: number, end: number): void {
    if (start === end) return
    const room = importLimits.cellCharacters - this.cell.length
    if (end - start > room) this.fault('cellTooLong')
    if (room <= 0) return
    const piece = text.slice(start, Math.min(end, start + room))
    if (piece.includes('\0')) this.fault('nul')
    this.cell += piece
  }

  private countLine(code: number): void {
    if (code === carriageReturn || (code === lineFeed && !this.isAfterReturn)) this.line += 1
    this.isAfterReturn = code === carriageReturn
  }

  private fault(kind: CsvFault['kind']): void {
    const column = Math.min(this.columnCount, importLimits.columns)
    const isKnown = this.faults.some((fault) => fault.kind === kind && fault.column === column)
    if (!isKnown) this.faults.push({ kind, column })
  }

  private endCell(): void {
    this.isBegun = true
    if (this.columnCount < importLimits.columns) this.cells.push(this.cell)
    else if (this.cell !== '') this.fault('tooManyColumns')
    this.columnCount += 1
    this.cell = ''
    this.state = 'cellStart'
  }

  private endRecord(): void {
    this.endCell()
    this.records.push({ line: this.recordLine, cells: this.cells, faults: this.faults })
    this.cells = []
    this.faults = []
    this.columnCount = 0
    this.isBegun = false
    this.recordLine = this.line
  }
}

/** Whether a record holds nothing but blanks. */
export function isBlankRecord(record: CsvRecord): boolean {
  return record.cells.every((cell) => cell.trim() === '')
}
