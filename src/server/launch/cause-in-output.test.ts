import { describe, expect, it } from 'vitest'
import { causeInOutput } from './cause-in-output'

const uncaught = `/shop/src/server/db/migrate.ts:12
    throw new Error('a line of source, not the cause')
          ^

Error: Settings: SESSION_SECRET is wrong (too short).
    at parseEnv (/shop/src/server/env.ts:40:9)

Node.js v20.20.2
`

describe('causeInOutput', () => {
  it.each([
    ['npm error code ENOSPC\nnpm error nospc ENOSPC: no space left on device, write', 'the disk is full'],
    ['could not write to log file: No space left on device', 'the disk is full'],
    [
      '⨯ Failed to start server\nError: listen EADDRINUSE: address already in use 127.0.0.1:3000',
      'port 3000 is taken by another program',
    ],
    [
      'AggregateError [ECONNREFUSED]:\n    at x\nError: connect ECONNREFUSED 127.0.0.1:5999',
      'nothing answers at 127.0.0.1:5999',
    ],
    ['Error: getaddrinfo ENOTFOUND db.shop.example', 'the host db.shop.example cannot be found'],
    [
      'error: password authentication failed for user "crib"\n    at Parser',
      'password authentication failed for user "crib"',
    ],
    [
      "src/a.ts(2,7): error TS2307: Cannot find module './b'.\nFailed to type check.",
      "src/a.ts(2,7): Cannot find module './b'",
    ],
    ['Running checks\nSomething broke\n', 'Something broke'],
    ['', 'it gave no reason'],
  ])('says of %j: %s', (output, cause) => {
    expect(causeInOutput(output)).toBe(cause)
  })

  it('takes the message of an uncaught error, neither its source line nor its stack', () => {
    expect(causeInOutput(uncaught)).toBe('Settings: SESSION_SECRET is wrong (too short)')
  })

  it('never answers more than one line', () => {
    expect(causeInOutput(`Error: ${'x'.repeat(1000)}\nmore`)).toHaveLength(300)
  })
})
