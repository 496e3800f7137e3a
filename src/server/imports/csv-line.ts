import Papa from 'papaparse'

/** Tells spreadsheets that a file is UTF-8. */
export const utf8Mark = '\ufeff'

/** What a spreadsheet would take for a formula when a cell begins with it. */
const formulaStart = /^\s*[=+\-@＝＋－＠]|^[\t\r\n]/

/** A quote of our own stands before text that would read as a formula; a row of text that has quotes already gets one more. */
const quotedStart = /^'+\s*[=+\-@＝＋－＠]/

/** One record as RFC 4180 writes it, its line end included. */
export function csvLine(cells: readonly string[], delimiter: string): string {
  return `${Papa.unparse([[...cells]], { delimiter, newline: '\r\n' })}\r\n`
}

export function isFormulaLike(cell: string): boolean {
  return formulaStart.test(cell)
}

/** A text of ours as a cell that no spreadsheet computes; `withoutFormulaGuard` gives the text back. */
export function guardedText(text: string): string {
  return isFormulaLike(text) || quotedStart.test(text) ? `'${text}` : text
}

export function withoutFormulaGuard(cell: string): string {
  return cell.replace(/^'(?='*\s*[=+\-@＝＋－＠])/, '')
}
