import { parseCount } from '@/core/units/parse-count'
import type { ReorderPointChange } from '@/hooks/use-reorder-points'
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
  { field: 'orderUpTo', label: 'Order up to', width: 120, kind: 'count' },
  { field: 'packSize', label: 'Pack', width: 90, kind: 'count' },
  { field: 'minimumOrder', label: 'Smallest order', width: 130, kind: 'count' },
  { field: 'supplierId', label: 'Supplier', width: 200, kind: 'supplier' },
  { field: 'supplierPartNumber', label: 'Supplier’s number', width: 160, kind: 'text' },
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

/** A field as it would be typed. */
export function typedText(row: ReorderPointRow, field: ReorderPointField): string {
  return String(row[field] ?? '')
}

export function supplierChoices(suppliers: readonly SupplierResponse[]): { value: string; label: string }[] {
  return [{ value: '', label: 'None' }, ...suppliers.map(({ id, name }) => ({ value: id, label: name }))]
}
