import { CoreInputError } from '@/core/core-input-error'
import { notNegative, notNegativeOr, positive, positiveOrNull } from '@/core/outline/checked-number'
import type { CutterDimensions } from '@/core/outline/cutter-dimensions'
import { holeToolForms } from '@/core/tooling'
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

/**
 * The feature with gaps filled, what can't be refused, and a hole that is circled turned into its wall.
 *
 * Units      Millimetres and degrees.
 * Result     A hole only for a hole tool; any other form gets a straight wall in an opening of the hole's diameter.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `negative`, `draft-out-of-range`,
 *            `tilt-out-of-range`, `tilt-without-spherical-tip`, `tilt-with-closed-wall`, `chamfer-not-checked`,
 *            `hole-tool-on-wall`.
 *
 * @example
 * checkedFeature({ kind: 'wall', depthMm: 5, tiltDeg: 10 }, cutterDimensions(squareCutter)) // => throws tilt-without-spherical-tip
 */
export function checkedFeature(feature: Feature, cutter: CutterDimensions): CheckedFeature {
  if (cutter.form === 'chamfer')
    throw new CoreInputError(
      'chamfer-not-checked',
      'cutter.form',
      'Reach is not worked out for a chamfer tool.',
    )
  const isHoleTool = (holeToolForms as readonly string[]).includes(cutter.form)
  if (feature.kind === 'hole') return checkedHole(feature, isHoleTool)
  if (isHoleTool)
    throw new CoreInputError('hole-tool-on-wall', 'cutter.form', 'A drill, reamer or tap can’t cut a wall.')
  return checkedWall(feature, cutter)
}

function checkedHole(hole: HoleFeature, isHoleTool: boolean): CheckedFeature {
  const depthMm = positive(hole.depthMm, 'feature.depthMm', 'The depth')
  const diameterMm = positive(hole.diameterMm, 'feature.diameterMm', 'The hole diameter')
  const breakThroughMm = notNegativeOr(hole.breakThroughMm, 0, 'feature.breakThroughMm', 'The break-through')
  if (isHoleTool) return { kind: 'hole', depthMm, diameterMm, breakThroughMm }
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

function checkedWall(wall: WallFeature, cutter: CutterDimensions): CheckedWall {
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
  if (checked.tiltDeg > 0) refuseTilt(checked, cutter)
  return checked
}

function checkedObstacle({ setbackMm, riseMm }: Obstacle, index: number): Obstacle {
  const path = `feature.obstacles.${index}`
  return {
    setbackMm: notNegative(setbackMm, `${path}.setbackMm`, 'The setback'),
    riseMm: notNegative(riseMm, `${path}.riseMm`, 'The rise'),
  }
}

/** The far wall, the corner's side wall or an obstacle would decide; and only a ball turns about its own centre. */
function refuseTilt(wall: CheckedWall, cutter: CutterDimensions): void {
  const path = 'feature.tiltDeg'
  if (!cutter.hasSphericalTip)
    throw new CoreInputError('tilt-without-spherical-tip', path, 'Only a tool with a ball tip may be tilted.')
  if (wall.obstacles.length > 0 || wall.openingWidthMm !== null || wall.insideCornerRadiusMm !== null)
    throw new CoreInputError(
      'tilt-with-closed-wall',
      path,
      'A tilted tool is checked only on an open wall, without obstacles, opening width or inside corner.',
    )
  if (wall.draftDeg + wall.tiltDeg >= 90)
    throw new CoreInputError('tilt-out-of-range', path, 'Draft and tilt together must be below 90°.')
  if (cutter.taperHalfAngleDeg + wall.tiltDeg > 90)
    throw new CoreInputError('tilt-out-of-range', path, 'Taper and tilt together must not pass 90°.')
}
