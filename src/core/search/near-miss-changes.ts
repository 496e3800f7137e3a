import { cutterDimensions } from '@/core/outline/cutter-dimensions'
import { overlapToleranceMm } from '@/core/outline/types'
import { checkedFeature } from '@/core/reach/checked-feature'
import { reachAnswer, requiredStickOutMm } from '@/core/reach/reach-answer'
import { caseInFeature, reachCase } from '@/core/reach/reach-case'
import type { ReachAnswer, ReachRequest, WallFeature } from '@/core/reach/types'
import type { CutterGeometry, HolderGeometry } from '@/core/tooling'
import type { AskedSearch } from './asked-search'
import type { FoundMiss } from './near-misses'
import { outsideWindowMm, stickOutLimit } from './stick-out-rule'
import type { NearMiss, SearchChange, StoppedBy } from './types'

/** Draft and tilt are tried in steps of half a degree, up to this much more than was asked. */
export const angleStepDeg = 0.5
export const mostDraftDeg = 10
export const mostTiltDeg = 45

/** A nut is tried in steps of this, and no slimmer than its shank with this wall a side; common practice for mini nuts. */
const nutStepMm = 0.5
const leastNutWallMm = 3

/** What no change of holder, nut or angle helps. */
const pastHelp: readonly StoppedBy[] = ['scallop', 'cornerRadius', 'floorRadius', 'usableLength']

/**
 * The smallest changes on the same assembly that would make it reach, each by itself and each tried by the reach check.
 *
 * Units      Millimetres and degrees.
 * Result     In the order stick-out, nut, draft, tilt, stick-out to diameter; empty where none of them does.
 *
 * @example
 * changesOf({ miss: { shortfalls: [{ by: 'scallop', shortfallMm: 1 }] } }, null) // => []
 */
export function changesOf({ miss, request }: FoundMiss, asked: AskedSearch): SearchChange[] {
  if (miss.shortfalls.some(({ by }) => pastHelp.includes(by))) return []
  const changes = [
    longerStickOut(miss, request, asked),
    slimmerNut(miss, request, asked),
    moreDraft(request, asked),
    moreTilt(request, asked),
    longerToDiameter(miss, request),
  ]
  return changes.filter((change) => change !== null)
}

/** Whether the reach check and the question's own limits are kept; the stick-out where they are. */
function stickOutThatHolds(request: ReachRequest, asked: AskedSearch): number | null {
  const answer = reachAnswer(request)
  return answer.verdict === 'reaches' && keepsLimits(answer, request.cutter, asked)
    ? answer.stickOut.usedMm
    : null
}

function keepsLimits(
  { stickOut, gaugeLengthMm }: ReachAnswer,
  { cuttingDiameterMm }: CutterGeometry,
  { longestStickOutToDiameter: longestToDiameter, gaugeLengthMm: window }: AskedSearch,
): boolean {
  const { longestMm } = stickOutLimit({ stepMm: 1, longestToDiameter, window }, cuttingDiameterMm)
  return stickOut.usedMm <= longestMm + overlapToleranceMm && outsideWindowMm(window, gaugeLengthMm) === 0
}

/** Helps only where the assembly is too short for the machine. */
function longerStickOut(
  { shortfalls, stickOutMm, gaugeLengthMm }: NearMiss,
  request: ReachRequest,
  asked: AskedSearch,
): SearchChange | null {
  const window = asked.gaugeLengthMm
  if (!window || shortfalls.length !== 1 || gaugeLengthMm >= window.shortestMm) return null
  const { stickOutStepMm } = request.settings
  const neededMm = stickOutMm + window.shortestMm - gaugeLengthMm
  const longerMm = Math.ceil(neededMm / stickOutStepMm - 1e-9) * stickOutStepMm
  const holds = stickOutThatHolds({ ...request, stickOutMm: longerMm }, asked) !== null
  return holds ? { kind: 'stickOut', stickOutMm: longerMm } : null
}

function longerToDiameter(
  { shortfalls, stickOutMm }: NearMiss,
  { cutter }: ReachRequest,
): SearchChange | null {
  const [first, ...more] = shortfalls
  if (first?.by !== 'stickOutToDiameter' || more.length > 0) return null
  const stickOutToDiameter = stickOutMm / cutter.cuttingDiameterMm
  return { kind: 'stickOutToDiameter', stickOutToDiameter, stickOutMm }
}

/** The widest nut that would do, found by halving: a slimmer one never asks for more. */
function slimmerNut({ stickOut }: NearMiss, request: ReachRequest, asked: AskedSearch): SearchChange | null {
  if (stickOut.part !== 'nut') return null
  const ofNutDiameterMm = nutDiameterMm(request.holder)
  const least = Math.ceil((request.cutter.shankDiameterMm + 2 * leastNutWallMm) / nutStepMm)
  const doesHold = (steps: number) =>
    stickOutThatHolds({ ...request, holder: withNut(request.holder, steps * nutStepMm) }, asked) !== null
  if (least * nutStepMm >= ofNutDiameterMm || !doesHold(least)) return null
  let holding = least
  let failing = Math.ceil(ofNutDiameterMm / nutStepMm)
  while (failing - holding > 1) {
    const middle = Math.floor((holding + failing) / 2)
    if (doesHold(middle)) holding = middle
    else failing = middle
  }
  return { kind: 'nut', nutDiameterMm: holding * nutStepMm, ofNutDiameterMm }
}

function nutDiameterMm({ segments }: HolderGeometry): number {
  const nuts = segments.filter(({ part }) => part === 'nut')
  return Math.max(
    ...nuts.map(({ noseDiameterMm, spindleDiameterMm }) => Math.max(noseDiameterMm, spindleDiameterMm)),
  )
}

function withNut(holder: HolderGeometry, mostMm: number): HolderGeometry {
  const segments = holder.segments.map((segment) =>
    segment.part === 'nut'
      ? {
          ...segment,
          noseDiameterMm: Math.min(segment.noseDiameterMm, mostMm),
          spindleDiameterMm: Math.min(segment.spindleDiameterMm, mostMm),
        }
      : segment,
  )
  return { ...holder, segments }
}

function moreDraft(request: ReachRequest, asked: AskedSearch): SearchChange | null {
  const { feature } = request
  if (feature.kind === 'hole') return null
  const draftDeg = feature.draftDeg ?? 0
  const mostDeg = Math.min(draftDeg + mostDraftDeg, 59.5, 89.5 - (feature.tiltDeg ?? 0))
  const found = firstAngle(draftDeg, mostDeg, request, asked, (deg) => ({ ...feature, draftDeg: deg }))
  return (
    found && {
      kind: 'draft',
      draftDeg: found.deg,
      moreDeg: found.deg - draftDeg,
      stickOutMm: found.stickOutMm,
    }
  )
}

function moreTilt(request: ReachRequest, asked: AskedSearch): SearchChange | null {
  const { feature } = request
  if (feature.kind === 'hole' || !isTiltable(feature, request.cutter)) return null
  const tiltDeg = feature.tiltDeg ?? 0
  const mostDeg = Math.min(
    tiltDeg + mostTiltDeg,
    89.5 - (feature.draftDeg ?? 0),
    90 - (request.cutter.taperHalfAngleDeg ?? 0),
  )
  const found = firstAngle(tiltDeg, mostDeg, request, asked, (deg) => ({ ...feature, tiltDeg: deg }))
  return (
    found && { kind: 'tilt', tiltDeg: found.deg, moreDeg: found.deg - tiltDeg, stickOutMm: found.stickOutMm }
  )
}

/** The first angle above what was asked, on the half degree, that holds; a whole answer says so in the end. */
function firstAngle(
  fromDeg: number,
  mostDeg: number,
  request: ReachRequest,
  asked: AskedSearch,
  featureAt: (deg: number) => WallFeature,
): { deg: number; stickOutMm: number } | null {
  const reach = reachCase(request)
  for (let step = Math.floor(fromDeg / angleStepDeg) + 1; step * angleStepDeg <= mostDeg; step++) {
    const deg = step * angleStepDeg
    const feature = featureAt(deg)
    if (requiredStickOutMm(caseInFeature(reach, checkedFeature(feature, reach.cutter))) === null) continue
    const stickOutMm = stickOutThatHolds({ ...request, feature }, asked)
    if (stickOutMm !== null) return { deg, stickOutMm }
  }
  return null
}

/** Only an open wall, and only with a ball's tip: what the reach check tilts at all. */
function isTiltable(
  { obstacles, openingWidthMm, insideCornerRadiusMm }: WallFeature,
  cutter: CutterGeometry,
): boolean {
  const isOpen = (obstacles ?? []).length === 0 && openingWidthMm == null && insideCornerRadiusMm == null
  return isOpen && cutterDimensions(cutter).hasSphericalTip
}
