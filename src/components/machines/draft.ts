import { decimalText } from '@/core/units/decimal-text'
import type { LengthUnit } from '@/core/units/length-unit'
import { parseCount } from '@/core/units/parse-count'
import { parseDecimal } from '@/core/units/parse-decimal'
import { parseLength } from '@/core/units/parse-length'
import { lengthInputText } from '@/lib/format-length'

export interface DraftField {
  /** The field of the request, and so of its errors. */
  name: string
  label: string
  symbol?: string
  kind: 'line' | 'text' | 'length' | 'distance' | 'number' | 'count'
  isRequired?: boolean
  hint?: string
}

export interface DraftManner {
  unit: LengthUnit
  decimalComma: boolean
}

export type DraftTexts = Record<string, string>

/** What the fields of a form open with. */
export function draftTexts(
  fields: readonly DraftField[],
  row: Readonly<Record<string, unknown>> | null,
  manner: DraftManner,
): DraftTexts {
  return Object.fromEntries(
    fields.map((field) => [field.name, openingText(field, row?.[field.name], manner)]),
  )
}

function openingText({ kind }: DraftField, value: unknown, { unit, decimalComma }: DraftManner): string {
  if (typeof value === 'string') return value
  if (typeof value !== 'number') return ''
  if (kind === 'length' || kind === 'distance') return lengthInputText(value, unit, { decimalComma })
  const text = decimalText(value, 0, 9)
  return decimalComma ? text.replace('.', ',') : text
}

export interface DraftReading {
  body: Record<string, string | number | null>
  /** What could not be read, by field; empty where all of it could. */
  faults: Record<string, string>
}

/** Reads what was typed, each field once; what is left empty is null, or a fault where it is needed. */
export function readDraft(
  fields: readonly DraftField[],
  texts: Readonly<DraftTexts>,
  manner: DraftManner,
): DraftReading {
  const reading: DraftReading = { body: {}, faults: {} }
  for (const field of fields) {
    const read = readField(field, texts[field.name] ?? '', manner)
    if (read.ok) reading.body[field.name] = read.value
    else reading.faults[field.name] = read.message
  }
  return reading
}

type FieldReading = { ok: true; value: string | number | null } | { ok: false; message: string }

function readField(
  { kind, label, isRequired }: DraftField,
  text: string,
  { unit, decimalComma }: DraftManner,
): FieldReading {
  if (text.trim() === '') {
    if (isRequired) return { ok: false, message: `${label} is needed.` }
    return { ok: true, value: kind === 'line' || kind === 'text' ? '' : null }
  }
  switch (kind) {
    case 'line':
    case 'text':
      return { ok: true, value: text }
    case 'length':
    case 'distance': {
      const read = parseLength(text, {
        unit,
        decimalComma,
        allowZero: kind === 'distance',
        drillSizes: false,
      })
      return read.ok ? { ok: true, value: read.mm } : read
    }
    case 'count': {
      const read = parseCount(text)
      return read.ok ? { ok: true, value: read.count } : read
    }
    case 'number':
      return parseDecimal(text, { decimalComma })
  }
}
