import { describe, expect, test } from 'vitest'
import { leastSpeedLimit } from './speed-limit'

describe('what caps the spindle speed', () => {
  test('it is the least of spindle, holder and cutter, and its part is named', () => {
    expect(leastSpeedLimit({ spindle: 24_000, holder: 18_000, cutter: 20_000 })).toEqual({
      part: 'holder',
      rpm: 18_000,
    })
    expect(leastSpeedLimit({ spindle: 24_000, holder: 25_000, cutter: 20_000 })?.part).toBe('cutter')
    expect(leastSpeedLimit({ spindle: 12_000, holder: 25_000, cutter: 20_000 })?.part).toBe('spindle')
  })

  test('what is not known caps nothing, and with none known there is no cap', () => {
    expect(leastSpeedLimit({ spindle: null, cutter: 20_000 })).toEqual({ part: 'cutter', rpm: 20_000 })
    expect(leastSpeedLimit({})).toBeNull()
  })

  test('of equal ones the first is named', () => {
    expect(leastSpeedLimit({ cutter: 9000, spindle: 9000 })?.part).toBe('spindle')
  })

  test('it refuses a limit of nothing', () => {
    expect(() => leastSpeedLimit({ holder: 0 })).toThrow('faster than 0')
  })
})
