import { describe, expect, test } from 'vitest'
import { mmPerInch } from '../units/length-unit'
import { metresPerFoot } from '../units/parse-speed'
import { spindleRange } from './spindle-range'

/* By hand: n = 12·SFM/(π·D in inches); at 1/2 in, 100 SFM is 763.94 rpm and 300 SFM is 2291.83 rpm. */
const halfInchMm = mmPerInch / 2
const range = { lowMPerMin: 100 * metresPerFoot, highMPerMin: 300 * metresPerFoot }

describe('the spindle speeds of a range', () => {
  test('they are those of the two cutting speeds where nothing limits them', () => {
    const answer = spindleRange(halfInchMm, range)
    expect(answer.lowRpm).toBeCloseTo(763.94, 2)
    expect(answer.highRpm).toBeCloseTo(2291.83, 2)
    expect(answer.limited).toBe('no')
  })

  test('they are held to the limit', () => {
    expect(spindleRange(halfInchMm, range, 2000)).toMatchObject({
      highRpm: 2000,
      limited: 'high',
    })
  })

  test('they are the limit itself where even the slow end is above it', () => {
    expect(spindleRange(halfInchMm, range, 700)).toEqual({
      lowRpm: 700,
      highRpm: 700,
      limited: 'all',
    })
  })

  test('a limit just at the fast end takes nothing away, one just below does', () => {
    const { highRpm } = spindleRange(halfInchMm, range)
    expect(spindleRange(halfInchMm, range, highRpm).limited).toBe('no')
    expect(spindleRange(halfInchMm, range, highRpm - 1e-6).limited).toBe('high')
  })

  test('it refuses a range that runs backwards and a diameter that is none', () => {
    expect(() => spindleRange(6, { lowMPerMin: 100, highMPerMin: 90 })).toThrow('above the higher')
    expect(() => spindleRange(0, range)).toThrow('more than 0')
  })
})
