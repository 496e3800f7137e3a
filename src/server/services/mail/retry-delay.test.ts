import { describe, expect, test } from 'vitest'
import { retryDelaySeconds } from './retry-delay'

describe('the wait between tries', () => {
  test('it doubles up to its limit and stays there', () => {
    expect([1, 2, 3].map((tries) => retryDelaySeconds('unreachable', tries))).toEqual([15, 30, 60])
    expect(retryDelaySeconds('later', 5000)).toBe(3600)
    expect(retryDelaySeconds('refused', 1)).toBe(300)
    expect(retryDelaySeconds('refused', 5000)).toBe(21_600)
  })
})
