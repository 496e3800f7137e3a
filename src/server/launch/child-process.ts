import { type ChildProcess, spawn } from 'node:child_process'
import { existsSync } from 'node:fs'

const setpriv = '/usr/bin/setpriv'

/**
 * Starts a program in a process group of its own, so that Ctrl-C in the terminal reaches it only through us and in order.
 * Should this process be killed outright, the kernel ends the child too.
 */
export function startChild(
  argv: readonly string[],
  environment: NodeJS.ProcessEnv,
  output: 'pipe' | number,
): ChildProcess {
  const tied = existsSync(setpriv) ? [setpriv, '--pdeathsig', 'TERM', ...argv] : [...argv]
  const [command = '', ...args] = tied
  return spawn(command, args, { env: environment, detached: true, stdio: ['ignore', output, output] })
}

/** Resolves with the exit code, or with the name of the signal or fault that ended it. */
export function exitOf(child: ChildProcess): Promise<number | string> {
  if (child.exitCode !== null || child.signalCode !== null) {
    return Promise.resolve(child.exitCode ?? child.signalCode ?? 'unknown')
  }
  return new Promise((resolve) => {
    child.once('error', (error) => resolve(error.message))
    child.once('exit', (code, signal) => resolve(code ?? signal ?? 'unknown'))
  })
}

/** Asks a child and all it started to end, and after a while insists. */
export async function endChild(child: ChildProcess, patienceMs = 10_000): Promise<void> {
  const ended = exitOf(child)
  signalGroup(child, 'SIGTERM')
  const insist = setTimeout(() => signalGroup(child, 'SIGKILL'), patienceMs)
  await ended
  clearTimeout(insist)
  signalGroup(child, 'SIGKILL')
}

function signalGroup(child: ChildProcess, signal: NodeJS.Signals) {
  if (child.pid === undefined) return
  try {
    process.kill(-child.pid, signal)
  } catch {
    // Nobody of the group is left.
  }
}
