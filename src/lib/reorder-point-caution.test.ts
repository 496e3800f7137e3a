import { describe, expect, test } from 'vitest'
import { suggestedOrder } from '@/core/stock/suggested-order'
import { reorderPointCaution } from './reorder-point-caution'

describe('the caution about a reorder point', () => {
  test.each([
    [0, 0],
    [3, 3],
    [3, 4],
    [0, 1],
    [9, 30],
  ])(
    'it is said of %i with %i exactly where an order in single pieces leaves the item low',
    (reorderPoint, orderUpTo) => {
      const isLowAfterwards = Array.from({ length: reorderPoint + 1 }, (_, position) => position).some(
        (position) =>
          position + suggestedOrder(position, { orderUpTo, packSize: 1, minimumOrder: 1 }) <= reorderPoint,
      )
      expect(reorderPointCaution({ reorderPoint, orderUpTo }) !== null).toBe(isLowAfterwards)
    },
  )
})
