import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { setTimeout as sleep } from 'node:timers/promises'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { runStep } from './run-step'
import { Interrupted } from './step-failure'

let folder = ''
const stepOf = (script: string, signal?: AbortSignal) => ({
  name: 'Trial',
  argv: ['bash', '-c', script],
  environment: process.env,
  logPath: join(folder, 'trial.log'),
  ...(signal ? { signal } : {}),
})

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'run-step-'))
})

afterEach(() => rmSync(folder, { recursive: true }))

it('answers what the command printed and keeps all of it in the log', async () => {
  await expect(runStep(stepOf('echo answer; echo aside >&2'))).resolves.toBe('answer')
  expect(readFileSync(join(folder, 'trial.log'), 'utf8')).toContain('aside')
})

it('names the step, the cause and the log of a command that fails', async () => {
  await expect(runStep(stepOf('echo "Error: no such tool" >&2; exit 3'))).rejects.toMatchObject({
    step: 'Trial',
    reason: 'no such tool',
    logPath: join(folder, 'trial.log'),
  })
})

it('passes on the sentence of a script that has said it already', async () => {
  const script = 'echo "make start stopped at Database: the port is taken." >&2; exit 1'
  await expect(runStep(stepOf(script))).rejects.toMatchObject({
    step: 'Database',
    reason: 'the port is taken',
  })
})

it('leaves nothing running when it is interrupted', async () => {
  const controller = new AbortController()
  const step = runStep(stepOf(`sleep 321 & echo $! >${folder}/pid; wait`, controller.signal))
  const refused = expect(step).rejects.toBeInstanceOf(Interrupted)
  await sleep(300)
  controller.abort()
  await refused
  await expectEnded(Number(readFileSync(join(folder, 'pid'), 'utf8')))
})

it('leaves nothing running that the command left behind', async () => {
  await runStep(stepOf(`sleep 321 & echo $! >${folder}/pid`))
  await expectEnded(Number(readFileSync(join(folder, 'pid'), 'utf8')))
})

/** A signal is delivered when the kernel comes to it: soon, and long before the 321 seconds of the sleeper are over. */
function expectEnded(pid: number): Promise<void> {
  return expect.poll(() => isRunning(pid), { timeout: 5000 }).toBe(false)
}

/** A process that has ended may stay listed as a zombie until somebody collects it. */
function isRunning(pid: number): boolean {
  try {
    return !/^State:\s+Z/m.test(readFileSync(`/proc/${pid}/status`, 'utf8'))
  } catch {
    return false
  }
}
