import { describe, expect, it } from 'vitest'
import { parseCount } from './parse-count'
import { parseDecimal } from './parse-decimal'

describe('parseDecimal', () => {
  it('reads plain decimals, with a comma where that is set and a sign where that is allowed', () => {
    expect(parseDecimal('0.8', { decimalComma: false })).toEqual({ ok: true, value: 0.8 })
    expect(parseDecimal('0,8', { decimalComma: true })).toEqual({ ok: true, value: 0.8 })
    expect(parseDecimal('-.8', { decimalComma: false, allowNegative: true })).toEqual({
      ok: true,
      value: -0.8,
    })
    expect(parseDecimal('-0', { decimalComma: false, allowNegative: true })).toEqual({ ok: true, value: 0 })
  })

  it.each([
    ['', 'empty'],
    ['twelve', 'not-a-number'],
    ['1e5', 'not-a-number'],
    ['--1', 'not-a-number'],
    ['-1', 'negative'],
    ['0,8', 'decimal-comma'],
    ['1,000.5', 'ambiguous'],
    ['9'.repeat(13), 'too-large'],
  ])('refuses %j with %s', (text, code) => {
    expect(parseDecimal(text, { decimalComma: false })).toMatchObject({ ok: false, code })
  })
})

describe('parseCount', () => {
  it('reads digits alone', () => {
    expect(parseCount(' 12 ')).toEqual({ ok: true, count: 12 })
    expect(parseCount('0')).toEqual({ ok: true, count: 0 })
  })

  it('reads thousands as the pages print them, whatever the width of the space', () => {
    for (const text of ['8 000', '8\u2009000', '8\u202f000', '8\u00a0000']) {
      expect(parseCount(text)).toEqual({ ok: true, count: 8000 })
    }
    expect(parseCount('1 000 000')).toEqual({ ok: true, count: 1_000_000 })
  })

  it('reads a comma or a point between thousands where it cannot be the decimal sign', () => {
    expect(parseCount('8,000', { decimalComma: false })).toEqual({ ok: true, count: 8000 })
    expect(parseCount('8.000', { decimalComma: true })).toEqual({ ok: true, count: 8000 })
    expect(parseCount('8.000', { decimalComma: false })).toMatchObject({ ok: false, code: 'not-a-count' })
    expect(parseCount('8,000', { decimalComma: true })).toMatchObject({ ok: false, code: 'not-a-count' })
    for (const text of ['8,00', '8,0000', '12,34,567', '1,000 000', '1234,567']) {
      expect(parseCount(text, { decimalComma: false })).toMatchObject({ ok: false, code: 'not-a-count' })
    }
  })

  it.each([
    ['', 'empty'],
    ['1 2', 'not-a-count'],
    ['12 00', 'not-a-count'],
    ['a dozen', 'not-a-count'],
    ['1.5', 'not-a-count'],
    ['1,000', 'not-a-count'],
    ['-3', 'negative'],
    ['1000000001', 'too-large'],
  ])('refuses %j with %s', (text, code) => {
    expect(parseCount(text)).toMatchObject({ ok: false, code })
  })
})
