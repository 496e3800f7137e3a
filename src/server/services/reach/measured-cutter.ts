import type { CutterGeometry } from '@/core/tooling'

/** What may be measured on one tagged piece. */
export interface MeasuredSizes {
  cuttingDiameterMm: number | null
  cornerRadiusMm: number | null
  lengthOfCutMm: number | null
  reachLengthMm: number | null
  overallLengthMm: number | null
}

/**
 * The catalogue's cutter as one piece of it measures.
 *
 * A ground-back cutter keeps its run-out: the fluted length changes by as much as the length of cut did, and never
 * passes the piece's own end.
 */
export function measuredCutter(catalogue: CutterGeometry, piece: MeasuredSizes): CutterGeometry {
  const measured = {
    ...catalogue,
    cuttingDiameterMm: piece.cuttingDiameterMm ?? catalogue.cuttingDiameterMm,
    cornerRadiusMm: piece.cornerRadiusMm ?? catalogue.cornerRadiusMm,
    lengthOfCutMm: piece.lengthOfCutMm ?? catalogue.lengthOfCutMm,
    reachLengthMm: piece.reachLengthMm ?? catalogue.reachLengthMm,
    overallLengthMm: piece.overallLengthMm ?? catalogue.overallLengthMm,
  }
  if (piece.lengthOfCutMm === null || catalogue.fluteLengthMm == null) return measured
  const runOutMm = catalogue.lengthOfCutMm == null ? 0 : catalogue.fluteLengthMm - catalogue.lengthOfCutMm
  const fluteLengthMm = Math.min(measured.overallLengthMm, piece.lengthOfCutMm + runOutMm)
  return { ...measured, fluteLengthMm }
}
