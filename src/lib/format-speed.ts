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
 * A spindle speed in whole revolutions, thousands apart by a no-break space, which is no decimal sign anywhere.
 *
 * @example
 * formatRpm(14605.4) // => '14\u00a0605 rpm'
 */
export function formatRpm(rpm: number): string {
  return `${decimalText(rpm, 0, 0).replace(/\B(?=(?:\d{3})+$)/g, '\u00a0')} rpm`
}
