import { overlapToleranceMm } from '@/core/outline/types'
import type { LowerBound, UpperBound } from './bound-names'
import { partInFloor } from './first-touches'
import type { ReachMessage } from './message-codes'
import { isShort, type ReachCase } from './reach-case'
import {
  type Bound,
  largestBound,
  roundedUpMm,
  type StickOutBounds,
  smallestBound,
  stickOutBounds,
} from './stick-out-bounds'

/** What stick-outs there are, before one is chosen. */
export interface StickOutRange {
  bounds: StickOutBounds
  /** The largest of the bounds that no depth changes. */
  fixed: Bound<LowerBound>
  lower: Bound<LowerBound>
  upper: Bound<UpperBound>
  isCrossed: boolean
  /** Rounded up; null where no stick-out does. */
  requiredMm: number | null
}

/**
 * The bounds on stick-out, and the one required.
 *
 * Assumes `fits` is false where the feature does not take the tool, or nothing holds it.
 *
 * Units      Millimetres.
 *
 * @example
 * stickOutRange(reachCase(reachRequest({})), true).lower.by // => 'flutes'
 */
export function stickOutRange(reach: ReachCase, fits: boolean): StickOutRange {
  const { at, cutter, clamping, holderParts, clearances, settings } = reach
  const bounds = stickOutBounds(at, cutter, clamping, holderParts, clearances, settings)
  const fixed = largestBound(bounds.fixedLower)
  const lower = largestBound([...bounds.fixedLower, ...bounds.clearanceLower])
  const upper = smallestBound(bounds.upper)
  const isAllowed = lower.mm <= upper.mm + overlapToleranceMm
  const isPossible = fits && isAllowed && !doesCutterBreakRule(reach)
  return {
    bounds,
    fixed,
    lower,
    upper,
    isCrossed: fixed.mm > upper.mm + overlapToleranceMm,
    requiredMm: isPossible ? roundedUpMm(lower.mm, settings.stickOutStepMm, upper.mm) : null,
  }
}

/** Cutter, flutes or point are what stops it, or stand in the floor: no stick-out helps. */
function doesCutterBreakRule(reach: ReachCase): boolean {
  return (
    isShort(reach, Math.min(reach.cutterTouch.tipDepthMm, reach.usableTipDepthMm)) ||
    partInFloor(reach.at, reach.cutterParts, reach.clearances) !== null
  )
}

/**
 * Whether the far side of a tilted tool stands in the floor at a stick-out.
 *
 * Tolerance  1e-9 mm.
 *
 * @example
 * standsInFloor(reachCase(reachRequest({})), stickOutRange(reachCase(reachRequest({})), true), 20) // => false
 */
export function standsInFloor(reach: ReachCase, range: StickOutRange, stickOutMm: number): boolean {
  const { at } = reach
  if (at.kind === 'hole' || at.tiltDeg === 0) return false
  const floor = range.bounds.clearanceLower.find(({ by }) => by === 'floor')
  const holderMm = floor ? (floor.mm - stickOutMm) * at.cosTilt : 0
  return holderMm > overlapToleranceMm || partInFloor(at, reach.cutterParts, reach.clearances) !== null
}

/**
 * Why no stick-out is allowed: the two bounds that cross, and by how much.
 *
 * Units      Millimetres.
 * Result     Empty where they don't.
 *
 * @example
 * crossedMessages(stickOutRange(reachCase(reachRequest({})), true)) // => []
 */
export function crossedMessages({ fixed, upper, isCrossed }: StickOutRange): ReachMessage[] {
  if (!isCrossed) return []
  return [
    {
      code: 'bounds-crossed',
      values: {
        lowerBound: fixed.by,
        lowerMm: fixed.mm,
        upperBound: upper.by,
        upperMm: upper.mm,
        overlapMm: fixed.mm - upper.mm,
      },
    },
  ]
}

/**
 * Which bounds a stick-out breaks that no depth changes.
 *
 * Units      Millimetres.
 * Result     Empty where it keeps them all.
 *
 * @example
 * brokenBoundMessages(stickOutRange(reachCase(reachRequest({})), true), 13)[0].values.bound // => 'flutes'
 */
export function brokenBoundMessages({ bounds }: StickOutRange, stickOutMm: number): ReachMessage[] {
  const low = bounds.fixedLower.filter(({ mm }) => stickOutMm < mm - overlapToleranceMm)
  const high = bounds.upper.filter(({ mm }) => stickOutMm > mm + overlapToleranceMm)
  return [...low, ...high].map(({ by, mm }) => ({
    code: 'stick-out-breaks-bound',
    values: { stickOutMm, bound: by, boundMm: mm, overlapMm: Math.abs(stickOutMm - mm) },
  }))
}
