import { overlapToleranceMm } from '@/core/outline/types'
import { assemblyComplianceUmPerN } from '@/core/stiffness/compliance'
import { assumptionMessages } from './assumption-messages'
import { firstTouches } from './first-touches'
import { cutsNothing, fitMessages, maximumAxialStepMm, uncutAtFootMm } from './fit-messages'
import { holdingOf } from './holding-messages'
import type { ReachMessage } from './message-codes'
import { cautionMessages, shortMessages } from './outcome-messages'
import {
  askedDepthMm,
  featureDepthMm,
  isShort,
  type ReachCase,
  reachCase,
  refuseBadSettings,
  tipReach,
} from './reach-case'
import {
  brokenBoundMessages,
  crossedMessages,
  type StickOutRange,
  standsInFloor,
  stickOutRange,
} from './stick-out-answer'
import type { FirstTouch, ReachAnswer, ReachRequest, StickOutAnswer, StiffnessAnswer } from './types'

/**
 * Whether a tool assembly reaches the depth of a feature, at what stick-out, and what stops it where it does not.
 *
 * Assumes the flutes on the wall and the tip on the floor (or a hole tool on its hole's axis), clearances kept all round,
 * the spindle's face as wide as its nose or without end, and what the messages say was taken for granted. Everything is
 * closed form over straight lines and arcs; the same request gives the same answer.
 *
 * Units      Millimetres, degrees, newtons; stiffness in micrometres per newton.
 * Result     A depth that is null is without limit. Reach, first touches, stiffness and verdict are at
 *            `stickOut.usedMm`: the stick-out given, else the one required, else the largest allowed.
 * Errors     CoreInputError for a geometry that can't be and for what is not checked: as `cutterDimensions`,
 *            `checkedFeature`, `holderOutline`, `extensionOutline`, `checkedClamping`; its path is the request's.
 * Source     Hand cases in test/reference/reach-hand-cases.md; two independent oracles in test/reference.
 * Tolerance  An overlap of up to 1e-9 mm is none.
 *
 * @example
 * reachAnswer({ feature: { kind: 'wall', depthMm: 12 }, cutter: { form: 'square', cuttingDiameterMm: 3.175, lengthOfCutMm: 12.7, fluteLengthMm: 12.7, shankDiameterMm: 3.175, overallLengthMm: 38.1 }, holder: { gaugeLengthMm: 100, boreDepthMm: 30, minimumGripMm: 15, segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 28 }] }, stickOutMm: 20, settings: defaultReachSettings }).reachMm // => 12.7
 */
export function reachAnswer(request: ReachRequest): ReachAnswer {
  refuseBadSettings(request.settings)
  const reach = reachCase(request)
  const holding = holdingOf(request)
  const refusals = [...featureRefusals(reach), ...holding.refusals]
  const range = stickOutRange(reach, refusals.length === 0)
  const usedMm = request.stickOutMm ?? range.requiredMm ?? range.upper.mm
  refusals.push(...crossedMessages(range))
  if (request.stickOutMm != null) refusals.push(...brokenBoundMessages(range, usedMm))
  const verdict = verdictAt(reach, range, usedMm, refusals)
  return {
    verdict,
    ...reachFields(reach, range, usedMm),
    firstTouch: touchesAt(reach, usedMm),
    stickOut: stickOutFields(reach, range, usedMm),
    gaugeLengthMm: request.holder.gaugeLengthMm + (request.extension?.projectionMm ?? 0) + usedMm,
    maximumAxialStepMm: maximumAxialStepMm(reach.cutter, reach.at),
    stiffness: stiffnessAt(request, reach, usedMm),
    uncutAtFootMm: uncutAtFootMm(reach.cutter, reach.at),
    messages: [
      ...refusals,
      ...shortMessages(request, reach, range, verdict),
      ...cautionMessages(reach),
      ...holding.notes,
      ...assumptionMessages(request, reach.cutter),
    ],
  }
}

function verdictAt(reach: ReachCase, range: StickOutRange, usedMm: number, refusals: ReachMessage[]) {
  if (refusals.length > 0) return 'impossible'
  const holds = !isShort(reach, tipReach(reach, usedMm).tipDepthMm) && !standsInFloor(reach, range, usedMm)
  return holds ? 'reaches' : 'short'
}

/** Reach at the stick-out used and at the largest allowed, and what limits it. */
function reachFields(reach: ReachCase, range: StickOutRange, usedMm: number) {
  const used = tipReach(reach, usedMm)
  const reachMm = featureDepthMm(reach, used.tipDepthMm)
  const isFloorAlone = !isShort(reach, used.tipDepthMm) && standsInFloor(reach, range, usedMm)
  return {
    shortfallMm: reachMm === null ? 0 : Math.max(0, askedDepthMm(reach) - reachMm),
    reachMm,
    limitedBy: isFloorAlone ? ('floor' as const) : used.limitedBy,
    reachAtBestMm: featureDepthMm(reach, tipReach(reach, range.upper.mm).tipDepthMm),
  }
}

function touchesAt(reach: ReachCase, usedMm: number): FirstTouch[] {
  const touches = firstTouches(reach.at, reach.cutterParts, reach.holderParts, usedMm, reach.clearances)
  if (!cutsNothing(reach.cutter, reach.at)) return touches
  return touches.map((touch) => (touch.part === 'flute' ? { ...touch, depthMm: 0 } : touch))
}

function stickOutFields(reach: ReachCase, range: StickOutRange, usedMm: number): StickOutAnswer {
  return {
    requiredMm: range.requiredMm,
    minimumMm: range.lower.mm,
    maximumMm: range.upper.mm,
    usedMm,
    gripMm: reach.clamping.gripMm ?? reach.clamping.insertionMm ?? 0,
    boundBy: range.lower.by,
    upperBoundBy: range.upper.by,
  }
}

function stiffnessAt(request: ReachRequest, { cutter }: ReachCase, usedMm: number): StiffnessAnswer {
  const { holder, extension, settings, sideLoadN } = request
  const { substrate } = request.cutter
  const complianceUmPerN = assemblyComplianceUmPerN(cutter, substrate, holder, extension, usedMm, settings)
  return {
    complianceUmPerN,
    stickOutToDiameter: usedMm / (2 * cutter.radiusMm),
    deflectionUm: sideLoadN == null ? null : sideLoadN * complianceUmPerN,
  }
}

/** Why the feature does not take the tool at any stick-out. */
function featureRefusals(reach: ReachCase): ReachMessage[] {
  const { feature, cutter, at, settings } = reach
  return [...fitMessages(feature, cutter, at, settings), ...obstacleMessages(reach)]
}

/**
 * The stick-out a prepared assembly requires in its feature, and nothing else of its answer.
 *
 * Assumes something holds the shank.
 *
 * Units      Millimetres.
 * Result     As the answer's `stickOut.requiredMm`; null where no stick-out does.
 *
 * @example
 * requiredStickOutMm(reachCase(reachRequest({}))) // => 14
 */
export function requiredStickOutMm(reach: ReachCase): number | null {
  return stickOutRange(reach, featureRefusals(reach).length === 0).requiredMm
}

/** The length of cut may not strike what stands on the part on its way to the depth. */
function obstacleMessages(reach: ReachCase): ReachMessage[] {
  const flutes = firstTouches(
    reach.at,
    reach.cutterParts.filter(({ clearance }) => clearance === 'flute'),
    [],
    0,
    reach.clearances,
  )
  return flutes.flatMap(({ depthMm }) =>
    depthMm !== null && depthMm < askedDepthMm(reach) - overlapToleranceMm
      ? [{ code: 'flutes-strike-obstacle', values: { depthMm } }]
      : [],
  )
}
