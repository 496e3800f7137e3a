import { describe, expect, it } from 'vitest'
import { parseAngle } from './parse-angle'

const point = { decimalComma: false }

describe('parseAngle', () => {
  it.each([
    ['30', 30],
    ['30°', 30],
    ['7.5 deg', 7.5],
    ['.5 Degrees', 0.5],
    ['0', 0],
    ['360', 360],
  ])('reads %s as %d degrees', (text, deg) => {
    expect(parseAngle(text, point)).toEqual({ ok: true, deg })
  })

  it('reads a decimal comma where it is set', () => {
    expect(parseAngle('7,5', { decimalComma: true })).toEqual({ ok: true, deg: 7.5 })
  })

  it.each([
    ['', 'empty'],
    ['steep', 'not-an-angle'],
    ['30 rad', 'not-an-angle'],
    ["30°15'", 'not-an-angle'],
    ['.', 'not-an-angle'],
    ['-5', 'negative'],
    ['7,5', 'decimal-comma'],
    ['361', 'too-large'],
  ])('refuses %j with %s', (text, code) => {
    expect(parseAngle(text, point)).toMatchObject({ ok: false, code })
  })
})
