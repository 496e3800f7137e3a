import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type ParseLengthOptions, parseLength } from './parse-length'

const inMm: ParseLengthOptions = { unit: 'mm', decimalComma: false }
const inInches: ParseLengthOptions = { unit: 'in', decimalComma: false }
const withComma: ParseLengthOptions = { unit: 'mm', decimalComma: true }

describe('parseLength', () => {
  it.each([
    ['1/8', 3.175, 'fraction'],
    [' 1 / 8 ', 3.175, 'fraction'],
    ['4 1/8', 104.775, 'fraction'],
    ['4-1/8', 104.775, 'fraction'],
    ['4 - 1/8', 104.775, 'fraction'],
    ['4–1/8"', 104.775, 'fraction'],
    ['1/8 in', 3.175, 'fraction'],
    ['1/8"', 3.175, 'fraction'],
    ['1/2 mm', 0.5, 'fraction'],
    ['½', 12.7, 'fraction'],
    ['1½ in', 38.1, 'fraction'],
    ['1/64', 0.396875, 'fraction'],
    ['1/3 in', 8.466666667, 'fraction'],
    ['9/8', 28.575, 'fraction'],
    ['3.175', 3.175, 'plain'],
    ['.5', 0.5, 'plain'],
    ['5.', 5, 'plain'],
    ['007', 7, 'plain'],
    ['3.1750000', 3.175, 'plain'],
    ['Ø6', 6, 'plain'],
    ['⌀ 6 mm', 6, 'unit'],
    ['0.125"', 3.175, 'unit'],
    ['.125 in', 3.175, 'unit'],
    ['.125IN.', 3.175, 'unit'],
    ['0.125″', 3.175, 'unit'],
    ['0.125”', 3.175, 'unit'],
    ["0.125''", 3.175, 'unit'],
    ['2 inches', 50.8, 'unit'],
    ['3.175 mm', 3.175, 'unit'],
    ['3.175\u00a0MM', 3.175, 'unit'],
    ['2.5cm', 25, 'unit'],
    ['0.1 m', 100, 'unit'],
    ['25 µm', 0.025, 'unit'],
    ['25 μm', 0.025, 'unit'],
    ['25um', 0.025, 'unit'],
    ['50 thou', 1.27, 'unit'],
    ['50 mil', 1.27, 'unit'],
    ['1 ft', 304.8, 'unit'],
    ['2 feet', 609.6, 'unit'],
    ['#7', 5.1054, 'drillSize'],
    ['# 7', 5.1054, 'drillSize'],
    ['No. 7', 5.1054, 'drillSize'],
    ['no 80', 0.3429, 'drillSize'],
    ['F', 6.5278, 'drillSize'],
    ['f', 6.5278, 'drillSize'],
    ['m', 7.493, 'drillSize'],
  ])('reads %s as %d mm', (text, mm, as) => {
    expect(parseLength(text, inMm)).toEqual({ ok: true, mm, as })
  })

  it('takes a bare number in the unit set, and everything else the same in both', () => {
    expect(parseLength('0.125', inInches)).toEqual({ ok: true, mm: 3.175, as: 'plain' })
    for (const text of ['1/8', '3.175 mm', '#7', 'F', '50 thou', '4 1/8']) {
      expect(parseLength(text, inInches)).toEqual(parseLength(text, inMm))
    }
  })

  it.each([
    ['', 'empty'],
    ['   ', 'empty'],
    ['abc', 'not-a-length'],
    ['.', 'not-a-length'],
    ['NaN', 'not-a-length'],
    ['Infinity', 'not-a-length'],
    ['1.2.3', 'not-a-length'],
    ['1/0', 'not-a-length'],
    ['1//8', 'not-a-length'],
    ['1/8/2', 'not-a-length'],
    ['3.175 mm 2', 'not-a-length'],
    ['3 4', 'not-a-length'],
    ['1e3', 'not-a-length'],
    ['2 + 2', 'not-a-length'],
    ['sqrt(4)', 'not-a-length'],
    ['1'.repeat(500), 'not-a-length'],
    ['5 furlongs', 'unit-unknown'],
    ['5 constructor', 'unit-unknown'],
    ["2'", 'unit-unknown'],
    ['5 mmm', 'unit-unknown'],
    ['1/8 bananas', 'unit-unknown'],
    ['4 9/8', 'fraction-improper'],
    ['1 8/8', 'fraction-improper'],
    ['#0', 'drill-size-unknown'],
    ['#81', 'drill-size-unknown'],
    ['No. 100', 'drill-size-unknown'],
    ['-3', 'negative'],
    ['−1/8', 'negative'],
    ['-xx', 'not-a-length'],
    ['0', 'zero'],
    ['0.000 mm', 'zero'],
    ['0/8', 'zero'],
    ['0.0000000001 mm', 'too-small'],
    ['100001', 'too-large'],
    ['9'.repeat(39), 'too-large'],
    ['101 m', 'too-large'],
    ['3,175', 'decimal-comma'],
    ['0,5 in', 'decimal-comma'],
    ['1.250,5', 'ambiguous'],
    ['1,250,000', 'ambiguous'],
  ])('refuses %j with %s', (text, code) => {
    expect(parseLength(text, inMm)).toMatchObject({ ok: false, code })
  })

  it('reads a decimal comma only where it is set, and never guesses what a group of three means', () => {
    expect(parseLength('3,175', withComma)).toEqual({ ok: true, mm: 3.175, as: 'plain' })
    expect(parseLength('0,125 in', withComma)).toEqual({ ok: true, mm: 3.175, as: 'unit' })
    expect(parseLength('0.125 in', withComma)).toEqual({ ok: true, mm: 3.175, as: 'unit' })
    expect(parseLength('12.5', withComma)).toEqual({ ok: true, mm: 12.5, as: 'plain' })
    for (const text of ['1.250', '3.175 mm', '1.250,5', '1,250.5']) {
      expect(parseLength(text, withComma), text).toMatchObject({ ok: false, code: 'ambiguous' })
    }
  })

  it('takes drill sizes and zero only where they are wanted', () => {
    for (const text of ['#7', 'F', 'No. 7']) {
      expect(parseLength(text, { ...inMm, drillSizes: false })).toMatchObject({ code: 'not-a-length' })
    }
    expect(parseLength('0', { ...inMm, allowZero: true })).toEqual({ ok: true, mm: 0, as: 'plain' })
  })

  it('says in its message what was typed, and cuts it where it is long', () => {
    expect(parseLength('5 furlongs', inMm)).toMatchObject({ message: expect.stringContaining('“furlongs”') })
    const long = parseLength('x'.repeat(10_000), inMm)
    expect(long.ok ? 0 : long.message.length).toBeLessThan(150)
  })

  it('keeps every decimal of a millimetre up to the ninth', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 99_999 }),
        fc.integer({ min: 0, max: 999_999_999 }),
        (whole, part) => {
          const text = `${whole}.${String(part).padStart(9, '0')}`
          expect(parseLength(text, inMm)).toEqual({ ok: true, mm: Number(text), as: 'plain' })
        },
      ),
    )
  })

  it('agrees with exact arithmetic for every fraction, whole number or both', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 99 }),
        fc
          .integer({ min: 1, max: 6 })
          .chain((power) => fc.tuple(fc.integer({ min: 1, max: 2 ** power - 1 }), fc.constant(2 ** power))),
        (whole, [top, bottom]) => {
          const parsed = parseLength(whole > 0 ? `${whole} ${top}/${bottom}` : `${top}/${bottom}`, inInches)
          const tenths = (whole * bottom + top) * 254
          expect(parsed).toEqual({ ok: true, mm: tenths / (10 * bottom), as: 'fraction' })
        },
      ),
    )
  })

  it('answers something for any text at all, and a length only within its bounds', () => {
    const scraps = fc.string({ unit: fc.constantFrom(...'0123456789./,-# "\'inmftFØ½µ') })
    fc.assert(
      fc.property(
        fc.oneof(fc.string(), scraps),
        fc.boolean(),
        fc.constantFrom('mm' as const, 'in' as const),
        (text, decimalComma, unit) => {
          const parsed = parseLength(text, { unit, decimalComma })
          if (parsed.ok) {
            expect(parsed.mm).toBeGreaterThan(0)
            expect(parsed.mm).toBeLessThanOrEqual(100_000)
          } else {
            expect(parsed.message).toMatch(/^[^\n]{5,}\.$/)
          }
        },
      ),
      { numRuns: 2000 },
    )
  })

  it('is quick enough for the cells of a large file: 100,000 in well under a second', () => {
    const cells = ['3.175', '0.125', '12.7', '1/8', '3.175 mm', '#7', '38.1', '4 1/8', '50 thou', '6']
    const started = performance.now()
    let sum = 0
    for (let round = 0; round < 10_000; round++) {
      for (const cell of cells) {
        const parsed = parseLength(cell, inMm)
        sum += parsed.ok ? parsed.mm : 0
      }
    }
    expect(performance.now() - started).toBeLessThan(1000)
    expect(sum).toBeGreaterThan(0)
  })
})
