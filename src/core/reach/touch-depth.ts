import { type OutlineArc, overlapToleranceMm } from '@/core/outline/types'
import { type HolePlacement, partHeight, partU, type WallPlacement } from './placement'
import type { Obstacle } from './types'

/**
 * Least height above the floor at which a straight line of the outline stands beyond the wall's line.
 *
 * Assumes the line rises or is a flat face; its far end may be at radius Infinity on a face. An overlap of up to 1e-9 mm
 * is none.
 *
 * Units      Millimetres; z from the tip, radii widened by the clearance already.
 * Result     Infinity where it never touches. May be negative below the floor.
 *
 * @example
 * wallTouchMm(placementOf({ kind: 'wall', depthMm: 10 }, ballCutter), 12, 2, 20, 4) // => 16
 */
export function wallTouchMm(at: WallPlacement, z0: number, r0: number, z1: number, r1: number): number {
  const g0 = beyondWall(at, z0, r0)
  const g1 = r1 === Number.POSITIVE_INFINITY ? r1 : beyondWall(at, z1, r1)
  if (g0 <= overlapToleranceMm && g1 <= overlapToleranceMm) return Number.POSITIVE_INFINITY
  let leastMm = Number.POSITIVE_INFINITY
  if (g0 > 0) leastMm = partHeight(at, z0, r0)
  if (g1 > 0 && r1 !== Number.POSITIVE_INFINITY) leastMm = Math.min(leastMm, partHeight(at, z1, r1))
  if (g0 > 0 === g1 > 0) return leastMm
  if (r1 === Number.POSITIVE_INFINITY) {
    const perRadius = at.cosTilt - at.sinTilt * at.tanDraft
    return Math.min(leastMm, partHeight(at, z0, r0 - g0 / perRadius))
  }
  const share = g0 / (g0 - g1)
  return Math.min(leastMm, partHeight(at, z0 + share * (z1 - z0), r0 + share * (r1 - r0)))
}

function beyondWall(at: WallPlacement, z: number, r: number): number {
  return partU(at, z, r) - partHeight(at, z, r) * at.tanDraft
}

/**
 * Depth at which a straight line of the outline first touches an obstacle, over every height of the tip from the floor to
 * the wall's top edge.
 *
 * Assumes no tilt; the line rises or is a flat face whose far end may be at radius Infinity.
 *
 * Units      Millimetres; the line widened and lowered by the clearance already.
 * Result     0 or more; Infinity where it never touches.
 *
 * @example
 * obstacleTouchMm(placementOf({ kind: 'wall', depthMm: 10 }, ballCutter), { setbackMm: 5, riseMm: 12 }, 20, 0, 20, 14) // => 8
 */
export function obstacleTouchMm(
  at: WallPlacement,
  { setbackMm, riseMm }: Obstacle,
  z0: number,
  r0: number,
  z1: number,
  r1: number,
): number {
  const clearRadiusMm = at.standOffMm + setbackMm
  const radiusAt = (z: number) => (z >= z1 ? r1 : r0 + ((z - z0) / (z1 - z0)) * (r1 - r0))
  if (z0 <= riseMm && Math.max(r0, radiusAt(Math.min(z1, riseMm))) - clearRadiusMm > overlapToleranceMm)
    return 0
  if (z1 <= riseMm) return Number.POSITIVE_INFINITY
  const fromZ = Math.max(z0, riseMm)
  const f0 = (z0 >= riseMm ? r0 : radiusAt(riseMm)) - clearRadiusMm - (fromZ - riseMm) * at.tanDraft
  const f1 = r1 - clearRadiusMm - (z1 - riseMm) * at.tanDraft
  if (f0 <= overlapToleranceMm && f1 <= overlapToleranceMm) return Number.POSITIVE_INFINITY
  if (f0 > 0 || z1 === fromZ) return fromZ - riseMm
  return fromZ + (f0 / (f0 - f1)) * (z1 - fromZ) - riseMm
}

/**
 * As `obstacleTouchMm` for a rounded corner: circle and line cross in closed form.
 *
 * Assumes no tilt; `byMm` is how much the arc is widened and lowered.
 *
 * Units      Millimetres.
 * Result     0 or more; Infinity where it never touches.
 *
 * @example
 * arcObstacleTouchMm(placementOf({ kind: 'wall', depthMm: 10 }, ballCutter), { setbackMm: 0, riseMm: 12 }, cornerArc(3, 0, 3, 3), 0.5) // => 0
 */
export function arcObstacleTouchMm(
  at: WallPlacement,
  obstacle: Obstacle,
  arc: OutlineArc,
  byMm: number,
): number {
  const { setbackMm, riseMm } = obstacle
  const centreZ = arc.centreZMm - byMm
  const centreR = arc.centreRadiusMm + byMm
  const radiusMm = arc.arcRadiusMm
  const fromZ = arc.fromZMm - byMm
  const toZ = arc.toZMm - byMm
  const lowTopZ = Math.min(toZ, riseMm)
  const lowTopR = centreR + Math.sqrt(Math.max(0, radiusMm ** 2 - (centreZ - lowTopZ) ** 2))
  if (fromZ <= riseMm && lowTopR - at.standOffMm - setbackMm > overlapToleranceMm) return 0
  if (toZ <= riseMm) return Number.POSITIVE_INFINITY
  // Angles from the equator down: the arc runs from startRad, low, to endRad, high.
  const draftRad = Math.asin(at.sinWall)
  const angleAt = (z: number) => Math.asin(Math.min(1, Math.max(-1, (centreZ - z) / radiusMm)))
  const startRad = angleAt(Math.max(fromZ, riseMm))
  const endRad = angleAt(toZ)
  const overlapMm = (centreR - at.standOffMm - setbackMm) * at.cosWall - (centreZ - riseMm) * at.sinWall
  const deepestRad = Math.min(startRad, Math.max(endRad, draftRad))
  if (overlapMm + radiusMm * Math.cos(deepestRad - draftRad) <= overlapToleranceMm * at.cosWall)
    return Number.POSITIVE_INFINITY
  const enterRad = draftRad + Math.acos(Math.min(1, Math.max(-1, -overlapMm / radiusMm)))
  return Math.max(0, centreZ - radiusMm * Math.sin(Math.min(startRad, enterRad)) - riseMm)
}

/**
 * Height above the tip at which a straight line of the outline is first wider than its hole.
 *
 * Units      Millimetres; radii widened by the clearance already.
 * Result     Infinity where it never is.
 *
 * @example
 * holeTouchMm(placementOf({ kind: 'hole', depthMm: 20, diameterMm: 6 }, drillCutter), 10, 2, 20, 4) // => 15
 */
export function holeTouchMm(at: HolePlacement, z0: number, r0: number, z1: number, r1: number): number {
  if (Math.max(r0, r1) <= at.roomRadiusMm + overlapToleranceMm) return Number.POSITIVE_INFINITY
  if (r0 > at.roomRadiusMm || z0 === z1) return z0
  return z0 + ((at.roomRadiusMm - r0) / (r1 - r0)) * (z1 - z0)
}
