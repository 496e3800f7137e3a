import { describe, expect, it } from 'vitest'
import { checkSettings, readLaunchSettings } from './settings'

const complete = {
  DATABASE_URL: 'postgresql://127.0.0.1/leadline',
  SESSION_SECRET: 'x'.repeat(32),
  DATA_DIR: '/data',
}

describe('readLaunchSettings', () => {
  it('wants the demo shop on a database of its own alone', () => {
    expect(readLaunchSettings({ DATA_DIR: '/data' }).wantsDemo).toBe(true)
    expect(readLaunchSettings({ DATA_DIR: '/data', DEMO: 'no' }).wantsDemo).toBe(false)
    expect(readLaunchSettings({ ...complete }).wantsDemo).toBe(false)
    expect(readLaunchSettings({ ...complete, DEMO: 'yes' }).wantsDemo).toBe(false)
  })

  it('takes an empty DATABASE_URL for none', () => {
    expect(readLaunchSettings({ DATA_DIR: '/data', DATABASE_URL: '' })).toMatchObject({
      ownDatabaseUrl: undefined,
      wantsDemo: true,
    })
  })

  it('names a wrong DEMO', () => {
    expect(() => readLaunchSettings({ DATA_DIR: '/data', DEMO: 'maybe' })).toThrow(/^Settings: DEMO is wrong/)
  })
})

describe('checkSettings', () => {
  it('names the setting that is wrong, in one sentence', () => {
    expect(() => checkSettings({ ...complete, PORT: 'seventy' })).toThrow(
      /^Settings: PORT is wrong \([^\n]*\)$/,
    )
  })

  it('passes what the programs will accept', () => {
    expect(checkSettings(complete)).toMatchObject({ HOST: '127.0.0.1', PORT: 3000 })
  })
})
