import { describe, expect, it } from 'vitest'
import type { BalanceResponse, ItemStockResponse } from '@/schemas/stock'
import { likelyCribId, piecesByCrib, pointOutlook } from './crib-stock'

function lying(
  cribCode: string,
  quantity: number,
  condition: BalanceResponse['condition'] = 'new',
): BalanceResponse {
  return {
    locationId: `${cribCode}-A`,
    locationCode: 'A-1',
    locationName: 'A-1',
    locationKind: 'bin',
    cribId: cribCode.toLowerCase(),
    cribCode,
    condition,
    quantity,
  }
}

function stocked(balances: BalanceResponse[], change: Partial<ItemStockResponse> = {}): ItemStockResponse {
  return { onHand: 0, reserved: 0, available: 0, coming: 0, balances, ...change }
}

const cribs = [{ id: 'east' }, { id: 'main' }]
const east = { id: 'east', code: 'EAST' }

describe('the crib of a first reorder point', () => {
  it('is where its pieces lie, not the first of the list', () => {
    expect(likelyCribId(cribs, piecesByCrib(stocked([lying('MAIN', 3)])), undefined)).toBe('main')
  })

  it('is the fullest of several, and worn pieces do not count', () => {
    const pieces = piecesByCrib(stocked([lying('EAST', 9, 'worn'), lying('EAST', 1), lying('MAIN', 2)]))
    expect(pieces.map(({ cribCode, pieces: count }) => [cribCode, count])).toEqual([
      ['MAIN', 2],
      ['EAST', 1],
    ])
  })

  it('is asked for where it lies in none and there are several', () => {
    expect(likelyCribId(cribs, [], undefined)).toBe('')
    expect(likelyCribId([{ id: 'east' }], [], undefined)).toBe('east')
  })

  it('is the one that is looked at', () => {
    expect(likelyCribId(cribs, piecesByCrib(stocked([lying('MAIN', 3)])), 'east')).toBe('east')
  })
})

describe('what is said before a point is saved', () => {
  it('says that it is low at once in a crib that has none, and where the pieces are', () => {
    expect(pointOutlook(stocked([lying('MAIN', 3)]), east, 2)).toEqual({
      sentence: '0 in EAST, 3 in MAIN; low at once.',
      isCaution: true,
    })
  })

  it('is low at the point itself and not above it', () => {
    expect(pointOutlook(stocked([lying('EAST', 2)]), east, 2)?.isCaution).toBe(true)
    expect(pointOutlook(stocked([lying('EAST', 3)]), east, 2)?.sentence).toBe('3 in EAST; not low.')
  })

  it('is not sure where pieces are reserved or on their way', () => {
    expect(pointOutlook(stocked([lying('EAST', 3)], { reserved: 1 }), east, 2)?.sentence).toContain('perhaps')
    expect(pointOutlook(stocked([lying('EAST', 1)], { coming: 4 }), east, 2)?.sentence).toContain('perhaps')
  })

  it('says nothing of being low while no point is typed, and nothing at all without a crib', () => {
    expect(pointOutlook(stocked([lying('EAST', 3)]), east, null)?.sentence).toBe('Usable pieces: 3 in EAST.')
    expect(pointOutlook(stocked([]), undefined, 2)).toBeNull()
  })
})
