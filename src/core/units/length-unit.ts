import { mathjsLengthMm } from './mathjs-length'

/** The two units a person, a shop or a file may be set to. */
export const lengthUnits = ['mm', 'in'] as const
export type LengthUnit = (typeof lengthUnits)[number]

/** Exact by definition since 1959 (NIST SP 811, appendix B). */
export const mmPerInch = 25.4

/** Lengths are kept to this many decimals of a millimetre: the nearest 1e-9 mm, far below anything that can be made. */
export const lengthDecimals = 9

/** What people write after a dimension, in lower case, and the name mathjs has for it. */
const mathjsNames: Readonly<Record<string, string>> = {
  m: 'm',
  cm: 'cm',
  µm: 'um',
  um: 'um',
  micron: 'um',
  microns: 'um',
  ft: 'ft',
  foot: 'ft',
  feet: 'ft',
  thou: 'mil',
  mil: 'mil',
  mils: 'mil',
}

const inchWords = new Set(['in', 'in.', 'inch', 'inches', '"', '″', '”', '“', "''", '′′', '’’'])

const scale = 10 ** lengthDecimals
const steps = new Map<string, bigint>()

/**
 * How many steps of 1e-9 mm one of the unit written as `word` is, or undefined for a word that is no unit of length.
 *
 * Millimetres and inches go round mathjs; the rarer units are asked of it once each.
 *
 * Units      1e-9 mm, a whole number for every unit known here.
 * Errors     None.
 * Source     mathjs 15's unit table, checked in length-unit.test.ts against NIST SP 811 (2008), appendix B.
 *
 * @example
 * unitSteps('in') // => 25400000000n
 * unitSteps('thou') // => 25400000n
 * unitSteps('parsec') // => undefined
 */
export function unitSteps(word: string): bigint | undefined {
  const lower = word.toLowerCase().replace('μ', 'µ')
  if (lower === 'mm') return BigInt(scale)
  if (inchWords.has(lower)) return BigInt(mmPerInch * scale)
  const known = steps.get(lower)
  if (known !== undefined) return known
  const name = Object.hasOwn(mathjsNames, lower) ? mathjsNames[lower] : undefined
  if (name === undefined) return undefined
  const found = BigInt(Math.round(mathjsLengthMm(name) * scale))
  steps.set(lower, found)
  return found
}
