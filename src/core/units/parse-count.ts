import { type ParseFailure, parseFailure, quoted, tidyText } from './parsed'

/** Fits PostgreSQL's integer with room for sums. */
const largestCount = 1_000_000_000

/**
 * The number of pieces, teeth or packs written in `text`.
 *
 * Shapes     Digits alone: `12`. A separator of thousands is refused, since elsewhere it is the decimal sign.
 * Result     A whole number, 0 to 1,000,000,000.
 * Errors     None thrown; a failure `empty`, `not-a-count`, `negative`, `too-large`.
 *
 * @example
 * parseCount('12') // => { ok: true, count: 12 }
 */
export function parseCount(text: string): { ok: true; count: number } | ParseFailure {
  const written = tidyText(text)
  if (written === '') return parseFailure('empty', 'Enter a whole number.')
  if (/^-\d+$/.test(written)) return parseFailure('negative', "A count can't be negative.")
  if (!/^\d+$/.test(written)) {
    return parseFailure(
      'not-a-count',
      `${quoted(written)} is not a whole number. Write digits alone, like 12.`,
    )
  }
  const count = Number(written)
  return count > largestCount ? parseFailure('too-large', 'This count is too large.') : { ok: true, count }
}
