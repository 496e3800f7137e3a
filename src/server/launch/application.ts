import { join } from 'node:path'
import { runStep } from './run-step'
import { type ServerProcess, startServer } from './server-process'

/** What the steps of one run share: where it logs, what its programs are told, what ends it. */
export interface Run {
  environment: NodeJS.ProcessEnv
  logFolder: string
  signal: AbortSignal
}

/** Runs one of package.json's scripts and answers what it printed. */
export function runScript(
  { environment, logFolder, signal }: Run,
  name: string,
  script: string,
): Promise<string> {
  return runStep({
    name,
    argv: ['npm', 'run', '--silent', script],
    environment,
    logPath: join(logFolder, `${script.replace(':', '-')}.log`),
    signal,
  })
}

/** Serves the build of this checkout, or of another folder that was built like it. */
export function startWebServer(
  { environment, logFolder }: Run,
  host: string,
  port: number,
  builtFolder = process.cwd(),
): ServerProcess {
  const argv = [process.execPath, 'node_modules/next/dist/bin/next', 'start', builtFolder]
  argv.push('-H', host, '-p', String(port))
  return startServer('Web server', argv, environment, join(logFolder, 'web.log'))
}

export function startWorker({ environment, logFolder }: Run): ServerProcess {
  // A small nursery of objects: an import makes and drops them by the million, and few outlive their batch.
  const argv = [process.execPath, '--max-semi-space-size=4', '--conditions=react-server']
  argv.push('--import', 'tsx', 'src/server/worker.ts')
  return startServer('Worker', argv, environment, join(logFolder, 'worker.log'))
}
