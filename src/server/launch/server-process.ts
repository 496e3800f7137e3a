import type { ChildProcess } from 'node:child_process'
import { closeSync, existsSync, openSync, readFileSync, renameSync } from 'node:fs'
import { causeInOutput } from './cause-in-output'
import { endChild, exitOf, startChild } from './child-process'
import { StepFailure } from './step-failure'

/** A program that runs until it is told to stop: the web server, the worker. */
export interface ServerProcess {
  name: string
  /** Undefined where it could not be started. */
  pid: number | undefined
  /** Rejects with a StepFailure when the program ends without having been told to; never resolves. */
  failed: Promise<never>
  stop: () => Promise<void>
}

export function startServer(
  name: string,
  argv: readonly string[],
  environment: NodeJS.ProcessEnv,
  logPath: string,
): ServerProcess {
  if (existsSync(logPath)) renameSync(logPath, `${logPath}.1`)
  const log = openSync(logPath, 'a', 0o600)
  const child = startChild(argv, environment, log)
  closeSync(log)
  const failed = failureOf(child, name, logPath)
  // Whoever awaits `failed` sees the rejection; until somebody does it must not end this process.
  failed.catch(() => undefined)
  return { name, pid: child.pid, failed, stop: () => endChild(child) }
}

async function failureOf(child: ChildProcess, name: string, logPath: string): Promise<never> {
  const exit = await exitOf(child)
  throw new StepFailure(name, causeInOutput(readFileSync(logPath, 'utf8') || `it ended (${exit})`), logPath)
}
