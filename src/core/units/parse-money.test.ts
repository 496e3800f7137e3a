import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { parseMoney } from './parse-money'

const cents = { decimals: 2, decimalComma: false }
const comma = { decimals: 2, decimalComma: true }

describe('parseMoney', () => {
  it.each([
    ['18.5', 1850],
    ['18.50', 1850],
    ['$18.50', 1850],
    ['18.50 €', 1850],
    ['18.500', 1850],
    ['1,234.50', 123450],
    ['1,234,567.89', 123456789],
    ['0', 0],
    ['.07', 7],
  ])('reads %s as %d cents', (text, minor) => {
    expect(parseMoney(text, cents)).toEqual({ ok: true, minor })
  })

  it('reads the comma as the decimal sign where that is set', () => {
    expect(parseMoney('18,50', comma)).toEqual({ ok: true, minor: 1850 })
    expect(parseMoney('1.234,50', comma)).toEqual({ ok: true, minor: 123450 })
  })

  it('follows the decimals of the currency', () => {
    expect(parseMoney('1200', { decimals: 0, decimalComma: false })).toEqual({ ok: true, minor: 1200 })
    expect(parseMoney('1.234', { decimals: 3, decimalComma: false })).toEqual({ ok: true, minor: 1234 })
    expect(parseMoney('12.5', { decimals: 0, decimalComma: false })).toMatchObject({
      code: 'too-many-decimals',
    })
  })

  it.each([
    ['', 'empty'],
    ['$', 'empty'],
    ['cheap', 'not-an-amount'],
    ['-5', 'negative'],
    ['18.505', 'too-many-decimals'],
    ['1,234', 'decimal-comma'],
    ['12,34.50', 'ambiguous'],
    ['9'.repeat(14), 'too-large'],
  ])('refuses %j with %s', (text, code) => {
    expect(parseMoney(text, cents)).toMatchObject({ ok: false, code })
  })

  it('says how to write a comma that can only be the decimal sign, and both ways where it can be thousands', () => {
    expect(parseMoney('19,40', cents)).toMatchObject({ code: 'decimal-comma', message: 'Write it 19.40.' })
    expect(parseMoney('19,4', cents)).toMatchObject({ message: 'Write it 19.4.' })
    expect(parseMoney('1,234', cents)).toMatchObject({ message: 'Write 1234 or 1.234.' })
    expect(parseMoney('cheap, very', cents)).toMatchObject({ code: 'not-an-amount' })
  })

  it('reads back every amount of cents exactly', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1_000_000_000 }), (minor) => {
        const text = `${Math.floor(minor / 100)}.${String(minor % 100).padStart(2, '0')}`
        expect(parseMoney(text, cents)).toEqual({ ok: true, minor })
      }),
    )
  })
})
