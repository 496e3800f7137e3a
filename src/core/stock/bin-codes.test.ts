import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { binCodes, mostBinCodes } from './bin-codes'

describe('a pattern of bins', () => {
  test('it goes row by row from the first to the last', () => {
    const codes = binCodes('A1', 'F12')
    expect(codes).toHaveLength(72)
    expect(codes.slice(0, 2)).toEqual(['A1', 'A2'])
    expect(codes[12]).toBe('B1')
    expect(codes.at(-1)).toBe('F12')
  })

  test('it keeps leading zeros, signs between and small letters', () => {
    expect(binCodes('A-08', 'A-11')).toEqual(['A-08', 'A-09', 'A-10', 'A-11'])
    expect(binCodes('1.a', '2.b')).toEqual(['1.a', '1.b', '2.a', '2.b'])
    expect(binCodes('AZ', 'BB')).toEqual(['AZ', 'BA', 'BB'])
  })

  test('it may be a single bin', () => {
    expect(binCodes('  A1 ', 'A1')).toEqual(['A1'])
  })

  test.each([
    ['', 'A1', 'empty', 'first'],
    ['A1', ' ', 'empty', 'last'],
    ['A1', 'F', 'shapes-differ', 'last'],
    ['A1', 'f12', 'shapes-differ', 'last'],
    ['A-1', 'F.2', 'shapes-differ', 'last'],
    ['A1', 'AA2', 'shapes-differ', 'last'],
    ['B1', 'A2', 'backwards', 'last'],
    ['A5', 'B2', 'backwards', 'last'],
    ['A1', `A${mostBinCodes + 1}`, 'too-many', 'last'],
    ['1', '999999999', 'too-many', 'last'],
  ])('it refuses %j to %j', (first, last, code, path) => {
    expect(() => binCodes(first, last)).toThrow(expect.objectContaining({ code, path }))
  })

  test('it takes as many as the limit, and no code twice', () => {
    const codes = binCodes('1', String(mostBinCodes))
    expect(new Set(codes).size).toBe(mostBinCodes)
  })

  test('it holds rows times columns, whatever the wall', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 25 }), fc.integer({ min: 1, max: 70 }), (row, column) => {
        const last = `${String.fromCharCode(65 + row)}${column}`
        const codes = binCodes('A1', last)
        expect(codes).toHaveLength((row + 1) * column)
        expect(codes.at(-1)).toBe(last)
        expect(new Set(codes).size).toBe(codes.length)
      }),
    )
  })
})
