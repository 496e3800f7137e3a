import { CoreInputError } from '../core-input-error'
import { requireAmount, requireBetween, requireLength } from './checks'
import { cornerEffectiveDiameterMm, isBallEnd, requireCorner } from './corner-diameter'
import { chipThinningFactor, cuttingSpeedMPerMin, spindleRpmForSpeed } from './cutting-speed'
import { scallopHeightMm } from './scallop'
import {
  type BallCut,
  capHalfAngleDeg,
  combinedTiltDeg,
  isTipInCut,
  largestEffectiveDiameterMm,
  smallestEffectiveDiameterMm,
} from './tip-cap'

/** What is asked; what is null or absent was not given. */
export interface BallSpeedRequest {
  /** [DC] */
  cuttingDiameterMm: number
  /** [RE] Half the cutting diameter, a ball, unless given. */
  cornerRadiusMm?: number | null
  /** [ap] Normal to the surface. */
  depthOfCutMm: number
  /** Between the tool axis and the surface normal (β); with a lead, the angle at right angles to it (γ). */
  tiltDeg: number
  leadDeg?: number | null
  /** [ae] */
  stepoverMm?: number | null
  spindleRpm?: number | null
  wantedSpeedMPerMin?: number | null
  /** The least of what the spindle, the holder and the cutter allow [RPMX]. */
  maximumRpm?: number | null
}

export interface Span {
  largest: number
  smallest: number
}

export interface BallSpeedAnswer {
  /** Between the tool axis and the surface normal (β). */
  tiltDeg: number
  effectiveDiameterMm: Span
  tipInCut: boolean
  /** The tip is clear beyond this tilt; 90 where no tilt clears it, null for a corner radius, which is not tilted. */
  tiltToClearTipDeg: number | null
  /** Null, like all that follows from them, without a spindle speed or a wanted cutting speed. */
  speedMPerMin: Span | null
  /** What the cutting diameter itself would have at this spindle speed. */
  nominalSpeedMPerMin: number | null
  spindleRpm: number | null
  /** Whether the largest allowed spindle speed held back what was asked for. */
  spindleLimited: boolean
  /** Null, like the next, without a stepover. */
  scallopHeightMm: number | null
  chipThinningFactor: number | null
}

/**
 * All there is to say about the speed of a ball end, or a corner radius, in a shallow cut: the diameters that cut,
 * whether the dead tip is among them, their speeds, the scallop and the chip thinning.
 *
 * A wanted cutting speed is taken at the largest diameter that cuts. A spindle speed over the largest allowed, asked
 * for or worked out, is held back to it, and the answer says so. A corner radius is answered with the axis normal to
 * the surface only; its flat end always has the dead tip in the cut.
 *
 * Shapes     Either a spindle speed or a wanted cutting speed, or neither.
 * Units      Millimetres, degrees, revolutions a minute, m/min.
 * Result     Never NaN or infinite.
 * Errors     CoreInputError `not-finite`, `not-positive`, `too-large`, `out-of-range`, `corner-radius-too-large`,
 *            `tilt-with-corner-radius`, `stepover-over-diameter`, `speed-given-twice`, with the field as its path.
 * Source     test/reference/ball-end/ball-end.md; by hand: DC 6, ap 0.3, 20 000 rpm is 164.3 m/min.
 * Tolerance  As the functions it calls.
 *
 * @example
 * ballSpeedAnswer({ cuttingDiameterMm: 10, depthOfCutMm: 1, tiltDeg: 0 }).effectiveDiameterMm // => { largest: 6, smallest: 0 }
 * ballSpeedAnswer({ cuttingDiameterMm: 10, depthOfCutMm: 1, tiltDeg: 0, stepoverMm: 6 }).scallopHeightMm // => 1
 */
export function ballSpeedAnswer(request: BallSpeedRequest): BallSpeedAnswer {
  requireBetween(request.tiltDeg, 0, 90, 'tiltDeg', 'The tilt')
  const tiltDeg = isGiven(request.leadDeg)
    ? combinedTiltDeg(request.leadDeg, request.tiltDeg)
    : request.tiltDeg
  const engagement = engagementOf(request, tiltDeg)
  const effectiveDiameterMm = engagement.effectiveDiameterMm
  const { spindleRpm, spindleLimited } = spindleOf(request, effectiveDiameterMm.largest)
  return {
    tiltDeg,
    ...engagement,
    speedMPerMin:
      spindleRpm === null
        ? null
        : {
            largest: cuttingSpeedMPerMin(effectiveDiameterMm.largest, spindleRpm),
            smallest: cuttingSpeedMPerMin(effectiveDiameterMm.smallest, spindleRpm),
          },
    nominalSpeedMPerMin:
      spindleRpm === null ? null : cuttingSpeedMPerMin(request.cuttingDiameterMm, spindleRpm),
    spindleRpm,
    spindleLimited,
    ...stepoverOf(request, effectiveDiameterMm.largest),
  }
}

type Engagement = Pick<BallSpeedAnswer, 'effectiveDiameterMm' | 'tipInCut' | 'tiltToClearTipDeg'>

function engagementOf(request: BallSpeedRequest, tiltDeg: number): Engagement {
  const { cuttingDiameterMm, cornerRadiusMm, depthOfCutMm } = request
  if (isGiven(cornerRadiusMm)) requireCorner(cuttingDiameterMm, cornerRadiusMm)
  if (isGiven(cornerRadiusMm) && !isBallEnd(cuttingDiameterMm, cornerRadiusMm)) {
    if (tiltDeg > 0) {
      throw new CoreInputError(
        'tilt-with-corner-radius',
        request.tiltDeg > 0 ? 'tiltDeg' : 'leadDeg',
        'A cutter with a corner radius is answered without tilt only: on a tilted one the flat end cuts too.',
      )
    }
    const largest = cornerEffectiveDiameterMm({ cuttingDiameterMm, cornerRadiusMm, depthOfCutMm })
    return { effectiveDiameterMm: { largest, smallest: 0 }, tipInCut: true, tiltToClearTipDeg: null }
  }
  const cut: BallCut = { cuttingDiameterMm, depthOfCutMm, tiltDeg }
  return {
    effectiveDiameterMm: {
      largest: largestEffectiveDiameterMm(cut),
      smallest: smallestEffectiveDiameterMm(cut),
    },
    tipInCut: isTipInCut(cut),
    tiltToClearTipDeg: capHalfAngleDeg(cuttingDiameterMm, depthOfCutMm),
  }
}

function spindleOf(
  { spindleRpm, wantedSpeedMPerMin, maximumRpm }: BallSpeedRequest,
  diameterMm: number,
): Pick<BallSpeedAnswer, 'spindleRpm' | 'spindleLimited'> {
  if (isGiven(spindleRpm) && isGiven(wantedSpeedMPerMin)) {
    throw new CoreInputError(
      'speed-given-twice',
      'wantedSpeedMPerMin',
      'Give a spindle speed or a wanted cutting speed, not both.',
    )
  }
  if (isGiven(spindleRpm)) requireAmount(spindleRpm, 'spindleRpm', 'The spindle speed')
  if (isGiven(maximumRpm)) requireAmount(maximumRpm, 'maximumRpm', 'The largest spindle speed')
  const askedRpm = isGiven(wantedSpeedMPerMin)
    ? spindleRpmForSpeed(diameterMm, wantedSpeedMPerMin)
    : (spindleRpm ?? null)
  if (askedRpm === null || !isGiven(maximumRpm) || askedRpm <= maximumRpm) {
    return { spindleRpm: askedRpm, spindleLimited: false }
  }
  return { spindleRpm: maximumRpm, spindleLimited: true }
}

function stepoverOf(
  request: BallSpeedRequest,
  effectiveDiameterMm: number,
): Pick<BallSpeedAnswer, 'scallopHeightMm' | 'chipThinningFactor'> {
  const { stepoverMm } = request
  if (!isGiven(stepoverMm)) return { scallopHeightMm: null, chipThinningFactor: null }
  requireLength(stepoverMm, 'stepoverMm', 'The stepover')
  return {
    scallopHeightMm: scallopHeightMm(request, stepoverMm),
    chipThinningFactor: chipThinningFactor(stepoverMm, effectiveDiameterMm),
  }
}

function isGiven(value: number | null | undefined): value is number {
  return value !== null && value !== undefined
}
