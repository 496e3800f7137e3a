import { overlapToleranceMm } from '@/core/outline/types'
import { type CheckPart, widenedStart } from './check-parts'
import type { HolePlacement, Placement, WallPlacement } from './placement'
import type { Obstacle } from './types'

const none = Number.NEGATIVE_INFINITY

/** A line of the widened, lowered outline: `a` from the nose face up. */
export type LineBound = (a0: number, r0: number, a1: number, r1: number) => number

/**
 * What one line of the outline behind the nose asks of the stick-out, wall or hole, obstacles and floor together.
 *
 * Assumes the line widened and lowered by the clearance already. Of a whole outline the largest counts.
 *
 * Units      Millimetres.
 * Result     A function of the line; -Infinity where any stick-out does.
 *
 * @example
 * lineBoundAt(placementOf({ kind: 'wall', depthMm: 25 }, squareCutter))(-0.5, 0, -0.5, 14.5) // => 25.5
 */
export function lineBoundAt(at: Placement): LineBound {
  if (at.kind === 'hole') return (a0, r0, a1, r1) => holeBoundMm(at, a0, r0, a1, r1)
  const edgeRadiusMm = topEdgeRadiusMm(at)
  return (a0, r0, a1, r1) => {
    let boundMm = wallBoundMm(at, edgeRadiusMm, a0, r0, a1, r1)
    if (at.tiltDeg > 0) boundMm = Math.max(boundMm, floorLineBoundMm(at, a0, r0, a1, r1))
    for (const obstacle of at.obstacles)
      boundMm = Math.max(boundMm, obstacleBoundMm(at, obstacle, a0, r0, a1, r1))
    return boundMm
  }
}

/**
 * The most any line behind the nose can ask of the stick-out: a face at the lowered nose itself, over the whole depth.
 *
 * Units      Millimetres.
 * Result     Infinity with tilt, where a wide body asks for more the wider it is.
 *
 * @example
 * mostBoundMm(placementOf({ kind: 'wall', depthMm: 25, obstacles: [{ setbackMm: 5, riseMm: 12 }] }, squareCutter), 0.5) // => 37.5
 */
export function mostBoundMm(at: Placement, clearanceMm: number): number {
  if (at.kind === 'hole') return at.tipDepthMm + clearanceMm
  if (at.tiltDeg > 0) return Number.POSITIVE_INFINITY
  const riseMm = at.obstacles.reduce((most, { riseMm: rise }) => Math.max(most, rise), 0)
  return riseMm + at.tipDepthMm + clearanceMm
}

/**
 * Radius of the widened nose face from which on it asks for `mostBoundMm`, whatever stands behind it.
 *
 * Units      Millimetres.
 * Result     Infinity with tilt, where no radius says so.
 *
 * @example
 * fullDepthRadiusMm(placementOf({ kind: 'wall', depthMm: 25 }, squareCutter)).toFixed(4) // => '1.5875'
 */
export function fullDepthRadiusMm(at: Placement): number {
  if (at.kind === 'hole') return at.roomRadiusMm + overlapToleranceMm
  if (at.tiltDeg > 0) return Number.POSITIVE_INFINITY
  return topEdgeRadiusMm(at) + highestSetbackMm(at) + overlapToleranceMm
}

/** Of the highest obstacles the nearest; 0 where nothing stands above the top face. */
function highestSetbackMm({ obstacles }: WallPlacement): number {
  const highestMm = Math.max(0, ...obstacles.map(({ riseMm }) => riseMm))
  if (highestMm === 0) return 0
  return Math.min(...obstacles.filter(({ riseMm }) => riseMm === highestMm).map(({ setbackMm }) => setbackMm))
}

/**
 * The stick-out that keeps every part behind the nose off the wall, or out of the hole, at the feature's depth.
 *
 * Units      Millimetres.
 * Result     -Infinity where any stick-out does.
 *
 * @example
 * clearanceBoundMm(placementOf({ kind: 'wall', depthMm: 25 }, squareCutter), holderCheckParts(handHolder, null), 0.5) // => 25.5
 */
export function clearanceBoundMm(at: Placement, holderParts: CheckPart[], clearanceMm: number): number {
  if (at.kind === 'hole')
    return largestMm(holderParts, clearanceMm, (a0, r0, a1, r1) => holeBoundMm(at, a0, r0, a1, r1))
  const edgeRadiusMm = topEdgeRadiusMm(at)
  return largestMm(holderParts, clearanceMm, (a0, r0, a1, r1) =>
    wallBoundMm(at, edgeRadiusMm, a0, r0, a1, r1),
  )
}

/**
 * The stick-out that keeps every part behind the nose off the obstacles at the feature's depth.
 *
 * Units      Millimetres.
 * Result     -Infinity where any stick-out does.
 *
 * @example
 * obstaclesBoundMm(placementOf({ kind: 'wall', depthMm: 25, obstacles: [{ setbackMm: 5, riseMm: 12 }] }, squareCutter), holderCheckParts(handHolder, null), 0.5) // => 37.5
 */
export function obstaclesBoundMm(at: WallPlacement, holderParts: CheckPart[], clearanceMm: number): number {
  let boundMm = none
  for (const obstacle of at.obstacles) {
    const ofLine: LineBound = (a0, r0, a1, r1) => obstacleBoundMm(at, obstacle, a0, r0, a1, r1)
    boundMm = Math.max(boundMm, largestMm(holderParts, clearanceMm, ofLine))
  }
  return boundMm
}

/**
 * The stick-out that keeps the far side of a tilted holder off the floor; a spindle only where its width is known.
 *
 * Units      Millimetres.
 * Result     -Infinity without tilt.
 *
 * @example
 * floorBoundMm(placementOf({ kind: 'wall', depthMm: 30, tiltDeg: 30 }, ballCutter), holderCheckParts(handHolder, null), 0.5).toFixed(3) // => '8.407'
 */
export function floorBoundMm(at: WallPlacement, holderParts: CheckPart[], clearanceMm: number): number {
  if (at.tiltDeg === 0) return none
  return largestMm(holderParts, clearanceMm, (a0, r0, a1, r1) => floorLineBoundMm(at, a0, r0, a1, r1))
}

function floorLineBoundMm(at: WallPlacement, a0: number, r0: number, a1: number, r1: number): number {
  return Math.max(floorPointBoundMm(at, a0, r0), floorPointBoundMm(at, a1, r1))
}

function floorPointBoundMm(at: WallPlacement, a: number, r: number): number {
  if (r === Number.POSITIVE_INFINITY) return none
  return at.pivotMm + (r * at.sinTilt - at.pivotMm) / at.cosTilt - a
}

function largestMm(holderParts: CheckPart[], clearanceMm: number, ofLine: LineBound): number {
  let boundMm = none
  for (const part of holderParts)
    for (const line of part.lines) {
      const r0 = widenedStart(line, clearanceMm)
      boundMm = Math.max(
        boundMm,
        ofLine(line.z0 - clearanceMm, r0, line.z1 - clearanceMm, line.r1 + clearanceMm),
      )
    }
  return boundMm
}

/** On a straight line the lesser of the two heights is greatest at an end or where the two meet: at the wall's top edge. */
function wallBoundMm(
  at: WallPlacement,
  edgeRadiusMm: number,
  a0: number,
  r0: number,
  a1: number,
  r1: number,
): number {
  let boundMm = Math.max(neededHeightMm(at, r0) - a0, neededHeightMm(at, r1) - a1)
  const crosses = Math.min(r0, r1) < edgeRadiusMm && Math.max(r0, r1) > edgeRadiusMm + overlapToleranceMm
  if (crosses) {
    const share = r1 === Number.POSITIVE_INFINITY ? 0 : (edgeRadiusMm - r0) / (r1 - r0)
    boundMm = Math.max(boundMm, heightAtDepthMm(at, edgeRadiusMm) - (a0 + share * (a1 - a0)))
  }
  return boundMm
}

/** How high above the tip a point at this radius has to stand: off the wall's line, or out of its top. */
function neededHeightMm(at: WallPlacement, radiusMm: number): number {
  if (radiusMm === Number.POSITIVE_INFINITY) return at.tiltDeg > 0 ? none : at.tipDepthMm
  return Math.min(heightAtWallMm(at, radiusMm), heightAtDepthMm(at, radiusMm))
}

function heightAtWallMm(at: WallPlacement, radiusMm: number): number {
  if (at.tiltDeg > 0) return at.pivotMm + (radiusMm * at.cosWall - at.pivotMm) / at.sinWall
  if (at.tanDraft > 0) return (radiusMm - at.standOffMm) / at.tanDraft
  return radiusMm > at.standOffMm + overlapToleranceMm ? Number.POSITIVE_INFINITY : none
}

function heightAtDepthMm(at: WallPlacement, radiusMm: number): number {
  if (at.tiltDeg === 0) return at.tipDepthMm
  return at.pivotMm + (at.tipDepthMm - at.pivotMm - radiusMm * at.sinTilt) / at.cosTilt
}

/** Radius at which the wall's top edge stands from the tool's axis. */
function topEdgeRadiusMm(at: WallPlacement): number {
  const acrossMm = at.tipDepthMm * at.tanDraft - at.axisUMm
  return acrossMm * at.cosTilt + (at.tiltDeg > 0 ? (at.tipDepthMm - at.pivotMm) * at.sinTilt : 0)
}

function obstacleBoundMm(
  at: WallPlacement,
  { setbackMm, riseMm }: Obstacle,
  a0: number,
  r0: number,
  a1: number,
  r1: number,
): number {
  const clearRadiusMm = at.standOffMm + setbackMm
  if (Math.max(r0, r1) <= clearRadiusMm + overlapToleranceMm) return none
  const meetRadiusMm = clearRadiusMm + at.tipDepthMm * at.tanDraft
  const onEdgeMm =
    obstacleBackMm(at, clearRadiusMm, clearRadiusMm) - alongLineMm(clearRadiusMm, a0, r0, a1, r1)
  let heightMm = Math.max(
    r0 > clearRadiusMm ? obstacleBackMm(at, clearRadiusMm, r0) - a0 : onEdgeMm,
    r1 > clearRadiusMm ? obstacleBackMm(at, clearRadiusMm, r1) - a1 : onEdgeMm,
  )
  if (Math.min(r0, r1) < meetRadiusMm && Math.max(r0, r1) > meetRadiusMm)
    heightMm = Math.max(
      heightMm,
      obstacleBackMm(at, clearRadiusMm, meetRadiusMm) - alongLineMm(meetRadiusMm, a0, r0, a1, r1),
    )
  return riseMm + heightMm
}

/** How far below the top edge the tip may be when a point at this radius is at the obstacle's face. */
function obstacleBackMm(at: WallPlacement, clearRadiusMm: number, radiusMm: number): number {
  return at.tanDraft > 0 ? Math.min(at.tipDepthMm, (radiusMm - clearRadiusMm) / at.tanDraft) : at.tipDepthMm
}

/** Where along a line its radius is this. */
function alongLineMm(radiusMm: number, a0: number, r0: number, a1: number, r1: number): number {
  return r1 === Number.POSITIVE_INFINITY ? a0 : a0 + ((radiusMm - r0) / (r1 - r0)) * (a1 - a0)
}

function holeBoundMm(at: HolePlacement, a0: number, r0: number, a1: number, r1: number): number {
  const room = at.roomRadiusMm
  if (Math.max(r0, r1) <= room + overlapToleranceMm) return none
  if (r0 > room || a0 === a1) return at.tipDepthMm - a0
  return at.tipDepthMm - (a0 + ((room - r0) / (r1 - r0)) * (a1 - a0))
}
