import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, allRows, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { siteDatabase } from '../support/api-stock'

let crib: ApiClient
const db = siteDatabase()

beforeAll(async () => {
  crib = await signedInAs('cribManager')
})
afterAll(() => db.destroy())

async function createCrib(): Promise<{ id: string; cribId: string }> {
  const code = uniqueCode('CRIB')
  const made = await crib.post('/api/locations', {
    kind: 'crib',
    code,
    name: code,
    timeZone: 'Europe/Vienna',
  })
  return { id: made.body.id, cribId: made.body.cribId }
}

const post = (parentId: string, first: string, last: string) =>
  crib.post('/api/locations/pattern', { parentId, first, last })
const binsOf = (cribId: string) => allRows(crib, `/api/locations?kind=bin&cribId=${cribId}&limit=500`)

describe('a pattern of bins', () => {
  it('makes a whole wall of them in one go, with one entry in the audit', async () => {
    const root = await createCrib()
    const answer = await post(root.id, 'A1', 'F12')
    expect(answer.status).toBe(201)
    expect(answer.body.added).toBe(72)
    const bins = await binsOf(root.cribId)
    expect(bins).toHaveLength(72)
    expect(bins.find(({ code }) => code === 'F12')).toMatchObject({
      kind: 'bin',
      name: 'Bin F12',
      parentId: root.id,
    })
    const entries = await db('audit_entries').where({ action: 'locations-added', entity_id: root.id })
    expect(entries).toHaveLength(1)
    expect(entries[0]).toMatchObject({ actor_id: crib.user.id })
    expect(entries[0].after.codes).toHaveLength(72)
  })

  it('makes none where one is taken, in small letters or archived too, and says which', async () => {
    const root = await createCrib()
    const { body: bin } = await crib.post('/api/locations', {
      kind: 'bin',
      code: 'b2',
      name: 'Bin',
      parentId: root.id,
    })
    await crib.remove(`/api/locations/${bin.id}`)
    const answer = await post(root.id, 'A1', 'B3')
    expect(answer.status).toBe(409)
    expect(answer.body.code).toBe('code-taken')
    expect(answer.body.detail).toContain('b2')
    expect(faultPaths(answer)).toEqual(['first'])
    expect(await binsOf(root.cribId)).toEqual([])
  })

  it('sent twice at once stands once', async () => {
    const root = await createCrib()
    const answers = await Promise.all([post(root.id, 'A1', 'C9'), post(root.id, 'A1', 'C9')])
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409])
    expect(await binsOf(root.cribId)).toHaveLength(27)
  })

  it('is refused beside its field where it cannot be', async () => {
    const root = await createCrib()
    for (const [first, last, path] of [
      ['A1', 'F', 'last'],
      ['B1', 'A1', 'last'],
      ['A1', 'Z999', 'last'],
    ] as const) {
      const answer = await post(root.id, first, last)
      expect(answer.status, `${first} to ${last}`).toBe(422)
      expect(faultPaths(answer)).toEqual([path])
    }
    expect((await post(root.id, 'A1', 'A1')).status).toBe(201)
    const [made] = await binsOf(root.cribId)
    const within = await post(made?.id ?? '', 'B1', 'B2')
    expect(within.status).toBe(422)
    expect(faultPaths(within)).toEqual(['parentId'])
    expect(faultPaths(await post('999999999', 'A1', 'A2'))).toEqual(['parentId'])
    expect(faultPaths(await post(root.id, ' ', 'A2'))).toEqual(['first'])
  })
})

describe('the first day', () => {
  it('tells how far the shop is from what is there', async () => {
    const root = await createCrib()
    const before = (await crib.get('/api/first-day')).body
    await post(root.id, 'A1', 'A2')
    const { status, body } = await crib.get('/api/first-day')
    expect(status).toBe(200)
    expect(Number(body.bins)).toBeGreaterThanOrEqual(Number(before.bins) + 2)
    expect(body.isDone).toMatchObject({ bins: true, people: true })
  })
})
