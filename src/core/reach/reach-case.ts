import { notNegative, positive } from '@/core/outline/checked-number'
import { type CutterDimensions, cutterDimensions } from '@/core/outline/cutter-dimensions'
import { overlapToleranceMm } from '@/core/outline/types'
import type { CutterGeometry } from '@/core/tooling'
import { type CheckPart, checkPartsOfDimensions, holderCheckParts } from './check-parts'
import { type CheckedFeature, checkedFeature } from './checked-feature'
import { type LeastTouch, leastTouch } from './first-touches'
import { cutsNothing } from './fit-messages'
import { type Placement, placement } from './placement'
import { type CheckedClamping, checkedClamping } from './stick-out-bounds'
import {
  type Clearances,
  defaultReachSettings,
  type ReachLimit,
  type ReachRequest,
  type ReachSettings,
} from './types'

/** What of a request no feature changes. */
export interface PreparedAssembly {
  cutter: CutterDimensions
  cutterParts: CheckPart[]
  holderParts: CheckPart[]
  clamping: CheckedClamping
  clearances: Clearances
  settings: ReachSettings
  /** Where a hole tool's flutes or reach length end; of no meaning for any other. */
  usableLengthMm: number
}

/** A request with everything checked and every outline ready. */
export interface ReachCase extends PreparedAssembly {
  feature: CheckedFeature
  at: Placement
  /** First touch of the cutter's own parts: the same at every stick-out. */
  cutterTouch: LeastTouch
  /** Depth of the tip at which a hole tool's flutes or reach length end; Infinity for any other. */
  usableTipDepthMm: number
}

export interface TipReach {
  tipDepthMm: number
  limitedBy: ReachLimit | null
}

/**
 * Checks a request and prepares what every answer about it needs.
 *
 * Units      Millimetres and degrees.
 * Errors     CoreInputError as `cutterDimensions`, `checkedFeature`, `holderOutline`, `extensionOutline`,
 *            `checkedClamping`; `not-finite`, `not-positive`, `negative` for stick-out, clearances and side load.
 *
 * @example
 * reachCase(reachRequest({ stickOutMm: -1 })) // => throws not-positive
 */
export function reachCase(request: ReachRequest): ReachCase {
  const { settings } = request
  const cutter = cutterDimensions(request.cutter)
  const feature = checkedFeature(request.feature, cutter)
  const clearances = checkedClearances(request)
  const cutterParts = checkPartsOfDimensions(cutter)
  if (request.stickOutMm != null) positive(request.stickOutMm, 'stickOutMm', 'The stick-out')
  if (request.sideLoadN != null) notNegative(request.sideLoadN, 'sideLoadN', 'The side load')
  const assembly = {
    cutter,
    usableLengthMm: usableTipDepthMm(request.cutter, cutter, settings),
    cutterParts,
    holderParts: holderCheckParts(request.holder, request.extension),
    clamping: checkedClamping(request.holder, request.extension, request.collet),
    clearances,
    settings,
  }
  return caseInFeature(assembly, feature)
}

/**
 * A prepared assembly in a feature, its own or another.
 *
 * Units      Millimetres and degrees.
 *
 * @example
 * caseInFeature(reachCase(reachRequest({})), checkedFeature({ kind: 'wall', depthMm: 3 }, cutterDimensions(squareCutter))).at.tipDepthMm // => 3
 */
export function caseInFeature(assembly: PreparedAssembly, feature: CheckedFeature): ReachCase {
  const { cutter, cutterParts, clearances, usableLengthMm } = assembly
  const at = placement(feature, cutter)
  return {
    ...assembly,
    feature,
    at,
    cutterTouch: leastTouch(at, cutterParts, 0, clearances),
    usableTipDepthMm: at.kind === 'wall' ? Number.POSITIVE_INFINITY : usableLengthMm,
  }
}

/**
 * The clearances asked for, the shop's where none are given.
 *
 * Units      Millimetres.
 * Errors     CoreInputError `not-given`, `not-finite`, `negative` at `clearances.…`.
 *
 * @example
 * checkedClearances({ clearances: { holderMm: 1 }, settings: defaultReachSettings }) // => { shankMm: 0.025, holderMm: 1 }
 */
export function checkedClearances({
  clearances,
  settings,
}: Pick<ReachRequest, 'clearances' | 'settings'>): Clearances {
  const shankMm = clearances?.shankMm ?? settings.shankClearanceMm
  const holderMm = clearances?.holderMm ?? settings.holderClearanceMm
  return {
    shankMm: notNegative(shankMm, 'clearances.shankMm', 'The shank clearance'),
    holderMm: notNegative(holderMm, 'clearances.holderMm', 'The holder clearance'),
  }
}

/**
 * Depth of the tip at which a hole tool's flutes or reach length end.
 *
 * Assumes room for the chips in a drill's flutes; a reach length says how deep any hole tool may go.
 *
 * Units      Millimetres.
 * Result     May be negative for flutes shorter than their chips need.
 *
 * @example
 * usableTipDepthMm(drillCutter, cutterDimensions(drillCutter), defaultReachSettings) // => 31
 */
export function usableTipDepthMm(
  given: CutterGeometry,
  cutter: CutterDimensions,
  { drillChipRoomDiameters }: ReachSettings,
): number {
  if (given.reachLengthMm != null) return given.reachLengthMm
  const chipRoomMm = cutter.form === 'drill' ? drillChipRoomDiameters * 2 * cutter.radiusMm : 0
  return cutter.lengthOfCutMm - chipRoomMm
}

/**
 * How deep the tip gets at a stick-out, and what stops it there.
 *
 * Units      Millimetres.
 * Result     Infinity and null where nothing does; 0 and `flute` where the tool can't lie along the wall at all.
 *
 * @example
 * tipReach(reachCase(reachRequest({})), 20) // => { tipDepthMm: 12.7, limitedBy: 'shank' }
 */
export function tipReach(reach: ReachCase, stickOutMm: number): TipReach {
  if (cutsNothing(reach.cutter, reach.at)) return { tipDepthMm: 0, limitedBy: 'flute' }
  const ofHolder = leastTouch(reach.at, reach.holderParts, stickOutMm, reach.clearances)
  const touch = ofHolder.tipDepthMm < reach.cutterTouch.tipDepthMm ? ofHolder : reach.cutterTouch
  if (reach.usableTipDepthMm < touch.tipDepthMm)
    return { tipDepthMm: Math.max(0, reach.usableTipDepthMm), limitedBy: 'usableLength' }
  return { tipDepthMm: touch.tipDepthMm, limitedBy: touch.part }
}

/**
 * The depth asked of the feature, counted as its reach is.
 *
 * Units      Millimetres.
 *
 * @example
 * askedDepthMm(reachCase(reachRequest({ feature: { kind: 'wall', depthMm: 10, throughMm: 1 } }))) // => 11
 */
export function askedDepthMm({ at }: ReachCase): number {
  return at.tipDepthMm - at.leadMm
}

/**
 * A depth of the tip as depth of the feature.
 *
 * Units      Millimetres.
 * Result     null where it is without limit; never below 0.
 *
 * @example
 * featureDepthMm(reachCase(reachRequest({})), Infinity) // => null
 */
export function featureDepthMm({ at }: ReachCase, tipDepthMm: number): number | null {
  return Number.isFinite(tipDepthMm) ? Math.max(0, tipDepthMm - at.leadMm) : null
}

/**
 * Whether a depth of the tip falls short of the one asked.
 *
 * Tolerance  1e-9 mm.
 *
 * @example
 * isShort(reachCase(reachRequest({ feature: { kind: 'wall', depthMm: 10 } })), 9.5) // => true
 */
export function isShort({ at }: ReachCase, tipDepthMm: number): boolean {
  return tipDepthMm < at.tipDepthMm - overlapToleranceMm
}

const settingsAboveZero: readonly (keyof ReachSettings)[] = [
  'stickOutStepMm',
  'fluteStiffnessRatio',
  'carbideModulusGpa',
  'steelModulusGpa',
]

/**
 * Refuses settings no answer can be worked out with; a shop's are checked where they are entered, too.
 *
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `negative` at `settings.…`.
 *
 * @example
 * refuseBadSettings({ ...defaultReachSettings, stickOutStepMm: 0 }) // => throws not-positive
 */
export function refuseBadSettings(settings: ReachSettings): void {
  for (const name of Object.keys(defaultReachSettings) as (keyof ReachSettings)[]) {
    const refuse = settingsAboveZero.includes(name) ? positive : notNegative
    refuse(settings[name], `settings.${name}`, 'The setting')
  }
}
