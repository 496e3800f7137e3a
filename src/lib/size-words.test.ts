import { expect, test } from 'vitest'
import type { ItemSize } from '@/schemas/item-size'
import { fullSizeWords, sizeWords } from './size-words'

const cutter: ItemSize = {
  kind: 'cutter',
  form: 'square',
  cuttingDiameterMm: 6,
  cornerRadiusMm: null,
  lengthOfCutMm: 13,
  overallLengthMm: 57,
}

test('it says what a cutter is by its form and diameter, in the reader’s unit', () => {
  expect(sizeWords(cutter, 'mm')).toBe('Square end mill 6 mm')
  expect(sizeWords({ ...cutter, cuttingDiameterMm: 6.35 }, 'in')).toBe('Square end mill 1/4 (0.250) in')
})

test('it says more of a cutter where twins stand together', () => {
  expect(fullSizeWords(cutter, 'mm')).toBe('Square end mill 6 mm · APMX 13 · OAL 57')
})

test('it says what holds, by what it takes and how far it reaches', () => {
  const bore = { kind: 'collet', series: 'ER16' } as const
  expect(sizeWords({ kind: 'holder', taper: 'BT30', bore, gaugeLengthMm: 100 }, 'mm')).toBe(
    'BT30 holder, ER16 collet, gauge length 100 mm',
  )
  expect(
    sizeWords(
      { kind: 'holder', taper: null, bore: { kind: 'fixed', diameterMm: 12 }, gaugeLengthMm: 80 },
      'mm',
    ),
  ).toBe('Holder, 12 mm bore, gauge length 80 mm')
  expect(sizeWords({ kind: 'extension', bore, projectionMm: 60 }, 'mm')).toBe(
    'Extension, ER16 collet, projection 60 mm',
  )
  expect(sizeWords({ kind: 'collet', series: 'ER16', minimumMm: 5, maximumMm: 6 }, 'mm')).toBe(
    'ER16 collet 5 to 6 mm',
  )
})
