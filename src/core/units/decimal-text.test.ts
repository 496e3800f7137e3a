import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { decimalText } from './decimal-text'

describe('decimalText', () => {
  it.each([
    [0, 0, 3, '0'],
    [-0.0001, 0, 3, '0'],
    [-1.5, 0, 3, '-1.5'],
    [1.0005, 0, 3, '1.001'],
    [0.015625, 3, 4, '0.0156'],
    [0.99996, 3, 4, '1.000'],
    [1e-9, 0, 9, '0.000000001'],
    [12345.6789, 0, 0, '12346'],
    [1e15, 0, 3, '1000000000000000'],
  ])('writes %d with %d to %d decimals as %s', (value, minimum, maximum, text) => {
    expect(decimalText(value, minimum, maximum)).toBe(text)
  })

  it('is never further from the number than half of its last decimal', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.integer({ min: 0, max: 9 }),
        (value, decimals) => {
          const text = decimalText(value, 0, decimals)
          expect(Math.abs(Number(text) - value)).toBeLessThanOrEqual(0.5 * 10 ** -decimals + 1e-9)
          expect(text).not.toMatch(/e|\.\d*0$|\.$|^-0$/)
        },
      ),
    )
  })
})
