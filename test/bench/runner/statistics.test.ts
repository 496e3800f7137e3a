import { describe, expect, it } from 'vitest'
import { median, percentile } from './statistics'

const upTo = (count: number) => Array.from({ length: count }, (_, at) => count - at)

describe('percentile', () => {
  // The example of nearest rank that NIST's handbook and most textbooks print: 15, 20, 35, 40, 50 (from memory).
  it.each([
    [0.05, 15],
    [0.3, 20],
    [0.4, 20],
    [0.5, 35],
    [1, 50],
  ])('%f of five values is the one at the nearest rank', (share, expected) => {
    expect(percentile([35, 20, 15, 50, 40], share)).toBe(expected)
  })

  it('takes the 95th of a hundred, whatever order they come in', () => {
    expect(percentile(upTo(100), 0.95)).toBe(95)
    expect(percentile(upTo(200), 0.975)).toBe(195)
    expect(percentile(upTo(1000), 0.975)).toBe(975)
  })

  it('leaves the values as they were', () => {
    const values = [3, 1, 2]
    percentile(values, 0.5)
    expect(values).toEqual([3, 1, 2])
  })

  it('refuses no values and a share that is none', () => {
    expect(() => percentile([], 0.5)).toThrow(RangeError)
    expect(() => percentile([1], 0)).toThrow(RangeError)
    expect(() => percentile([1], 97.5)).toThrow(RangeError)
  })
})

describe('median', () => {
  it('is the middle of an odd number and between the two middles of an even one', () => {
    expect(median([9, 1, 5])).toBe(5)
    expect(median([9, 1, 5, 7])).toBe(6)
    expect(median([4])).toBe(4)
  })

  it('refuses no values', () => expect(() => median([])).toThrow(RangeError))
})
