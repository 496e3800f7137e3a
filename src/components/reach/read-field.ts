import { decimalText } from '@/core/units/decimal-text'
import { type LengthUnit, lengthDecimals } from '@/core/units/length-unit'
import { parseAngle } from '@/core/units/parse-angle'
import { parseDecimal } from '@/core/units/parse-decimal'
import { parseLength } from '@/core/units/parse-length'
import { parseSpeed } from '@/core/units/parse-speed'
import { lengthInputText } from '@/lib/format-length'
import { speedInputText } from '@/lib/format-speed'
import type { FieldKind } from './reach-fields'

/** How the person reads and writes figures. */
export interface Reading {
  unit: LengthUnit
  decimalComma: boolean
}

/** A figure in millimetres, degrees, newtons or m/min; a word where the field holds one; null where nothing was typed. */
export type FieldValue = number | string | null

export type FieldRead = { ok: true; value: FieldValue } | { ok: false; message: string }

/** What a typed text says, read once. */
export function readField(kind: FieldKind, text: string, reading: Reading): FieldRead {
  const written = text.trim()
  if (written === '') return { ok: true, value: null }
  switch (kind) {
    case 'length':
    case 'lengthOrZero': {
      const read = parseLength(written, { ...reading, allowZero: kind === 'lengthOrZero' })
      return read.ok ? { ok: true, value: read.mm } : read
    }
    case 'angle': {
      const read = parseAngle(written, reading)
      return read.ok ? { ok: true, value: read.deg } : read
    }
    case 'speed': {
      const read = parseSpeed(written, reading)
      return read.ok ? { ok: true, value: read.mPerMin } : read
    }
    case 'number': {
      const read = parseDecimal(written, reading)
      return read.ok ? { ok: true, value: read.value } : read
    }
    case 'choice':
    case 'text':
      return { ok: true, value: written }
  }
}

/** The text a field shows for a figure; `readField` reads the same figure back. */
export function fieldText(kind: FieldKind, value: FieldValue, reading: Reading): string {
  if (value === null) return ''
  if (typeof value === 'string') return value
  if (kind === 'length' || kind === 'lengthOrZero')
    return lengthInputText(value, reading.unit, { decimalComma: reading.decimalComma })
  if (kind === 'speed') return speedInputText(value, reading.unit, { decimalComma: reading.decimalComma })
  const text = decimalText(value, 0, lengthDecimals)
  return reading.decimalComma ? text.replace('.', ',') : text
}
