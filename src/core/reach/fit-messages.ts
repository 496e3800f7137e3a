import type { CutterDimensions } from '@/core/outline/cutter-dimensions'
import { overlapToleranceMm } from '@/core/outline/types'
import type { CheckedFeature, CheckedWall } from './checked-feature'
import type { ReachMessage } from './message-codes'
import type { Placement, WallPlacement } from './placement'
import type { ReachSettings } from './types'

const angleToleranceDeg = 1e-9

/** Any of these refuses the cutter; a search tells each of them by name, so none may be added unseen. */
export type FitMessage = Extract<
  ReachMessage,
  {
    code:
      | 'hole-diameter-mismatch'
      | 'hole-too-narrow'
      | 'opening-too-narrow'
      | 'corner-too-tight'
      | 'floor-radius-too-small'
      | 'taper-steeper-than-wall'
      | 'length-of-cut-below-contact'
  }
>

/**
 * Why this feature does not take this cutter at any stick-out; empty where it does.
 *
 * Units      Millimetres and degrees, in the messages' own names.
 * Tolerance  1e-9 mm, 1e-9 degrees.
 *
 * @example
 * fitMessages(checkedFeature({ kind: 'wall', depthMm: 5, openingWidthMm: 3 }, cutterDimensions(squareCutter)), cutterDimensions(squareCutter), placementOf({ kind: 'wall', depthMm: 5 }, squareCutter), defaultReachSettings)[0].code // => 'opening-too-narrow'
 */
export function fitMessages(
  feature: CheckedFeature,
  cutter: CutterDimensions,
  at: Placement,
  settings: ReachSettings,
): FitMessage[] {
  if (feature.kind === 'wall') return at.kind === 'wall' ? wallFitMessages(feature, cutter, at) : []
  const offMm = Math.abs(feature.diameterMm - 2 * cutter.radiusMm)
  if (offMm <= settings.holeToleranceMm + overlapToleranceMm) return []
  return [
    {
      code: 'hole-diameter-mismatch',
      values: {
        holeDiameterMm: feature.diameterMm,
        cuttingDiameterMm: 2 * cutter.radiusMm,
        toleranceMm: settings.holeToleranceMm,
      },
    },
  ]
}

/** One list from first to last: a search asks this of every cutter of a crib. */
function wallFitMessages(wall: CheckedWall, cutter: CutterDimensions, at: WallPlacement): FitMessage[] {
  const messages: FitMessage[] = []
  const { openingWidthMm, insideCornerRadiusMm, floorRadiusMm } = wall
  const neededMm = 2 * at.standOffMm
  if (openingWidthMm !== null && openingWidthMm < neededMm - overlapToleranceMm)
    messages.push(tooNarrow(openingWidthMm, neededMm, wall.isHole))
  if (insideCornerRadiusMm !== null && insideCornerRadiusMm < cutter.radiusMm - overlapToleranceMm)
    messages.push({
      code: 'corner-too-tight',
      values: {
        insideCornerRadiusMm,
        toolRadiusMm: cutter.radiusMm,
        shortfallMm: cutter.radiusMm - insideCornerRadiusMm,
      },
    })
  if (floorRadiusMm !== null && floorRadiusMm < cutter.cornerRadiusMm - overlapToleranceMm)
    messages.push({
      code: 'floor-radius-too-small',
      values: {
        floorRadiusMm,
        cornerRadiusMm: cutter.cornerRadiusMm,
        shortfallMm: cutter.cornerRadiusMm - floorRadiusMm,
      },
    })
  addFormMessages(messages, cutter, at)
  return messages
}

function tooNarrow(widthMm: number, neededMm: number, isHole: boolean): FitMessage {
  const needed = { neededMm, shortfallMm: neededMm - widthMm }
  return isHole
    ? { code: 'hole-too-narrow', values: { holeDiameterMm: widthMm, ...needed } }
    : { code: 'opening-too-narrow', values: { openingWidthMm: widthMm, ...needed } }
}

function addFormMessages(messages: FitMessage[], cutter: CutterDimensions, at: WallPlacement): void {
  if (isTaperTooSteep(cutter, at))
    messages.push({
      code: 'taper-steeper-than-wall',
      values: {
        taperHalfAngleDeg: cutter.taperHalfAngleDeg,
        wallDeg: at.draftDeg + at.tiltDeg,
        uncutAtFootMm: uncutAtFootMm(cutter, at),
      },
    })
  const contactHeightMm = contactZMm(cutter, at)
  if (contactHeightMm > 0 && cutter.lengthOfCutMm <= contactHeightMm + overlapToleranceMm)
    messages.push({
      code: 'length-of-cut-below-contact',
      values: { lengthOfCutMm: cutter.lengthOfCutMm, contactHeightMm },
    })
}

/**
 * Whether the cutter leans more than the wall does as it sees it, so that it can't lie along it.
 *
 * Tolerance  1e-9 degrees.
 */
function isTaperTooSteep(cutter: CutterDimensions, at: WallPlacement): boolean {
  return cutter.taperHalfAngleDeg > at.draftDeg + at.tiltDeg + angleToleranceDeg
}

/**
 * Whether this tool can't lie along this wall at all: its reach there is 0.
 *
 * @example
 * cutsNothing(cutterDimensions({ ...ballCutter, lengthOfCutMm: 2 }), placementOf({ kind: 'wall', depthMm: 5 }, ballCutter)) // => true
 */
export function cutsNothing(cutter: CutterDimensions, at: Placement): boolean {
  if (at.kind === 'hole') return false
  const messages: FitMessage[] = []
  addFormMessages(messages, cutter, at)
  return messages.length > 0
}

/**
 * Height along the tool, from the tip, at which its rounded end touches the wall.
 *
 * Units      Millimetres.
 * Result     0 for a sharp end.
 */
function contactZMm(cutter: CutterDimensions, at: WallPlacement): number {
  return cutter.cornerRadiusMm * (1 - at.sinWall)
}

/**
 * What a taper steeper than the wall leaves standing at the wall's foot.
 *
 * Units      Millimetres, measured along the floor.
 * Result     0 where the taper is not too steep; null for a rounded tip, for which it is not defined.
 *
 * @example
 * uncutAtFootMm(cutterDimensions(squareCutter), placementOf({ kind: 'wall', depthMm: 5 }, squareCutter)) // => 0
 */
export function uncutAtFootMm(cutter: CutterDimensions, at: Placement): number | null {
  if (at.kind === 'hole' || !isTaperTooSteep(cutter, at)) return 0
  if (cutter.cornerRadiusMm > 0) return null
  const taperTan = Math.tan((cutter.taperHalfAngleDeg * Math.PI) / 180)
  return Math.min(cutter.lengthOfCutMm, at.tipDepthMm) * (taperTan - at.sinWall / at.cosWall)
}

/**
 * The largest depth cut at one pass along the axis.
 *
 * Units      Millimetres.
 * Result     0 or more: the length of cut above where the tool touches the wall.
 *
 * @example
 * maximumAxialStepMm(cutterDimensions(ballCutter), placementOf({ kind: 'wall', depthMm: 5 }, ballCutter)) // => 9
 */
export function maximumAxialStepMm(cutter: CutterDimensions, at: Placement): number {
  return at.kind === 'hole'
    ? cutter.lengthOfCutMm
    : Math.max(0, cutter.lengthOfCutMm - contactZMm(cutter, at))
}
