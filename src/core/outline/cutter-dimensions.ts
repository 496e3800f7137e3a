import { withPrintedBallRadius } from '@/core/catalogue/printed-ball-radius'
import { CoreInputError } from '@/core/core-input-error'
import type { CutterForm, CutterGeometry } from '@/core/tooling'
import { notNegativeOr, positive, positiveOrNull, radians, tangent } from './checked-number'
import { overlapToleranceMm } from './types'

/** What was not given and is taken for granted; the answer says so. */
export type CutterAssumption =
  | 'lengthOfCut'
  | 'fluteLength'
  | 'transitionAngle'
  | 'neckWithoutLength'
  | 'cornerRadiusNotUsed'

export interface NeckDimensions {
  startRadiusMm: number
  endRadiusMm: number
  /** [LU] Where the neck ends. */
  endZMm: number
  /** Where the transition ends and full shank begins; `endZMm` without a transition. */
  fullShankZMm: number
}

/** A cutter with every figure checked and every gap filled. */
export interface CutterDimensions {
  form: CutterForm
  radiusMm: number
  cornerRadiusMm: number
  taperHalfAngleDeg: number
  /** Height of the point of a drill, or of the lead of a reamer or tap [PL]. */
  pointLengthMm: number
  /** Radius at the tip and slope of a drill's point or a chamfer; slope Infinity where there is none. */
  tipRadiusMm: number
  pointSlope: number
  lengthOfCutMm: number
  fluteLengthMm: number
  /** Where the run-out ends; more than `radiusMm` on a taper. */
  fluteEndRadiusMm: number
  neck: NeckDimensions | null
  shankRadiusMm: number
  overallLengthMm: number
  /** The tip is a half ball: the only kind that may be tilted. */
  hasSphericalTip: boolean
  assumptions: CutterAssumption[]
}

const roundedForms: readonly CutterForm[] = ['cornerRadius', 'ball', 'tapered']
const pointedForms: readonly CutterForm[] = ['drill', 'reamer', 'tap', 'chamfer']

/** Between neck and shank, a side, where none was given. */
export const usualTransitionAngleDeg = 45

/** Printed radii are rounded to a thousandth; a half diameter so rounded is still a half diameter. */
const printedRoundingMm = 0.001

/**
 * The cutter's figures with gaps filled and impossible ones refused.
 *
 * Assumes a length of cut given alone is followed by a run-out of half the diameter, or by none where a neck follows;
 * a fluted length given alone is read as the length of cut; a transition rises at 45 degrees. Each is reported in
 * `assumptions`. A corner radius within 0.001 mm of half the diameter is half the diameter.
 *
 * Units      Millimetres; angles in degrees, a side.
 * Result     Radii, not diameters. `fluteLengthMm` is at least `lengthOfCutMm` and at most the overall length.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `negative`, `length-of-cut-missing`,
 *            `corner-radius-over-half`, `corner-radius-missing`, `corner-radius-not-half`, `corner-radius-on-square`, `taper-out-of-range`, `neck-taper-out-of-range`,
 *            `transition-out-of-range`, `point-angle-out-of-range`, `point-longer-than-cut`, `tip-over-diameter`,
 *            `flutes-shorter-than-cut`, `flutes-longer-than-cutter`, `reach-length-longer-than-cutter`.
 *
 * @example
 * cutterDimensions({ form: 'square', cuttingDiameterMm: 6, lengthOfCutMm: 12, shankDiameterMm: 6, overallLengthMm: 60 }).fluteLengthMm // => 15
 */
export function cutterDimensions(cutter: CutterGeometry): CutterDimensions {
  const assumptions: CutterAssumption[] = []
  const radiusMm = positive(cutter.cuttingDiameterMm, 'cutter.cuttingDiameterMm', 'The cutting diameter') / 2
  const shankRadiusMm = positive(cutter.shankDiameterMm, 'cutter.shankDiameterMm', 'The shank diameter') / 2
  const overallLengthMm = positive(cutter.overallLengthMm, 'cutter.overallLengthMm', 'The overall length')
  const cornerRadiusMm = cornerRadius(cutter, radiusMm, assumptions)
  const lengths = fluteLengths(cutter, overallLengthMm, assumptions)
  const taperHalfAngleDeg = taper(cutter)
  return {
    form: cutter.form,
    radiusMm,
    cornerRadiusMm,
    taperHalfAngleDeg,
    ...point(cutter, radiusMm, lengths.lengthOfCutMm),
    ...lengths,
    fluteEndRadiusMm: fluteEndRadius(radiusMm, cornerRadiusMm, taperHalfAngleDeg, lengths.fluteLengthMm),
    neck: neck(cutter, lengths.fluteLengthMm, shankRadiusMm, overallLengthMm, assumptions),
    shankRadiusMm,
    overallLengthMm,
    hasSphericalTip: cornerRadiusMm === radiusMm,
    assumptions,
  }
}

function cornerRadius(cutter: CutterGeometry, radiusMm: number, assumptions: CutterAssumption[]): number {
  const path = 'cutter.cornerRadiusMm'
  const given = notNegativeOr(withPrintedBallRadius(cutter).cornerRadiusMm, null, path, 'The corner radius')
  if (given !== null && given > radiusMm + printedRoundingMm)
    throw new CoreInputError('corner-radius-over-half', path, 'The corner radius is over half the diameter.')
  if (cutter.form === 'cornerRadius' && given === null)
    throw new CoreInputError('corner-radius-missing', path, 'The corner radius is needed for this form.')
  const isHalf = given !== null && Math.abs(given - radiusMm) <= printedRoundingMm
  if (cutter.form === 'ball') {
    if (given !== null && !isHalf)
      throw new CoreInputError(
        'corner-radius-not-half',
        path,
        'A ball’s radius is half its cutting diameter.',
      )
    return radiusMm
  }
  if (cutter.form === 'square' && given)
    throw new CoreInputError('corner-radius-on-square', path, 'A square end has no corner radius.')
  if (!roundedForms.includes(cutter.form)) {
    if (given) assumptions.push('cornerRadiusNotUsed')
    return 0
  }
  return isHalf ? radiusMm : (given ?? 0)
}

function fluteLengths(cutter: CutterGeometry, overallLengthMm: number, assumptions: CutterAssumption[]) {
  const cutPath = 'cutter.lengthOfCutMm'
  const flutePath = 'cutter.fluteLengthMm'
  const cutMm = positiveOrNull(cutter.lengthOfCutMm, cutPath, 'The length of cut')
  const flutedMm = positiveOrNull(cutter.fluteLengthMm, flutePath, 'The fluted length')
  const lengthOfCutMm = cutMm ?? flutedMm
  if (lengthOfCutMm === null)
    throw new CoreInputError(
      'length-of-cut-missing',
      cutPath,
      'The length of cut or the fluted length is needed.',
    )
  if (lengthOfCutMm > overallLengthMm)
    throw new CoreInputError(
      'flutes-longer-than-cutter',
      cutMm === null ? flutePath : cutPath,
      'The flutes are longer than the whole cutter.',
    )
  if (cutMm !== null && flutedMm !== null) {
    if (flutedMm < cutMm)
      throw new CoreInputError(
        'flutes-shorter-than-cut',
        flutePath,
        'The fluted length is below the length of cut.',
      )
    if (flutedMm > overallLengthMm)
      throw new CoreInputError(
        'flutes-longer-than-cutter',
        flutePath,
        'The flutes are longer than the whole cutter.',
      )
    return { lengthOfCutMm, fluteLengthMm: flutedMm }
  }
  if (cutMm === null) assumptions.push('lengthOfCut')
  assumptions.push('fluteLength')
  const neckFollows = cutter.neckDiameterMm != null && (cutter.reachLengthMm ?? 0) > lengthOfCutMm
  const runOutMm = neckFollows ? 0 : cutter.cuttingDiameterMm / 2
  return { lengthOfCutMm, fluteLengthMm: Math.min(lengthOfCutMm + runOutMm, overallLengthMm) }
}

function taper(cutter: CutterGeometry): number {
  if (cutter.form !== 'tapered') return 0
  const path = 'cutter.taperHalfAngleDeg'
  const angleDeg = positive(cutter.taperHalfAngleDeg, path, 'The taper angle a side')
  if (angleDeg >= 90)
    throw new CoreInputError('taper-out-of-range', path, 'The taper a side must be below 90°.')
  return angleDeg
}

function fluteEndRadius(
  radiusMm: number,
  cornerRadiusMm: number,
  taperDeg: number,
  fluteLengthMm: number,
): number {
  const taperRad = radians(taperDeg)
  const straightFromMm = cornerRadiusMm * (1 - Math.sin(taperRad))
  const startMm = radiusMm - cornerRadiusMm + cornerRadiusMm * Math.cos(taperRad)
  return startMm + Math.max(0, fluteLengthMm - straightFromMm) * Math.tan(taperRad)
}

/** A reamer or tap without a point angle has no lead; a drill or chamfer must have one. */
function point(cutter: CutterGeometry, radiusMm: number, lengthOfCutMm: number) {
  const blunt = { pointLengthMm: 0, tipRadiusMm: radiusMm, pointSlope: Number.POSITIVE_INFINITY }
  const path = 'cutter.pointAngleDeg'
  if (!pointedForms.includes(cutter.form)) return blunt
  const needsAngle = cutter.form === 'drill' || cutter.form === 'chamfer'
  if (!needsAngle && cutter.pointAngleDeg == null) return blunt
  const angleDeg = positive(cutter.pointAngleDeg, path, 'The point angle')
  if (angleDeg > 180)
    throw new CoreInputError('point-angle-out-of-range', path, 'The point angle is over 180°.')
  const tipRadiusMm = cutter.form === 'chamfer' ? chamferTipRadius(cutter, radiusMm) : 0
  const pointSlope = tangent(angleDeg / 2)
  const pointLengthMm = (radiusMm - tipRadiusMm) / pointSlope
  if (pointLengthMm > lengthOfCutMm && cutter.form !== 'chamfer')
    throw new CoreInputError('point-longer-than-cut', path, 'The point is longer than the length of cut.')
  return { pointLengthMm, tipRadiusMm, pointSlope }
}

function chamferTipRadius(cutter: CutterGeometry, radiusMm: number): number {
  const path = 'cutter.tipDiameterMm'
  const tipRadiusMm = notNegativeOr(cutter.tipDiameterMm, 0, path, 'The tip diameter') / 2
  if (tipRadiusMm > radiusMm)
    throw new CoreInputError('tip-over-diameter', path, 'The tip is wider than the cutting diameter.')
  return tipRadiusMm
}

function neck(
  cutter: CutterGeometry,
  fluteLengthMm: number,
  shankRadiusMm: number,
  overallLengthMm: number,
  assumptions: CutterAssumption[],
): NeckDimensions | null {
  const reachPath = 'cutter.reachLengthMm'
  const diameterMm = positiveOrNull(cutter.neckDiameterMm, 'cutter.neckDiameterMm', 'The neck diameter')
  const endZMm = positiveOrNull(cutter.reachLengthMm, reachPath, 'The reach length')
  const taperDeg = neckTaper(cutter)
  const transitionDeg = transitionAngle(cutter)
  if (endZMm !== null && endZMm > overallLengthMm + overlapToleranceMm)
    throw new CoreInputError(
      'reach-length-longer-than-cutter',
      reachPath,
      'The reach length is over the overall length.',
    )
  if (diameterMm !== null && endZMm === null) assumptions.push('neckWithoutLength')
  if (diameterMm === null || endZMm === null || endZMm <= fluteLengthMm) return null
  const startRadiusMm = diameterMm / 2
  const endRadiusMm = startRadiusMm + (endZMm - fluteLengthMm) * Math.tan(radians(taperDeg))
  const riseMm = Math.max(0, shankRadiusMm - endRadiusMm)
  if (riseMm > 0 && cutter.neckTransitionAngleDeg == null) assumptions.push('transitionAngle')
  return { startRadiusMm, endRadiusMm, endZMm, fullShankZMm: endZMm + riseMm / tangent(transitionDeg) }
}

function neckTaper(cutter: CutterGeometry): number {
  const path = 'cutter.neckTaperHalfAngleDeg'
  const taperDeg = notNegativeOr(cutter.neckTaperHalfAngleDeg, 0, path, 'The neck taper')
  if (taperDeg >= 90)
    throw new CoreInputError('neck-taper-out-of-range', path, 'The neck taper must be below 90°.')
  return taperDeg
}

function transitionAngle(cutter: CutterGeometry): number {
  const path = 'cutter.neckTransitionAngleDeg'
  const angleDeg = positiveOrNull(cutter.neckTransitionAngleDeg, path, 'The transition angle')
  if (angleDeg !== null && angleDeg > 90)
    throw new CoreInputError('transition-out-of-range', path, 'The transition angle is over 90°.')
  return angleDeg ?? usualTransitionAngleDeg
}
