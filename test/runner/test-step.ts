import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { runToEnd } from '@/server/launch/run-step'
import { Interrupted } from '@/server/launch/step-failure'
import { oneFailure, type Tally, tallyOfCheck, tallyOfPlaywright, tallyOfVitest } from './tally'

/** What the steps of one test run share. */
export interface TestRun {
  environment: NodeJS.ProcessEnv
  logFolder: string
  signal: AbortSignal
}

/** A step that hangs is ended and counts as failed, so that the run always ends with a count. */
const patienceMs = 15 * 60_000

/** Lint, types, import rules: a script of package.json that succeeds or not. */
export function runCheck(run: TestRun, script: string): Promise<Tally> {
  return runTestStep(run, script, ['npm', 'run', '--silent', script], run.environment, tallyOfCheck)
}

/** One of the projects in vitest.config.ts. */
export function runVitest(run: TestRun, project: string): Promise<Tally> {
  const report = join(run.logFolder, `${project}.json`)
  const argv = ['node_modules/.bin/vitest', 'run', '--project', project]
  argv.push('--reporter=default', '--reporter=json', `--outputFile.json=${report}`)
  return runTestStep(run, project, argv, run.environment, (exit) => tallyOfVitest(textOrNull(report), exit))
}

export function runPlaywright(run: TestRun): Promise<Tally> {
  const report = join(run.logFolder, 'browser.json')
  const argv = ['node_modules/.bin/playwright', 'test', '--reporter=list,json']
  const environment = { ...run.environment, PLAYWRIGHT_JSON_OUTPUT_FILE: report }
  return runTestStep(run, 'browser', argv, environment, (exit) => tallyOfPlaywright(textOrNull(report), exit))
}

async function runTestStep(
  run: TestRun,
  name: string,
  argv: readonly string[],
  environment: NodeJS.ProcessEnv,
  tallyOf: (exit: number | string) => Tally,
): Promise<Tally> {
  const startedAt = performance.now()
  const logPath = join(run.logFolder, `${name}.log`)
  const signal = AbortSignal.any([run.signal, AbortSignal.timeout(patienceMs)])
  try {
    const { exit, output } = await runToEnd({ name, argv, environment, logPath, signal })
    const tally = tallyOf(exit)
    if (tally.failed > 0) process.stdout.write(`${output.trimEnd()}\n`)
    report(name, tally, startedAt)
    return tally
  } catch (error) {
    if (!(error instanceof Interrupted)) throw error
    process.stdout.write(`${run.signal.aborted ? 'Stopped' : 'Ended, as it took too long'}: ${name}\n`)
    return oneFailure
  }
}

function report(name: string, { passed, failed }: Tally, startedAt: number) {
  const seconds = ((performance.now() - startedAt) / 1000).toFixed(1)
  process.stdout.write(`${name}: ${passed} passed, ${failed} failed (${seconds} s)\n`)
}

function textOrNull(path: string): string | null {
  return existsSync(path) ? readFileSync(path, 'utf8') : null
}
