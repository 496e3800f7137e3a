import { overlapToleranceMm } from '@/core/outline/types'
import { roundedUpMm } from '@/core/reach/stick-out-bounds'
import type { GaugeLengthWindow } from './types'

/** What the shop and the question say about stick-outs. */
export interface StickOutRule {
  stepMm: number
  longestToDiameter: number | null
  window: GaugeLengthWindow | null
}

/** The limits of one diameter. */
export interface StickOutLimit {
  /** The longest stick-out asked for; Infinity without one. */
  longestMm: number
  /** The largest lower bound that is rounded up to no more than that. */
  longestLowerMm: number
}

/**
 * The longest stick-out of a diameter, and the lower bounds that may be rounded up below it.
 *
 * Units      Millimetres.
 * Tolerance  1e-9 mm; a lower bound within 1e-9 steps above a step is on it, as in `roundedUpMm`.
 *
 * @example
 * stickOutLimit({ stepMm: 0.5, longestToDiameter: 4, window: null }, 6.3).longestLowerMm.toFixed(3) // => '25.000'
 */
export function stickOutLimit(
  { stepMm, longestToDiameter }: StickOutRule,
  diameterMm: number,
): StickOutLimit {
  if (longestToDiameter === null)
    return { longestMm: Number.POSITIVE_INFINITY, longestLowerMm: Number.POSITIVE_INFINITY }
  const longestMm = longestToDiameter * diameterMm
  const steps = Math.floor((longestMm + overlapToleranceMm) / stepMm)
  return { longestMm, longestLowerMm: (steps + 1e-9) * stepMm }
}

/**
 * The largest lower bound with which a stick-out exists that keeps the upper bound and the limit.
 *
 * Units      Millimetres.
 *
 * @example
 * largestLowerMm({ longestMm: 25.2, longestLowerMm: 25 }, 25.1) // => 25.100000001
 */
export function largestLowerMm({ longestMm, longestLowerMm }: StickOutLimit, upperMm: number): number {
  const heldMm = upperMm + overlapToleranceMm
  return upperMm <= longestMm + overlapToleranceMm ? heldMm : Math.min(heldMm, longestLowerMm)
}

/**
 * The stick-out of an assembly: the least allowed, rounded up; where the bounds cross, the largest.
 *
 * Units      Millimetres.
 *
 * @example
 * chosenStickOutMm(25.2, 40, 0.5) // => 25.5
 */
export function chosenStickOutMm(lowerMm: number, upperMm: number, stepMm: number): number {
  return lowerMm <= upperMm + overlapToleranceMm ? roundedUpMm(lowerMm, stepMm, upperMm) : upperMm
}

/**
 * How far a gauge length is outside what the machine takes.
 *
 * Units      Millimetres.
 * Result     0 inside, and without a window.
 *
 * @example
 * outsideWindowMm({ shortestMm: 100, longestMm: 150 }, 152.5) // => 2.5
 */
export function outsideWindowMm(window: GaugeLengthWindow | null, gaugeLengthMm: number): number {
  if (!window) return 0
  const outMm = Math.max(window.shortestMm - gaugeLengthMm, gaugeLengthMm - window.longestMm)
  return outMm > overlapToleranceMm ? outMm : 0
}

/** An assembly's bounds, and what of its gauge length is behind the nose. */
export interface BoundedAssembly {
  lowerMm: number
  upperMm: number
  behindMm: number
}

/**
 * Whether an assembly keeps its bounds, the longest stick-out and the gauge length.
 *
 * Units      Millimetres.
 *
 * @example
 * keepsRule({ stepMm: 0.5, longestToDiameter: null, window: { shortestMm: 0, longestMm: 120 } }, { longestMm: Infinity, longestLowerMm: Infinity }, { lowerMm: 25.2, upperMm: 40, behindMm: 100 }) // => false
 */
export function keepsRule(
  rule: StickOutRule,
  limit: StickOutLimit,
  { lowerMm, upperMm, behindMm }: BoundedAssembly,
): boolean {
  if (lowerMm > largestLowerMm(limit, upperMm)) return false
  if (!rule.window) return true
  return outsideWindowMm(rule.window, behindMm + chosenStickOutMm(lowerMm, upperMm, rule.stepMm)) === 0
}

/**
 * How short an assembly falls of its stick-out's rules: crossed bounds, the longest stick-out, the gauge length. All have
 * to be mended, so the most counts.
 *
 * Units      Millimetres; `behindMm` is what of the gauge length is behind the nose.
 * Result     0 where it keeps them all.
 *
 * @example
 * stickOutShortfallMm({ stepMm: 0.5, longestToDiameter: null, window: null }, { longestMm: Infinity, longestLowerMm: Infinity }, { lowerMm: 45, upperMm: 42, behindMm: 100 }) // => 3
 */
export function stickOutShortfallMm(
  { stepMm, window }: StickOutRule,
  { longestMm }: StickOutLimit,
  { lowerMm, upperMm, behindMm }: BoundedAssembly,
): number {
  const stickOutMm = chosenStickOutMm(lowerMm, upperMm, stepMm)
  const crossedMm = lowerMm > upperMm + overlapToleranceMm ? lowerMm - upperMm : 0
  const overMm = stickOutMm > longestMm + overlapToleranceMm ? stickOutMm - longestMm : 0
  return Math.max(crossedMm, overMm, outsideWindowMm(window, behindMm + stickOutMm))
}
