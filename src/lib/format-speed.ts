import { decimalText } from '@/core/units/decimal-text'
import type { LengthUnit } from '@/core/units/length-unit'
import { metresPerFoot } from '@/core/units/parse-speed'

/** How a person's unit of length names cutting speed. */
export const speedUnitNames: Readonly<Record<LengthUnit, string>> = { mm: 'm/min', in: 'SFM' }

/**
 * A cutting speed in m/min for people who work in mm, in SFM for those who work in inches; one decimal below 1000.
 *
 * @example
 * formatSpeed(164.328, 'mm') // => '164.3 m/min'
 * formatSpeed(152.4, 'in') // => '500 SFM'
 */
export function formatSpeed(mPerMin: number, unit: LengthUnit): string {
  const value = unit === 'mm' ? mPerMin : mPerMin / metresPerFoot
  return `${decimalText(value, 0, value < 1000 ? 1 : 0)} ${speedUnitNames[unit]}`
}

/**
 * A cutting speed as it stands in a field, without its unit: what `parseSpeed` reads back in the same unit.
 *
 * @example
 * speedInputText(152.4, 'in', { decimalComma: false }) // => '500'
 * speedInputText(7.5, 'mm', { decimalComma: true }) // => '7,5'
 */
export function speedInputText(
  mPerMin: number,
  unit: LengthUnit,
  { decimalComma }: { decimalComma: boolean },
): string {
  const text = decimalText(unit === 'mm' ? mPerMin : mPerMin / metresPerFoot, 0, 1)
  return decimalComma ? text.replace('.', ',') : text
}

/**
 * The two ends of a range of cutting speed with the unit once.
 *
 * @example
 * formatSpeedRange({ lowMPerMin: 60, highMPerMin: 110 }, 'mm') // => '60 to 110 m/min'
 */
export function formatSpeedRange(
  { lowMPerMin, highMPerMin }: { lowMPerMin: number; highMPerMin: number },
  unit: LengthUnit,
): string {
  const [low] = formatSpeed(lowMPerMin, unit).split(' ')
  return `${low} to ${formatSpeed(highMPerMin, unit)}`
}

/**
 * A spindle speed in whole revolutions, thousands apart by a no-break space, which is no decimal sign anywhere.
 *
 * @example
 * formatRpm(14605.4) // => '14\u00a0605 rpm'
 */
export function formatRpm(rpm: number): string {
  return `${decimalText(rpm, 0, 0).replace(/\B(?=(?:\d{3})+$)/g, '\u00a0')} rpm`
}
