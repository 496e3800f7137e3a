import { appendFileSync } from 'node:fs'
import { causeInOutput } from './cause-in-output'
import { endChild, exitOf, startChild } from './child-process'
import { findStepFailure, Interrupted, StepFailure } from './step-failure'

export interface Step {
  name: string
  argv: readonly string[]
  environment: NodeJS.ProcessEnv
  logPath: string
  /** Ends the step early; a step that tidies up takes none. */
  signal?: AbortSignal
}

export interface StepResult {
  exit: number | string
  /** What it wrote to standard output alone. */
  answer: string
  output: string
}

/** Runs a command to its end, whatever the end; its whole output goes to the log as well. */
export async function runToEnd({ name, argv, environment, logPath, signal }: Step): Promise<StepResult> {
  if (signal?.aborted) throw new Interrupted()
  const child = startChild(argv, environment, 'pipe')
  let answer = ''
  let output = ''
  child.stdout?.setEncoding('utf8').on('data', (text: string) => {
    answer += text
    output += text
  })
  child.stderr?.setEncoding('utf8').on('data', (text: string) => {
    output += text
  })
  const closed = new Promise((resolve) => child.once('close', resolve).once('error', resolve))
  const interrupt = () => void endChild(child)
  signal?.addEventListener('abort', interrupt, { once: true })
  const exit = await exitOf(child)
  // A child of its own that it left behind would keep the output open, and run on.
  await endChild(child)
  await closed
  signal?.removeEventListener('abort', interrupt)
  keepLog(logPath, `# ${name}: ${argv.join(' ')}\n${output}`)
  if (signal?.aborted) throw new Interrupted()
  return { exit, answer: answer.trim(), output }
}

/** Runs a command that must succeed, and answers what it wrote to standard output. */
export async function runStep(step: Step): Promise<string> {
  const { exit, answer, output } = await runToEnd(step)
  if (exit === 0) return answer
  throw (
    findStepFailure(output) ?? new StepFailure(step.name, causeInOutput(output || `${exit}`), step.logPath)
  )
}

function keepLog(logPath: string, text: string) {
  try {
    appendFileSync(logPath, text, { mode: 0o600 })
  } catch {
    // A full disk must not hide the cause that is about to be told.
  }
}
