import type { CutterForm, CutterGeometry } from '../tooling'

/** Forms that work a straight wall from its foot; the rest are for holes, faces, slots, threads and edges. */
export const pocketForms = ['square', 'cornerRadius', 'ball'] as const satisfies readonly CutterForm[]

/** Lengths that differ by less are the same. */
export const usableDepthRoundingMm = 1e-6

export interface UsableDepth {
  depthMm: number
  /** What ends it: the neck's end, or the length of cut. */
  endsWith: 'neck' | 'lengthOfCut'
}

/**
 * How deep a straight wall a cutter can work before something of the cutter itself rubs, the holder left aside: to the
 * end of its neck where it has one that keeps the clearance and begins where the length of cut ends, else its length of
 * cut. Null where neither length is known.
 *
 * A reading of the catalogue, cautious in that a run-out counts as thick as the flutes and so does a thinner shank: both
 * may go deeper, which the reach check answers.
 *
 * Units      Millimetres.
 * Source     reach.md, sections 1 and 3: run-out, neck and shank keep the shank clearance from the wall.
 *
 * @example
 * usableDepth({ form: 'square', cuttingDiameterMm: 6, lengthOfCutMm: 8, neckDiameterMm: 5.8, reachLengthMm: 20, shankDiameterMm: 6, overallLengthMm: 60 }, 0.025) // => { depthMm: 20, endsWith: 'neck' }
 */
export function usableDepth(cutter: CutterGeometry, shankClearanceMm: number): UsableDepth | null {
  const lengthMm = cutter.lengthOfCutMm ?? cutter.fluteLengthMm ?? null
  if (lengthMm === null) return null
  const { neckDiameterMm, reachLengthMm } = cutter
  const runOutEndMm = cutter.fluteLengthMm ?? lengthMm
  const isRelieved =
    neckDiameterMm != null &&
    reachLengthMm != null &&
    (cutter.neckTaperHalfAngleDeg ?? 0) === 0 &&
    neckDiameterMm + 2 * shankClearanceMm <= cutter.cuttingDiameterMm + usableDepthRoundingMm &&
    runOutEndMm <= lengthMm + usableDepthRoundingMm
  return isRelieved && reachLengthMm > lengthMm
    ? { depthMm: reachLengthMm, endsWith: 'neck' }
    : { depthMm: lengthMm, endsWith: 'lengthOfCut' }
}
