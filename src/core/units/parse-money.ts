import { readDecimal } from './exact-decimal'
import { type ParseFailure, parseFailure, quoted, tidyText } from './parsed'

const largestMinor = 1_000_000_000_000n

const groupedPoint = /^\d{1,3}(?:,\d{3})+\.\d+$/
const groupedComma = /^\d{1,3}(?:\.\d{3})+,\d+$/

/**
 * The amount of money written in `text`, in minor units (cents) of a currency with `decimals` decimals.
 *
 * Thousands may be separated where a decimal sign follows (`1,234.50`, or `1.234,50` with `decimalComma`): only then
 * is it certain which is which. A currency sign in front or behind is passed over.
 *
 * Units      Minor units, 0 to 1e12.
 * Errors     None thrown; a failure `empty`, `not-an-amount`, `decimal-comma`, `ambiguous`, `negative`,
 *            `too-many-decimals`, `too-large`.
 *
 * @example
 * parseMoney('$18.50', { decimals: 2, decimalComma: false }) // => { ok: true, minor: 1850 }
 * parseMoney('1200', { decimals: 0, decimalComma: false }) // => { ok: true, minor: 1200 }
 */
export function parseMoney(
  text: string,
  options: { decimals: number; decimalComma: boolean },
): { ok: true; minor: number } | ParseFailure {
  const written = tidyText(text).replace(/^\p{Sc}\s*|\s*\p{Sc}$/gu, '')
  if (written === '') return parseFailure('empty', 'Enter an amount.')
  if (written.startsWith('-') && parseMoney(written.slice(1), options).ok) {
    return parseFailure('negative', "This amount can't be negative.")
  }
  const read = readDecimal(withoutGroups(written, options.decimalComma), options.decimalComma)
  if (!read.ok) {
    return read.code === 'not-a-number'
      ? parseFailure('not-an-amount', `${quoted(written)} is not an amount. Write it like 18.50.`)
      : read
  }
  const shift = 10n ** BigInt(Math.max(0, read.decimals - options.decimals))
  if (read.digits % shift !== 0n) {
    return parseFailure(
      'too-many-decimals',
      options.decimals === 0
        ? 'This currency has no decimals.'
        : `At most ${options.decimals} decimals are money here.`,
    )
  }
  const minor = (read.digits / shift) * 10n ** BigInt(Math.max(0, options.decimals - read.decimals))
  if (minor > largestMinor) return parseFailure('too-large', 'This amount is too large.')
  return { ok: true, minor: Number(minor) }
}

function withoutGroups(written: string, decimalComma: boolean): string {
  if (decimalComma) return groupedComma.test(written) ? written.replaceAll('.', '') : written
  return groupedPoint.test(written) ? written.replaceAll(',', '') : written
}
