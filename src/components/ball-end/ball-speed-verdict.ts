import type { BallSpeedAnswer, BallSpeedRequest } from '@/core/ball-end/ball-speed-answer'
import { isBallEnd } from '@/core/ball-end/corner-diameter'
import type { SpeedLimit } from '@/core/speeds/speed-limit'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import { formatRpm, formatSpeed } from '@/lib/format-speed'
import { limitName } from '@/lib/speed-limit-words'

export interface BallSpeedVerdict {
  kind: 'holds' | 'caution'
  /** The answer in one sentence. */
  sentence: string
  /** What of it needs care, a sentence each. */
  remarks: string[]
}

/** What the answer comes to, in the person's unit. `limit` is what caps the spindle speed. */
export function ballSpeedVerdict(
  request: BallSpeedRequest,
  answer: BallSpeedAnswer,
  unit: LengthUnit,
  limit: SpeedLimit | null,
): BallSpeedVerdict {
  const remarks = [limitRemark(request, answer, unit, limit), tipRemark(answer), deepRemark(request)].filter(
    (remark) => remark !== null,
  )
  return {
    kind: answer.tipInCut || answer.spindleLimited ? 'caution' : 'holds',
    sentence: speedSentence(request, answer, unit),
    remarks,
  }
}

/** `the 6 mm ball`, `the 12 mm cutter with 1 mm corners`. */
export function toolName({ cuttingDiameterMm, cornerRadiusMm }: BallSpeedRequest, unit: LengthUnit): string {
  const diameter = formatLength(cuttingDiameterMm, unit, { fractions: true })
  return cornerRadiusMm == null || isBallEnd(cuttingDiameterMm, cornerRadiusMm)
    ? `${diameter} ball`
    : `${diameter} cutter with ${formatLength(cornerRadiusMm, unit)} corners`
}

function speedSentence(request: BallSpeedRequest, answer: BallSpeedAnswer, unit: LengthUnit): string {
  const tool = toolName(request, unit)
  const effective = formatLength(answer.effectiveDiameterMm.largest, unit)
  const { speedMPerMin, nominalSpeedMPerMin, spindleRpm } = answer
  if (speedMPerMin === null || nominalSpeedMPerMin === null || spindleRpm === null) {
    return `The ${tool} cuts on a diameter of ${effective} at most.`
  }
  const speed = formatSpeed(speedMPerMin.largest, unit)
  const nominal = formatSpeed(nominalSpeedMPerMin, unit)
  const start = `At ${formatRpm(spindleRpm)} the ${tool} cuts at ${speed}`
  return speed === nominal
    ? `${start}, on its whole diameter.`
    : `${start}, on a diameter of ${effective}; its own diameter would say ${nominal}.`
}

function tipRemark(answer: BallSpeedAnswer): string | null {
  const { tiltToClearTipDeg, tiltDeg } = answer
  if (tiltToClearTipDeg === null)
    return 'The middle of its flat end has no cutting speed: let it leave the work, never plunge on it.'
  if (!answer.tipInCut)
    return `The dead tip is out of the cut: it would enter at ${formatAngle(tiltToClearTipDeg)} of tilt or less.`
  if (tiltToClearTipDeg >= 90) return 'The dead tip is in the cut, and at this depth no tilt lifts it out.'
  const more = tiltDeg > 0 ? `; it leans ${formatAngle(tiltDeg)}` : ''
  return `The dead tip is in the cut and rubs: lean the tool more than ${formatAngle(tiltToClearTipDeg)} to lift it out${more}.`
}

function limitRemark(
  request: BallSpeedRequest,
  answer: BallSpeedAnswer,
  unit: LengthUnit,
  limit: SpeedLimit | null,
): string | null {
  if (!answer.spindleLimited || answer.speedMPerMin === null || limit === null) return null
  const cap = formatRpm(limit.rpm)
  return request.wantedSpeedMPerMin == null
    ? `${formatRpm(request.spindleRpm ?? 0)} is over ${limitName(limit)}, so ${cap} is reckoned with.`
    : `${formatSpeed(request.wantedSpeedMPerMin, unit)} would need more than ${limitName(limit)} of ${cap}.`
}

function deepRemark({ cuttingDiameterMm, cornerRadiusMm, depthOfCutMm }: BallSpeedRequest): string | null {
  const radiusMm = cornerRadiusMm ?? cuttingDiameterMm / 2
  return depthOfCutMm > radiusMm
    ? 'The cut is deeper than the radius: the side cuts too, on the whole diameter.'
    : null
}
