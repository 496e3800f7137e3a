import { runStep } from './run-step'

/** Starts the project's own PostgreSQL for this run and answers its address. */
export function startCluster(
  environment: NodeJS.ProcessEnv,
  logPath: string,
  signal: AbortSignal,
): Promise<string> {
  return runStep({
    name: 'Database',
    argv: ['bash', 'db/server.sh', 'start', '--for-a-run'],
    environment,
    logPath,
    signal,
  })
}

/** Stops it again, unless it was also started by hand. */
export async function stopCluster(environment: NodeJS.ProcessEnv, logPath: string): Promise<void> {
  await runStep({
    name: 'Database',
    argv: ['bash', 'db/server.sh', 'stop', '--after-a-run'],
    environment,
    logPath,
  })
}
