import type { LengthUnit } from './length-unit'
import { parseDecimal } from './parse-decimal'
import { type ParseFailure, parseFailure, quoted, tidyText } from './parsed'

/** Exact: 1 ft = 0.3048 m (NIST SP 811, appendix B). */
export const metresPerFoot = 0.3048

const speedPattern = /^(-?[\d.,]+)\s*(\D.*)?$/
const metreWords = new Set(['m/min', 'm/min.', 'mpm', 'smm'])
const footWords = new Set(['sfm', 'sfpm', 'ft/min', 'fpm'])

/**
 * The cutting speed written in `text`: a bare number is in m/min for people who work in mm, in SFM (surface feet a
 * minute) for those who work in inches.
 *
 * Units      m/min, more than 0.
 * Errors     None thrown; a failure `empty`, `not-a-speed`, `unit-unknown`, `decimal-comma`, `ambiguous`, `negative`,
 *            `zero`, `too-large`.
 *
 * @example
 * parseSpeed('120', { unit: 'mm', decimalComma: false }) // => { ok: true, mPerMin: 120 }
 * parseSpeed('500 SFM', { unit: 'mm', decimalComma: false }) // => { ok: true, mPerMin: 152.4 }
 */
export function parseSpeed(
  text: string,
  options: { unit: LengthUnit; decimalComma: boolean },
): { ok: true; mPerMin: number } | ParseFailure {
  const written = tidyText(text)
  if (written === '') return parseFailure('empty', 'Enter a cutting speed.')
  const [, number, word] = speedPattern.exec(written) ?? []
  if (number === undefined) {
    return parseFailure(
      'not-a-speed',
      `${quoted(written)} is not a cutting speed. Write it like 120 m/min or 400 SFM.`,
    )
  }
  const factor = mPerMinFactor(word, options.unit)
  if (factor === undefined) {
    return parseFailure(
      'unit-unknown',
      `${quoted(word ?? '')} is not a unit of cutting speed. Write m/min or SFM.`,
    )
  }
  const read = parseDecimal(number, options)
  if (!read.ok) return read
  if (read.value === 0) return parseFailure('zero', 'A cutting speed must be more than 0.')
  return { ok: true, mPerMin: Number((read.value * factor).toPrecision(15)) }
}

function mPerMinFactor(word: string | undefined, unit: LengthUnit): number | undefined {
  const lower = word?.toLowerCase()
  if (lower === undefined) return unit === 'mm' ? 1 : metresPerFoot
  if (metreWords.has(lower)) return 1
  return footWords.has(lower) ? metresPerFoot : undefined
}
