import type { CutterGeometry } from '../tooling'

/** Four places of an inch, twice rounded: a 3/16 ball is printed as .1875 with R .0938, 0.0013 mm over its half. */
const printedRoundingMm = 0.01

/**
 * A cutter with its ball's radius at exactly half the cutting diameter, where a catalogue printed it rounded.
 *
 * A radius further off is left for `cutterProblems` to refuse; any other form is left alone.
 *
 * Units      Millimetres.
 * Errors     None.
 * Source     Common practice of inch catalogues, which print four places.
 * Tolerance  0.01 mm.
 *
 * @example
 * withPrintedBallRadius({ form: 'ball', cuttingDiameterMm: 4.7625, cornerRadiusMm: 2.38252 }).cornerRadiusMm // => 2.38125
 * withPrintedBallRadius({ form: 'ball', cuttingDiameterMm: 6, cornerRadiusMm: 2 }).cornerRadiusMm // => 2
 */
export function withPrintedBallRadius<
  Cutter extends Pick<CutterGeometry, 'form' | 'cuttingDiameterMm' | 'cornerRadiusMm'>,
>(cutter: Cutter): Cutter {
  if (cutter.form !== 'ball' || cutter.cornerRadiusMm == null) return cutter
  const radiusMm = cutter.cuttingDiameterMm / 2
  const isRounded = Math.abs(cutter.cornerRadiusMm - radiusMm) <= printedRoundingMm
  return isRounded ? { ...cutter, cornerRadiusMm: radiusMm } : cutter
}
