export interface OrderRule {
  orderUpTo: number
  packSize: number
  /** The supplier takes no smaller order. */
  minimumOrder: number
}

/**
 * How many pieces to order now: up to the order-up-to level, at least the supplier's minimum, in whole packs.
 *
 * Assumes the position counts what is available and what is coming.
 *
 * Units      Pieces.
 * Result     0 where the position is at the level or above it; else a multiple of the pack.
 * Source     Common practice of a reorder point with an order-up-to level.
 *
 * @example
 * suggestedOrder(3, { orderUpTo: 12, packSize: 5, minimumOrder: 1 }) // => 10
 * suggestedOrder(12, { orderUpTo: 12, packSize: 5, minimumOrder: 20 }) // => 0
 */
export function suggestedOrder(position: number, rule: OrderRule): number {
  const missing = rule.orderUpTo - position
  if (missing <= 0) return 0
  return Math.ceil(Math.max(missing, rule.minimumOrder) / rule.packSize) * rule.packSize
}
