import { describe, expect, it } from 'vitest'
import { parseEnv } from './env'

const good = {
  DATABASE_URL: 'postgres://leadline@127.0.0.1:54329/leadline',
  SESSION_SECRET: 'a secret of at least thirty-two characters',
  DATA_DIR: 'data',
}

describe('the settings', () => {
  it('take what is not set from their defaults', () => {
    expect(parseEnv(good)).toMatchObject({
      HOST: '127.0.0.1',
      PORT: 3000,
      publicUrl: 'http://127.0.0.1:3000',
    })
  })

  it.each([
    ['DATABASE_URL', 'mysql://elsewhere/leadline'],
    ['SESSION_SECRET', 'short'],
    ['PORT', '70000'],
    ['PUBLIC_URL', 'leadline.example'],
    ['LOG_LEVEL', 'loud'],
    ['SMTP_URL', 'https://mail.leadline.example'],
    ['MAIL_FROM', 'nobody'],
    ['MAIL_FROM', 'a@leadline.example\r\nBcc: b@leadline.example'],
  ])('name %s where it is wrong', (name, value) => {
    expect(() => parseEnv({ ...good, [name]: value })).toThrow(new RegExp(`^Settings: ${name} is wrong`))
  })

  it('want to know whom mail comes from once there is a mail server', () => {
    const server = { ...good, SMTP_URL: 'smtp://mail.leadline.example:587' }
    expect(() => parseEnv(server)).toThrow('Settings: MAIL_FROM is not set.')
    expect(parseEnv({ ...server, MAIL_FROM: 'Crib <crib@leadline.example>' }).mailFrom).toBe(
      'Crib <crib@leadline.example>',
    )
    expect(parseEnv({ ...good, SMTP_URL: '' }).SMTP_URL).toBeUndefined()
  })

  it('name every one that is missing, in one sentence', () => {
    expect(() => parseEnv({})).toThrow(
      'Settings: DATABASE_URL is not set; SESSION_SECRET is not set; DATA_DIR is not set.',
    )
  })

  it('send the session cookie over plain HTTP on loopback alone', () => {
    expect(parseEnv(good).isCookieSecure).toBe(false)
    expect(parseEnv({ ...good, HOST: '0.0.0.0' }).isCookieSecure).toBe(true)
    expect(parseEnv({ ...good, PUBLIC_URL: 'https://tools.shop.example' }).isCookieSecure).toBe(true)
  })
})
