import fc from 'fast-check'
import { unit } from 'mathjs'
import { describe, expect, it } from 'vitest'
import { mmPerInch, unitSteps } from '@/core/units/length-unit'
import { parseLength } from '@/core/units/parse-length'
import { metresPerFoot } from '@/core/units/parse-speed'

/** See nist.md. */
const published: [string, number][] = [
  ['in', 25.4],
  ['ft', 304.8],
  ['mil', 0.0254],
  ['thou', 0.0254],
  ['mm', 1],
  ['cm', 10],
  ['m', 1000],
  ['µm', 0.001],
]

describe('units of length against NIST SP 811, appendix B', () => {
  it.each(published)('one %s is %d mm', (word, mm) => {
    expect(Number(unitSteps(word)) / 1e9).toBe(mm)
  })

  it('the inch and the surface foot are the published ones', () => {
    expect(mmPerInch).toBe(25.4)
    expect(metresPerFoot).toBe(0.3048)
  })

  it('every written length with a unit agrees with mathjs, which works on floating point throughout', () => {
    const words: [string, string][] = [
      ['mm', 'mm'],
      ['cm', 'cm'],
      ['in', 'inch'],
      ['ft', 'ft'],
      ['thou', 'mil'],
      ['µm', 'um'],
    ]
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 99_999 }),
        fc.constantFrom(...words),
        (thousandths, [word, name]) => {
          const text = (thousandths / 1000).toString()
          const parsed = parseLength(`${text} ${word}`, { unit: 'mm', decimalComma: false })
          const expected = unit(Number(text), name).toNumber('mm')
          expect(parsed.ok ? parsed.mm : Number.NaN).toBeCloseTo(expected, 8)
        },
      ),
    )
  })
})
