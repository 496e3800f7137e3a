import type { LengthUnit } from '@/core/units/length-unit'
import { parseAngle } from '@/core/units/parse-angle'
import { parseCount } from '@/core/units/parse-count'
import { parseLength } from '@/core/units/parse-length'
import { parseMoney } from '@/core/units/parse-money'
import { type ParseFailure, quoted } from '@/core/units/parsed'
import type { ImportFieldType } from '@/schemas/import-fields'
import { withoutFormulaGuard } from './csv-line'
import { conditionNamed, formNamed, partNamed, substrateNamed } from './trade-words'

export interface CellContext {
  /** Of a bare number in this cell. */
  unit: LengthUnit
  decimalComma: boolean
  /** Of the shop's currency. */
  currencyDecimals: number
}

export type CellValue =
  | { kind: 'blank' }
  | { kind: 'value'; value: string | number | readonly [number, number] }
  | { kind: 'problem'; message: string }

const blank: CellValue = { kind: 'blank' }

/** What lists write for "has none"; in a text it may be meant. */
const nothingWords = /^(?:[-–—.]+|n\/?a|none|null|nil|tbd|\?)$/i

/**
 * The value of one cell. A blank one says nothing, and so does `-` or `n/a` where a number or a word of a list is
 * expected. A quote that our own reject file put before `=`, `+`, `-` or `@` is taken off again.
 */
export function cellValue(type: ImportFieldType, cell: string, context: CellContext): CellValue {
  const text = cell.trim()
  if (text === '') return blank
  if (type === 'text') return { kind: 'value', value: withoutFormulaGuard(text) }
  return nothingWords.test(text) ? blank : readers[type](text, context)
}

type Reader = (text: string, context: CellContext) => CellValue

const length =
  (options: { allowZero: boolean; drillSizes: boolean }): Reader =>
  (text, context) => {
    const read = parseLength(text, { ...options, unit: context.unit, decimalComma: context.decimalComma })
    return read.ok ? { kind: 'value', value: read.mm } : unread(read)
  }

const plainLength = length({ allowZero: false, drillSizes: false })

const readers: Readonly<Record<Exclude<ImportFieldType, 'text'>, Reader>> = {
  length: plainLength,
  diameter: length({ allowZero: false, drillSizes: true }),
  distance: length({ allowZero: true, drillSizes: false }),
  range: readRange,
  angle: (text, context) => {
    const read = parseAngle(text, context)
    return read.ok ? { kind: 'value', value: read.deg } : unread(read)
  },
  count: (text) => readCount(text.replace(/^z\s*=?\s*(?=\d)|(?<=\d)\s*(?:fl|flutes?|z|teeth|rpm)\.?$/gi, '')),
  quantity: (text) => readCount(text.replace(/(?<=\d)\s*(?:pcs?|pieces?|ea|each)\.?$/i, '')),
  days: (text) => readCount(text.replace(/(?<=\d)\s*(?:d|days?)\.?$/i, '')),
  money: (text, context) => {
    const read = parseMoney(text, { decimals: context.currencyDecimals, decimalComma: context.decimalComma })
    return read.ok ? { kind: 'value', value: read.minor } : unread(read)
  },
  form: (text) =>
    word(
      formNamed(text),
      text,
      'a form known here',
      'square, corner radius, ball, tapered, drill or another',
    ),
  substrate: (text) => word(substrateNamed(text), text, 'known here', 'carbide or HSS'),
  part: (text) => word(partNamed(text), text, 'a part of a holder', 'nut or holder'),
  condition: (text) => word(conditionNamed(text), text, 'a condition', 'new, used, reground or worn'),
  unit: (text) => word(unitNamed(text), text, 'a unit', 'mm or in'),
}

function problem(message: string): CellValue {
  return { kind: 'problem', message }
}

/** A comma that is no decimal sign may be one all the same: the file as a whole can say so. */
function unread({ code, message }: ParseFailure): CellValue {
  return problem(
    code === 'decimal-comma'
      ? `${message} If commas are the decimals of this file, say so under Columns.`
      : message,
  )
}

function word(value: string | undefined, text: string, what: string, instead: string): CellValue {
  return value === undefined
    ? problem(`${quoted(text)} is not ${what}. Write ${instead}.`)
    : { kind: 'value', value }
}

/** A count as spreadsheets keep it: `4`, or `4.0` where the column was made of decimals. */
function readCount(text: string): CellValue {
  const read = parseCount(text.replace(/^(\d+)\.0+$/, '$1'))
  return read.ok ? { kind: 'value', value: read.count } : problem(read.message)
}

export function unitNamed(text: string): LengthUnit | undefined {
  const written = text.trim().toLowerCase()
  if (/^(?:mm|millimet(?:er|re)s?|metric|m)$/.test(written)) return 'mm'
  return /^(?:in|in\.|inch|inches|imperial|english|"|i)$/.test(written) ? 'in' : undefined
}

/** `3-2`, `2.0 – 3.0 mm`, `1/8 to 1/4`: a dash between fractions needs blanks around it, since `1-1/8` is one size. */
function readRange(text: string, context: CellContext): CellValue {
  const unit = /\s*(mm|in|inch|")\s*$/i.exec(text)?.[1]
  const body = unit ? text.slice(0, text.length - unit.length).trim() : text
  const parts = body.includes('/')
    ? body.split(/\s+(?:-|–|—|to)\s+|\s*(?:\.\.\.?|…)\s*/i)
    : body.split(/\s*(?:-|–|—|\bto\b|\.\.\.?|…)\s*/i)
  if (parts.length !== 2) return problem(`${quoted(text)} is not a range. Write it like 2 - 3.`)
  const of = { ...context, unit: unitNamed(unit ?? '') ?? context.unit }
  const [first, second] = parts.map((part) => plainLength(part, of))
  for (const end of [first, second]) if (end?.kind === 'problem') return end
  if (first?.kind !== 'value' || second?.kind !== 'value') return problem(`${quoted(text)} is not a range.`)
  const ends = [Number(first.value), Number(second.value)].sort((a, b) => a - b)
  return { kind: 'value', value: [ends[0] ?? 0, ends[1] ?? 0] }
}
