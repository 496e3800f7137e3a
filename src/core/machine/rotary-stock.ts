import { finiteOr, notNegative, notNegativeOr, positive } from '@/core/outline/checked-number'

/** Bar or block held in a rotary axis that lies flat over the table. */
export interface RotaryStock {
  widthMm: number
  heightMm: number
  /** How far the axis stands from the middle of the stock, along its width and its height; 0 unless given. */
  offsetXMm?: number | null
  offsetYMm?: number | null
  /** Of the rotary axis above the table. */
  axisHeightMm: number
  /** The farthest that jaws, chuck or faceplate stand from the axis; 0 unless given. */
  chuckRadiusMm?: number | null
}

/**
 * Radius of the circle that whatever turns about a rotary axis sweeps: √((w/2 + |ex|)² + (h/2 + |ey|)²), the corner
 * that stands farthest out, or the jaws or the faceplate where they stand out farther.
 *
 * Shapes     The stock is a rectangle across the axis; a round bar counts as the square about it, which is cautious.
 * Units      Millimetres; offsets may be negative.
 * Result     More than half the smaller side.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `negative` at `rotaryStock.…`.
 * Source     Plane geometry; test/reference/machine/machine-window.md, cases 5 to 8.
 * Tolerance  1e-9 mm.
 *
 * @example
 * sweptRadiusMm({ widthMm: 80, heightMm: 80, axisHeightMm: 120 }).toFixed(3) // => '56.569'
 * sweptRadiusMm({ widthMm: 30, heightMm: 40, axisHeightMm: 120, chuckRadiusMm: 62.5 }) // => 62.5
 */
export function sweptRadiusMm(stock: RotaryStock): number {
  const halfWidthMm = positive(stock.widthMm, 'rotaryStock.widthMm', 'The stock width') / 2
  const halfHeightMm = positive(stock.heightMm, 'rotaryStock.heightMm', 'The stock height') / 2
  const offsetXMm = Math.abs(finiteOr(stock.offsetXMm, 0, 'rotaryStock.offsetXMm', 'The offset'))
  const offsetYMm = Math.abs(finiteOr(stock.offsetYMm, 0, 'rotaryStock.offsetYMm', 'The offset'))
  const chuckMm = notNegativeOr(stock.chuckRadiusMm, 0, 'rotaryStock.chuckRadiusMm', 'The chuck radius')
  return Math.max(Math.hypot(halfWidthMm + offsetXMm, halfHeightMm + offsetYMm), chuckMm)
}

/**
 * What is left on the thinnest side of a rectangular stock once it is turned to a round part, the stock standing as far
 * off the axis as the centring may be wrong: (width − diameter)/2 − error, for the side and the offset that leave least.
 *
 * Units      Millimetres.
 * Result     Negative: the part does not clean up, by that much.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `negative`.
 * Source     Plane geometry; test/reference/machine/machine-window.md, case 9.
 * Tolerance  1e-9 mm.
 *
 * @example
 * centringMarginMm({ widthMm: 50, heightMm: 50, axisHeightMm: 120 }, 48, 0.4) // => 0.6
 */
export function centringMarginMm(
  stock: RotaryStock,
  partDiameterMm: number,
  centringErrorMm: number,
): number {
  const diameterMm = positive(partDiameterMm, 'partDiameterMm', 'The part diameter')
  const errorMm = notNegative(centringErrorMm, 'centringErrorMm', 'The centring error')
  const halfWidthMm = positive(stock.widthMm, 'rotaryStock.widthMm', 'The stock width') / 2
  const halfHeightMm = positive(stock.heightMm, 'rotaryStock.heightMm', 'The stock height') / 2
  const offsetXMm = Math.abs(finiteOr(stock.offsetXMm, 0, 'rotaryStock.offsetXMm', 'The offset'))
  const offsetYMm = Math.abs(finiteOr(stock.offsetYMm, 0, 'rotaryStock.offsetYMm', 'The offset'))
  return Math.min(halfWidthMm - offsetXMm, halfHeightMm - offsetYMm) - diameterMm / 2 - errorMm
}
