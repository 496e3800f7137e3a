import { describe, expect, it } from 'vitest'
import type { BalanceResponse } from '@/schemas/stock'
import { byUse, issueTargets } from './move-dialog'

function lying(
  locationCode: string,
  quantity: number,
  condition: BalanceResponse['condition'],
): BalanceResponse {
  return {
    ...{ locationId: locationCode, locationCode, locationName: locationCode, locationKind: 'bin' as const },
    ...{ cribId: '1', cribCode: 'MAIN', condition, quantity },
  }
}

describe('what is issued', () => {
  it('is taken first from where most usable pieces lie, worn ones last however many', () => {
    const sources = [lying('A', 9, 'worn'), lying('B', 1, 'new'), lying('C', 4, 'used')]
    expect(sources.toSorted(byUse).map(({ locationCode }) => locationCode)).toEqual(['C', 'B', 'A'])
  })

  it('goes to one’s own hands, a machine or the hands of another, each named once', () => {
    const actor = { name: 'Mara Lindqvist', locationId: '7' }
    const machines = [{ id: '3', name: 'Mill 1' }]
    const people = [
      { id: '7', name: 'Mara Lindqvist' },
      { id: '8', name: 'Jonas Reber' },
    ]
    expect(issueTargets(actor, machines, people).map(({ label }) => label)).toEqual([
      'My hands (Mara Lindqvist)',
      'Mill 1',
      'Jonas Reber',
    ])
    expect(issueTargets(actor, machines, [])).toHaveLength(2)
  })
})
