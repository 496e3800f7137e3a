import { CoreInputError } from '@/core/core-input-error'
import { notNegative, notNegativeOr, positiveOrNull } from '@/core/outline/checked-number'
import type { CutterDimensions } from '@/core/outline/cutter-dimensions'
import type { Clamping, ColletGeometry, ExtensionGeometry, HolderGeometry } from '@/core/tooling'
import type { LowerBound, UpperBound } from './bound-names'
import type { CheckPart } from './check-parts'
import { clearanceBoundMm, floorBoundMm, obstaclesBoundMm } from './clearance-bounds'
import type { Placement } from './placement'
import type { Clearances, ReachSettings } from './types'

/** How whatever holds the cutter clamps it. */
export interface CheckedClamping {
  boreDepthMm: number
  gripStartMm: number
  /** The least that must be clamped; null for a side-lock that names none. */
  gripMm: number | null
  /** A side-lock's; null for any other. */
  insertionMm: number | null
}

export interface Bound<Name> {
  by: Name
  mm: number
}

export interface StickOutBounds {
  /** What bore, flutes or neck, and side-lock ask; never helped by the depth. */
  fixedLower: Bound<LowerBound>[]
  /** What the rule asks of nut, holder, extension and spindle at this depth. */
  clearanceLower: Bound<LowerBound>[]
  upper: Bound<UpperBound>[]
}

const colletGripShare = 2 / 3

/**
 * What clamps the cutter: the extension where there is one, else the holder, with its collet.
 *
 * Assumes the longer grip where both holder and collet name one, and two thirds of its length for a collet where none
 * is named.
 *
 * Units      Millimetres.
 * Errors     CoreInputError `bore-depth-missing`, `grip-missing`, `not-finite`, `not-positive`, `negative`.
 *
 * @example
 * checkedClamping({ gaugeLengthMm: 80, boreDepthMm: 50, segments: [] }, null, { series: 'ER20', minimumMm: 5, maximumMm: 6, lengthMm: 30 }).gripMm // => 20
 */
export function checkedClamping(
  holder: HolderGeometry,
  extension: ExtensionGeometry | null | undefined,
  collet: ColletGeometry | null | undefined,
): CheckedClamping {
  return extension
    ? clampingOf('extension', extension, null, collet)
    : clampingOf('holder', holder, holder.sideLockInsertionMm, collet)
}

/**
 * As `checkedClamping`, from the one that clamps alone.
 *
 * Units      Millimetres.
 * Errors     As `checkedClamping`.
 *
 * @example
 * clampingOf('extension', { boreDepthMm: 30, minimumGripMm: 12 }, null, null).insertionMm // => null
 */
export function clampingOf(
  owner: 'holder' | 'extension',
  clamping: Clamping,
  sideLockInsertionMm: number | null | undefined,
  collet: ColletGeometry | null | undefined,
): CheckedClamping {
  const boreDepthMm = positiveOrNull(clamping.boreDepthMm, `${owner}.boreDepthMm`, 'The bore depth')
  if (boreDepthMm === null)
    throw new CoreInputError('bore-depth-missing', `${owner}.boreDepthMm`, 'The bore depth is needed.')
  const insertionMm = positiveOrNull(sideLockInsertionMm, 'holder.sideLockInsertionMm', 'The insertion')
  const gripMm = gripOf(
    notNegativeOr(clamping.minimumGripMm, null, `${owner}.minimumGripMm`, 'The grip'),
    collet,
  )
  if (gripMm === null && insertionMm === null)
    throw new CoreInputError(
      'grip-missing',
      `${owner}.minimumGripMm`,
      'The minimum clamping length is needed, or a collet that names its own or its length.',
    )
  const gripStartMm = notNegativeOr(clamping.gripStartMm, 0, `${owner}.gripStartMm`, 'The start of the grip')
  return { boreDepthMm, gripStartMm, gripMm, insertionMm }
}

function gripOf(ofHolderMm: number | null, collet: ColletGeometry | null | undefined): number | null {
  const ofColletMm = collet?.minimumGripMm ?? null
  if (ofColletMm !== null) {
    const checkedMm = notNegative(ofColletMm, 'collet.minimumGripMm', 'The grip')
    return ofHolderMm === null ? checkedMm : Math.max(ofHolderMm, checkedMm)
  }
  if (ofHolderMm !== null) return ofHolderMm
  const lengthMm = positiveOrNull(collet?.lengthMm, 'collet.lengthMm', 'The collet length')
  return lengthMm === null ? null : lengthMm * colletGripShare
}

/**
 * Every bound on the stick-out of a cutter at the feature's depth.
 *
 * Units      Millimetres.
 * Result     Lists, each bound with its name; a bound that does not apply is left out.
 * Source     Worked by hand in test/reference/reach-hand-cases.md.
 * Tolerance  1e-9 mm.
 *
 * @example
 * stickOutBounds(placementOf({ kind: 'wall', depthMm: 10 }, squareCutter), cutterDimensions(squareCutter), checkedClamping(handHolder, null, null), holderCheckParts(handHolder, null), { shankMm: 0.025, holderMm: 0.5 }, defaultReachSettings).clearanceLower // => [{ by: 'clearance', mm: 10.5 }]
 */
export function stickOutBounds(
  at: Placement,
  cutter: CutterDimensions,
  clamping: CheckedClamping,
  holderParts: CheckPart[],
  clearances: Clearances,
  settings: ReachSettings,
): StickOutBounds {
  return {
    fixedLower: fixedLowerBounds(cutter, clamping, settings),
    clearanceLower: clearanceLowerBounds(at, holderParts, clearances),
    upper: upperBounds(cutter, clamping),
  }
}

function fixedLowerBounds(
  cutter: CutterDimensions,
  { boreDepthMm, insertionMm }: CheckedClamping,
  settings: ReachSettings,
): Bound<LowerBound>[] {
  const bounds: Bound<LowerBound>[] = [{ by: 'bore', mm: cutter.overallLengthMm - boreDepthMm }]
  bounds.push(fullShankBound(cutter, settings))
  if (insertionMm !== null) bounds.push({ by: 'sideLock', mm: cutter.overallLengthMm - insertionMm })
  return bounds
}

/**
 * The stick-out that leaves only full shank behind the nose.
 *
 * Units      Millimetres.
 *
 * @example
 * fullShankBound(cutterDimensions(neckedCutter), defaultReachSettings) // => { by: 'neck', mm: 39.1875 }
 */
export function fullShankBound(
  { neck, fluteLengthMm }: CutterDimensions,
  { fluteToGripMm }: ReachSettings,
): Bound<LowerBound> {
  return neck
    ? { by: 'neck', mm: neck.fullShankZMm + fluteToGripMm }
    : { by: 'flutes', mm: fluteLengthMm + fluteToGripMm }
}

function upperBounds(cutter: CutterDimensions, clamping: CheckedClamping): Bound<UpperBound>[] {
  const { gripMm, gripStartMm, insertionMm } = clamping
  const bounds: Bound<UpperBound>[] = []
  if (insertionMm !== null) bounds.push({ by: 'sideLock', mm: cutter.overallLengthMm - insertionMm })
  if (gripMm !== null) bounds.push({ by: 'grip', mm: cutter.overallLengthMm - gripMm - gripStartMm })
  return bounds
}

/**
 * The stick-outs that keep nut, holder, extension and spindle clear at the feature's depth.
 *
 * Units      Millimetres.
 * Result     At most one each of clearance, obstacle, floor; left out where nothing is asked.
 *
 * @example
 * clearanceLowerBounds(placementOf({ kind: 'wall', depthMm: 25 }, squareCutter), holderCheckParts(handHolder, null), { shankMm: 0.025, holderMm: 0.5 }) // => [{ by: 'clearance', mm: 25.5 }]
 */
export function clearanceLowerBounds(
  at: Placement,
  holderParts: CheckPart[],
  clearances: Clearances,
): Bound<LowerBound>[] {
  const bounds: Bound<LowerBound>[] = [
    { by: 'clearance', mm: clearanceBoundMm(at, holderParts, clearances.holderMm) },
  ]
  if (at.kind === 'wall') {
    bounds.push({ by: 'obstacle', mm: obstaclesBoundMm(at, holderParts, clearances.holderMm) })
    bounds.push({ by: 'floor', mm: floorBoundMm(at, holderParts, clearances.holderMm) })
  }
  return bounds.filter(({ mm }) => mm > Number.NEGATIVE_INFINITY)
}

/**
 * The largest bound, the first named where two are alike.
 *
 * Errors     None; a list without bounds has none: -Infinity is never returned from `stickOutBounds`' lists.
 *
 * @example
 * largestBound([{ by: 'bore', mm: 10 }, { by: 'flutes', mm: 13 }]).by // => 'flutes'
 */
export function largestBound<Name>(bounds: Bound<Name>[]): Bound<Name> {
  return bounds.reduce((largest, bound) => (bound.mm > largest.mm ? bound : largest))
}

/**
 * The smallest bound, the first named where two are alike.
 *
 * @example
 * smallestBound([{ by: 'sideLock', mm: 20 }, { by: 'grip', mm: 20 }]).by // => 'sideLock'
 */
export function smallestBound<Name>(bounds: Bound<Name>[]): Bound<Name> {
  return bounds.reduce((smallest, bound) => (bound.mm < smallest.mm ? bound : smallest))
}

/**
 * A stick-out rounded up to the shop's step, never past the largest allowed.
 *
 * Units      Millimetres.
 * Tolerance  A stick-out within 1e-9 steps above a step is on it.
 *
 * @example
 * roundedUpMm(39.1875, 0.5, 60) // => 39.5
 */
export function roundedUpMm(leastMm: number, stepMm: number, largestMm: number): number {
  const steps = Math.ceil(leastMm / stepMm - 1e-9)
  return Math.min(Math.max(leastMm, steps * stepMm), largestMm)
}
