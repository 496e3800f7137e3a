import { describe, expect, it } from 'vitest'
import type { BalanceResponse } from '@/schemas/stock'
import { returnTargets } from './move-dialog'

function lying(
  locationId: string,
  code: string,
  quantity: number,
  condition: BalanceResponse['condition'] = 'new',
) {
  return {
    locationId,
    locationCode: code,
    locationName: code,
    locationKind: 'bin',
    cribId: '1',
    cribCode: 'MAIN',
    condition,
    quantity,
  } satisfies BalanceResponse
}

const places = [
  { id: '90', code: 'A-1', cribCode: 'EAST' },
  { id: '91', code: 'A-2', cribCode: 'EAST' },
]

describe('where a piece comes back to', () => {
  it('is first of all where it lies, though the bin stands in no block of the list that was read', () => {
    const options = returnTargets([lying('7', 'E3-24', 1), lying('8', 'E1-01', 4)], places, '')
    expect(options.map((option) => option.label)).toEqual([
      'MAIN E1-01',
      'MAIN E3-24',
      'EAST A-1',
      'EAST A-2',
    ])
  })

  it('names a bin once, in whatever conditions pieces lie there', () => {
    const options = returnTargets([lying('90', 'A-1', 1, 'used'), lying('90', 'A-1', 2)], places, '')
    expect(options.map((option) => option.value)).toEqual(['90', '91'])
  })

  it('is asked for where it lies nowhere: no bin is taken for granted', () => {
    expect(returnTargets([], places, '')[0]).toEqual({ value: '', label: 'Choose a bin' })
  })

  it('is what was searched for', () => {
    expect(returnTargets([lying('7', 'E3-24', 1)], places, 'A-').map((option) => option.value)).toEqual([
      '90',
      '91',
    ])
  })
})
