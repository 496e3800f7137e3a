import { beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, signIn, uniqueCode } from '../support/api'
import { createPerson } from '../support/people'

let mine: ApiClient
let theirs: ApiClient
let ownerName: string

beforeAll(async () => {
  const [one, other] = [await createPerson('machinist'), await createPerson('cribManager')]
  ownerName = one.name
  mine = await signIn(one.email, one.password)
  theirs = await signIn(other.email, other.password)
})

const view = (change: object = {}) => ({
  ...{ kind: 'cutter', name: uniqueCode('View'), isShared: false, query: 'form=ball&columns=code,finish' },
  ...change,
})
const make = async (change: object = {}) => (await mine.post('/api/saved-views', view(change))).body
const namesOf = async (client: ApiClient, kind = 'cutter') => {
  const { body } = await client.get(`/api/saved-views?kind=${kind}`)
  return body.rows.map(({ name }) => name)
}

describe('a saved view', () => {
  it('is kept as it was, a column that means nothing included, and listed under its kind', async () => {
    const made = await mine.post('/api/saved-views', view())
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({
      ...{ version: 1, isShared: false, isMine: true, ownerName, query: 'form=ball&columns=code,finish' },
    })
    expect(await namesOf(mine)).toContain(made.body.name)
    expect(await namesOf(mine, 'holder')).not.toContain(made.body.name)
  })

  it('is its owner’s alone until it is shared, and then still only the owner’s to change', async () => {
    const { id, name } = await make()
    expect(await namesOf(theirs)).not.toContain(name)
    expect((await theirs.patch(`/api/saved-views/${id}`, { version: 1, name: 'Mine now' })).status).toBe(404)
    const shared = await mine.patch(`/api/saved-views/${id}`, { version: 1, isShared: true })
    expect(shared.body).toMatchObject({ version: 2, isShared: true, isMine: true })
    expect(await namesOf(theirs)).toContain(name)
    expect((await theirs.patch(`/api/saved-views/${id}`, { version: 2, name: 'Mine now' })).status).toBe(403)
    expect((await theirs.remove(`/api/saved-views/${id}`)).status).toBe(403)
    expect(await namesOf(mine)).toContain(name)
  })

  it('is named once a person and kind, capitals or not', async () => {
    const { name } = await make()
    const again = await mine.post('/api/saved-views', view({ name: String(name).toUpperCase() }))
    expect(again.status).toBe(409)
    expect(again.body.code).toBe('name-taken')
    expect(faultPaths(again)).toEqual(['name'])
    expect((await theirs.post('/api/saved-views', view({ name }))).status).toBe(201)
    expect((await mine.post('/api/saved-views', view({ name, kind: 'collet' }))).status).toBe(201)
    const other = await make()
    const renamed = await mine.patch(`/api/saved-views/${other.id}`, { version: 1, name })
    expect(renamed.body.code).toBe('name-taken')
  })

  it('refuses a change of a version that is gone, a name that is empty and a query without end', async () => {
    const { id } = await make()
    await mine.patch(`/api/saved-views/${id}`, { version: 1, query: 'q=drill' })
    const stale = await mine.patch(`/api/saved-views/${id}`, { version: 1, query: 'q=tap' })
    expect(stale.body).toMatchObject({ code: 'stale-version', current: { version: 2, query: 'q=drill' } })
    expect(faultPaths(await mine.post('/api/saved-views', view({ name: '  ' })))).toEqual(['name'])
    expect(faultPaths(await mine.post('/api/saved-views', view({ query: 'x'.repeat(5001) })))).toEqual([
      'query',
    ])
  })

  it('is gone when its owner removes it; an admin may remove a shared one', async () => {
    const { id, name } = await make()
    const admin = await signedInAs('admin')
    expect((await admin.remove(`/api/saved-views/${id}`)).status).toBe(404)
    expect((await mine.remove(`/api/saved-views/${id}`)).status).toBe(204)
    expect(await namesOf(mine)).not.toContain(name)
    const shared = await make({ isShared: true })
    expect((await admin.remove(`/api/saved-views/${shared.id}`)).status).toBe(204)
  })
})
