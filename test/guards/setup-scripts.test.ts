import { spawnSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { findStepFailure } from '@/server/launch/step-failure'

let folder = ''

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'setup-scripts-'))
})

afterEach(() => rmSync(folder, { recursive: true }))

function bash(script: string, settings: Record<string, string> = {}) {
  const environment = {
    ...process.env,
    DATA_DIR: join(folder, 'data'),
    LEADLINE_GOAL: 'make start',
    ...settings,
  }
  return spawnSync('bash', ['-c', script], { env: environment, encoding: 'utf8' })
}

describe('the cause of a failed command', () => {
  const npmUnreachable = [
    'npm error code ENOTFOUND',
    'npm error syscall getaddrinfo',
    'npm error errno ENOTFOUND',
    'npm error network request to http://packages.example/zod failed, reason: getaddrinfo ENOTFOUND packages.example',
    'npm error network This is a problem related to network connectivity.',
    'npm error A complete log of this run can be found in: /somewhere',
  ]

  it.each([
    [
      'npm without a network',
      npmUnreachable,
      'request to http://packages.example/zod failed, reason: getaddrinfo ENOTFOUND packages.example',
    ],
    ['npm on a full disk', ['npm error code ENOSPC', 'npm error syscall write'], 'the disk is full'],
    [
      'apt',
      ['Reading package lists...', 'E: Unable to locate package postgresql-15'],
      'Unable to locate package postgresql-15',
    ],
    [
      'initdb',
      ['creating directory', 'initdb: error: could not create directory "/x": Permission denied'],
      'initdb: error: could not create directory "/x": Permission denied',
    ],
    ['a program that says little', ['', 'it went wrong.', ''], 'it went wrong'],
    ['a program that says nothing', [], 'it gave no reason'],
  ])('is found in the output of %s', (_, lines, cause) => {
    writeFileSync(join(folder, 'log'), lines.join('\n'))
    expect(bash(`source db/common.sh; cause_in '${folder}/log'`).stdout.trim()).toBe(cause)
  })
})

it('a failing script says one sentence, which the launcher can read again', () => {
  const { status, stdout, stderr } = bash(
    'source db/common.sh; fail Disk "there is no space left" /data/x.log',
  )
  expect({ status, stdout, lines: stderr.trim().split('\n').length }).toEqual({
    status: 1,
    stdout: '',
    lines: 1,
  })
  expect(findStepFailure(stderr)).toMatchObject({
    step: 'Disk',
    reason: 'there is no space left',
    logPath: '/data/x.log',
  })
})

it.each([
  ['5432', "port 5432 is left to Debian's own PostgreSQL"],
  ['many', 'DATABASE_PORT must be a port number, not "many"'],
  ['70000', 'DATABASE_PORT must be a port number, not "70000"'],
])('the database server refuses port %s and starts nothing', (port, cause) => {
  const { status, stderr } = bash('db/server.sh start --for-a-run', { DATABASE_PORT: port })
  expect(status).toBe(1)
  expect(findStepFailure(stderr)?.reason).toContain(cause)
  expect(bash('db/server.sh status').stdout.trim()).toBe('stopped')
})
