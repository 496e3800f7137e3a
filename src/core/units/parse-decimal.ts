import { readDecimal } from './exact-decimal'
import { type ParseFailure, parseFailure, quoted, tidyText } from './parsed'

const largest = 1e12

/**
 * The plain number written in `text`, for what has no unit of its own (a factor, a rate, a spindle speed).
 *
 * Shapes     `12`, `0.8`, `.8`; `0,8` with `decimalComma`; `-0.8` with `allowNegative`.
 * Errors     None thrown; a failure `empty`, `not-a-number`, `decimal-comma`, `ambiguous`, `negative`, `too-large`.
 *
 * @example
 * parseDecimal('0.8', { decimalComma: false }) // => { ok: true, value: 0.8 }
 */
export function parseDecimal(
  text: string,
  options: { decimalComma: boolean; allowNegative?: boolean },
): { ok: true; value: number } | ParseFailure {
  const written = tidyText(text)
  if (written === '') return parseFailure('empty', 'Enter a number.')
  const isNegative = written.startsWith('-')
  const read = readDecimal(isNegative ? written.slice(1) : written, options.decimalComma)
  if (!read.ok) {
    return read.code === 'not-a-number'
      ? parseFailure(read.code, `${quoted(written)} is not a number.`)
      : read
  }
  if (isNegative && !options.allowNegative) return parseFailure('negative', "This can't be negative.")
  const size = Number(`${read.digits}e-${read.decimals}`)
  if (size > largest) return parseFailure('too-large', 'This number is too large.')
  return { ok: true, value: isNegative && size !== 0 ? -size : size }
}
