import { decimalText } from '@/core/units/decimal-text'

/**
 * An angle in degrees, to a hundredth at most.
 *
 * @example
 * formatAngle(35.5312) // => '35.53°'
 */
export function formatAngle(deg: number): string {
  return `${decimalText(deg, 0, 2)}°`
}
