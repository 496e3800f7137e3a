import { CoreInputError } from '@/core/core-input-error'
import { notNegative, notNegativeOr, positive, positiveOrNull } from '@/core/outline/checked-number'
import type { CutterDimensions } from '@/core/outline/cutter-dimensions'
import { type CutterForm, holeToolForms } from '@/core/tooling'
import type { Feature, HoleFeature, Obstacle, WallFeature } from './types'

export interface CheckedWall {
  kind: 'wall'
  depthMm: number
  draftDeg: number
  tiltDeg: number
  throughMm: number
  /** Counted off reach and first touches; see `WallPlacement`. */
  leadMm: number
  openingWidthMm: number | null
  /** The opening is a hole that the tool circles in. */
  isHole: boolean
  insideCornerRadiusMm: number | null
  floorRadiusMm: number | null
  obstacles: readonly Obstacle[]
}

export interface CheckedHole {
  kind: 'hole'
  depthMm: number
  diameterMm: number
  breakThroughMm: number
}

export type CheckedFeature = CheckedWall | CheckedHole

const draftLimitDeg = 60

/** A feature checked by itself: what a tool that goes round asks, and what one that makes its own hole does. */
export interface CheckedDemand {
  /** The wall, or the wall a hole is for a tool that circles in it. */
  wall: CheckedWall
  /** null for a wall: no hole tool cuts it. */
  hole: CheckedHole | null
}

/**
 * A feature with gaps filled and what can't be refused, before any cutter is known.
 *
 * Units      Millimetres and degrees.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `negative`, `draft-out-of-range`,
 *            `tilt-out-of-range`, `tilt-with-closed-wall`.
 *
 * @example
 * checkedDemand({ kind: 'hole', depthMm: 20, diameterMm: 6 }).wall.openingWidthMm // => 6
 */
export function checkedDemand(feature: Feature): CheckedDemand {
  if (feature.kind === 'wall') return { wall: checkedWall(feature), hole: null }
  const hole = checkedHole(feature)
  return { wall: circledWall(hole), hole }
}

/** Why a cutter is not asked at all about a feature; an edge or the check itself makes an error of it. */
export interface FormRefusal {
  code: 'chamfer-not-checked' | 'hole-tool-on-wall' | 'tilt-without-spherical-tip' | 'tilt-out-of-range'
  path: string
  message: string
}

/**
 * Why the form of a cutter can't be asked about a feature: a chamfer, a hole tool on a wall, a tip that may not tilt.
 *
 * Result     null where it can.
 *
 * @example
 * formRefusal(checkedDemand({ kind: 'wall', depthMm: 5 }), cutterDimensions(drillCutter)).code // => 'hole-tool-on-wall'
 */
export function formRefusal({ wall, hole }: CheckedDemand, cutter: CutterDimensions): FormRefusal | null {
  if (cutter.form === 'chamfer') return chamferRefusal
  if (isHoleTool(cutter)) return hole ? null : holeToolRefusal
  if (wall.tiltDeg === 0) return null
  if (!cutter.hasSphericalTip) return tipRefusal
  return cutter.taperHalfAngleDeg + wall.tiltDeg > 90 ? taperRefusal : null
}

const tiltPath = 'feature.tiltDeg'
const chamferRefusal: FormRefusal = {
  code: 'chamfer-not-checked',
  path: 'cutter.form',
  message: 'Reach is not worked out for a chamfer tool.',
}
const holeToolRefusal: FormRefusal = {
  code: 'hole-tool-on-wall',
  path: 'cutter.form',
  message: 'A drill, reamer or tap can’t cut a wall.',
}
/** Only a ball turns about its own centre. */
const tipRefusal: FormRefusal = {
  code: 'tilt-without-spherical-tip',
  path: tiltPath,
  message: 'Only a tool with a ball tip may be tilted.',
}
const taperRefusal: FormRefusal = {
  code: 'tilt-out-of-range',
  path: tiltPath,
  message: 'Taper and tilt together must not pass 90°.',
}

/**
 * Whether a cutter makes its own hole on its axis.
 *
 * @example
 * isHoleTool(drillCutter) // => true
 */
export function isHoleTool({ form }: { form: CutterForm }): boolean {
  return (holeToolForms as readonly CutterForm[]).includes(form)
}

/**
 * The feature as it is to one cutter: gaps filled, what can't be refused, a hole that is circled turned into its wall.
 *
 * Units      Millimetres and degrees.
 * Result     A hole only for a hole tool; any other form gets a straight wall in an opening of the hole's diameter.
 * Errors     CoreInputError as `checkedDemand`, and the codes of `formRefusal`.
 *
 * @example
 * checkedFeature({ kind: 'wall', depthMm: 5, tiltDeg: 10 }, cutterDimensions(squareCutter)) // => throws tilt-without-spherical-tip
 */
export function checkedFeature(feature: Feature, cutter: CutterDimensions): CheckedFeature {
  const demand = checkedDemand(feature)
  const refusal = formRefusal(demand, cutter)
  if (refusal) throw new CoreInputError(refusal.code, refusal.path, refusal.message)
  return featureFor(demand, cutter)
}

/**
 * What of a checked feature a cutter is asked that its form does not refuse.
 *
 * @example
 * featureFor(checkedDemand({ kind: 'hole', depthMm: 20, diameterMm: 6 }), cutterDimensions(squareCutter)).kind // => 'wall'
 */
export function featureFor({ wall, hole }: CheckedDemand, cutter: CutterDimensions): CheckedFeature {
  return hole && isHoleTool(cutter) ? hole : wall
}

function checkedHole(hole: HoleFeature): CheckedHole {
  return {
    kind: 'hole',
    depthMm: positive(hole.depthMm, 'feature.depthMm', 'The depth'),
    diameterMm: positive(hole.diameterMm, 'feature.diameterMm', 'The hole diameter'),
    breakThroughMm: notNegativeOr(hole.breakThroughMm, 0, 'feature.breakThroughMm', 'The break-through'),
  }
}

function circledWall({ depthMm, diameterMm, breakThroughMm }: CheckedHole): CheckedWall {
  return {
    kind: 'wall',
    depthMm,
    draftDeg: 0,
    tiltDeg: 0,
    throughMm: breakThroughMm,
    leadMm: breakThroughMm,
    openingWidthMm: diameterMm,
    isHole: true,
    insideCornerRadiusMm: null,
    floorRadiusMm: null,
    obstacles: [],
  }
}

function checkedWall(wall: WallFeature): CheckedWall {
  const checked: CheckedWall = {
    kind: 'wall',
    depthMm: positive(wall.depthMm, 'feature.depthMm', 'The depth'),
    draftDeg: notNegativeOr(wall.draftDeg, 0, 'feature.draftDeg', 'The draft'),
    tiltDeg: notNegativeOr(wall.tiltDeg, 0, 'feature.tiltDeg', 'The tilt'),
    throughMm: notNegativeOr(wall.throughMm, 0, 'feature.throughMm', 'The allowance below the floor'),
    leadMm: 0,
    openingWidthMm: positiveOrNull(wall.openingWidthMm, 'feature.openingWidthMm', 'The opening'),
    isHole: false,
    insideCornerRadiusMm: notNegativeOr(
      wall.insideCornerRadiusMm,
      null,
      'feature.insideCornerRadiusMm',
      'The inside corner radius',
    ),
    floorRadiusMm: notNegativeOr(wall.floorRadiusMm, null, 'feature.floorRadiusMm', 'The floor radius'),
    obstacles: (wall.obstacles ?? []).map(checkedObstacle),
  }
  if (checked.draftDeg >= draftLimitDeg)
    throw new CoreInputError('draft-out-of-range', 'feature.draftDeg', 'The draft must be below 60°.')
  if (checked.tiltDeg > 0) refuseTilt(checked)
  return checked
}

function checkedObstacle({ setbackMm, riseMm }: Obstacle, index: number): Obstacle {
  const path = `feature.obstacles.${index}`
  return {
    setbackMm: notNegative(setbackMm, `${path}.setbackMm`, 'The setback'),
    riseMm: notNegative(riseMm, `${path}.riseMm`, 'The rise'),
  }
}

/** The far wall, the corner's side wall or an obstacle would decide. */
function refuseTilt(wall: CheckedWall): void {
  if (wall.obstacles.length > 0 || wall.openingWidthMm !== null || wall.insideCornerRadiusMm !== null)
    throw new CoreInputError(
      'tilt-with-closed-wall',
      tiltPath,
      'A tilted tool is checked only on an open wall, without obstacles, opening width or inside corner.',
    )
  if (wall.draftDeg + wall.tiltDeg >= 90)
    throw new CoreInputError('tilt-out-of-range', tiltPath, 'Draft and tilt together must be below 90°.')
}
