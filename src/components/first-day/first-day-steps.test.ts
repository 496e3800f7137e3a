import { describe, expect, test } from 'vitest'
import type { FirstDay } from '@/schemas/first-day'
import { stepTexts } from './first-day-steps'

const empty: FirstDay = {
  isDone: { settings: false, bins: false, catalogue: false, stock: false, people: false },
  cribs: 1,
  bins: 0,
  cutters: 0,
  holders: 0,
  collets: 0,
  extensions: 0,
  piecesInBins: 0,
  people: 1,
}

const stateOf = (change: Partial<FirstDay>, id: string) =>
  stepTexts({ ...empty, ...change }, 'mm').find((step) => step.id === id)?.state

describe('the steps of the first day', () => {
  test('they come in their order', () => {
    expect(stepTexts(empty, 'mm').map(({ id }) => id)).toEqual([
      'settings',
      'bins',
      'catalogue',
      'stock',
      'people',
    ])
  })

  test('opening stock says what it needs first, and then what there is', () => {
    expect(stateOf({}, 'stock')).toContain('needs bins first')
    expect(stateOf({ bins: 3 }, 'stock')).toContain('needs the catalogue first')
    expect(stateOf({ bins: 3, cutters: 1 }, 'stock')).toBe('Nothing in a bin yet.')
    expect(stateOf({ bins: 3, cutters: 1, piecesInBins: 1 }, 'stock')).toBe('1 piece in bins.')
  })

  test('the catalogue says what the reach check still lacks', () => {
    expect(stateOf({}, 'catalogue')).toContain('needs cutters and holders')
    expect(stateOf({ cutters: 5 }, 'catalogue')).toContain('needs holders too')
    expect(stateOf({ cutters: 5, holders: 1, collets: 1 }, 'catalogue')).toBe(
      '5 cutters, 1 holder, 1 collet, 0 extensions.',
    )
  })
})
