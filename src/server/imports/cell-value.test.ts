import { describe, expect, it } from 'vitest'
import type { ImportFieldType } from '@/schemas/import-fields'
import { cellValue } from './cell-value'

const inches = { unit: 'in', decimalComma: false, currencyDecimals: 2 } as const
const millimetres = { unit: 'mm', decimalComma: true, currencyDecimals: 2 } as const

function read(
  type: ImportFieldType,
  cell: string,
  context: typeof inches | typeof millimetres = inches,
): unknown {
  const value = cellValue(type, cell, context)
  return value.kind === 'value' ? value.value : value.kind
}

describe('cells', () => {
  it.each<[ImportFieldType, string, unknown]>([
    ['length', '1/2', 12.7],
    ['length', '4 1/8', 104.775],
    ['length', '.375', 9.525],
    ['length', '10 mm', 10],
    ['diameter', '#7', 5.1054],
    ['diameter', 'F', 6.5278],
    ['length', 'F', 'problem'],
    ['distance', '0', 0],
    ['length', '0', 'problem'],
    ['length', '-', 'blank'],
    ['length', 'N/A', 'blank'],
    ['length', '  ', 'blank'],
    ['text', 'N/A', 'N/A'],
    ['text', "'-5X", '-5X'],
    ['text', "'tis", "'tis"],
    ['count', '4 FL', 4],
    ['count', 'Z4', 4],
    ['count', '4.0', 4],
    ['count', '4.5', 'problem'],
    ['quantity', '12 pcs', 12],
    ['days', '6 days', 6],
    ['days', '6d', 6],
    ['days', '2 weeks', 'problem'],
    ['angle', '118°', 118],
    ['money', '$1,234.50', 123450],
    ['substrate', 'Solid Carbide', 'carbide'],
    ['substrate', 'HSS-Co8', 'hss'],
    ['substrate', 'ceramic', 'problem'],
    ['part', 'Nut', 'nut'],
    ['condition', 'Re-ground', 'problem'],
    ['condition', 'REGROUND', 'reground'],
    ['unit', 'Inches', 'in'],
    ['unit', 'metric', 'mm'],
    ['range', '.250 - .125', [3.175, 6.35]],
    ['range', '3-2 mm', [2, 3]],
    ['range', '1/8 to 1/4', [3.175, 6.35]],
    ['range', '1-1/8', 'problem'],
  ])('it reads %s “%s”', (type, cell, expected) => expect(read(type, cell)).toEqual(expected))

  it('it takes a decimal comma only where the shop writes one', () => {
    expect(read('length', '3,5', millimetres)).toBe(3.5)
    expect(read('length', '3,5', inches)).toBe('problem')
  })

  it.each([
    ['Ball Nose End Mill', 'ball'],
    ['BALLNOSE', 'ball'],
    ['Bull Nose', 'cornerRadius'],
    ['corner-radius', 'cornerRadius'],
    ['cornerRadius', 'cornerRadius'],
    ['Square EM, 4 flute', 'square'],
    ['Flat', 'square'],
    ['Tapered ball', 'tapered'],
    ['Spot drill', 'drill'],
    ['Jobber Drill', 'drill'],
    ['tap drill', 'drill'],
    ['Spiral point tap', 'tap'],
    ['Chucking reamer', 'reamer'],
    ['Threadmill', 'threadMill'],
    ['faceMill', 'faceMill'],
    ['Chamfer mill 90', 'chamfer'],
    ['T-slot', 'slotting'],
    ['Center drill', 'problem'],
    ['hammer', 'problem'],
  ])('it takes “%s” for the form it is', (cell, expected) => expect(read('form', cell)).toBe(expected))
})
