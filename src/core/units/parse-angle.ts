import { readDecimal } from './exact-decimal'
import { type ParseFailure, parseFailure, quoted, tidyText } from './parsed'

const anglePattern = /^([\d.,]+)\s*(?:°|º|deg|degs|degree|degrees)?$/i

/**
 * The angle written in `text`, in degrees with or without saying so.
 *
 * Shapes     `30`, `30°`, `30 deg`, `2.5`; `2,5` with `decimalComma`.
 * Units      Degrees, 0 to 360.
 * Errors     None thrown; a failure `empty`, `not-an-angle`, `decimal-comma`, `ambiguous`, `negative`, `too-large`.
 *
 * @example
 * parseAngle('7.5°', { decimalComma: false }) // => { ok: true, deg: 7.5 }
 */
export function parseAngle(
  text: string,
  options: { decimalComma: boolean },
): { ok: true; deg: number } | ParseFailure {
  const written = tidyText(text)
  if (written === '') return parseFailure('empty', 'Enter an angle.')
  if (written.startsWith('-') && parseAngle(written.slice(1), options).ok) {
    return parseFailure('negative', "This angle can't be negative.")
  }
  const number = anglePattern.exec(written)?.[1]
  const read = number === undefined ? undefined : readDecimal(number, options.decimalComma)
  if (read === undefined || (!read.ok && read.code === 'not-a-number')) {
    return parseFailure('not-an-angle', `${quoted(written)} is not an angle. Write degrees, like 30 or 7.5.`)
  }
  if (!read.ok) return read
  const deg = Number(`${read.digits}e-${read.decimals}`)
  return deg > 360 ? parseFailure('too-large', 'An angle is at most 360°.') : { ok: true, deg }
}
