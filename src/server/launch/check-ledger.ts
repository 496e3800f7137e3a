import { join } from 'node:path'
import { startCluster, stopCluster } from './cluster'
import { runStep, runToEnd } from './run-step'
import { readLaunchSettings } from './settings'
import { StepFailure } from './step-failure'
import { listenForStop } from './stop-signal'

/** Proves the ledger of the database that `make start` uses, which may be running or not. */
async function main(signal: AbortSignal): Promise<number> {
  const { dataFolder, ownDatabaseUrl } = readLaunchSettings(process.env)
  const logPath = join(dataFolder, 'log', 'check-ledger.log')
  const common = { environment: process.env, logPath, signal }
  const status = { ...common, name: 'Database', argv: ['bash', 'db/server.sh', 'status'] }
  const isOurs = !ownDatabaseUrl && (await runStep(status)) === 'stopped'
  try {
    const url = ownDatabaseUrl ?? (await startCluster(process.env, logPath, signal))
    const environment: NodeJS.ProcessEnv = { ...process.env, DATABASE_URL: url }
    const argv = ['npm', 'run', '--silent', 'check-ledger']
    const { exit, output } = await runToEnd({ ...common, name: 'Ledger', argv, environment })
    process.stdout.write(output)
    return exit === 0 ? 0 : 1
  } finally {
    if (isOurs) await stopCluster(process.env, logPath)
  }
}

process.exitCode = await main(listenForStop()).catch((error: unknown) => {
  const failure = error instanceof StepFailure ? error : new StepFailure('Ledger', String(error))
  process.stderr.write(`${failure.sentence('make check-ledger')}\n`)
  return 1
})
