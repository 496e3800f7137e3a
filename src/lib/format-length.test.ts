import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { parseLength } from '@/core/units/parse-length'
import { formatInchSize, formatLength, lengthInputText } from './format-length'

/** Any length that can be kept: whole steps of 1e-9 mm up to 10 m. */
const anyLengthMm = fc.integer({ min: 1, max: 10_000_000_000_000 }).map((steps) => steps / 1e9)

function readBackMm(text: string, unit: 'mm' | 'in', decimalComma = false): number {
  const parsed = parseLength(text, { unit, decimalComma })
  return parsed.ok ? parsed.mm : Number.NaN
}

describe('formatLength', () => {
  it.each([
    [3.175, 'mm', '3.175 mm'],
    [6, 'mm', '6 mm'],
    [0.396875, 'mm', '0.397 mm'],
    [-0.5, 'mm', '-0.5 mm'],
    [3.175, 'in', '0.125 in'],
    [25.4, 'in', '1.000 in'],
    [0.396875, 'in', '0.0156 in'],
    [3, 'in', '0.1181 in'],
  ] as const)('writes %d in %s as %s', (mm, unit, text) => {
    expect(formatLength(mm, unit)).toBe(text)
  })

  it('leaves the unit away where a heading has it, and reads fractions only in inches', () => {
    expect(formatLength(3.175, 'in', { withUnit: false })).toBe('0.125')
    expect(formatLength(3.175, 'in', { fractions: true })).toBe('1/8 (0.125) in')
    expect(formatLength(3.175, 'mm', { fractions: true })).toBe('3.175 mm')
  })

  it('goes finer where it is asked to', () => {
    expect(formatLength(0.010435, 'mm', { extraDecimals: 1 })).toBe('0.0104 mm')
    expect(formatLength(0.010435, 'in', { extraDecimals: 1 })).toBe('0.00041 in')
  })
})

describe('formatInchSize', () => {
  it.each([
    [0.396875, '1/64 (0.0156) in'],
    [3.175, '1/8 (0.125) in'],
    [19.05, '3/4 (0.750) in'],
    [104.775, '4 1/8 (4.125) in'],
    [25.4, '1.000 in'],
    [5.1054, '0.201 in'],
    [6.5, '0.2559 in'],
    [0, '0.000 in'],
  ])('writes %d mm as %s', (mm, text) => {
    expect(formatInchSize(mm)).toBe(text)
  })
})

describe('lengthInputText', () => {
  it.each([
    [3.175, 'mm', '3.175'],
    [0.396875, 'mm', '0.396875'],
    [3.175, 'in', '0.125'],
    [0.396875, 'in', '0.015625'],
    [3, 'in', '3 mm'],
    [0, 'in', '0'],
  ] as const)('opens %d in %s as %s', (mm, unit, text) => {
    expect(lengthInputText(mm, unit)).toBe(text)
  })

  it('is read back as the same length, in either unit and with either decimal sign', () => {
    fc.assert(
      fc.property(
        anyLengthMm,
        fc.constantFrom('mm' as const, 'in' as const),
        fc.boolean(),
        (mm, unit, decimalComma) => {
          expect(readBackMm(lengthInputText(mm, unit, { decimalComma }), unit, decimalComma)).toBe(mm)
        },
      ),
    )
  })

  it('gives an inch decimal of up to six places back as it was typed', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 99_999_999 }), (millionths) => {
        const typed = (millionths / 1e6).toFixed(6).replace(/\.?0+$/, '')
        expect(lengthInputText(readBackMm(typed, 'in'), 'in')).toBe(typed)
      }),
    )
  })
})
