import { describe, expect, it } from 'vitest'
import { sumOf, tallyOfCheck, tallyOfPlaywright, tallyOfVitest } from '../runner/tally'

const oneFailure = { passed: 0, failed: 1 }

describe('tallyOfVitest', () => {
  const file = (status: string, ...tests: string[]) => ({
    status,
    assertionResults: tests.map((each) => ({ status: each })),
  })
  const report = (passed: number, failed: number, ...testResults: object[]) =>
    JSON.stringify({ numPassedTests: passed, numFailedTests: failed, testResults })

  it('counts tests', () => {
    expect(
      tallyOfVitest(report(2, 1, file('failed', 'passed', 'failed'), file('passed', 'passed')), 1),
    ).toEqual({
      passed: 2,
      failed: 1,
    })
  })

  it('counts a file that could not be loaded as a failure', () => {
    expect(tallyOfVitest(report(1, 0, file('passed', 'passed'), file('failed')), 1)).toEqual({
      passed: 1,
      failed: 1,
    })
  })

  it('counts a run that ends badly without a failed test as a failure', () => {
    expect(tallyOfVitest(report(1, 0, file('passed', 'passed')), 1)).toEqual({ passed: 1, failed: 1 })
    expect(tallyOfVitest(report(1, 0, file('passed', 'passed')), 'SIGKILL')).toEqual({ passed: 1, failed: 1 })
  })

  it('counts a run of no tests as a failure', () => {
    expect(tallyOfVitest(report(0, 0), 0)).toEqual(oneFailure)
  })

  it.each([null, '', '{"numPassedTests": 3', '{}'])(
    'counts a crash that left the report %j as a failure',
    (left) => {
      expect(tallyOfVitest(left, 0)).toEqual(oneFailure)
    },
  )
})

describe('tallyOfPlaywright', () => {
  const report = (expected: number, unexpected: number, flaky = 0) =>
    JSON.stringify({ stats: { expected, unexpected, flaky, skipped: 0 } })

  it('counts tests, and one that passed only at the second try as failed', () => {
    expect(tallyOfPlaywright(report(5, 1, 2), 1)).toEqual({ passed: 5, failed: 3 })
  })

  it('counts no test, a bad end and no report as a failure', () => {
    expect(tallyOfPlaywright(report(0, 0), 0)).toEqual(oneFailure)
    expect(tallyOfPlaywright(report(2, 0), 1)).toEqual({ passed: 2, failed: 1 })
    expect(tallyOfPlaywright(null, 1)).toEqual(oneFailure)
  })
})

it('counts a check as one', () => {
  expect([tallyOfCheck(0), tallyOfCheck(1), tallyOfCheck('SIGKILL')]).toEqual([
    { passed: 1, failed: 0 },
    oneFailure,
    oneFailure,
  ])
})

it('adds everything up', () => {
  expect(sumOf([{ passed: 2, failed: 1 }, oneFailure, { passed: 3, failed: 0 }])).toEqual({
    passed: 5,
    failed: 2,
  })
})
