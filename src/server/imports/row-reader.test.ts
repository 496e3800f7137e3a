import { describe, expect, it } from 'vitest'
import type { ImportColumn } from '@/schemas/import-mapping'
import { RowReader } from './row-reader'

function column(heading: string, field: string, unit: ImportColumn['unit'] = null): ImportColumn {
  return { heading, field, unit, origin: 'known', samples: [], note: null }
}

function warningsOf(columns: ImportColumn[], cells: string[], unit: 'mm' | 'in' = 'mm'): string[] {
  const reader = new RowReader(columns, {
    kind: 'cutters',
    unit,
    decimalComma: false,
    decimalsOrigin: 'shop',
    defaults: {},
    currencyDecimals: 2,
  })
  return reader
    .warningsOf({ line: 2, cells, faults: [] })
    .map((warning) => `${warning.column}: ${warning.value}`)
}

const columns = [
  column('Dia', 'cuttingDiameterMm'),
  column('LOC', 'lengthOfCutMm'),
  column('OAL', 'overallLengthMm'),
]

describe('millimetres beside fractions of an inch', () => {
  it.each([
    ['a bare whole number', ['1/8', '1/2', '2'], 'OAL: 2'],
    ['a bare decimal', ['1/8', '.5', '1 1/2'], 'LOC: .5'],
  ])('are taken with a word about %s', (_, cells, expected) => {
    expect(warningsOf(columns, cells)).toEqual([expected])
  })

  it('are not spoken of where the row is all fractions, all numbers, or says its units', () => {
    expect(warningsOf(columns, ['1/8', '1/2', '1 1/2'])).toEqual([])
    expect(warningsOf(columns, ['3', '8', '57'])).toEqual([])
    expect(warningsOf(columns, ['1/8', '12 mm', '57 mm'])).toEqual([])
  })

  it('are not spoken of where the file or the column is in inches', () => {
    expect(warningsOf(columns, ['1/8', '.5', '2'], 'in')).toEqual([])
    const inInches = [column('Dia', 'cuttingDiameterMm'), column('LOC (in)', 'lengthOfCutMm', 'in')]
    expect(warningsOf(inInches, ['1/8', '.5'])).toEqual([])
  })
})
