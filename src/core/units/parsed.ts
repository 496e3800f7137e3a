/** Why typed text was refused: a stable code, and a short sentence to put beside the field. */
export interface ParseFailure {
  ok: false
  code: ParseFailureCode
  message: string
}

export type ParseFailureCode =
  | 'empty'
  | 'not-a-length'
  | 'not-an-angle'
  | 'not-a-count'
  | 'not-an-amount'
  | 'not-a-speed'
  | 'not-a-number'
  | 'unit-unknown'
  | 'drill-size-unknown'
  | 'fraction-improper'
  | 'decimal-comma'
  | 'ambiguous'
  | 'negative'
  | 'zero'
  | 'too-small'
  | 'too-large'
  | 'too-many-decimals'

export function parseFailure(code: ParseFailureCode, message: string): ParseFailure {
  return { ok: false, code, message }
}

const odd = /[^\x20-\x7e]/
const longestText = 60

/**
 * Typed or pasted text with the look-alikes of print made plain: no-break spaces, long dashes, ½ and its kin, and a
 * diameter sign in front, which says nothing about the number.
 */
export function tidyText(text: string): string {
  const trimmed = text.trim()
  if (!odd.test(trimmed)) return trimmed
  return trimmed
    .replace(/[\u00a0\u2007\u2009\u202f]/g, ' ')
    .replace(/[\u2010-\u2015\u2212]/g, '-')
    .replace(/^[Øø⌀∅]\s*/, '')
    .replace(/[¼½¾⅐-⅞]/g, (sign) => ` ${sign.normalize('NFKC')}`)
    .replace(/\u2044/g, '/')
    .trim()
}

/** Text as it is quoted back in a message, cut where it is long. */
export function quoted(text: string): string {
  return `“${text.length > longestText ? `${text.slice(0, longestText)}…` : text}”`
}
