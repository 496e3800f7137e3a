import { positive } from '@/core/outline/checked-number'
import type { WorkMaterial } from './work-materials'

/**
 * Specific cutting force after Kienzle, kc = kc1.1·h^(−mc): a thin chip costs more a square millimetre than a thick one.
 *
 * An estimate: tables differ by 20 to 40 % for one material; rake and wear are left out.
 *
 * Units      Millimetres (chip thickness), N/mm².
 * Result     More than 0.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive` at `chipMm`.
 * Source     Derived cases: test/reference/cutting/cutting-force.md, section 3.
 * Tolerance  Those cases to the digits they print.
 *
 * @example
 * specificForceNPerMm2({ unitForceNPerMm2: 1700, thicknessExponent: 0.24 }, 0.1).toFixed(1) // => '2954.3'
 */
export function specificForceNPerMm2(
  material: Pick<WorkMaterial, 'unitForceNPerMm2' | 'thicknessExponent'>,
  chipMm: number,
): number {
  const thicknessMm = positive(chipMm, 'chipMm', 'The chip thickness')
  return material.unitForceNPerMm2 * thicknessMm ** -material.thicknessExponent
}
