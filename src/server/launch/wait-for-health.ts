import { setTimeout as sleep } from 'node:timers/promises'
import type { ServerProcess } from './server-process'
import { Interrupted, StepFailure } from './step-failure'

/** Waits until the server says that it and its database are well, or until it has failed. */
export async function waitForHealth(
  address: string,
  server: ServerProcess,
  logPath: string,
  signal: AbortSignal,
  patienceMs = 60_000,
): Promise<void> {
  const deadline = Date.now() + patienceMs
  while (Date.now() < deadline) {
    if (signal.aborted) throw new Interrupted()
    if (await Promise.race([isHealthy(address), server.failed])) return
    await Promise.race([sleep(200), server.failed])
  }
  throw new StepFailure(server.name, `it does not answer at ${address}/api/health`, logPath)
}

async function isHealthy(address: string): Promise<boolean> {
  try {
    const response = await fetch(`${address}/api/health`, { signal: AbortSignal.timeout(5_000) })
    return response.ok
  } catch {
    return false
  }
}
