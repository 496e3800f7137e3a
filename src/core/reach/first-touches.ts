import { overlapToleranceMm, type ToolPart } from '@/core/outline/types'
import { type CheckPart, widenedStart } from './check-parts'
import type { Placement, WallPlacement } from './placement'
import { arcObstacleTouchMm, holeTouchMm, obstacleTouchMm, wallTouchMm } from './touch-depth'
import type { Clearances, FirstTouch } from './types'

/**
 * Depth of the feature at which every part of the assembly first touches, at one stick-out.
 *
 * Assumes each part is asked alone: what stops the tool is the least of them.
 *
 * Units      Millimetres.
 * Result     Parts from the tip up; null where a part never touches; never below 0.
 * Source     Definitions worked by hand in test/reference/reach-hand-cases.md.
 * Tolerance  An overlap of up to 1e-9 mm is none.
 *
 * @example
 * firstTouches(placementOf({ kind: 'wall', depthMm: 10 }, { form: 'square', cuttingDiameterMm: 6, lengthOfCutMm: 12, fluteLengthMm: 12, shankDiameterMm: 6, overallLengthMm: 60 }), cutterCheckParts({ form: 'square', cuttingDiameterMm: 6, lengthOfCutMm: 12, fluteLengthMm: 12, shankDiameterMm: 6, overallLengthMm: 60 }), [], 30, { shankMm: 0.025, holderMm: 0.5 }) // => [{ part: 'flute', depthMm: null }, { part: 'shank', depthMm: 12 }]
 */
export function firstTouches(
  at: Placement,
  cutterParts: CheckPart[],
  holderParts: CheckPart[],
  stickOutMm: number,
  clearances: Clearances,
): FirstTouch[] {
  const ofCutter = cutterParts.map((part) => firstTouch(at, part, 0, clearances))
  return ofCutter.concat(holderParts.map((part) => firstTouch(at, part, stickOutMm, clearances)))
}

function firstTouch(at: Placement, part: CheckPart, liftMm: number, clearances: Clearances): FirstTouch {
  const tipDepthMm = partTipDepthMm(at, part, liftMm, clearances)
  return {
    part: part.part,
    depthMm: Number.isFinite(tipDepthMm) ? Math.max(0, tipDepthMm - at.leadMm) : null,
  }
}

/** The part that touches first, and the depth of the tip where it does. */
export interface LeastTouch {
  part: ToolPart | null
  tipDepthMm: number
}

/**
 * The part that touches first among some, the lower one where two touch together.
 *
 * Units      Millimetres.
 * Result     Depth of the tip, not of the feature: a hole tool's point counts. Infinity and null where none touches.
 *
 * @example
 * leastTouch(placementOf({ kind: 'wall', depthMm: 25 }, squareCutter), cutterCheckParts(squareCutter), 0, { shankMm: 0.025, holderMm: 0.5 }) // => { part: 'shank', tipDepthMm: 12.7 }
 */
export function leastTouch(
  at: Placement,
  parts: CheckPart[],
  liftMm: number,
  clearances: Clearances,
): LeastTouch {
  const least: LeastTouch = { part: null, tipDepthMm: Number.POSITIVE_INFINITY }
  for (const part of parts) {
    const tipDepthMm = partTipDepthMm(at, part, liftMm, clearances)
    if (tipDepthMm < least.tipDepthMm) {
      least.part = part.part
      least.tipDepthMm = tipDepthMm
    }
  }
  return least
}

/**
 * Depth of the tip at which one part first touches.
 *
 * Assumes `liftMm` raises the part: 0 for a cutter's, the stick-out for one behind the nose.
 *
 * Units      Millimetres.
 * Result     0 or more; Infinity where it never touches.
 *
 * @example
 * partTipDepthMm(placementOf({ kind: 'wall', depthMm: 25 }, squareCutter), holderCheckParts(handHolder, null)[0], 20, { shankMm: 0.025, holderMm: 0.5 }) // => 19.5
 */
export function partTipDepthMm(
  at: Placement,
  part: CheckPart,
  liftMm: number,
  clearances: Clearances,
): number {
  const { clearance } = part
  const outMm = clearance === 'holder' ? clearances.holderMm : clearances.shankMm
  const upMm = clearance === 'holder' ? liftMm - clearances.holderMm : liftMm
  let leastMm = Number.POSITIVE_INFINITY
  if (clearance !== 'flute')
    for (const line of part.lines) {
      const r0 = widenedStart(line, outMm)
      const [z0, z1, r1] = [line.z0 + upMm, line.z1 + upMm, line.r1 + outMm]
      leastMm = Math.min(
        leastMm,
        at.kind === 'wall' ? wallTouchMm(at, z0, r0, z1, r1) : holeTouchMm(at, z0, r0, z1, r1),
      )
    }
  if (at.kind === 'wall' && at.obstacles.length > 0)
    leastMm = Math.min(leastMm, obstaclesTouchMm(at, part, liftMm, clearances.holderMm))
  return Math.max(0, leastMm)
}

/** Everything, the length of cut too, keeps the holder's clearance from what stands on the part. */
function obstaclesTouchMm(at: WallPlacement, part: CheckPart, liftMm: number, clearanceMm: number): number {
  const upMm = liftMm - clearanceMm
  let leastMm = Number.POSITIVE_INFINITY
  for (const obstacle of at.obstacles)
    for (const line of part.lines) {
      const touchMm = line.arc
        ? arcObstacleTouchMm(at, obstacle, line.arc, clearanceMm)
        : obstacleTouchMm(
            at,
            obstacle,
            line.z0 + upMm,
            widenedStart(line, clearanceMm),
            line.z1 + upMm,
            line.r1 + clearanceMm,
          )
      leastMm = Math.min(leastMm, touchMm)
    }
  return leastMm
}

/**
 * The part of a tilted cutter whose far side stands in the floor.
 *
 * Assumes the length of cut stays off it: a ball on the floor does.
 *
 * Result     null where none does, as always without tilt.
 *
 * @example
 * partInFloor(placementOf({ kind: 'wall', depthMm: 25, tiltDeg: 60 }, ballCutter), cutterCheckParts({ ...ballCutter, shankDiameterMm: 20 }), { shankMm: 0.025, holderMm: 0.5 }) // => 'shank'
 */
export function partInFloor(
  at: Placement,
  cutterParts: CheckPart[],
  clearances: Clearances,
): ToolPart | null {
  if (at.kind === 'hole' || at.tiltDeg === 0) return null
  const isInFloor = (z: number, r: number) =>
    farSideHeightMm(at, z, r + clearances.shankMm) < -overlapToleranceMm
  const found = cutterParts.find(
    ({ clearance, lines }) =>
      clearance === 'cutter' && lines.some(({ z0, r0, z1, r1 }) => isInFloor(z0, r0) || isInFloor(z1, r1)),
  )
  return found?.part ?? null
}

/**
 * How high above the floor the far side of a tilted tool stands, at one point of its outline.
 *
 * Units      Millimetres; the radius widened by the clearance already.
 * Result     Below 0 in the floor.
 *
 * @example
 * farSideHeightMm({ ...placementOf({ kind: 'wall', depthMm: 25, tiltDeg: 30 }, ballCutter), cosTilt: 1, sinTilt: 0.5 }, 20, 14) // => 13
 */
export function farSideHeightMm(at: WallPlacement, zMm: number, radiusMm: number): number {
  return at.pivotMm + (zMm - at.pivotMm) * at.cosTilt - radiusMm * at.sinTilt
}
