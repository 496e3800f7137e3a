import { describe, expect, it } from 'vitest'
import { parseSpeed } from './parse-speed'

const inMm = { unit: 'mm', decimalComma: false } as const

describe('parseSpeed', () => {
  it.each([
    ['120', 120],
    ['120 m/min', 120],
    ['500 SFM', 152.4],
    ['500 ft/min', 152.4],
  ])('reads %s as %d m/min', (text, mPerMin) => {
    expect(parseSpeed(text, inMm)).toEqual({ ok: true, mPerMin })
  })

  it('takes a bare number as surface feet a minute where people work in inches', () => {
    expect(parseSpeed('500', { unit: 'in', decimalComma: false })).toEqual({ ok: true, mPerMin: 152.4 })
  })

  it.each([
    ['', 'empty'],
    ['fast', 'not-a-speed'],
    ['120 rpm', 'unit-unknown'],
    ['0', 'zero'],
    ['-5', 'negative'],
    ['1,5', 'decimal-comma'],
  ])('refuses %j with %s', (text, code) => {
    expect(parseSpeed(text, inMm)).toMatchObject({ ok: false, code })
  })
})
