import { mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { availableParallelism, cpus } from 'node:os'
import { join } from 'node:path'
import { Started } from '@/server/launch/started'
import { Interrupted, StepFailure } from '@/server/launch/step-failure'
import { aborted, listenForStop } from '@/server/launch/stop-signal'
import { testEnvironment } from '../runner/test-site'
import type { Bench } from './runner/bench'
import { Lab } from './runner/lab'
import { currentLoad, type Outcome, reportTable } from './runner/report'

const goal = 'make bench'
const say = (line: string) => process.stdout.write(`${line}\n`)

/** The benches asked for, in the order of their names; a name that is none stops the run before anything is built. */
async function chosenBenches(only: string): Promise<Bench[]> {
  const names = readdirSync(import.meta.dirname)
    .filter((file) => file.endsWith('.bench.ts'))
    .map((file) => file.replace('.bench.ts', ''))
    .sort()
  const wanted = only.split(/[\s,]+/).filter(Boolean)
  const unknown = wanted.find((name) => !names.includes(name))
  if (unknown) throw new StepFailure('Settings', `ONLY names ${unknown}, and there is ${names.join(', ')}`)
  const chosen = wanted.length > 0 ? wanted : names
  return Promise.all(
    chosen.map(async (name) => {
      const module: { bench: Bench } = await import(`./${name}.bench.ts`)
      return module.bench
    }),
  )
}

/** One bench after another, so that none costs another anything; one that fails leaves the others their turn. */
async function measureAll(benches: readonly Bench[], lab: Lab): Promise<Outcome[]> {
  const outcomes: Outcome[] = []
  for (const bench of benches) {
    if (lab.signal.aborted) break
    say(bench.name)
    const before = currentLoad()
    const startedAt = performance.now()
    const result = await figuresOf(bench, lab)
    const seconds = Math.round((performance.now() - startedAt) / 100) / 10
    outcomes.push({ bench: bench.name, ...result, load: { before, after: currentLoad() }, seconds })
  }
  return outcomes
}

async function figuresOf(bench: Bench, lab: Lab): Promise<Pick<Outcome, 'figures' | 'failure'>> {
  try {
    const stopped = aborted(lab.signal).then((): never => {
      throw new Interrupted()
    })
    return { figures: await Promise.race([bench.run(lab), stopped, lab.failed]), failure: null }
  } catch (error) {
    return { figures: [], failure: reasonOf(error) }
  }
}

function reasonOf(error: unknown): string {
  if (error instanceof Interrupted) return 'The run was stopped.'
  if (error instanceof StepFailure) return error.sentence(goal)
  return error instanceof Error ? (error.stack ?? error.message) : String(error)
}

function keepReport(folder: string, outcomes: readonly Outcome[]): string {
  const path = join(folder, `${new Date().toISOString().replace(/[:.]/g, '-')}.json`)
  const machine = { cores: availableParallelism(), processor: cpus()[0]?.model ?? '', node: process.version }
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  writeFileSync(path, `${JSON.stringify({ machine, outcomes }, null, 2)}\n`)
  return path
}

async function main(signal: AbortSignal): Promise<void> {
  const benches = await chosenBenches(process.env.ONLY ?? '')
  const dataFolder = join(process.env.DATA_DIR ?? '.leadline', 'bench')
  const workFolder = join(dataFolder, 'work')
  rmSync(workFolder, { recursive: true, force: true })
  mkdirSync(dataFolder, { recursive: true, mode: 0o711 })
  mkdirSync(workFolder, { mode: 0o700 })
  const environment = {
    ...(await testEnvironment(dataFolder)),
    // The database as a shop has it, not one that trades its safety for speed.
    CLUSTER_IS_THROWAWAY: 'no',
    NEXT_DIST_DIR: '.next',
  }
  const lab = new Lab({ environment, logFolder: workFolder, signal }, new Started())
  const outcomes = await measureAll(benches, lab)
  await lab.close()
  say(`\n${reportTable(outcomes)}`)
  say(`Kept in ${keepReport(join(dataFolder, 'reports'), outcomes)}; logs in ${workFolder}.`)
  // A missed limit is said in the table and fails nothing; what could not be measured does.
  if (outcomes.some(({ failure }) => failure !== null)) process.exitCode = 1
}

try {
  await main(listenForStop())
} catch (error) {
  process.stderr.write(`${reasonOf(error)}\n`)
  process.exitCode = 1
}
// Whatever an interrupted bench was still waiting for is not waited for.
process.exit()
