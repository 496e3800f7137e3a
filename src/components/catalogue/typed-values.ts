import type { FieldValues } from 'react-hook-form'
import { decimalText } from '@/core/units/decimal-text'
import type { LengthUnit } from '@/core/units/length-unit'
import { parseAngle } from '@/core/units/parse-angle'
import { parseCount } from '@/core/units/parse-count'
import { parseLength } from '@/core/units/parse-length'
import { parseMoney } from '@/core/units/parse-money'
import type { ParseFailure } from '@/core/units/parsed'
import { lengthInputText } from '@/lib/format-length'
import { currencyDecimals } from '@/lib/format-money'
import type { FieldProblem } from '@/schemas/problem'
import type { ItemField, ItemFormDefinition } from './item-form-definition'
import { putAt, valueAt } from './value-at'

/** How a person writes and reads numbers. */
export interface Manner {
  unit: LengthUnit
  decimalComma: boolean
  currency: string
}

export interface TypedSegment {
  part: string
  lengthMm: string
  noseDiameterMm: string
  spindleDiameterMm: string
}

type AnyFormDefinition = Pick<ItemFormDefinition<never>, 'groups' | 'segments' | 'blank'>

const segmentLengths = ['lengthMm', 'noseDiameterMm', 'spindleDiameterMm'] as const

export function formFields(definition: AnyFormDefinition): ItemField[] {
  return definition.groups.flatMap((group) => group.fields)
}

export function blankSegment(part = 'holder'): TypedSegment {
  return { part, lengthMm: '', noseDiameterMm: '', spindleDiameterMm: '' }
}

/** What the form opens with for a new item: everything empty but the usual choices. */
export function blankValues(definition: AnyFormDefinition): FieldValues {
  const values: FieldValues = {}
  for (const field of formFields(definition))
    putAt(values, field.path, valueAt(definition.blank, field.path) ?? '')
  if (definition.segments) values.segments = [blankSegment(definition.segments.hasPart ? 'nut' : 'holder')]
  return values
}

/** A row as the person would have typed it. */
export function typedRow(definition: AnyFormDefinition, row: object, manner: Manner): FieldValues {
  const values: FieldValues = {}
  for (const field of formFields(definition))
    putAt(values, field.path, typedText(field, valueAt(row, field.path), manner))
  if (definition.segments) {
    const segments = (valueAt(row, 'segments') ?? []) as FieldValues[]
    values.segments = segments.map((segment) => ({
      part: segment.part ?? 'holder',
      ...Object.fromEntries(
        segmentLengths.map((name) => [name, lengthInputText(segment[name], manner.unit, manner)]),
      ),
    }))
  }
  return values
}

/** One value as the person would have typed it. */
export function typedText(field: ItemField, value: unknown, manner: Manner): string {
  if (value === null || value === undefined) return ''
  if (typeof value !== 'number') return String(value)
  if (field.kind === 'length') return lengthInputText(value, manner.unit, manner)
  if (field.kind === 'money') {
    const decimals = currencyDecimals(manner.currency)
    return localised(decimalText(value / 10 ** decimals, decimals, decimals), manner)
  }
  return localised(decimalText(value, 0, 9), manner)
}

function localised(text: string, { decimalComma }: Manner): string {
  return decimalComma ? text.replace('.', ',') : text
}

export interface ReadValues {
  body: FieldValues
  problems: FieldProblem[]
}

/** The one place where what was typed becomes millimetres, degrees and minor units. */
export function readTyped(definition: AnyFormDefinition, values: FieldValues, manner: Manner): ReadValues {
  const read: ReadValues = { body: {}, problems: [] }
  for (const field of formFields(definition)) {
    const isShown = field.isShown?.(values) ?? true
    if (isShown) readInto(read, field, field.path, valueAt(values, field.path), manner)
    else if (!field.path.includes('.')) putAt(read.body, field.path, null)
  }
  if (definition.segments) readSegments(read, values.segments ?? [], definition.segments.hasPart, manner)
  return read
}

/** What was typed for one field alone; null clears it, and the server says where that can't be. */
export function readTypedField(
  field: ItemField,
  text: string,
  manner: Manner,
): { ok: true; value: unknown } | { ok: false; message: string } {
  const read: ReadValues = { body: {}, problems: [] }
  readInto(read, field, field.path, text, manner)
  const [problem] = read.problems
  if (problem) return { ok: false, message: problem.message }
  return { ok: true, value: valueAt(read.body, field.path) ?? null }
}

function readSegments(read: ReadValues, segments: TypedSegment[], hasPart: boolean, manner: Manner): void {
  read.body.segments = segments.map((segment) => (hasPart ? { part: segment.part } : {}))
  for (const [index, segment] of segments.entries())
    for (const name of segmentLengths)
      readInto(read, { kind: 'length', isRequired: true }, `segments.${index}.${name}`, segment[name], manner)
}

function readInto(
  read: ReadValues,
  field: Pick<ItemField, 'kind' | 'allowZero' | 'isRequired'>,
  path: string,
  typed: unknown,
  manner: Manner,
): void {
  const text = typeof typed === 'string' ? typed : ''
  if (field.kind === 'line' || field.kind === 'text') {
    putAt(read.body, path, text)
    return
  }
  if (text.trim() === '') {
    // Left out where it must be there, so that the schema's own sentence asks for it.
    if (!field.isRequired) putAt(read.body, path, null)
    return
  }
  if (field.kind === 'choice') {
    putAt(read.body, path, text)
    return
  }
  const value = readNumber(field, text, manner)
  if (typeof value === 'number') putAt(read.body, path, value)
  else read.problems.push({ path, message: value.message })
}

function readNumber(
  { kind, allowZero }: Pick<ItemField, 'kind' | 'allowZero'>,
  text: string,
  { unit, decimalComma, currency }: Manner,
): number | ParseFailure {
  if (kind === 'angle') {
    const read = parseAngle(text, { decimalComma })
    return read.ok ? read.deg : read
  }
  if (kind === 'count') {
    const read = parseCount(text, { decimalComma })
    return read.ok ? read.count : read
  }
  if (kind === 'money') {
    const read = parseMoney(text, { decimals: currencyDecimals(currency), decimalComma })
    return read.ok ? read.minor : read
  }
  const read = parseLength(text, { unit, decimalComma, allowZero })
  return read.ok ? read.mm : read
}
