import type { ReachRequest, ReachVerdict } from '@/core/reach/types'
import { clampingRange, cornerRadiusMm } from './solids'

/** Sums of hundredths are not exact. */
const hair = 1e-9

/** What an oracle has to be able to say about a tool in a part. */
export interface SolidOracle {
  readonly canLieAlongWall: boolean
  readonly fitsOpening: boolean
  flutesStrike(depthMm: number): boolean
  strikes(depthMm: number, stickOutMm: number): boolean
}

/**
 * The verdict on a wall, from an oracle's answers and the plain limits of feature and clamping.
 */
export function naiveWallVerdict(request: ReachRequest, oracle: SolidOracle): ReachVerdict {
  const { feature, cutter, stickOutMm } = request
  const range = clampingRange(request)
  const depthMm = askedDepthMm(request)
  if (feature.kind === 'wall') {
    if ((feature.insideCornerRadiusMm ?? Number.POSITIVE_INFINITY) < cutter.cuttingDiameterMm / 2)
      return 'impossible'
    if ((feature.floorRadiusMm ?? Number.POSITIVE_INFINITY) < cornerRadiusMm(cutter)) return 'impossible'
  }
  if (range.fromMm > range.toMm + hair) return 'impossible'
  if (stickOutMm != null && (stickOutMm < range.fromMm - hair || stickOutMm > range.toMm + hair))
    return 'impossible'
  if (!oracle.canLieAlongWall || !oracle.fitsOpening || oracle.flutesStrike(depthMm)) return 'impossible'
  return oracle.strikes(depthMm, stickOutMm ?? range.toMm) ? 'short' : 'reaches'
}

/** How deep the tip has to go. */
export function askedDepthMm({ feature }: ReachRequest): number {
  return (
    feature.depthMm + (feature.kind === 'wall' ? (feature.throughMm ?? 0) : (feature.breakThroughMm ?? 0))
  )
}
