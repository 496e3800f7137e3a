import { readFileSync } from 'node:fs'
import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { colletPlans, holderPlans } from '../../../db/seeds/demo-shop/holders'

interface ColletRow {
  series: string
  attribute: string
  value: string
  seen: 'page' | 'memory'
}

/** Every row's source stands in the file, and what is from memory in collets.md. */
const rows = Papa.parse<ColletRow>(readFileSync(new URL('./collets.csv', import.meta.url), 'utf8'), {
  header: true,
  skipEmptyLines: true,
}).data

function valuesOf(series: string, attribute: string, seen: ColletRow['seen']): string[] {
  return rows
    .filter((row) => row.series === series && row.attribute === attribute && row.seen === seen)
    .map((row) => row.value)
}

const collets = colletPlans().map(({ code, geometry }) => ({ code, ...geometry }))
const nuts = holderPlans().flatMap(({ code, geometry, segments }) =>
  segments
    .filter((segment) => segment.part === 'nut' && geometry.bore_series)
    .map((segment) => ({ code, series: String(geometry.bore_series), ...segment })),
)

describe('the demo shop’s collets against pages that were seen', () => {
  it('compares every series it stocks', () => {
    expect([...new Set(collets.map((collet) => collet.series))].sort()).toEqual([
      'ER11',
      'ER16',
      'ER20',
      'ER25',
      'ER32',
      'ER40',
    ])
    expect(nuts.length).toBeGreaterThan(10)
  })

  it.each(collets)('$code, $series, is as long as its series', ({ series, length_mm }) => {
    expect(valuesOf(series, 'collet_length_L', 'page').map(Number)).toEqual([length_mm])
  })

  it.each(collets)('$code, $series to $maximum_mm, is within the range of its series', (collet) => {
    const [low, high] = rangeOf(valuesOf(collet.series, 'series_clamping_range', 'page'))
    expect(collet.minimum_mm).toBeGreaterThanOrEqual(low)
    expect(collet.maximum_mm).toBeLessThanOrEqual(high)
  })

  it.each(collets)('$code closes by no more than its nominal size allows', ({ minimum_mm, maximum_mm }) => {
    const attribute = `single_collet_collapse_nominal_${maximum_mm <= 3 ? 'le' : 'gt'}_3mm`
    const [most] = valuesOf('ER (all)', attribute, 'page').map(Number)
    expect(maximum_mm - minimum_mm).toBeLessThanOrEqual((most ?? 0) + 1e-9)
  })

  it.each(nuts)('$code has a nut wider than the bore its collet sits in', ({ series, nose }) => {
    const [bore] = valuesOf(series, 'taper_reference_diameter_d2', 'page').map(Number)
    expect(nose).toBeGreaterThan(bore ?? Number.POSITIVE_INFINITY)
  })
})

describe('the demo shop’s nuts against values from memory', () => {
  it.each(nuts)('$code, $series, has a nut as wide as some maker’s', ({ series, nose }) => {
    const widths = ['standard_hex', 'standard_slotted', 'mini'].flatMap((kind) =>
      valuesOf(series, `nut_outside_diameter_${kind}`, 'memory').map(Number),
    )
    expect(widths).toContain(nose)
  })
})

/** The widest of the ranges that were seen: lower limits differ by maker. */
function rangeOf(ranges: string[]): [low: number, high: number] {
  const ends = ranges.map((range) => range.split('-').map(Number))
  return [Math.min(...ends.map((end) => end[0] ?? 0)), Math.max(...ends.map((end) => end[1] ?? 0))]
}
