import { join } from 'node:path'
import type { Env } from './env'
import { type Run, runScript, startWebServer, startWorker } from './launch/application'
import { buildIfChanged } from './launch/build'
import { startCluster, stopCluster } from './launch/cluster'
import { assertPortFree } from './launch/ports'
import { keptSessionSecret } from './launch/session-secret'
import { checkSettings, type LaunchSettings, readLaunchSettings } from './launch/settings'
import { Started } from './launch/started'
import { Interrupted, StepFailure } from './launch/step-failure'
import { aborted, listenForStop } from './launch/stop-signal'
import { waitForHealth } from './launch/wait-for-health'
import { demoAccounts, isDemoThere, localAddress, welcome } from './launch/welcome'

const goal = 'make start'
const say = (line: string) => process.stdout.write(`${line}\n`)

const started = new Started()

async function main(signal: AbortSignal): Promise<void> {
  const launch = readLaunchSettings(process.env)
  const logFolder = join(launch.dataFolder, 'log')
  const environment: NodeJS.ProcessEnv = {
    ...process.env,
    NODE_ENV: 'production',
    SESSION_SECRET: process.env.SESSION_SECRET ?? keptSessionSecret(launch.dataFolder),
    DATABASE_URL: launch.ownDatabaseUrl ?? (await runOwnDatabase(logFolder, signal)),
  }
  const settings = checkSettings(environment)
  await assertPortFree(settings.HOST, settings.PORT)
  const run: Run = { environment, logFolder, signal }

  say('Bringing the database up to date')
  await runScript(run, 'Migration', 'migrate')
  const accounts = await prepareAccounts(run, launch, settings)
  await buildIfChanged({
    projectFolder: process.cwd(),
    environment,
    logPath: join(logFolder, 'build.log'),
    signal,
    announce: () => say('Building (half a minute or so; skipped while nothing changes)'),
  })

  const web = started.add(startWebServer(run, settings.HOST, settings.PORT))
  const worker = started.add(startWorker(run))
  const webLog = join(logFolder, 'web.log')
  await Promise.race([waitForHealth(localAddress(settings), web, webLog, signal), worker.failed])
  say(welcome(settings, accounts))
  await Promise.race([aborted(signal), web.failed, worker.failed])
  say('Stopping')
}

async function runOwnDatabase(logFolder: string, signal: AbortSignal): Promise<string> {
  const logPath = join(logFolder, 'database.log')
  started.addDatabase(() => stopCluster(process.env, logPath))
  return startCluster(process.env, logPath, signal)
}

/** Loads the demo shop where it is wanted and the database is new, and answers how to get in. */
async function prepareAccounts(run: Run, launch: LaunchSettings, settings: Env): Promise<string> {
  if (launch.wantsDemo) {
    const told = lastLine(await runScript(run, 'Demo shop', 'seed:demo'))
    say(told)
    if (isDemoThere(told)) return demoAccounts
  }
  // A server that listens on every interface has no address by that name.
  const environment = { ...run.environment, PUBLIC_URL: settings.PUBLIC_URL ?? localAddress(settings) }
  const address = lastLine(await runScript({ ...run, environment }, 'First administrator', 'first-admin'))
  return address && `Make the first administrator at this address, which works once:\n  ${address}`
}

function lastLine(text: string): string {
  return text.split('\n').at(-1)?.trim() ?? ''
}

/** Tells a failure in one sentence and answers the exit code. */
function tell(error: unknown): number {
  if (error instanceof Interrupted) say('Stopped before it was running')
  else if (error instanceof StepFailure) process.stderr.write(`${error.sentence(goal)}\n`)
  else {
    const cause = error instanceof Error ? error.message : String(error)
    process.stderr.write(`${new StepFailure('Launch', cause).sentence(goal)}\n`)
  }
  return 1
}

const signal = listenForStop()
process.exitCode = await main(signal).then(() => 0, tell)
await started.stopAll().catch((error: unknown) => {
  process.exitCode = tell(error)
})
