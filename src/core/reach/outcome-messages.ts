import { radians } from '@/core/outline/checked-number'
import type { CutterDimensions } from '@/core/outline/cutter-dimensions'
import { overlapToleranceMm } from '@/core/outline/types'
import { partInFloor } from './first-touches'
import { maximumAxialStepMm } from './fit-messages'
import type { ReachMessage } from './message-codes'
import type { WallPlacement } from './placement'
import { askedDepthMm, featureDepthMm, isShort, type ReachCase } from './reach-case'
import type { StickOutRange } from './stick-out-answer'
import type { ReachRequest, ReachVerdict } from './types'

/**
 * What stops a tool short of its depth, and what would help.
 *
 * Units      Millimetres, in the messages' own names.
 * Result     Empty unless the verdict is `short`.
 *
 * @example
 * shortMessages(reachRequest({}), reachCase(reachRequest({})), stickOutRange(reachCase(reachRequest({})), true), 'reaches') // => []
 */
export function shortMessages(
  request: ReachRequest,
  reach: ReachCase,
  range: StickOutRange,
  verdict: ReachVerdict,
): ReachMessage[] {
  if (verdict !== 'short') return []
  const messages = cutterMessages(reach)
  const { lower, upper, requiredMm } = range
  const floor = range.bounds.clearanceLower.find(({ by }) => by === 'floor')
  if (floor && floor.mm > (request.stickOutMm ?? upper.mm))
    messages.push({ code: 'holder-strikes-floor', values: { neededStickOutMm: floor.mm } })
  if (lower.mm > upper.mm)
    messages.push({
      code: 'needed-stick-out-over-maximum',
      values: {
        lowerBound: lower.by,
        neededMm: lower.mm,
        maximumMm: upper.mm,
        shortfallMm: lower.mm - upper.mm,
      },
    })
  if (requiredMm !== null && request.stickOutMm != null && requiredMm > request.stickOutMm)
    messages.push({
      code: 'longer-stick-out-reaches',
      values: { stickOutMm: request.stickOutMm, requiredMm },
    })
  return messages
}

/** What of the cutter itself breaks the rule. */
function cutterMessages(reach: ReachCase): ReachMessage[] {
  const messages: ReachMessage[] = []
  const { cutterTouch, usableTipDepthMm } = reach
  const askedMm = askedDepthMm(reach)
  const rubMm = featureDepthMm(reach, cutterTouch.tipDepthMm)
  if (cutterTouch.part && rubMm !== null && isShort(reach, cutterTouch.tipDepthMm))
    messages.push({
      code: 'cutter-rubs',
      values: { part: cutterTouch.part, depthMm: rubMm, shortfallMm: askedMm - rubMm },
    })
  const usableMm = featureDepthMm(reach, usableTipDepthMm)
  if (usableMm !== null && isShort(reach, usableTipDepthMm))
    messages.push({
      code: 'usable-length-too-short',
      values: { usableDepthMm: usableMm, shortfallMm: askedMm - usableMm },
    })
  const inFloor = partInFloor(reach.at, reach.cutterParts, reach.clearances)
  if (inFloor) messages.push({ code: 'cutter-strikes-floor', values: { part: inFloor } })
  return messages
}

/**
 * Cautions that hold whatever the verdict: a depth in steps, a wall below the rounded corner.
 *
 * Units      Millimetres, in the messages' own names.
 *
 * @example
 * cautionMessages(reachCase(reachRequest({ feature: { kind: 'wall', depthMm: 25.4 } })))[0].values.steps // => 2
 */
export function cautionMessages({ at, cutter }: ReachCase): ReachMessage[] {
  const messages: ReachMessage[] = []
  if (at.kind === 'hole') return messages
  const stepMm = maximumAxialStepMm(cutter, at)
  if (stepMm > 0 && at.tipDepthMm > stepMm)
    messages.push({
      code: 'depth-in-steps',
      values: {
        depthMm: at.tipDepthMm,
        maximumAxialStepMm: stepMm,
        steps: Math.ceil(at.tipDepthMm / stepMm),
      },
    })
  const left = leftAtTop(cutter, at)
  if (left) messages.push({ code: 'wall-lower-than-corner', values: left })
  return messages
}

/** A wall that ends below where the rounded corner touches its line keeps this much at its top edge. */
function leftAtTop({ cornerRadiusMm }: CutterDimensions, at: WallPlacement) {
  const draftRad = radians(at.draftDeg)
  const contactHeightMm = cornerRadiusMm * (1 - Math.sin(draftRad))
  if (at.tipDepthMm >= contactHeightMm - overlapToleranceMm) return null
  const arcMm = Math.sqrt(cornerRadiusMm ** 2 - (cornerRadiusMm - at.tipDepthMm) ** 2)
  const leftAtTopMm = at.tipDepthMm * at.tanDraft + contactHeightMm / Math.cos(draftRad) - arcMm
  return { contactHeightMm, leftAtTopMm }
}
