import { CoreInputError } from '../core-input-error'
import { requireLength, requireNotNegative } from './checks'
import { isBallEnd, requireCorner } from './corner-diameter'

export interface ScallopTip {
  /** [DC] */
  cuttingDiameterMm: number
  /** [RE] Half the cutting diameter, a ball, unless given. */
  cornerRadiusMm?: number | null
}

/**
 * Height of the scallop (cusp) left between two passes on a flat surface: h = r − √(r² − (ae/2)²).
 *
 * A corner radius leaves one from its own radius, over the part of the stepover that its flat end does not clean,
 * ae − (DC − 2·RE). On a sloped or curved surface the height differs.
 *
 * Shapes     `stepoverMm`: 0 to DC. Wider passes leave a strip uncut, not a scallop.
 * Units      Millimetres.
 * Result     0 to the radius.
 * Errors     CoreInputError `not-finite`, `not-positive`, `too-large`, `corner-radius-too-large`, `out-of-range`,
 *            `stepover-over-diameter`.
 * Source     Plane geometry; cases derived: test/reference/ball-end/ball-end.md, section 4.
 * Tolerance  Within 1e-12 of itself (written without the difference of near-equal numbers).
 *
 * @example
 * scallopHeightMm({ cuttingDiameterMm: 10 }, 6) // => 1
 * scallopHeightMm({ cuttingDiameterMm: 10 }, 10) // => 5
 * scallopHeightMm({ cuttingDiameterMm: 20, cornerRadiusMm: 5 }, 16) // => 1
 */
export function scallopHeightMm(tip: ScallopTip, stepoverMm: number): number {
  const { radiusMm, flatMm } = checkedTip(tip)
  requireNotNegative(stepoverMm, 'stepoverMm', 'The stepover')
  if (stepoverMm > tip.cuttingDiameterMm) {
    throw new CoreInputError(
      'stepover-over-diameter',
      'stepoverMm',
      'The stepover is more than the cutting diameter: a strip would stay uncut between the passes.',
    )
  }
  const halfMm = Math.max(0, stepoverMm - flatMm) / 2
  return halfMm ** 2 / (radiusMm + Math.sqrt(Math.max(0, radiusMm ** 2 - halfMm ** 2)))
}

/**
 * Stepover that leaves a scallop of a given height on a flat surface: ae = 2·√(h(DC − h)), the inverse of
 * scallopHeightMm. A corner radius adds its flat end.
 *
 * Shapes     `heightMm`: 0 to the radius.
 * Units      Millimetres.
 * Result     0 to DC.
 * Errors     CoreInputError `not-finite`, `not-positive`, `too-large`, `corner-radius-too-large`, `out-of-range`.
 * Source     As scallopHeightMm.
 * Tolerance  Back and forth within 1e-9 mm.
 *
 * @example
 * stepoverForScallopMm({ cuttingDiameterMm: 10 }, 1) // => 6
 * stepoverForScallopMm({ cuttingDiameterMm: 20, cornerRadiusMm: 5 }, 1) // => 16
 */
export function stepoverForScallopMm(tip: ScallopTip, heightMm: number): number {
  const { radiusMm, flatMm } = checkedTip(tip)
  requireNotNegative(heightMm, 'scallopHeightMm', 'The scallop height')
  if (heightMm > radiusMm) {
    throw new CoreInputError(
      'out-of-range',
      'scallopHeightMm',
      'The scallop height is more than the radius of the tip.',
    )
  }
  return flatMm + 2 * Math.sqrt(heightMm * (2 * radiusMm - heightMm))
}

function checkedTip({ cuttingDiameterMm, cornerRadiusMm }: ScallopTip): { radiusMm: number; flatMm: number } {
  if (cornerRadiusMm !== null && cornerRadiusMm !== undefined)
    requireCorner(cuttingDiameterMm, cornerRadiusMm)
  else requireLength(cuttingDiameterMm, 'cuttingDiameterMm', 'The cutting diameter')
  if (!cornerRadiusMm || isBallEnd(cuttingDiameterMm, cornerRadiusMm)) {
    return { radiusMm: cuttingDiameterMm / 2, flatMm: 0 }
  }
  return { radiusMm: cornerRadiusMm, flatMm: cuttingDiameterMm - 2 * cornerRadiusMm }
}
