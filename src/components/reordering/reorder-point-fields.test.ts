import { describe, expect, test } from 'vitest'
import {
  type EditedField,
  editedFields,
  readTypedChange,
  readTypedPoint,
  typedCaution,
} from './reorder-point-fields'

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

describe('a typed form', () => {
  const typed = { reorderPoint: '4', orderUpTo: '12', packSize: '5', minimumOrder: '1' }

  test('it is read as a whole, and what may be empty is cleared', () => {
    expect(
      readTypedPoint({ ...typed, supplierId: '7', supplierPartNumber: ' T-1 ', leadTimeDays: '' }),
    ).toEqual({
      ok: true,
      change: {
        ...{ reorderPoint: 4, orderUpTo: 12, packSize: 5, minimumOrder: 1 },
        ...{ supplierId: '7', supplierPartNumber: 'T-1', leadTimeDays: null },
      },
    })
  })

  test('it says beside each field what cannot be read of it, all at once', () => {
    const read = readTypedPoint({ ...typed, reorderPoint: '-2', packSize: '2.5', leadTimeDays: '2 weeks' })
    expect(read).toEqual({
      ok: false,
      faults: {
        reorderPoint: "A count can't be negative.",
        packSize: '“2.5” is not a whole number. Write digits alone, like 12.',
        leadTimeDays: '“2 weeks” is not a whole number. Write digits alone, like 12.',
      },
    })
  })

  test('it cautions where an order would bring the item back to its point and no further', () => {
    expect(typedCaution({ ...typed, orderUpTo: '4' })).toContain('its alert stays open')
    expect(typedCaution(typed)).toBeNull()
    expect(typedCaution({ ...typed, orderUpTo: 'four' })).toBeNull()
  })
})
