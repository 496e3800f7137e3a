import { describe, expect, it } from 'vitest'
import { certainSign, isDoubtful, SeenSigns } from './decimal-sign'

function guessOf(...cells: string[]) {
  const seen = new SeenSigns()
  for (const cell of cells) seen.add(cell)
  return seen.guess()
}

describe('the decimal sign of a number', () => {
  it.each([
    ['12,50', 'comma'],
    ['0,125', 'comma'],
    ['0,5 mm', 'comma'],
    ['€ 1.234,50', 'comma'],
    ['12.5', 'point'],
    ['.375', 'point'],
    ['$1,234.50', 'point'],
    ['1,234', null],
    ['1.250', null],
    ['1,234,567', null],
    ['12', null],
    ['1/4"', null],
    ['x', null],
  ])('it finds in “%s” %s', (cell, sign) => expect(certainSign(cell)).toBe(sign))

  it('it doubts what may be thousands, and nothing else', () => {
    expect(['1,234', '1.250', '3,175 mm'].map(isDoubtful)).toEqual([true, true, true])
    expect(['0,125', '12,5', '1,234.50', '12'].map(isDoubtful)).toEqual([false, false, false, false])
  })
})

describe('the decimal sign of a file', () => {
  it('it is guessed only where all numbers that leave no doubt agree', () => {
    expect(guessOf('3', '0,5', '12,50', '1,234')).toBe('comma')
    expect(guessOf('3', '0.5')).toBe('point')
    expect(guessOf('0.5', '12,50')).toBeNull()
    expect(guessOf('1,234', '4')).toBeNull()
  })
})
