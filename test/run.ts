import { mkdirSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { Started } from '@/server/launch/started'
import { Interrupted, StepFailure } from '@/server/launch/step-failure'
import { listenForStop } from '@/server/launch/stop-signal'
import { oneFailure, sumOf, type Tally } from './runner/tally'
import { startTestDatabase, startTestSite, testEnvironment } from './runner/test-site'
import { runCheck, runPlaywright, runVitest, type TestRun } from './runner/test-step'

const say = (line: string) => process.stdout.write(`${line}\n`)

/**
 * All checks and tests, in two lanes for two cores: what needs no server beside building and starting the one that API
 * and browser tests share. A step that fails stops only what cannot do without it.
 */
async function testAll(run: TestRun, started: Started): Promise<Tally[]> {
  const database = startTestDatabase(run, started)
  const withoutSite = async () => [
    await runCheck(run, 'lint'),
    await runCheck(run, 'imports'),
    await runVitest(run, 'unit'),
    ...(await needing('db', database, async (ready) => [await runVitest(ready, 'db')])),
  ]
  const withSite = async () => {
    const types = await runCheck(run, 'typecheck')
    const site = database.then(async (ready) => {
      await startTestSite(ready, started)
      return ready
    })
    const tallies = await needing('api and browser', site, async (ready) => [
      await runVitest(ready, 'api'),
      await runPlaywright(ready),
    ])
    return [types, ...tallies]
  }
  return (await Promise.all([withoutSite(), withSite()])).flat()
}

/** Runs the tests that need something started first; where that fails they count as one failure, with the reason. */
async function needing(
  names: string,
  prerequisite: Promise<TestRun>,
  test: (ready: TestRun) => Promise<Tally[]>,
): Promise<Tally[]> {
  try {
    return await test(await prerequisite)
  } catch (error) {
    say(`${names}: not run. ${reasonOf(error)}`)
    return [oneFailure]
  }
}

function reasonOf(error: unknown): string {
  if (error instanceof Interrupted) return 'The run was stopped.'
  if (error instanceof StepFailure) return error.sentence('make test')
  return error instanceof Error ? error.message : String(error)
}

const signal = listenForStop()
const started = new Started()
const dataFolder = join(process.env.DATA_DIR ?? '.leadline', 'test')
const logFolder = join(dataFolder, 'log')
rmSync(logFolder, { recursive: true, force: true })
mkdirSync(dataFolder, { recursive: true, mode: 0o711 })
mkdirSync(logFolder, { mode: 0o700 })

const run: TestRun = { environment: await testEnvironment(dataFolder), logFolder, signal }
const tallies = await testAll(run, started)
await started.stopAll().catch((error: unknown) => {
  say(reasonOf(error))
  tallies.push(oneFailure)
})
const total = sumOf(tallies)
say(`Logs: ${logFolder}`)
say(`${total.passed} passed, ${total.failed} failed`)
process.exitCode = total.failed > 0 ? 1 : 0
