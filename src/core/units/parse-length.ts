import { drillSizeSteps } from './drill-sizes'
import { dividedToNearest, readDecimal } from './exact-decimal'
import { type LengthUnit, lengthDecimals, unitSteps } from './length-unit'
import { type ParseFailure, parseFailure, quoted, tidyText } from './parsed'

export interface ParseLengthOptions {
  /** What a bare number is in. */
  unit: LengthUnit
  /** Whether a comma is the decimal sign. */
  decimalComma: boolean
  /** Whether `#7` and `F` are read as drill sizes; yes unless false. */
  drillSizes?: boolean
  /** Whether 0 is an answer; no unless true. */
  allowZero?: boolean
}

export interface ParsedLength {
  ok: true
  mm: number
  as: 'plain' | 'fraction' | 'unit' | 'drillSize'
}

const longestMm = 100_000
const scale = 10 ** lengthDecimals

const decimalPattern = /^([\d.,]+)\s*(\D.*)?$/
const fractionPattern = /^(?:(\d{1,6})(?: +| *- *))?(\d{1,6}) ?\/ ?(\d{1,6})\s*(\D.*)?$/
const drillPattern = /^(?:#|no\.?)\s*(\d+)$|^([a-z])$/i

/**
 * The length written in `text`, the way people in a shop write dimensions.
 *
 * A bare fraction is inches, whatever the unit set; a bare number is in `unit`; a unit written after it wins. A single
 * letter is a letter drill, never a unit. `2'` is refused: too many people mean inches by it.
 *
 * Shapes     `1/8`, `4 1/8`, `4-1/8`, `½`, `0.125"`, `1/8 in`, `3.175 mm`, `.5`, `50 thou`, `#7`, `No. 7`, `F`;
 *            units mm, cm, m, µm, um, in, inch, ", ft, thou, mil.
 * Units      Result in millimetres, the nearest 1e-9 mm to the exact value, at most 100 m.
 * Errors     None thrown; a failure says why in one sentence: `empty`, `not-a-length`, `unit-unknown`,
 *            `drill-size-unknown`, `fraction-improper`, `decimal-comma`, `ambiguous`, `negative`, `zero`, `too-small`,
 *            `too-large`.
 * Source     1 in = 25.4 mm exactly, NIST SP 811 (2008), appendix B; drill sizes ASME B94.11M.
 *
 * @example
 * parseLength('1/8', { unit: 'mm', decimalComma: false }) // => { ok: true, mm: 3.175, as: 'fraction' }
 * parseLength('3,5', { unit: 'mm', decimalComma: true }) // => { ok: true, mm: 3.5, as: 'plain' }
 * parseLength('50 thou', { unit: 'mm', decimalComma: false }) // => { ok: true, mm: 1.27, as: 'unit' }
 */
export function parseLength(text: string, options: ParseLengthOptions): ParsedLength | ParseFailure {
  const written = tidyText(text)
  if (written === '') return parseFailure('empty', 'Enter a length.')
  if (written.startsWith('-')) return readNegative(written, options)
  const decimal = decimalPattern.exec(written)
  if (decimal) return readDecimalLength(written, decimal[1] ?? '', decimal[2], options)
  const fraction = fractionPattern.exec(written)
  if (fraction) return readFraction(written, fraction, options)
  const drill = options.drillSizes === false ? null : drillPattern.exec(written)
  if (drill) return readDrillSize(drill[1] === undefined ? written : `#${drill[1]}`)
  return notALength(written)
}

function readNegative(written: string, options: ParseLengthOptions): ParseFailure {
  const rest = parseLength(written.slice(1), options)
  return rest.ok ? parseFailure('negative', "A length can't be negative.") : notALength(written)
}

function readDecimalLength(
  written: string,
  number: string,
  word: string | undefined,
  options: ParseLengthOptions,
): ParsedLength | ParseFailure {
  if (word !== undefined && /\d/.test(word)) {
    const fraction = fractionPattern.exec(written)
    return fraction ? readFraction(written, fraction, options) : notALength(written)
  }
  const read = readDecimal(number, options.decimalComma)
  if (!read.ok) return read.code === 'not-a-number' ? notALength(written) : read
  const steps = unitSteps(word ?? options.unit)
  if (steps === undefined) return unknownUnit(word ?? '')
  const length = dividedToNearest(read.digits * steps, 10n ** BigInt(read.decimals))
  return checkedLength(length, read.digits === 0n, word === undefined ? 'plain' : 'unit', options)
}

function readFraction(
  written: string,
  [, whole, top, bottom, word]: RegExpExecArray,
  options: ParseLengthOptions,
): ParsedLength | ParseFailure {
  const [numerator, denominator] = [BigInt(top ?? ''), BigInt(bottom ?? '')]
  if (denominator === 0n || (word !== undefined && /\d/.test(word))) return notALength(written)
  if (whole !== undefined && numerator >= denominator) {
    return parseFailure(
      'fraction-improper',
      `In ${quoted(written)} the fraction is not less than one. Check it.`,
    )
  }
  const steps = unitSteps(word ?? 'in')
  if (steps === undefined) return unknownUnit(word ?? '')
  const total = BigInt(whole ?? 0) * denominator + numerator
  return checkedLength(dividedToNearest(total * steps, denominator), total === 0n, 'fraction', options)
}

function readDrillSize(name: string): ParsedLength | ParseFailure {
  const steps = drillSizeSteps(name)
  if (steps === undefined) {
    return parseFailure('drill-size-unknown', `There is no number drill ${name}; they run from #1 to #80.`)
  }
  return { ok: true, mm: Number(steps) / scale, as: 'drillSize' }
}

function checkedLength(
  steps: bigint,
  isZero: boolean,
  as: ParsedLength['as'],
  options: ParseLengthOptions,
): ParsedLength | ParseFailure {
  if (isZero && !options.allowZero) return parseFailure('zero', 'A length must be more than 0.')
  if (steps === 0n && !isZero) return parseFailure('too-small', 'This is smaller than any length known here.')
  const mm = Number(steps) / scale
  if (mm > longestMm)
    return parseFailure('too-large', 'This is more than 100 m. Check the number and its unit.')
  return { ok: true, mm, as }
}

function unknownUnit(word: string): ParseFailure {
  const known =
    word === "'" || word === '′' || word === '’'
      ? `${quoted(word)} can mean feet or inches. Write ft or in.`
      : `${quoted(word)} is not a unit of length known here. Write mm, cm, m, µm, in, ft or thou.`
  return parseFailure('unit-unknown', known)
}

function notALength(written: string): ParseFailure {
  return parseFailure(
    'not-a-length',
    `${quoted(written)} is not a length. Write it like 3.175 mm, 0.125 in or 1/8.`,
  )
}
