import { expect, it } from 'vitest'
import { isWithin, ratioFigure } from './bench'
import { type Outcome, reportTable } from './report'

const outcome = (figures: Outcome['figures'], failure: string | null = null): Outcome => ({
  bench: 'list',
  figures,
  failure,
  load: { before: 0.25, after: 1.5 },
  seconds: 12,
})

it('a ratio carries its two sides and is their quotient', () => {
  expect(ratioFigure('plain', { ours: 30, other: 20, unit: 'ms' }, 1.5, 400)).toEqual({
    name: 'plain',
    value: 1.5,
    unit: 'times',
    limit: { atMost: 1.5 },
    sides: { ours: 30, other: 20, unit: 'ms' },
    samples: 400,
  })
})

it('exactly the limit is within it, either way', () => {
  expect(isWithin({ value: 1.5, limit: { atMost: 1.5 } })).toBe(true)
  expect(isWithin({ value: 1.5001, limit: { atMost: 1.5 } })).toBe(false)
  expect(isWithin({ value: 95, limit: { atLeast: 95 } })).toBe(true)
  expect(isWithin({ value: 94, limit: { atLeast: 95 } })).toBe(false)
  expect(isWithin({ value: 1e9, limit: null })).toBe(true)
})

it('the table names each figure with its limit, both sides, samples and load', () => {
  const table = reportTable([outcome([ratioFigure('plain', { ours: 30, other: 24, unit: 'ms' }, 1.5, 400)])])
  expect(table).toMatch(/^list: plain +1\.25 × +≤ 1\.50 × +within +30 ms +24 ms +400 +0\.3 → 1\.5$/m)
  expect(table).toMatch(/1 of 1 limits kept on \d+ cores\.$/)
})

it('says plainly what is over or under its limit, what has none and what was not measured', () => {
  const table = reportTable([
    outcome([
      ratioFigure('plain', { ours: 60, other: 24, unit: 'ms' }, 1.5, 400),
      { name: 'accessibility', value: 94, unit: 'points', limit: { atLeast: 95 }, samples: 5 },
      { name: 'speed', value: 70, unit: 'points', limit: null, samples: 5, note: 'of the phone' },
    ]),
    outcome([], 'no browser'),
  ])
  expect(table).toMatch(/^list: plain +2\.50 × .*OVER THE LIMIT/m)
  expect(table).toMatch(/^list: accessibility +94 points .*UNDER THE LIMIT/m)
  expect(table).toMatch(/^list: speed +70 points +reported +5 /m)
  expect(table).toMatch(/^list: speed: of the phone$/m)
  expect(table).toMatch(/^list: not measured: no browser$/m)
  expect(table).toMatch(/0 of 2 limits kept on \d+ cores, 2 missed, 1 could not be measured\.$/)
})
