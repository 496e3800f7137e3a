import { describe, expect, it } from 'vitest'
import { findStepFailure, StepFailure } from './step-failure'

describe('StepFailure', () => {
  it('is told in one sentence that names the step, the cause and the log', () => {
    expect(new StepFailure('Build', 'the disk is full', '/data/log/build.log').sentence('make start')).toBe(
      'make start stopped at Build: the disk is full (details: /data/log/build.log).',
    )
  })

  it('survives being told by a script and read again', () => {
    const told = new StepFailure(
      'Database',
      'port 54329 on 127.0.0.1 is taken (choose another)',
      '/data/server.log',
    )
    const read = findStepFailure(`noise\n${told.sentence('make start')}\n`)
    expect(read).toMatchObject({ step: told.step, reason: told.reason, logPath: told.logPath })
    expect(findStepFailure('db/server.sh stopped at Database: it is so (maybe).\n')).toMatchObject({
      reason: 'it is so (maybe)',
      logPath: undefined,
    })
  })

  it('is not read out of other output', () => {
    expect(findStepFailure('Error: something else')).toBeNull()
  })
})
