import { decimalText } from '@/core/units/decimal-text'
import { type LengthUnit, lengthDecimals, mmPerInch } from '@/core/units/length-unit'
import { parseLength } from '@/core/units/parse-length'

export interface FormatLengthOptions {
  /** Whether the unit is written behind the number; yes unless false. */
  withUnit?: boolean
  /** Whether inches on a 1/64 read as fractions with the decimal beside, as sizes do; no unless true. */
  fractions?: boolean
  /** Decimals beyond the usual, for what is much smaller than a tool: a scallop, a deflection. */
  extraDecimals?: number
}

/**
 * A length as a drawing office writes it: millimetres with up to three decimals, inches with three or four.
 *
 * @example
 * formatLength(3.175, 'mm') // => '3.175 mm'
 * formatLength(3.175, 'in') // => '0.125 in'
 * formatLength(2.38125, 'in') // => '0.0938 in'
 */
export function formatLength(mm: number, unit: LengthUnit, options: FormatLengthOptions = {}): string {
  if (unit === 'in' && options.fractions) return formatInchSize(mm, options)
  const extra = options.extraDecimals ?? 0
  const number = unit === 'in' ? decimalText(mm / mmPerInch, 3, 4 + extra) : decimalText(mm, 0, 3 + extra)
  return options.withUnit === false ? number : `${number} ${unit}`
}

/**
 * An inch size as the trade says it: `1/8 (0.125) in` where it is on a 1/64 exactly, else the decimal.
 *
 * @example
 * formatInchSize(3.175) // => '1/8 (0.125) in'
 * formatInchSize(104.775) // => '4 1/8 (4.125) in'
 * formatInchSize(3) // => '0.1181 in'
 */
export function formatInchSize(mm: number, options: Pick<FormatLengthOptions, 'withUnit'> = {}): string {
  const decimal = formatLength(mm, 'in', { withUnit: false })
  const fraction = inchFraction(mm)
  const size = fraction === null ? decimal : `${fraction} (${decimal})`
  return options.withUnit === false ? size : `${size} in`
}

/** `4 1/8`, or null where the length is no fraction of an inch down to 1/64, or is a whole number of them. */
function inchFraction(mm: number): string | null {
  const sixtyFourths = (mm / mmPerInch) * 64
  const count = Math.round(sixtyFourths)
  const isExact = Math.abs(sixtyFourths - count) * (mmPerInch / 64) < 10 ** -lengthDecimals
  if (!isExact || count <= 0 || count % 64 === 0) return null
  let [top, bottom] = [count % 64, 64]
  while (top % 2 === 0) [top, bottom] = [top / 2, bottom / 2]
  const whole = Math.floor(count / 64)
  return `${whole > 0 ? `${whole} ` : ''}${top}/${bottom}`
}

/** More decimals of an inch than this are a millimetre size: it is shown as one. */
const longestInchText = 7

/**
 * The text a field opens with for editing: as short as it can be while `parseLength` reads the same length back in
 * the same unit. A size that is no plain inch decimal stands in millimetres with its unit, which an inch field reads
 * too: `3 mm` says more than 0.11811023622.
 *
 * @example
 * lengthInputText(3.175, 'in') // => '0.125'
 * lengthInputText(3, 'in') // => '3 mm'
 * lengthInputText(3.175, 'mm', { decimalComma: true }) // => '3,175'
 */
export function lengthInputText(
  mm: number,
  unit: LengthUnit,
  options: { decimalComma?: boolean } = {},
): string {
  const inMm = decimalText(mm, 0, lengthDecimals)
  const text = unit === 'mm' ? inMm : (inchInputText(inMm) ?? `${inMm} mm`)
  return options.decimalComma ? text.replace('.', ',') : text
}

function inchInputText(inMm: string): string | null {
  const text = decimalText(Number(inMm) / mmPerInch, 0, longestInchText)
  const readBack = parseLength(text, { unit: 'in', decimalComma: false, allowZero: true })
  return readBack.ok && readBack.mm === Number(inMm) ? text : null
}
