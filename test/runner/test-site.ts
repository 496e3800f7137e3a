import { randomBytes } from 'node:crypto'
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { runScript, startWebServer, startWorker } from '@/server/launch/application'
import { buildIfChanged } from '@/server/launch/build'
import { startCluster, stopCluster } from '@/server/launch/cluster'
import { findFreePort } from '@/server/launch/ports'
import type { Started } from '@/server/launch/started'
import { waitForHealth } from '@/server/launch/wait-for-health'
import type { TestRun } from './test-step'

/** Settings of a developer's own that must not reach into the tests. */
const strangers = ['FORCE_COLOR', 'HOST', 'PORT', 'PUBLIC_URL', 'DEMO', 'DATABASE_URL', 'LOG_LEVEL']

/** What everything in this run is told: a data folder, a build folder and ports that no `make start` uses. */
export async function testEnvironment(dataFolder: string): Promise<NodeJS.ProcessEnv> {
  const inherited = Object.fromEntries(
    Object.entries(process.env).filter(([name]) => !strangers.includes(name)),
  )
  const port = await findFreePort()
  return {
    ...inherited,
    NODE_ENV: 'test',
    NO_COLOR: '1',
    DATA_DIR: dataFolder,
    DATABASE_PORT: String(await findFreePort()),
    CLUSTER_IS_THROWAWAY: 'yes',
    HOST: '127.0.0.1',
    PORT: String(port),
    BASE_URL: `http://127.0.0.1:${port}`,
    SESSION_SECRET: randomBytes(32).toString('hex'),
    NEXT_DIST_DIR: '.next-test',
  }
}

/** Starts a new, empty cluster and answers the run that knows its address. A run that was killed may have left one. */
export async function startTestDatabase(run: TestRun, started: Started): Promise<TestRun> {
  const logPath = join(run.logFolder, 'database.log')
  const drop = async () => {
    await stopCluster(run.environment, logPath)
    rmSync(join(run.environment.DATA_DIR ?? '', 'postgres'), { recursive: true, force: true })
  }
  await drop()
  started.addDatabase(drop)
  const url = await startCluster(run.environment, logPath, run.signal)
  const environment = { ...run.environment, DATABASE_URL: url, TEST_DATABASE_URL: url }
  return { ...run, environment }
}

/** Builds and starts the one site that API and browser tests share: web server, worker and the demo shop. */
export async function startTestSite(run: TestRun, started: Started): Promise<void> {
  const site: TestRun = { ...run, environment: { ...run.environment, NODE_ENV: 'production' } }
  await runScript(site, 'Migration', 'migrate')
  await runScript(site, 'Demo shop', 'seed:demo')
  await buildKeepingTypes(site)
  const web = started.add(startWebServer(site, '127.0.0.1', Number(site.environment.PORT)))
  const worker = started.add(startWorker(site))
  const address = site.environment.BASE_URL ?? ''
  await Promise.race([
    waitForHealth(address, web, join(site.logFolder, 'web.log'), site.signal),
    worker.failed,
  ])
}

/** A build points next-env.d.ts at its own folder; an editor and `tsc` are to go on reading the usual one. */
async function buildKeepingTypes({ environment, logFolder, signal }: TestRun): Promise<void> {
  const before = existsSync('next-env.d.ts') ? readFileSync('next-env.d.ts') : undefined
  await buildIfChanged({
    projectFolder: process.cwd(),
    environment,
    logPath: join(logFolder, 'build.log'),
    signal,
    announce: () => process.stdout.write('Building the site that API and browser tests share\n'),
  }).finally(() => before && writeFileSync('next-env.d.ts', before))
}
