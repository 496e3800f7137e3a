import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { asNobody, faultPaths, signedInAs, signIn } from '../support/api'

/** An address nobody else in the test run comes from, as a TLS front would pass it on. */
const fromAnAddressOfItsOwn = () => ({ 'x-forwarded-for': `test-${randomUUID()}` })

function trySignIn(email: string, password: string, headers: Record<string, string>) {
  return asNobody().send('POST', '/api/session', { body: { email, password }, headers })
}

describe('POST /api/session', () => {
  it('answers who one is and sets a cookie no script can read', async () => {
    const answer = await asNobody().post('/api/session', {
      email: 'machinist@leadline.example',
      password: 'leadline-demo',
    })
    expect(answer.status).toBe(200)
    expect(answer.body.user).toEqual({
      id: expect.stringMatching(/^\d+$/),
      name: expect.any(String),
      email: 'machinist@leadline.example',
      role: 'machinist',
      locationId: expect.stringMatching(/^\d+$/),
    })
    const cookie = answer.headers.getSetCookie().join()
    expect(cookie).toMatch(/HttpOnly/i)
    expect(cookie).toMatch(/SameSite=lax/i)
  })

  it('takes an address in whatever case it is typed', async () => {
    const answer = await trySignIn('Machinist@Leadline.Example', 'leadline-demo', fromAnAddressOfItsOwn())
    expect(answer.status).toBe(200)
  })

  it('refuses a wrong password and an unknown account in the same words', async () => {
    const headers = fromAnAddressOfItsOwn()
    const wrong = await trySignIn('estimator@leadline.example', 'not it', headers)
    const unknown = await trySignIn(`${randomUUID()}@leadline.example`, 'not it', headers)
    expect([wrong.status, unknown.status]).toEqual([401, 401])
    expect(unknown.body.detail).toBe(wrong.body.detail)
  })

  it('names the fields that are missing', async () => {
    const answer = await asNobody().post('/api/session', { email: '' })
    expect(answer.status).toBe(400)
    expect(faultPaths(answer)).toEqual(['email', 'password'])
  })

  it('closes the door after ten failed tries a minute, for an account from anywhere', async () => {
    const email = `${randomUUID()}@leadline.example`
    for (let count = 0; count < 10; count += 1) {
      expect((await trySignIn(email, 'not it', fromAnAddressOfItsOwn())).status).toBe(401)
    }
    const answer = await trySignIn(email, 'not it', fromAnAddressOfItsOwn())
    expect(answer.status).toBe(429)
    expect(answer.body.code).toBe('too-many-tries')
  })

  it('closes the door after ten failed tries a minute, for an address at any account', async () => {
    const headers = fromAnAddressOfItsOwn()
    for (let count = 0; count < 10; count += 1) {
      expect((await trySignIn(`${randomUUID()}@leadline.example`, 'not it', headers)).status).toBe(401)
    }
    const right = await trySignIn('machinist@leadline.example', 'leadline-demo', headers)
    expect(right.status).toBe(429)
  })

  it('tells no more than ten of many tries at the same moment whether they were right', async () => {
    const email = `${randomUUID()}@leadline.example`
    const answers = await Promise.all(
      Array.from({ length: 25 }, () => trySignIn(email, 'not it', fromAnAddressOfItsOwn())),
    )
    const judged = answers.filter((answer) => answer.status === 401)
    expect(judged.length).toBeLessThanOrEqual(10)
    expect(answers.length - judged.length).toBe(answers.filter((answer) => answer.status === 429).length)
  })

  it('lets a whole shift in that signs in at the same moment from one address', async () => {
    const headers = fromAnAddressOfItsOwn()
    const answers = await Promise.all(
      Array.from({ length: 15 }, () => trySignIn('estimator@leadline.example', 'leadline-demo', headers)),
    )
    expect(answers.map((answer) => answer.status)).toEqual(Array.from({ length: 15 }, () => 200))
  })

  it('refuses a page of another site', async () => {
    const answer = await trySignIn('machinist@leadline.example', 'leadline-demo', {
      origin: 'https://elsewhere.example',
    })
    expect(answer.status).toBe(403)
    expect(answer.body.code).toBe('foreign-origin')
  })
})

describe('GET and DELETE /api/session', () => {
  it('say who is signed in, until signing out ends it on the server too', async () => {
    const client = await signedInAs('estimator')
    expect((await client.get('/api/session')).body.user).toMatchObject({ role: 'estimator' })
    expect((await client.remove('/api/session')).status).toBe(204)
    expect((await client.get('/api/session')).status).toBe(401)
  })

  it('let signing out be done by someone who is not signed in', async () => {
    expect((await asNobody().remove('/api/session')).status).toBe(204)
  })
})

describe('a session', () => {
  it('is not opened by a made-up cookie', async () => {
    const answer = await asNobody().send('GET', '/api/session', {
      headers: { cookie: 'leadline-session=made-up' },
    })
    expect(answer.status).toBe(401)
  })

  it('is a new one at every sign-in', async () => {
    const first = await signIn('machinist@leadline.example', 'leadline-demo')
    const second = await signIn('machinist@leadline.example', 'leadline-demo')
    await first.remove('/api/session')
    expect((await second.get('/api/session')).status).toBe(200)
  })
})
