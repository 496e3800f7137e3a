import type { BallSpeedAnswer, BallSpeedRequest } from '@/core/ball-end/ball-speed-answer'
import { isBallEnd } from '@/core/ball-end/corner-diameter'

/** The engaged edge on one side: along the rounding, seen from its centre, then along the straight side. */
export interface EngagedSide {
  arcDeg: number
  sideMm: number
}

/** The end of the tool in the plane it leans in, in mm, the centre of its rounding at 0, y down the axis. */
export interface TipGeometry {
  radiusMm: number
  /** Radius of the rounding: the ball's, or the corner's. */
  roundMm: number
  /** Half the flat end between two corners; 0 for a ball. */
  flatMm: number
  /** How far the edge stands in the cut on either side of the contact, in the plane of the tilt. */
  left: EngagedSide
  right: EngagedSide
  /** Radius and height below the centre of the largest and the smallest diameter that cut. */
  largest: { radiusMm: number; belowMm: number }
  smallest: { radiusMm: number; belowMm: number } | null
}

export function tipGeometry(request: BallSpeedRequest, answer: BallSpeedAnswer): TipGeometry {
  const radiusMm = request.cuttingDiameterMm / 2
  const cornerMm = request.cornerRadiusMm
  const roundMm = cornerMm == null || isBallEnd(request.cuttingDiameterMm, cornerMm) ? radiusMm : cornerMm
  const flatMm = radiusMm - roundMm
  const below = (diameterMm: number) => Math.sqrt(Math.max(0, roundMm ** 2 - (diameterMm / 2 - flatMm) ** 2))
  const { largest, smallest } = answer.effectiveDiameterMm
  return {
    radiusMm,
    roundMm,
    flatMm,
    left: engagedSide(request.depthOfCutMm, roundMm, -answer.tiltDeg),
    right: engagedSide(request.depthOfCutMm, roundMm, answer.tiltDeg),
    largest: { radiusMm: largest / 2, belowMm: below(largest) },
    smallest: smallest > 0 ? { radiusMm: smallest / 2, belowMm: below(smallest) } : null,
  }
}

/** The rounding ends a quarter turn from the tip, which leans to the right by `leanDeg`; beyond it the side cuts. */
function engagedSide(depthMm: number, roundMm: number, leanDeg: number): EngagedSide {
  const radians = Math.PI / 180
  const wantedDeg = Math.acos(Math.max(-1, 1 - depthMm / roundMm)) / radians
  const endDeg = 90 + leanDeg
  if (wantedDeg <= endDeg) return { arcDeg: wantedDeg, sideMm: 0 }
  const heightMm = roundMm * (1 - Math.cos(endDeg * radians))
  const rise = Math.cos(leanDeg * radians)
  return { arcDeg: endDeg, sideMm: rise < 1e-6 ? 0 : (depthMm - heightMm) / rise }
}
