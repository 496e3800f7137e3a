import { CoreInputError } from '@/core/core-input-error'
import { positive, radians } from '@/core/outline/checked-number'
import { specificForceNPerMm2 } from './specific-force'
import type { WorkMaterial } from './work-materials'

/** Axial force over D/2·f·kc·sin κ, as a maker prints it; others print 0.5 to 0.7. */
const thrustShare = 0.63

/**
 * Torque of drilling into the solid: M = f·kc·D²/8000.
 *
 * Each lip takes half the feed over half the diameter; a worn drill and packed chips ask for more. An estimate.
 *
 * Units      Millimetres, millimetres a revolution, N/mm²; newton metres.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`.
 * Source     A maker's printed example, 20 Nm: test/reference/cutting/drilling.md.
 * Tolerance  To the digits printed.
 *
 * @example
 * drillingTorqueNm(22, 0.15, 2200).toFixed(0) // => '20'
 */
export function drillingTorqueNm(
  diameterMm: number,
  feedPerRevolutionMm: number,
  specificForce: number,
): number {
  return (
    (positive(feedPerRevolutionMm, 'feedPerRevolutionMm', 'The feed a revolution') *
      positive(specificForce, 'specificForceNPerMm2', 'The specific cutting force') *
      positive(diameterMm, 'diameterMm', 'The drill diameter') ** 2) /
    8000
  )
}

/**
 * Thrust of drilling into the solid: F = 0.63·D/2·f·kc·sin κ, κ half the point angle.
 *
 * An estimate: a plain chisel edge pushes up to twice as much as a thinned one.
 *
 * Units      Millimetres, degrees, N/mm²; newtons.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `out-of-range` for a point over 180.
 * Source     A maker's printed example, 2286 N: test/reference/cutting/drilling.md.
 * Tolerance  To the digits printed, which were cut off there, not rounded.
 *
 * @example
 * Math.floor(drillingThrustN(22, 0.15, 2200, 180)) // => 2286
 */
export function drillingThrustN(
  diameterMm: number,
  feedPerRevolutionMm: number,
  specificForce: number,
  pointAngleDeg: number,
): number {
  return (
    ((thrustShare * positive(diameterMm, 'diameterMm', 'The drill diameter')) / 2) *
    positive(feedPerRevolutionMm, 'feedPerRevolutionMm', 'The feed a revolution') *
    positive(specificForce, 'specificForceNPerMm2', 'The specific cutting force') *
    Math.sin(radians(pointAngle(pointAngleDeg) / 2))
  )
}

export interface DrillingForce {
  chipMm: number
  specificForceNPerMm2: number
  torqueNm: number
  thrustN: number
}

/**
 * Torque and thrust of a drill, kc after Kienzle at the thickness of its chips, f/2·sin κ.
 *
 * Units      Millimetres, degrees; newton metres, newtons.
 * Errors     As drillingTorqueNm and drillingThrustN.
 * Source     test/reference/cutting/drilling.md.
 *
 * @example
 * drillingForce({ diameterMm: 10, feedPerRevolutionMm: 0.2, pointAngleDeg: 180 }, { unitForceNPerMm2: 1700, thicknessExponent: 0.24 }).specificForceNPerMm2.toFixed(1) // => '2954.3'
 */
export function drillingForce(
  cut: { diameterMm: number; feedPerRevolutionMm: number; pointAngleDeg: number },
  material: Pick<WorkMaterial, 'unitForceNPerMm2' | 'thicknessExponent'>,
): DrillingForce {
  const feedMm = positive(cut.feedPerRevolutionMm, 'feedPerRevolutionMm', 'The feed a revolution')
  const chipMm = (feedMm / 2) * Math.sin(radians(pointAngle(cut.pointAngleDeg) / 2))
  const specificForce = specificForceNPerMm2(material, chipMm)
  return {
    chipMm,
    specificForceNPerMm2: specificForce,
    torqueNm: drillingTorqueNm(cut.diameterMm, feedMm, specificForce),
    thrustN: drillingThrustN(cut.diameterMm, feedMm, specificForce, cut.pointAngleDeg),
  }
}

function pointAngle(angleDeg: number): number {
  const givenDeg = positive(angleDeg, 'pointAngleDeg', 'The point angle')
  if (givenDeg <= 180) return givenDeg
  throw new CoreInputError('out-of-range', 'pointAngleDeg', 'The point angle is more than 180.')
}
