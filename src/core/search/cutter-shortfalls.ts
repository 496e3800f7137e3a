import { scallopHeightMm } from '@/core/ball-end/scallop'
import type { CutterDimensions } from '@/core/outline/cutter-dimensions'
import { overlapToleranceMm, toolParts } from '@/core/outline/types'
import { checkPartsOfDimensions } from '@/core/reach/check-parts'
import { featureFor, formRefusal } from '@/core/reach/checked-feature'
import { farSideHeightMm, type LeastTouch, leastTouch } from '@/core/reach/first-touches'
import { type FitMessage, fitMessages } from '@/core/reach/fit-messages'
import { type Placement, placement, type WallPlacement } from '@/core/reach/placement'
import { holeTouchMm, wallTouchMm } from '@/core/reach/touch-depth'
import type { AskedSearch } from './asked-search'
import type { SearchTables } from './search-tables'
import type { ScallopLimit, SortedOutReason, StoppedBy } from './types'

/** Told of everything of a cutter itself that is short; without `by` it is not short but another tool altogether. */
export type ReportShortfall = (reason: SortedOutReason, by: StoppedBy | null, shortfallMm: number) => void

/**
 * How each tip of the tables stands in the feature, its form left aside.
 *
 * Units      Millimetres.
 *
 * @example
 * tipPlacements(searchTables({ cutters: [], holders: [], collets: [], extensions: [] }, defaultReachSettings), { demand: checkedDemand({ kind: 'wall', depthMm: 5 }) }) // => []
 */
export function tipPlacements(
  { cutters }: SearchTables,
  { demand }: Pick<AskedSearch, 'demand'>,
): Placement[] {
  return cutters.tips.map((tip) => placement(featureFor(demand, tip), tip))
}

/**
 * Tells what of a cutter itself keeps it from the feature, whatever holds it; of parts that touch, the first.
 *
 * Units      Millimetres.
 * Result     Nothing is told of a cutter that can be asked in an assembly.
 * Tolerance  1e-9 mm, as the reach check's.
 *
 * @example
 * (() => {
 *   const tables = searchTables({ cutters: [{ id: 'a', geometry: squareCutter }], holders: [], collets: [], extensions: [] }, defaultReachSettings)
 *   const asked = askedSearch(tables, { feature: { kind: 'wall', depthMm: 20 }, limit: 1, nearMissLimit: 1 })
 *   const told = []
 *   reportShortfalls(tables, asked, tipPlacements(tables, asked)[0], 0, (_, by, mm) => told.push(by, mm.toFixed(1)))
 *   return told
 * })() // => ['shank', '7.3']
 */
export function reportShortfalls(
  tables: SearchTables,
  asked: AskedSearch,
  at: Placement,
  row: number,
  report: ReportShortfall,
): void {
  const { cutters, settings } = tables
  const cutter = cutters.dimensions[row]!
  if (formRefusal(asked.demand, cutter)) {
    report('cutterForm', null, 0)
    return
  }
  const messages = fitMessages(featureFor(asked.demand, cutter), cutter, at, settings)
  for (const message of messages) {
    report(...fitShortfall(message))
  }
  if (asked.scallop && at.kind === 'wall') {
    const shortfallMm = scallopShortfallMm(cutter, asked.scallop)
    if (shortfallMm > overlapToleranceMm) report('scallop', 'scallop', shortfallMm)
  }
  const touch = cutterTouch(tables, asked, at, row)
  if (touch.tipDepthMm < at.tipDepthMm - overlapToleranceMm)
    report('cutterTouches', touch.part, depthShortfallMm(at, touch.tipDepthMm))
  const usableMm = cutters.usableTipDepthMm[row]!
  if (usableMm < at.tipDepthMm - overlapToleranceMm)
    report('usableLength', 'usableLength', depthShortfallMm(at, usableMm))
  if (at.kind === 'wall' && at.tiltDeg > 0) {
    const inMm = floorOverlapMm(tables, asked, at, row)
    if (inMm > overlapToleranceMm) report('cutterInFloor', 'floor', inMm)
  }
}

/** Counted as the feature's depth is: what is asked less what is reached, never below 0. */
function depthShortfallMm({ tipDepthMm, leadMm }: Placement, reachedMm: number): number {
  return tipDepthMm - leadMm - Math.max(0, reachedMm - leadMm)
}

function fitShortfall({ code, values }: FitMessage): Parameters<ReportShortfall> {
  switch (code) {
    case 'opening-too-narrow':
    case 'hole-too-narrow':
      return ['opening', 'opening', values.shortfallMm]
    case 'corner-too-tight':
      return ['cornerRadius', 'cornerRadius', values.shortfallMm]
    case 'floor-radius-too-small':
      return ['floorRadius', 'floorRadius', values.shortfallMm]
    case 'length-of-cut-below-contact': {
      const belowMm = values.contactHeightMm - values.lengthOfCutMm
      return ['lengthOfCut', 'lengthOfCut', Math.max(overlapToleranceMm, belowMm)]
    }
    case 'taper-steeper-than-wall':
      return ['taperSteeperThanWall', null, 0]
    case 'hole-diameter-mismatch':
      return ['holeDiameter', null, 0]
  }
}

/** A square end leaves no scallop; passes further apart than the tool is wide leave a strip, short by its width. */
function scallopShortfallMm(
  { radiusMm, cornerRadiusMm }: CutterDimensions,
  { stepoverMm, maximumHeightMm }: ScallopLimit,
): number {
  const cuttingDiameterMm = 2 * radiusMm
  if (stepoverMm > cuttingDiameterMm) return stepoverMm - cuttingDiameterMm
  if (cornerRadiusMm === 0) return 0
  return scallopHeightMm({ cuttingDiameterMm, cornerRadiusMm }, stepoverMm) - maximumHeightMm
}

/** As `leastTouch` of the whole cutter; only an obstacle is met by the length of cut and by arcs. */
function cutterTouch(
  { cutters }: SearchTables,
  { clearances }: AskedSearch,
  at: Placement,
  row: number,
): LeastTouch {
  if (at.kind === 'wall' && canMeetObstacle(at, cutters.widestMm[row]! + clearances.holderMm))
    return leastTouch(at, checkPartsOfDimensions(cutters.dimensions[row]!), 0, clearances)
  const { lineStart, z0, r0, z1, r1, isFromAxis, part } = cutters
  let tipDepthMm = Number.POSITIVE_INFINITY
  let least = -1
  for (let line = lineStart[row]!; line < lineStart[row + 1]!; line++) {
    const startMm = isFromAxis[line] === 1 ? 0 : r0[line]! + clearances.shankMm
    const endMm = r1[line]! + clearances.shankMm
    const touchMm =
      at.kind === 'wall'
        ? wallTouchMm(at, z0[line]!, startMm, z1[line]!, endMm)
        : holeTouchMm(at, z0[line]!, startMm, z1[line]!, endMm)
    if (touchMm < tipDepthMm) {
      tipDepthMm = touchMm
      least = line
    }
  }
  return {
    part: least < 0 ? null : (toolParts[part[least]!] ?? null),
    tipDepthMm: Math.max(0, tipDepthMm),
  }
}

/** No pass brings the axis nearer to an obstacle's face than the one on the floor. */
function canMeetObstacle({ obstacles, standOffMm }: WallPlacement, widestMm: number): boolean {
  return obstacles.some(({ setbackMm }) => widestMm > standOffMm + setbackMm)
}

/** How deep the far side of a tilted cutter stands in the floor; below 0 clear of it. */
function floorOverlapMm(
  { cutters }: SearchTables,
  { clearances }: AskedSearch,
  at: WallPlacement,
  row: number,
): number {
  const { lineStart, z0, r0, z1, r1 } = cutters
  let inMm = Number.NEGATIVE_INFINITY
  for (let line = lineStart[row]!; line < lineStart[row + 1]!; line++) {
    const startMm = farSideHeightMm(at, z0[line]!, r0[line]! + clearances.shankMm)
    const endMm = farSideHeightMm(at, z1[line]!, r1[line]! + clearances.shankMm)
    inMm = Math.max(inMm, -startMm, -endMm)
  }
  return inMm
}
