import { type ParseFailure, parseFailure, quoted } from './parsed'

/** A written decimal, exactly: digits / 10^decimals. */
export interface ExactDecimal {
  ok: true
  digits: bigint
  decimals: number
}

const withPoint = /^(\d*)\.?(\d*)$/
const longestNumber = 40

/**
 * An unsigned decimal as written, without rounding.
 *
 * A comma is the decimal sign only with `decimalComma`. What could also be a separator of thousands is refused, never
 * guessed: `1,250` without the setting, `1.250` with it, `1.250,5` always.
 *
 * Shapes     `text`: digits with at most one point or comma; `.5` and `5.` count.
 * Result     The exact decimal, or a failure `not-a-number`, `decimal-comma`, `ambiguous`.
 *
 * @example
 * readDecimal('0.125', false) // => { ok: true, digits: 125n, decimals: 3 }
 * readDecimal('0,125', true) // => { ok: true, digits: 125n, decimals: 3 }
 */
export function readDecimal(text: string, decimalComma: boolean): ExactDecimal | ParseFailure {
  if (text.includes(',')) return readComma(text, decimalComma)
  const match = text.length > longestNumber ? null : withPoint.exec(text)
  const whole = match?.[1] ?? ''
  const part = match?.[2] ?? ''
  if (whole === '' && part === '') return parseFailure('not-a-number', `${quoted(text)} is not a number.`)
  if (decimalComma && text.includes('.') && looksGrouped(whole, part))
    return ambiguous(text, `${whole},${part}`)
  return { ok: true, digits: BigInt(whole + part), decimals: part.length }
}

function readComma(text: string, decimalComma: boolean): ExactDecimal | ParseFailure {
  if (text.includes('.') || text.indexOf(',') !== text.lastIndexOf(',')) return ambiguous(text)
  const point = text.replace(',', '.')
  const read = readDecimal(point, false)
  if (decimalComma || !read.ok) return read
  const [whole = '', part = ''] = text.split(',')
  return parseFailure(
    'decimal-comma',
    looksGrouped(whole, part) ? `Write ${whole}${part} or ${point}.` : `Write it ${point}.`,
  )
}

/** One to three digits, then exactly three: 1.250 may be meant as 1250, 0.250 can't. */
function looksGrouped(whole: string, part: string): boolean {
  return part.length === 3 && whole.length <= 3 && /^[1-9]/.test(whole)
}

function ambiguous(text: string, decimal?: string): ParseFailure {
  const instead = decimal
    ? `Write ${decimal} or ${decimal.replace(',', '')}`
    : 'Leave out the separator of thousands'
  return parseFailure('ambiguous', `${quoted(text)} can be read in two ways. ${instead}.`)
}

/** numerator / denominator to the nearest whole number, halves up; neither is negative. */
export function dividedToNearest(numerator: bigint, denominator: bigint): bigint {
  return (2n * numerator + denominator) / (2n * denominator)
}
