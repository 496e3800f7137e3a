import { defaultReachSettings, type ReachRequest } from '@/core/reach/types'
import type { CutterGeometry, HolderGeometry } from '@/core/tooling'

/** The holder of the hand cases: gauge length 100, a nut 28 in diameter and 18 long, carried up as holder. */
export const handHolder: HolderGeometry = {
  gaugeLengthMm: 100,
  boreDepthMm: 40,
  minimumGripMm: 20,
  segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 28 }],
}

/** An eighth-inch square end mill whose shank begins where the length of cut ends. */
export const squareCutter: CutterGeometry = {
  form: 'square',
  cuttingDiameterMm: 3.175,
  lengthOfCutMm: 12.7,
  fluteLengthMm: 12.7,
  shankDiameterMm: 3.175,
  overallLengthMm: 38.1,
  substrate: 'carbide',
}

/** The same with a neck. */
export const neckedCutter: CutterGeometry = {
  ...squareCutter,
  lengthOfCutMm: 6.35,
  fluteLengthMm: 6.35,
  neckDiameterMm: 3,
  reachLengthMm: 38.1,
  overallLengthMm: 76.2,
}

/** A 6 mm ball. */
export const ballCutter: CutterGeometry = {
  form: 'ball',
  cuttingDiameterMm: 6,
  lengthOfCutMm: 12,
  fluteLengthMm: 12,
  shankDiameterMm: 6,
  overallLengthMm: 80,
  substrate: 'carbide',
}

/** A 6 mm drill with a 118 degree point. */
export const drillCutter: CutterGeometry = {
  form: 'drill',
  cuttingDiameterMm: 6,
  pointAngleDeg: 118,
  lengthOfCutMm: 40,
  fluteLengthMm: 45,
  shankDiameterMm: 6,
  overallLengthMm: 90,
  substrate: 'carbide',
}

/**
 * A request on the hand cases' holder, with what is given laid over it.
 */
export function reachRequest(given: Partial<ReachRequest>): ReachRequest {
  return {
    feature: { kind: 'wall', depthMm: 10 },
    cutter: squareCutter,
    holder: handHolder,
    settings: defaultReachSettings,
    ...given,
  }
}
