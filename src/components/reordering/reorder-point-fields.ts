import { parseCount } from '@/core/units/parse-count'
import type { ReorderPointChange } from '@/hooks/use-reorder-points'
import { reorderPointCaution } from '@/lib/reorder-point-caution'
import type { ReorderPointRow } from '@/schemas/reordering'
import type { SupplierResponse } from '@/schemas/supplier'

export type ReorderPointField = keyof ReorderPointChange

export interface EditedField {
  field: ReorderPointField
  label: string
  width: number
  kind: 'count' | 'optionalCount' | 'text' | 'supplier'
}

/** What can be typed of a reorder point, in the order of the columns. */
export const editedFields: readonly EditedField[] = [
  { field: 'reorderPoint', label: 'Reorder point', width: 130, kind: 'count' },
  { field: 'orderUpTo', label: 'Order up to', width: 140, kind: 'count' },
  { field: 'packSize', label: 'Pack', width: 80, kind: 'count' },
  { field: 'minimumOrder', label: 'Smallest order', width: 130, kind: 'count' },
  { field: 'supplierId', label: 'Supplier', width: 190, kind: 'supplier' },
  { field: 'supplierPartNumber', label: 'Supplier’s number', width: 150, kind: 'text' },
  { field: 'leadTimeDays', label: 'Lead time, days', width: 130, kind: 'optionalCount' },
]

export type TypedChange = { ok: true; change: ReorderPointChange } | { ok: false; message: string }

/** What a typed text means in a field; the server judges the figure itself. */
export function readTypedChange({ field, kind }: EditedField, text: string): TypedChange {
  if (kind === 'supplier') return { ok: true, change: { [field]: text === '' ? null : text } }
  if (kind === 'text') return { ok: true, change: { [field]: text.trim() === '' ? null : text.trim() } }
  if (kind === 'optionalCount' && text.trim() === '') return { ok: true, change: { [field]: null } }
  const read = parseCount(text)
  return read.ok ? { ok: true, change: { [field]: read.count } } : { ok: false, message: read.message }
}

export type TypedTexts = Readonly<Partial<Record<ReorderPointField, string>>>

/** What the fields of a form say together, with what cannot be read beside its field. */
export function readTypedPoint(
  texts: TypedTexts,
): { ok: true; change: ReorderPointChange } | { ok: false; faults: TypedTexts } {
  let change: ReorderPointChange = {}
  const faults: Partial<Record<ReorderPointField, string>> = {}
  for (const field of editedFields) {
    const read = readTypedChange(field, texts[field.field] ?? '')
    if (read.ok) change = { ...change, ...read.change }
    else faults[field.field] = read.message
  }
  return Object.keys(faults).length > 0 ? { ok: false, faults } : { ok: true, change }
}

/** What to think of, while it is still being typed. */
export function typedCaution(texts: TypedTexts): string | null {
  const [reorderPoint, orderUpTo] = [parseCount(texts.reorderPoint ?? ''), parseCount(texts.orderUpTo ?? '')]
  if (!reorderPoint.ok || !orderUpTo.ok) return null
  return reorderPointCaution({ reorderPoint: reorderPoint.count, orderUpTo: orderUpTo.count })
}

/** A field as it would be typed. */
export function typedText(row: ReorderPointRow, field: ReorderPointField): string {
  return String(row[field] ?? '')
}

/** A field as it is shown. */
export function shownText(row: ReorderPointRow, { field, kind }: EditedField): string {
  if (kind === 'supplier') return row.supplierName ?? ''
  return field === 'orderUpTo' && row.caution ? `${row.orderUpTo}, the point itself` : typedText(row, field)
}

/** Whom one can choose; the one a row has stays a choice even if it is not among them. */
export function supplierChoices(
  suppliers: readonly Pick<SupplierResponse, 'id' | 'name'>[],
): { value: string; label: string }[] {
  return [
    { value: '', label: 'None named' },
    ...suppliers.map(({ id, name }) => ({ value: id, label: name })),
  ]
}
