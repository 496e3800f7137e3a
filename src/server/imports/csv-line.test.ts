import fc from 'fast-check'
import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { csvLine, guardedText, withoutFormulaGuard } from './csv-line'

/** What OWASP names as the beginnings a spreadsheet computes (CSV Injection, 2024), and their full-width twins. */
const starts = ['=', '+', '-', '@', '\t=', '\r', '\n=', '＝', '＋', '－', '＠']

describe('a guarded text', () => {
  it('never begins with what a spreadsheet computes', () => {
    for (const start of starts) expect(guardedText(`${start}1+1`)).toMatch(/^'/)
    fc.assert(
      fc.property(fc.constantFrom(...starts), fc.string(), (start, rest) =>
        guardedText(start + rest).startsWith("'"),
      ),
    )
  })

  it('leaves other text alone', () => {
    for (const text of ['', 'EM-6', "6' bar", "'quoted'", '1-2', 'a=b']) expect(guardedText(text)).toBe(text)
  })

  it('comes back as it was, quotes of its own included', () => {
    const begin = fc.constantFrom('', "'", "''", '=', "'=", "''@", '-', "'＋")
    fc.assert(
      fc.property(begin, fc.string(), (start, rest) => {
        const text = (start + rest).trim()
        return withoutFormulaGuard(guardedText(text)) === text
      }),
    )
  })
})

describe('a line', () => {
  it('reads back as the same cells with an independent reader, whatever is in them', () => {
    const cells = fc.array(fc.string(), { minLength: 2, maxLength: 8 })
    fc.assert(
      fc.property(cells, fc.constantFrom(',', ';'), (given, delimiter) => {
        const read = Papa.parse<string[]>(csvLine(given, delimiter), { delimiter, newline: '\r\n' })
        expect(read.data[0]).toEqual(given)
      }),
    )
  })

  it('ends with CRLF and doubles a quote, as RFC 4180 sections 2.1 and 2.7 say', () => {
    expect(csvLine(['a', 'b"c', 'd,e'], ',')).toBe('a,"b""c","d,e"\r\n')
  })
})
