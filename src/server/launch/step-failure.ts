/** A step that could not be done. Whoever started Leadline reads one sentence: the step and the cause. */
export class StepFailure extends Error {
  readonly step: string
  readonly reason: string
  readonly logPath: string | undefined

  constructor(step: string, reason: string, logPath?: string) {
    super(`${step}: ${reason}`)
    this.step = step
    this.reason = reason
    this.logPath = logPath
  }

  sentence(goal: string): string {
    const details = this.logPath ? ` (details: ${this.logPath})` : ''
    return `${goal} stopped at ${this.step}: ${this.reason}${details}.`
  }
}

/** The sentence that a script in db/ has printed already, taken apart again; null where it printed none. */
export function findStepFailure(output: string): StepFailure | null {
  const said = /^.+ stopped at ([^:]+): (.+?)(?: \(details: ([^()]+)\))?\.$/m.exec(output)
  return said ? new StepFailure(said[1] ?? '', said[2] ?? '', said[3]) : null
}

/** Somebody pressed Ctrl-C (or ended the process) while a step was running. */
export class Interrupted extends Error {}
