import { readFileSync } from 'node:fs'
import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { cutterCatalogue } from '@/components/cutters/cutter-catalogue'
import { holderCatalogue } from '@/components/holders/holder-catalogue'
import { symbolNames, symbolTitle } from '@/lib/symbol-names'
import { importFields } from '@/schemas/import-fields'

interface Published {
  symbol: string
  preferred_name: string
  source: string
  /** `page` where the source was read, `memory` where the name still wants checking. */
  seen: string
}

const text = readFileSync(new URL('./iso13399.csv', import.meta.url), 'utf8')
const published = Papa.parse<Published>(text, { header: true, skipEmptyLines: true }).data

describe('the names of ISO 13399 symbols', () => {
  it('are those published, each with its source', () => {
    expect(Object.fromEntries(published.map((row) => [row.symbol, row.preferred_name]))).toEqual(symbolNames)
    for (const row of published) expect(`${row.source} ${row.seen}`).toMatch(/\S+ (page|memory)$/)
  })

  it('are known for every symbol over a column and beside a field of an import', () => {
    const ownSymbols = ['A', 'E', 'κ']
    const headings = [...cutterCatalogue.columns(true), ...holderCatalogue.columns(true)]
      .map(({ heading }) => heading)
      .filter((heading) => /^[A-Z]{2,}$/.test(heading))
    const ofImports = Object.values(importFields)
      .flat()
      .flatMap(({ symbol }) => symbol?.split(', ') ?? [])
    for (const symbol of [...headings, ...ofImports].filter((one) => !ownSymbols.includes(one)))
      expect(symbolTitle(symbol), symbol).toContain(symbolNames[symbol] ?? 'a name')
  })

  it('are told of a symbol with its unit, and of nothing that is none', () => {
    expect(symbolTitle('LU · mm')).toBe('LU: usable length (ISO 13399)')
    expect(symbolTitle('DMM, DCONMS')).toBe(
      'DMM: shank diameter; DCONMS: connection diameter machine side (ISO 13399)',
    )
    for (const none of ['mm', 'κ', 'A', '']) expect(symbolTitle(none)).toBeUndefined()
  })
})
