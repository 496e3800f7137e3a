import { z } from 'zod'

/** How many checks or tests held, and how many did not. */
export interface Tally {
  passed: number
  failed: number
}

export const oneFailure: Tally = { passed: 0, failed: 1 }

export function sumOf(tallies: readonly Tally[]): Tally {
  return tallies.reduce(
    (sum, tally) => ({ passed: sum.passed + tally.passed, failed: sum.failed + tally.failed }),
    { passed: 0, failed: 0 },
  )
}

/** Lint, types and import rules count one each. */
export function tallyOfCheck(exit: number | string): Tally {
  return exit === 0 ? { passed: 1, failed: 0 } : oneFailure
}

const vitestReportSchema = z.object({
  numPassedTests: z.int(),
  numFailedTests: z.int(),
  testResults: z.array(
    z.object({ status: z.string(), assertionResults: z.array(z.object({ status: z.string() })) }),
  ),
})

/** Counts vitest's JSON report; a test file that could not even be loaded counts as one failure. */
export function tallyOfVitest(report: string | null, exit: number | string): Tally {
  const parsed = vitestReportSchema.safeParse(jsonOrNull(report))
  if (!parsed.success) return oneFailure
  const { numPassedTests, numFailedTests, testResults } = parsed.data
  const brokenFiles = testResults.filter(
    ({ status, assertionResults }) =>
      status === 'failed' && !assertionResults.some((assertion) => assertion.status === 'failed'),
  )
  return heldToExit({ passed: numPassedTests, failed: numFailedTests + brokenFiles.length }, exit)
}

const playwrightReportSchema = z.object({
  stats: z.object({ expected: z.int(), unexpected: z.int(), flaky: z.int() }),
})

/** Counts Playwright's JSON report; a test that passed only when tried again counts as failed. */
export function tallyOfPlaywright(report: string | null, exit: number | string): Tally {
  const parsed = playwrightReportSchema.safeParse(jsonOrNull(report))
  if (!parsed.success) return oneFailure
  const { expected, unexpected, flaky } = parsed.data.stats
  return heldToExit({ passed: expected, failed: unexpected + flaky }, exit)
}

/** A runner that counts no failure and still ends badly (a crash, an error outside any test, no test found) has failed. */
function heldToExit(tally: Tally, exit: number | string): Tally {
  const isWrong = exit !== 0 || tally.passed === 0
  return isWrong && tally.failed === 0 ? { ...tally, failed: 1 } : tally
}

function jsonOrNull(text: string | null): unknown {
  try {
    return JSON.parse(text ?? '')
  } catch {
    return null
  }
}
