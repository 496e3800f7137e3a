import { CoreInputError } from '@/core/core-input-error'
import { radians } from '@/core/outline/checked-number'
import { type CutterDimensions, cutterDimensions } from '@/core/outline/cutter-dimensions'
import type { CutterGeometry } from '@/core/tooling'
import { type CheckedFeature, type CheckedWall, checkedFeature } from './checked-feature'
import type { Feature, Obstacle } from './types'

/** How the tool stands against a wall, flutes on the wall and tip on the floor. */
export interface WallPlacement {
  kind: 'wall'
  /** How deep the tip has to go: the wall's depth and a through cut's allowance. */
  tipDepthMm: number
  /** What of `tipDepthMm` is not counted as reach: 0 for a wall, the break-through of a hole that is circled. */
  leadMm: number
  draftDeg: number
  tiltDeg: number
  /** From the wall's foot to the axis, upright [w0]. */
  standOffMm: number
  /** Where the axis passes the height `pivotMm`, from the foot; negative, clear of the wall. */
  axisUMm: number
  /** Radius of the tool: the height the tilt turns about. */
  pivotMm: number
  tanDraft: number
  sinTilt: number
  cosTilt: number
  /** Of draft and tilt together: the wall as the tool sees it. */
  sinWall: number
  cosWall: number
  obstacles: readonly Obstacle[]
}

/** A hole tool on the axis of its hole. */
export interface HolePlacement {
  kind: 'hole'
  /** How deep the tip has to go: the full diameter's depth, the point and the break-through. */
  tipDepthMm: number
  /** What of `tipDepthMm` is not counted as reach: point and break-through. */
  leadMm: number
  roomRadiusMm: number
}

export type Placement = WallPlacement | HolePlacement

/** A point of the part's own frame: u into the wall from its foot, h up from the floor. */
export interface PartPoint {
  uMm: number
  hMm: number
}

/**
 * How a cutter stands in a feature.
 *
 * Assumes the flutes touch the wall and the tip the floor; a form that does not make its own hole circles in it.
 *
 * Units      Millimetres and degrees.
 * Errors     As `cutterDimensions` and `checkedFeature`.
 * Source     The tangent of a circle to a leaning line; worked in test/reference/reach-hand-cases.md.
 *
 * @example
 * placementOf({ kind: 'wall', depthMm: 10 }, { form: 'square', cuttingDiameterMm: 6, lengthOfCutMm: 12, shankDiameterMm: 6, overallLengthMm: 60 }).standOffMm // => 3
 */
export function placementOf(feature: Feature, cutter: CutterGeometry): Placement {
  const dimensions = cutterDimensions(cutter)
  return placement(checkedFeature(feature, dimensions), dimensions)
}

/**
 * As `placementOf`, from a feature and figures already checked.
 *
 * Units      Millimetres and degrees.
 * Errors     None.
 *
 * @example
 * placement(checkedFeature({ kind: 'hole', depthMm: 20, diameterMm: 6 }, cutterDimensions(drillCutter)), cutterDimensions(drillCutter)).roomRadiusMm // => 3
 */
export function placement(feature: CheckedFeature, cutter: CutterDimensions): Placement {
  if (feature.kind === 'wall') return wallPlacement(feature, cutter)
  const leadMm = cutter.pointLengthMm + feature.breakThroughMm
  return { kind: 'hole', tipDepthMm: feature.depthMm + leadMm, leadMm, roomRadiusMm: feature.diameterMm / 2 }
}

function wallPlacement(wall: CheckedWall, cutter: CutterDimensions): WallPlacement {
  const wallRad = radians(wall.draftDeg + wall.tiltDeg)
  const draftRad = radians(wall.draftDeg)
  const tiltRad = radians(wall.tiltDeg)
  const { radiusMm } = cutter
  const standOffMm = wallStandOffMm(radiusMm, cutter.cornerRadiusMm, wall.draftDeg + wall.tiltDeg)
  const ballUMm = (-radiusMm * (1 - Math.sin(draftRad))) / Math.cos(draftRad)
  return {
    kind: 'wall',
    tipDepthMm: wall.depthMm + wall.throughMm,
    leadMm: wall.leadMm,
    draftDeg: wall.draftDeg,
    tiltDeg: wall.tiltDeg,
    standOffMm,
    axisUMm: wall.tiltDeg > 0 ? ballUMm : -standOffMm,
    pivotMm: radiusMm,
    tanDraft: Math.tan(draftRad),
    sinTilt: Math.sin(tiltRad),
    cosTilt: Math.cos(tiltRad),
    sinWall: Math.sin(wallRad),
    cosWall: Math.cos(wallRad),
    obstacles: wall.obstacles,
  }
}

/**
 * Distance from a wall's foot to the tool's axis at the floor, tip on the floor and flutes on the wall [w0].
 *
 * Assumes a tool at rest against the wall with a taper no steeper than it.
 *
 * Units      Millimetres; degrees from upright, 0 to below 90.
 * Result     The radius for a square end; less for a rounded one on a leaning wall.
 * Errors     CoreInputError `wall-out-of-range`.
 *
 * @example
 * wallStandOffMm(3, 3, 30).toFixed(6) // => '1.732051'
 */
export function wallStandOffMm(radiusMm: number, cornerRadiusMm: number, wallDeg: number): number {
  if (!(wallDeg >= 0 && wallDeg < 90))
    throw new CoreInputError(
      'wall-out-of-range',
      'feature.tiltDeg',
      'Draft and tilt together must be below 90°.',
    )
  const wallRad = radians(wallDeg)
  return radiusMm - cornerRadiusMm + (cornerRadiusMm * (1 - Math.sin(wallRad))) / Math.cos(wallRad)
}

/**
 * Where a point of the outline stands in the part's frame, on the wall's side; on the far side for a negative radius.
 *
 * Assumes, for a hole tool, a frame whose wall is the hole's and whose floor is where its full diameter ends.
 *
 * Units      Millimetres.
 *
 * @example
 * toPartFrame(placementOf({ kind: 'wall', depthMm: 10 }, { form: 'square', cuttingDiameterMm: 6, lengthOfCutMm: 12, shankDiameterMm: 6, overallLengthMm: 60 }), 5, 3) // => { uMm: 0, hMm: 5 }
 */
export function toPartFrame(at: Placement, zMm: number, radiusMm: number): PartPoint {
  if (at.kind === 'hole') return { uMm: radiusMm - at.roomRadiusMm, hMm: zMm - at.leadMm }
  return { uMm: partU(at, zMm, radiusMm), hMm: partHeight(at, zMm, radiusMm) }
}

/**
 * The `uMm` of `toPartFrame` on a wall, without making a point.
 *
 * Units      Millimetres.
 *
 * @example
 * partU(placementOf({ kind: 'wall', depthMm: 10 }, ballCutter), 20, 14) // => 11
 */
export function partU(at: WallPlacement, zMm: number, radiusMm: number): number {
  return at.axisUMm - (zMm - at.pivotMm) * at.sinTilt + radiusMm * at.cosTilt
}

/**
 * The `hMm` of `toPartFrame` on a wall, without making a point.
 *
 * Units      Millimetres.
 *
 * @example
 * partHeight(placementOf({ kind: 'wall', depthMm: 10 }, ballCutter), 20, 14) // => 20
 */
export function partHeight(at: WallPlacement, zMm: number, radiusMm: number): number {
  if (at.tiltDeg === 0) return zMm
  return at.pivotMm + (zMm - at.pivotMm) * at.cosTilt + radiusMm * at.sinTilt
}
