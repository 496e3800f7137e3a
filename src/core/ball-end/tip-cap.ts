import { requireBetween, requireLength } from './checks'

/** A ball end in the cut. */
export interface BallCut {
  /** [DC] */
  cuttingDiameterMm: number
  /** [ap] Normal to the surface. */
  depthOfCutMm: number
  /** Between the tool axis and the surface normal, 0 to 90. */
  tiltDeg: number
}

const degreesPerRadian = 180 / Math.PI

/**
 * Half the angle, seen from the ball's centre, of the cap that stands in the cut: ψ = arccos(1 − 2·ap/DC).
 *
 * It is also the tilt beyond which the dead tip is out of the cut. At half the diameter and deeper the whole half ball
 * cuts and the answer is 90: no tilt lifts the tip out.
 *
 * Units      Millimetres in, degrees out.
 * Result     More than 0, at most 90.
 * Errors     CoreInputError `not-finite`, `not-positive`, `too-large`.
 * Source     A circle cut by a chord; test/reference/ball-end/ball-end.md, section 2.
 * Tolerance  Within 1e-9 degrees (taken from both legs, so a cut of a thousandth keeps its digits).
 *
 * @example
 * capHalfAngleDeg(10, 5) // => 90
 * capHalfAngleDeg(10, 8) // => 90
 */
export function capHalfAngleDeg(cuttingDiameterMm: number, depthOfCutMm: number): number {
  requireLength(cuttingDiameterMm, 'cuttingDiameterMm', 'The cutting diameter')
  requireLength(depthOfCutMm, 'depthOfCutMm', 'The depth of cut')
  const [across, up] = capLegsMm(cuttingDiameterMm, depthOfCutMm)
  return Math.atan2(across, up) * degreesPerRadian
}

/**
 * Largest diameter of the ball that cuts: the one that sets the cutting speed.
 *
 * DC·sin(min(β + ψ, 90°)); with the axis normal to the surface 2·√(ap(DC − ap)). Deeper than half the diameter it is
 * the diameter itself.
 *
 * Assumes the tool leans so that the cap lies to the outside of the tip, and ap is measured normal to the surface.
 *
 * Units      Millimetres, degrees.
 * Result     More than 0, at most DC.
 * Errors     CoreInputError `not-finite`, `not-positive`, `too-large`, `out-of-range` (tilt outside 0 to 90).
 * Source     Printed by five makers for β = 0, with tables: test/reference/ball-end/ball-end.md, section 1. With tilt
 *            plane geometry alone; no printed example was found.
 * Tolerance  The printed tables to their last digit.
 *
 * @example
 * largestEffectiveDiameterMm({ cuttingDiameterMm: 10, depthOfCutMm: 1, tiltDeg: 0 }) // => 6
 * largestEffectiveDiameterMm({ cuttingDiameterMm: 10, depthOfCutMm: 1, tiltDeg: 60 }) // => 10
 */
export function largestEffectiveDiameterMm(cut: BallCut): number {
  const { across, up, sin, cos } = checkedCap(cut)
  return cos * up <= sin * across ? cut.cuttingDiameterMm : sin * up + cos * across
}

/**
 * Smallest diameter of the ball that cuts; 0 while the dead tip is in the cut.
 *
 * DC·sin(max(β − ψ, 0)). At 0 the tip rubs instead of cutting: it has no speed.
 *
 * Units      Millimetres, degrees.
 * Result     0 to DC, never more than the largest.
 * Errors     As largestEffectiveDiameterMm.
 * Source     test/reference/ball-end/ball-end.md, section 2: derived.
 * Tolerance  Within 1e-9 mm.
 *
 * @example
 * smallestEffectiveDiameterMm({ cuttingDiameterMm: 10, depthOfCutMm: 1, tiltDeg: 0 }) // => 0
 * smallestEffectiveDiameterMm({ cuttingDiameterMm: 10, depthOfCutMm: 1, tiltDeg: 90 }) // => 8
 */
export function smallestEffectiveDiameterMm(cut: BallCut): number {
  const { across, up, sin, cos } = checkedCap(cut)
  return isTipInCut(cut) ? 0 : Math.max(0, sin * up - cos * across)
}

/**
 * Whether the dead tip, which has no cutting speed, is in the cut: β ≤ ψ.
 *
 * Errors     As largestEffectiveDiameterMm.
 *
 * @example
 * isTipInCut({ cuttingDiameterMm: 10, depthOfCutMm: 1, tiltDeg: 36 }) // => true
 * isTipInCut({ cuttingDiameterMm: 10, depthOfCutMm: 1, tiltDeg: 37 }) // => false
 */
export function isTipInCut(cut: BallCut): boolean {
  return cut.tiltDeg <= capHalfAngleDeg(cut.cuttingDiameterMm, cut.depthOfCutMm)
}

/**
 * Angle between tool axis and surface normal of a tool led by one angle and tilted by another about axes at right
 * angles: cos β = cos α · cos γ.
 *
 * Units      Degrees, each 0 to 90.
 * Result     0 to 90, at least the larger of the two.
 * Errors     CoreInputError `not-finite`, `out-of-range`.
 * Source     Spherical geometry; the hand case of lead 30 and tilt 20, 35.531°, in test/reference/ball-end.
 * Tolerance  Within 1e-9 degrees (taken from sines, so small angles keep their digits).
 *
 * @example
 * combinedTiltDeg(0, 0) // => 0
 * combinedTiltDeg(90, 20) // => 90
 */
export function combinedTiltDeg(leadDeg: number, tiltDeg: number): number {
  requireBetween(leadDeg, 0, 90, 'leadDeg', 'The lead')
  requireBetween(tiltDeg, 0, 90, 'tiltDeg', 'The tilt')
  const lead = leadDeg / degreesPerRadian
  const tilt = tiltDeg / degreesPerRadian
  const sin = Math.hypot(Math.sin(lead), Math.cos(lead) * Math.sin(tilt))
  return Math.atan2(sin, Math.cos(lead) * Math.cos(tilt)) * degreesPerRadian
}

/** DC·sin ψ and DC·cos ψ; from half the diameter on the whole half ball. */
function capLegsMm(cuttingDiameterMm: number, depthOfCutMm: number): [across: number, up: number] {
  if (depthOfCutMm >= cuttingDiameterMm / 2) return [cuttingDiameterMm, 0]
  return [
    2 * Math.sqrt(depthOfCutMm * (cuttingDiameterMm - depthOfCutMm)),
    cuttingDiameterMm - 2 * depthOfCutMm,
  ]
}

function checkedCap({ cuttingDiameterMm, depthOfCutMm, tiltDeg }: BallCut) {
  requireLength(cuttingDiameterMm, 'cuttingDiameterMm', 'The cutting diameter')
  requireLength(depthOfCutMm, 'depthOfCutMm', 'The depth of cut')
  requireBetween(tiltDeg, 0, 90, 'tiltDeg', 'The tilt')
  const [across, up] = capLegsMm(cuttingDiameterMm, depthOfCutMm)
  const tilt = tiltDeg / degreesPerRadian
  // 90° is no whole number of radians: its cosine must be none all the same.
  return { across, up, sin: Math.sin(tilt), cos: tiltDeg === 90 ? 0 : Math.cos(tilt) }
}
