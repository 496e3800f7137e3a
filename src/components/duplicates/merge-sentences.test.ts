import { describe, expect, test } from 'vitest'
import type { MergePreview } from '@/schemas/duplicate'
import { heldPlace, namedTags, reorderingSentences } from './merge-sentences'

const codes = { kept: 'EM-1', merged: 'EM-2' }
const crib: MergePreview['cribs'][number] = {
  cribCode: 'MAIN',
  kept: { reorderPoint: 2, orderUpTo: 9 },
  merged: { reorderPoint: 5, orderUpTo: 12 },
  closesAlert: false,
  positionAfter: 8,
  isLowBefore: false,
  isLowAfter: false,
}
const sentence = (change: Partial<typeof crib>) => reorderingSentences([{ ...crib, ...change }], codes)[0]

describe('what a merge says of reordering', () => {
  test('the kept item’s own point stays, and the other’s counts no more', () => {
    expect(sentence({})).toBe(
      'MAIN: EM-1 keeps its reorder point (2, up to 9); that of EM-2 (5, up to 12) counts no more. With 8 in position, EM-1 is not low.',
    )
  })

  test('a point is taken over where there was none', () => {
    expect(sentence({ kept: null })).toContain('MAIN: EM-1 takes over the reorder point (5, up to 12).')
  })

  test('the alert of the item that goes closes, and the kept one’s follows its position', () => {
    expect(sentence({ closesAlert: true })).toContain('The open alert of EM-2 closes. With 8')
    expect(sentence({ isLowBefore: true })).toContain('is no longer low: its alert closes')
    expect(sentence({ isLowBefore: true, isLowAfter: true })).toContain('stays low, and its alert open')
    expect(sentence({ isLowAfter: true })).toContain('is low, so an alert opens and mail goes out')
  })
})

describe('the places of what goes over', () => {
  const held: MergePreview['held'][number] = {
    locationId: '1',
    locationKind: 'bin',
    locationCode: 'A-1',
    locationName: 'Bin A-1',
    cribCode: 'MAIN',
    condition: 'new',
    quantity: 1,
    tags: [],
  }

  test('a bin is told by its crib, hands by whose they are', () => {
    expect(heldPlace(held)).toBe('MAIN · A-1')
    expect(heldPlace({ ...held, locationKind: 'person', locationName: 'Ida Roe' })).toBe('With Ida Roe')
  })

  test('many tags are not all named', () => {
    expect(namedTags(['T1', 'T2'])).toBe('T1, T2')
    expect(namedTags(['1', '2', '3', '4', '5', '6', '7', '8'])).toBe('1, 2, 3, 4, 5, 6 and 2 more')
  })
})
