import { type ParseFailure, parseFailure, quoted, tidyText } from './parsed'

/** Fits PostgreSQL's integer with room for sums. */
const largestCount = 1_000_000_000

/**
 * The number of pieces, teeth or packs written in `text`.
 *
 * Shapes     Digits alone, or in threes with spaces of any width between: `12`, `8 000`. A comma or a point between
 *            thousands is taken where it is known which of them is the decimal sign: `8,000` with `decimalComma` false,
 *            `8.000` with it true. Where that is not known it is refused: `1,000` may be one piece with three decimals.
 * Result     A whole number, 0 to 1,000,000,000.
 * Errors     None thrown; a failure `empty`, `not-a-count`, `negative`, `too-large`.
 *
 * @example
 * parseCount('12') // => { ok: true, count: 12 }
 * parseCount('8,000', { decimalComma: false }) // => { ok: true, count: 8000 }
 */
export function parseCount(
  text: string,
  settings?: { decimalComma: boolean },
): { ok: true; count: number } | ParseFailure {
  const written = withoutThousands(tidyText(text), settings)
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

/** Groups of three, all with the same separator; anything else is left to be refused as it stands. */
function withoutThousands(text: string, settings: { decimalComma: boolean } | undefined): string {
  const separator = settings ? (settings.decimalComma ? '.' : ',') : ' '
  const [, found] = /^-?\d{1,3}([ ,.])\d{3}(?:\1\d{3})*$/.exec(text) ?? []
  return found === ' ' || found === separator ? text.replaceAll(found, '') : text
}
