import {
  type CutterAssumption,
  type CutterDimensions,
  usualTransitionAngleDeg,
} from '@/core/outline/cutter-dimensions'
import type { ReachMessage } from './message-codes'
import type { ReachRequest } from './types'

/**
 * What was taken for granted, as messages: gaps in the cutter's figures, an unknown spindle, a rigid machine.
 *
 * Units      Millimetres and degrees, in the messages' own names.
 *
 * @example
 * assumptionMessages(reachRequest({ sideLoadN: 50 }), cutterDimensions(squareCutter)).map(({ code }) => code) // => ['spindle-width-unknown', 'spindle-taken-as-rigid']
 */
export function assumptionMessages(request: ReachRequest, cutter: CutterDimensions): ReachMessage[] {
  const messages = cutter.assumptions.map((assumption) => cutterMessage(assumption, request, cutter))
  if (
    !cutter.neck &&
    cutter.shankRadiusMm > cutter.fluteEndRadiusMm &&
    cutter.fluteLengthMm < cutter.overallLengthMm
  )
    messages.push({
      code: 'thicker-shank-taken-as-step',
      values: { shankDiameterMm: 2 * cutter.shankRadiusMm },
    })
  if (request.holder.spindleNoseDiameterMm == null)
    messages.push({ code: 'spindle-width-unknown', values: {} })
  if (request.cutter.substrate == null) messages.push({ code: 'substrate-assumed', values: {} })
  if (request.sideLoadN == null) messages.push({ code: 'deflection-not-asked', values: {} })
  const { fluteStiffnessRatio } = request.settings
  messages.push({ code: 'spindle-taken-as-rigid', values: { fluteStiffnessRatio } })
  return messages
}

function cutterMessage(
  assumption: CutterAssumption,
  { cutter: given }: ReachRequest,
  cutter: CutterDimensions,
): ReachMessage {
  switch (assumption) {
    case 'lengthOfCut':
      return { code: 'length-of-cut-assumed', values: { lengthOfCutMm: cutter.lengthOfCutMm } }
    case 'fluteLength':
      return {
        code: 'flute-length-assumed',
        values: {
          fluteLengthMm: cutter.fluteLengthMm,
          runOutMm: cutter.fluteLengthMm - cutter.lengthOfCutMm,
        },
      }
    case 'transitionAngle':
      return { code: 'transition-angle-assumed', values: { transitionAngleDeg: usualTransitionAngleDeg } }
    case 'neckWithoutLength':
      return { code: 'neck-without-length', values: { neckDiameterMm: given.neckDiameterMm ?? 0 } }
    case 'cornerRadiusNotUsed':
      return { code: 'corner-radius-not-used', values: { cornerRadiusMm: given.cornerRadiusMm ?? 0 } }
  }
}
