import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { suggestedOrder } from './suggested-order'

const pieces = (least: number) => fc.integer({ min: least, max: 5000 })

describe('the suggested quantity', () => {
  test('it fills up to the level, in whole packs, and keeps the supplier’s minimum', () => {
    expect(suggestedOrder(2, { orderUpTo: 10, packSize: 1, minimumOrder: 1 })).toBe(8)
    expect(suggestedOrder(2, { orderUpTo: 10, packSize: 5, minimumOrder: 1 })).toBe(10)
    expect(suggestedOrder(2, { orderUpTo: 10, packSize: 5, minimumOrder: 12 })).toBe(15)
    expect(suggestedOrder(-4, { orderUpTo: 10, packSize: 10, minimumOrder: 1 })).toBe(20)
    expect(suggestedOrder(10, { orderUpTo: 10, packSize: 10, minimumOrder: 50 })).toBe(0)
  })

  test('it is the smallest whole number of packs that does', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -500, max: 4999 }),
        pieces(0),
        pieces(1),
        pieces(1),
        (position, orderUpTo, packSize, minimumOrder) => {
          const quantity = suggestedOrder(position, { orderUpTo, packSize, minimumOrder })
          const isEnough = (ordered: number) => position + ordered >= orderUpTo && ordered >= minimumOrder
          expect(quantity % packSize).toBe(0)
          if (position >= orderUpTo) expect(quantity).toBe(0)
          else expect([isEnough(quantity), isEnough(quantity - packSize)]).toEqual([true, false])
        },
      ),
    )
  })
})
