import { notNegative, positive } from '@/core/outline/checked-number'
import { engagementRad, meanChipMm } from './engagement'
import { specificForceNPerMm2 } from './specific-force'
import type { WorkMaterial } from './work-materials'

/** Revolutions a minute and kilowatts to newton metres: 60 000/(2π). */
export const torqueFactor = 30_000 / Math.PI

export interface MillingCut {
  /** Of what cuts. */
  diameterMm: number
  fluteCount: number
  /** [ap] */
  depthOfCutMm: number
  /** [ae] */
  stepoverMm: number
  /** [fz] As programmed. */
  feedPerToothMm: number
}

export interface MillingForce {
  meanChipMm: number
  specificForceNPerMm2: number
  /** How many teeth are in the cut on the average. */
  teethInCut: number
  /** [Fc] In the cutting direction, all teeth in the cut together, on the average. */
  cuttingForceN: number
  /** What bends the tool: at least one whole tooth's force, and the radial share of it at right angles. */
  sideLoadN: number
  torqueNm: number
}

/**
 * Forces of a side-milling cut, upright edges: kc·ap·hm a tooth, kc after Kienzle at the mean chip thickness.
 *
 * Torque comes of the teeth in the cut on the average, z·φ/2π. The side load counts at least one whole tooth, which is
 * in the cut at some moment however narrow it is, and adds the radial share as a force at right angles, so that it is
 * Fc·√(1 + share²). Helix, run-out, wear and chatter are left out: an estimate.
 *
 * Shapes     `fluteCount` whole; `radialShare` radial over cutting force.
 * Units      Millimetres; newtons, newton metres.
 * Result     More than 0.
 * Errors     As meanChipMm; `not-positive` at `depthOfCutMm`, `fluteCount`; `negative` at `radialShare`.
 * Source     test/reference/cutting/cutting-force.md, section 3.
 * Tolerance  The printed power to its last digit, the derived case to its digits.
 *
 * @example
 * millingForce({ diameterMm: 12, fluteCount: 4, depthOfCutMm: 6, stepoverMm: 3, feedPerToothMm: 0.06 }, { unitForceNPerMm2: 1500, thicknessExponent: 0.22 }, 0.4).torqueNm.toFixed(4) // => '2.2534'
 */
export function millingForce(
  cut: MillingCut,
  material: Pick<WorkMaterial, 'unitForceNPerMm2' | 'thicknessExponent'>,
  radialShare: number,
): MillingForce {
  const depthMm = positive(cut.depthOfCutMm, 'depthOfCutMm', 'The depth of cut')
  const flutes = positive(cut.fluteCount, 'fluteCount', 'The number of flutes')
  const share = notNegative(radialShare, 'radialShare', 'The radial share')
  const chipMm = meanChipMm(cut.feedPerToothMm, cut.stepoverMm, cut.diameterMm)
  const specificForce = specificForceNPerMm2(material, chipMm)
  const teethInCut = (flutes * engagementRad(cut.stepoverMm, cut.diameterMm)) / (2 * Math.PI)
  const toothForceN = specificForce * depthMm * chipMm
  const cuttingForceN = toothForceN * teethInCut
  return {
    meanChipMm: chipMm,
    specificForceNPerMm2: specificForce,
    teethInCut,
    cuttingForceN,
    sideLoadN: toothForceN * Math.max(1, teethInCut) * Math.hypot(1, share),
    torqueNm: (cuttingForceN * cut.diameterMm) / 2000,
  }
}

/**
 * Power at a torque and a spindle speed: P = M·n/9549.3.
 *
 * Units      Newton metres and revolutions a minute in, kilowatts out.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `negative`.
 * Source     Definition of power.
 *
 * @example
 * powerAtTorqueKw(9549.296585513720, 1).toFixed(9) // => '1.000000000'
 */
export function powerAtTorqueKw(torqueNm: number, spindleRpm: number): number {
  return (
    (notNegative(torqueNm, 'torqueNm', 'The torque') *
      positive(spindleRpm, 'spindleRpm', 'The spindle speed')) /
    torqueFactor
  )
}
