import type { LengthUnit } from '@/core/units/length-unit'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import { formatMoney } from '@/lib/format-money'
import { type ImportKind, importField } from '@/schemas/import-fields'

export interface ValueLook {
  kind: ImportKind
  unit: LengthUnit
  currency: string
}

/** A field by the name it has on the page; bore columns have none among the fields of a file. */
export function fieldLabel(kind: ImportKind, field: string): string {
  if (field === 'segments') return 'Outline'
  if (field === 'boreKind') return 'Bore'
  return importField(kind, field)?.label ?? field
}

/** A staged value as people read it: lengths in their own unit, money in the shop's currency. */
export function valueText(field: string, value: unknown, look: ValueLook): string {
  if (value === null || value === undefined || value === '') return 'none'
  if (field === 'unitCost' && typeof value === 'number') return formatMoney(value, look.currency)
  if (typeof value === 'number') return numberText(field, value, look.unit)
  if (Array.isArray(value)) return value.map((piece) => segmentText(piece, look.unit)).join(', ')
  return typeof value === 'string' ? wordText(field, value) : JSON.stringify(value)
}

function numberText(field: string, value: number, unit: LengthUnit): string {
  if (field.endsWith('Mm')) return formatLength(value, unit)
  return field.endsWith('Deg') ? formatAngle(value) : value.toLocaleString('en')
}

/** `corner_radius` reads as two words; only the closed lists are written so. */
function wordText(field: string, value: string): string {
  return ['form', 'substrate', 'condition', 'boreKind'].includes(field) ? value.replaceAll('_', ' ') : value
}

function segmentText(piece: Record<string, unknown>, unit: LengthUnit): string {
  const length = (name: string) => formatLength(Number(piece[name]), unit, { withUnit: false })
  const [nose, spindle] = [length('nose_diameter_mm'), length('spindle_diameter_mm')]
  const across = nose === spindle ? `Ø${nose}` : `Ø${nose}–${spindle}`
  return `${piece.part === 'nut' ? 'nut ' : ''}${across} × ${length('length_mm')}`
}
