import { readFileSync } from 'node:fs'
import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { parseLength } from '@/core/units/parse-length'

interface DrillRow {
  kind: 'number' | 'letter' | 'fraction'
  designation: string
  inch: string
  mm_exact: string
}

/** ASME B94.11M as two independently published tables give it; the source of every row stands in the file. */
const rows = Papa.parse<DrillRow>(readFileSync(new URL('./drills.csv', import.meta.url), 'utf8'), {
  header: true,
  skipEmptyLines: true,
}).data

describe('drill sizes against drills.csv', () => {
  it('has all 80 numbers, 26 letters and the fractions to 2 inches', () => {
    const count = (kind: DrillRow['kind']) => rows.filter((row) => row.kind === kind).length
    expect([count('number'), count('letter'), count('fraction')]).toEqual([80, 26, 96])
  })

  it.each(rows)('$designation is $mm_exact mm', ({ kind, designation, inch, mm_exact }) => {
    const as = kind === 'fraction' ? 'fraction' : 'drillSize'
    for (const unit of ['mm', 'in'] as const) {
      const parsed = parseLength(designation, { unit, decimalComma: false })
      const isWholeInch = /^\d+ in$/.test(designation)
      expect(parsed).toEqual({ ok: true, mm: Number(mm_exact), as: isWholeInch ? 'unit' : as })
    }
    expect(parseLength(`${inch} in`, { unit: 'mm', decimalComma: false })).toMatchObject({
      mm: Number(mm_exact),
    })
  })
})
