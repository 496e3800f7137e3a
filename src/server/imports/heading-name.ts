import type { LengthUnit } from '@/core/units/length-unit'

export interface HeadingName {
  /** What the heading says once unit, punctuation and short forms are out of the way. */
  name: string
  /** The unit it states, in brackets or at its end. */
  unit: LengthUnit | null
  /** A currency it states, ISO 4217. */
  currency: string | null
  /** What stands in brackets and is no unit: a symbol perhaps. */
  inBrackets: string | null
  /** Words all in capitals outside the brackets, each with what the heading says without it: `DC` of `Ø DC` beside `diameter`. */
  capitals: { word: string; rest: string }[]
}

const unitWords: Readonly<Record<string, LengthUnit>> = {
  mm: 'mm',
  millimeter: 'mm',
  millimeters: 'mm',
  millimetre: 'mm',
  millimetres: 'mm',
  in: 'in',
  inch: 'in',
  inches: 'in',
  '"': 'in',
  '″': 'in',
}

const angleWords = new Set([
  'deg',
  'degs',
  'degree',
  'degrees',
  '°',
  'rpm',
  '1/min',
  'min-1',
  'pcs',
  'ea',
  'pc',
])

/** Short forms of headings and the word each stands for; an empty one says nothing. */
const words: Readonly<Record<string, string>> = {
  dia: 'diameter',
  diam: 'diameter',
  ø: 'diameter',
  rad: 'radius',
  len: 'length',
  lgth: 'length',
  lg: 'length',
  lngth: 'length',
  no: 'number',
  nr: 'number',
  num: 'number',
  nbr: 'number',
  mfr: 'maker',
  mfg: 'maker',
  manufacturer: 'maker',
  brand: 'maker',
  desc: 'description',
  descr: 'description',
  qty: 'quantity',
  quan: 'quantity',
  max: 'maximum',
  min: 'minimum',
  largest: 'maximum',
  smallest: 'minimum',
  flutes: 'flute',
  flt: 'flute',
  fl: 'flute',
  teeth: 'flute',
  tooth: 'flute',
  shk: 'shank',
  shnk: 'shank',
  cut: 'cutting',
  cutter: 'cutting',
  crnr: 'corner',
  cor: 'corner',
  oa: 'overall',
  total: 'overall',
  tot: 'overall',
  proj: 'projection',
  gage: 'gauge',
  cond: 'condition',
  loc: 'loc',
  seg: 'segment',
  ser: 'series',
  mat: 'material',
  matl: 'material',
  centre: 'center',
  the: '',
  of: '',
  tool: '',
  item: '',
  nominal: '',
  nom: '',
}

const brackets = /[([{]\s*([^)\]}]*?)\s*[)\]}]/g

/**
 * A heading as people write it, taken apart: `Shank Ø [mm]` is `shankdiameter` in mm, `Flute Len.` is `flutelength`,
 * `cuttingDiameterMm` is `cuttingdiameter` in mm.
 */
export function headingName(heading: string): HeadingName {
  const found: HeadingName = { name: '', unit: null, currency: null, inBrackets: null, capitals: [] }
  const outside = heading.replace(brackets, (_, inner: string) => {
    readBracket(inner, found)
    return ' '
  })
  const tokens = tokensOf(outside)
  readTail(tokens, found)
  found.name = plainName(tokens)
  found.capitals = [...new Set(outside.match(/(?<![\p{L}\p{N}])[A-Z]{2,}(?![\p{L}\p{N}])/gu) ?? [])].map(
    (word) => ({
      word,
      rest: plainName(tokens.filter((token) => token !== word.toLowerCase())),
    }),
  )
  return found
}

/** A name as `headingName` would answer it, for the lists of names known here. */
export function plainHeading(text: string): string {
  return plainName(tokensOf(text))
}

function readBracket(inner: string, found: HeadingName): void {
  const word = inner.toLowerCase().replace(/\.$/, '')
  const unit = unitOf(word)
  if (unit) found.unit = unit
  else if (/^[A-Z]{3}$/.test(inner) && !/^(?:LCF|OAL|DMM|NOF|SIG|DCN|DCX|LOC)$/.test(inner))
    found.currency = inner
  else if (word !== '' && !angleWords.has(word) && !/^\p{Sc}$/u.test(word)) found.inBrackets = inner
}

function unitOf(word: string): LengthUnit | null {
  return Object.hasOwn(unitWords, word) ? (unitWords[word] ?? null) : null
}

function tokensOf(text: string): string[] {
  return text
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase()
    .replace(/[øØ⌀∅φ]/g, ' ø ')
    .replace(/#/g, ' number ')
    .replace(/\bp\/n\b|\bp-n\b/g, 'pn')
    .replace(/["″]/g, ' " ')
    .replace(/°/g, ' deg ')
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .split(/[^\p{L}\p{N}"]+/u)
    .filter((token) => token !== '')
}

/** Takes a unit, a degree sign or a currency off the end, unless nothing else is there. */
function readTail(tokens: string[], found: HeadingName): void {
  while (tokens.length > 1) {
    const last = tokens.at(-1) ?? ''
    const unit = unitOf(last)
    if (unit) found.unit ??= unit
    else if (/^(?:usd|eur|gbp|cad|jpy|krw|chf|aud|sek|nok|dkk|pln|czk|cny|inr|mxn|brl)$/.test(last)) {
      found.currency ??= last.toUpperCase()
    } else if (!/^(?:deg|degs|degrees|degree)$/.test(last)) return
    tokens.pop()
  }
}

function plainName(tokens: string[]): string {
  const full = tokens.map((token) => (Object.hasOwn(words, token) ? (words[token] ?? token) : token)).join('')
  return full === '' ? tokens.join('') : full
}
