import { CoreInputError } from '@/core/core-input-error'
import { positive } from '@/core/outline/checked-number'
import { overlapToleranceMm } from '@/core/outline/types'

/**
 * Arc over which a tooth is in a side-milling cut: arccos(1 − 2·ae/D).
 *
 * Units      Millimetres in, radians out.
 * Result     0 to π, π for a slot.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`; `stepover-over-diameter` at `stepoverMm`.
 * Source     Plane geometry; the derived end mill of test/reference/cutting/cutting-force.md, section 3, has 60°.
 * Tolerance  1e-9.
 *
 * @example
 * (engagementRad(3, 12) * 180 / Math.PI).toFixed(6) // => '60.000000'
 */
export function engagementRad(stepoverMm: number, diameterMm: number): number {
  const widthMm = positive(stepoverMm, 'stepoverMm', 'The stepover')
  const acrossMm = positive(diameterMm, 'diameterMm', 'The diameter in the cut')
  if (widthMm > acrossMm + overlapToleranceMm) {
    throw new CoreInputError(
      'stepover-over-diameter',
      'stepoverMm',
      'The stepover is more than the diameter that cuts.',
    )
  }
  return Math.acos(Math.max(-1, 1 - (2 * widthMm) / acrossMm))
}

/**
 * Mean thickness of the chips of a side-milling cut over that arc: hm = 2·ae·fz/(D·φ), edge upright.
 *
 * Units      Millimetres.
 * Result     More than 0, never above the feed a tooth.
 * Errors     As engagementRad, and for the feed at `feedPerToothMm`.
 * Source     test/reference/cutting/cutting-force.md, section 3.
 * Tolerance  The derived case to its digits.
 *
 * @example
 * meanChipMm(0.06, 3, 12).toFixed(6) // => '0.028648'
 */
export function meanChipMm(feedPerToothMm: number, stepoverMm: number, diameterMm: number): number {
  const feedMm = positive(feedPerToothMm, 'feedPerToothMm', 'The feed a tooth')
  const arcRad = engagementRad(stepoverMm, diameterMm)
  return (2 * stepoverMm * feedMm) / (diameterMm * arcRad)
}
