import { describe, expect, test } from 'vitest'
import { type EditedField, editedFields, readTypedChange } from './reorder-point-fields'

function fieldOf(name: string): EditedField {
  const found = editedFields.find(({ field }) => field === name)
  if (!found) throw new Error(name)
  return found
}

describe('a typed change', () => {
  test('it is a whole number where pieces or days are asked for, and refused with a sentence where it is none', () => {
    expect(readTypedChange(fieldOf('reorderPoint'), ' 12 ')).toEqual({
      ok: true,
      change: { reorderPoint: 12 },
    })
    expect(readTypedChange(fieldOf('reorderPoint'), '')).toMatchObject({ ok: false })
    expect(readTypedChange(fieldOf('packSize'), '1.5')).toMatchObject({ ok: false })
    expect(readTypedChange(fieldOf('orderUpTo'), '-3')).toMatchObject({ ok: false })
  })

  test('it clears what may be empty', () => {
    expect(readTypedChange(fieldOf('leadTimeDays'), '')).toEqual({ ok: true, change: { leadTimeDays: null } })
    expect(readTypedChange(fieldOf('supplierId'), '')).toEqual({ ok: true, change: { supplierId: null } })
    expect(readTypedChange(fieldOf('supplierPartNumber'), '  ')).toEqual({
      ok: true,
      change: { supplierPartNumber: null },
    })
  })
})
