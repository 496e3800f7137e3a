import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { type Answer, type ApiClient, asNobody, faultPaths, signedInAs, signIn } from '../support/api'

const password = 'a password of one’s own'

function tokenIn(answer: Answer): string {
  const token = String(answer.body.link).split('/').at(-1)
  if (!token) throw new Error('The answer has no link.')
  return token
}

function personOf(answer: Answer): { id: string; version: number; email: string } {
  return answer.body.person as { id: string; version: number; email: string }
}

async function addPerson(admin: ApiClient, role = 'machinist'): Promise<Answer> {
  const email = `${randomUUID()}@leadline.example`
  const answer = await admin.post('/api/users', { email, name: 'Someone New', role })
  expect(answer.status).toBe(201)
  return answer
}

/** Someone new who has taken up the invitation and is signed in. */
async function joinedPerson(admin: ApiClient, role = 'machinist') {
  const added = await addPerson(admin, role)
  const accepted = await asNobody().post('/api/invitations', { token: tokenIn(added), password })
  expect(accepted.status).toBe(204)
  const person = personOf(added)
  return { person, client: await signIn(person.email, password) }
}

describe('adding a person', () => {
  it('answers a one-time address by which they set their password and come in', async () => {
    const admin = await signedInAs('admin')
    const { client, person } = await joinedPerson(admin, 'estimator')
    const who = await client.get('/api/session')
    expect(who.body.user).toMatchObject({ id: person.id, role: 'estimator' })
  })

  it('makes an address that opens once', async () => {
    const admin = await signedInAs('admin')
    const added = await addPerson(admin)
    const accept = () => asNobody().post('/api/invitations', { token: tokenIn(added), password })
    const answers = await Promise.all([accept(), accept()])
    expect(answers.map((answer) => answer.status).sort()).toEqual([204, 422])
  })

  it('makes a new address that closes the one before', async () => {
    const admin = await signedInAs('admin')
    const added = await addPerson(admin)
    const renewed = await admin.post(`/api/users/${personOf(added).id}/link`, {})
    const old = await asNobody().post('/api/invitations', { token: tokenIn(added), password })
    const fresh = await asNobody().post('/api/invitations', { token: tokenIn(renewed), password })
    expect([old.status, fresh.status]).toEqual([422, 204])
  })

  it.each([
    ['short', 'seven77'],
    ['longer than bcrypt reads', 'é'.repeat(37)],
  ])('refuses a password that is %s, beside its field', async (_, given) => {
    const admin = await signedInAs('admin')
    const added = await addPerson(admin)
    const answer = await asNobody().post('/api/invitations', { token: tokenIn(added), password: given })
    expect([400, 422]).toContain(answer.status)
    expect(faultPaths(answer)).toEqual(['password'])
  })

  it('refuses an e-mail address that is taken, in any case', async () => {
    const admin = await signedInAs('admin')
    const answer = await admin.post('/api/users', {
      email: 'Machinist@leadline.example',
      name: 'Twin',
      role: 'machinist',
    })
    expect(answer.status).toBe(409)
    expect(faultPaths(answer)).toEqual(['email'])
  })

  it('never answers a password hash', async () => {
    const admin = await signedInAs('admin')
    const { body } = await admin.get('/api/users')
    expect(JSON.stringify(body)).not.toMatch(/hash|\$2[aby]\$/i)
  })
})

describe('changing a person', () => {
  it('takes a new role at once', async () => {
    const admin = await signedInAs('admin')
    const { person, client } = await joinedPerson(admin, 'machinist')
    const cutter = { code: `P-${randomUUID()}` }
    expect((await client.post('/api/cutters', cutter)).status).toBe(403)
    const { body } = await admin.get('/api/users')
    const { version } = body.rows.find((row) => row.id === person.id)!
    const changed = await admin.patch(`/api/users/${person.id}`, { version, role: 'cribManager' })
    expect(changed.status).toBe(200)
    expect((await client.post('/api/cutters', cutter)).status).not.toBe(403)
  })

  it('signs out at once whoever is made inactive', async () => {
    const admin = await signedInAs('admin')
    const { person, client } = await joinedPerson(admin)
    const { body } = await admin.get('/api/users')
    const { version } = body.rows.find((row) => row.id === person.id)!
    const changed = await admin.patch(`/api/users/${person.id}`, { version, isActive: false })
    expect(changed.status).toBe(200)
    expect((await client.get('/api/session')).status).toBe(401)
    await expect(signIn(person.email, password)).rejects.toThrow('401')
  })

  it('refuses a stale version and answers the person as they are', async () => {
    const admin = await signedInAs('admin')
    const { id, version } = personOf(await addPerson(admin))
    await admin.patch(`/api/users/${id}`, { version, name: 'First' })
    const answer = await admin.patch(`/api/users/${id}`, { version, name: 'Second' })
    expect(answer.status).toBe(409)
    expect(answer.body.current).toMatchObject({ name: 'First' })
  })

  it('answers 404 for someone who is not there', async () => {
    const admin = await signedInAs('admin')
    expect((await admin.patch('/api/users/999999999', { version: 1, name: 'Nobody' })).status).toBe(404)
    expect((await admin.patch('/api/users/none', { version: 1, name: 'Nobody' })).status).toBe(404)
  })
})

describe('one’s own password', () => {
  it('is changed by the present one, and every other session ends', async () => {
    const admin = await signedInAs('admin')
    const { person, client } = await joinedPerson(admin)
    const elsewhere = await signIn(person.email, password)
    const changed = await client.send('PUT', '/api/me/password', {
      body: { currentPassword: password, newPassword: 'another one of mine' },
    })
    expect(changed.status).toBe(204)
    expect((await client.get('/api/session')).status).toBe(200)
    expect((await elsewhere.get('/api/session')).status).toBe(401)
    await expect(signIn(person.email, password)).rejects.toThrow('401')
    await signIn(person.email, 'another one of mine')
  })

  it('stays as it is without the present one', async () => {
    const admin = await signedInAs('admin')
    const { person, client } = await joinedPerson(admin)
    const answer = await client.send('PUT', '/api/me/password', {
      body: { currentPassword: 'not it at all', newPassword: 'another one of mine' },
    })
    expect(answer.status).toBe(422)
    expect(faultPaths(answer)).toEqual(['currentPassword'])
    await signIn(person.email, password)
  })
})

describe('setting up a shop', () => {
  it('is closed to a made-up address', async () => {
    const answer = await asNobody().post('/api/setup', {
      token: 'made-up',
      shopName: 'Another',
      currency: 'EUR',
      lengthUnit: 'mm',
      cribCode: 'X',
      cribName: 'X',
      timeZone: 'Europe/Dublin',
      name: 'Intruder',
      email: 'intruder@leadline.example',
      password,
    })
    expect(answer.status).toBe(422)
    expect(answer.body.code).toBe('link-expired')
  })
})
