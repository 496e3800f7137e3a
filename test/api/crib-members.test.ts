import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { type ApiClient, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, type Shelf, siteDatabase } from '../support/api-stock'

let db: Knex
let admin: ApiClient
let crib: ApiClient
let machinist: ApiClient
let shelf: Shelf

beforeAll(async () => {
  db = siteDatabase()
  ;[admin, crib, machinist] = await Promise.all([
    signedInAs('admin'),
    signedInAs('cribManager'),
    signedInAs('machinist'),
  ])
})
afterAll(() => db.destroy())
beforeEach(async () => {
  shelf = await createShelf(crib)
})

const member = (userId: string) => `/api/cribs/${shelf.cribId}/members/${userId}`
const rows = async () => (await crib.get(`/api/cribs/${shelf.cribId}/members`)).body.rows
const members = async () => (await rows()).filter(({ isMember }) => isMember).map(({ userId }) => userId)

async function addPerson(): Promise<string> {
  const name = uniqueCode('Member')
  const email = `${name.toLowerCase()}@leadline.example`
  const { body } = await admin.post('/api/users', { name, email, role: 'machinist' })
  return (body.person as { id: string }).id
}

describe('the members of a crib', () => {
  it('are added and taken away one by one, and again changes nothing', async () => {
    const id = machinist.user.id
    expect(await members()).toEqual([])
    for (const expected of [[id], [id]]) {
      expect((await crib.send('PUT', member(id))).status).toBe(204)
      expect(await members()).toEqual(expected)
    }
    const { rows: cribs } = (await machinist.get('/api/cribs')).body
    expect(cribs).toContainEqual(expect.objectContaining({ id: shelf.cribId, members: 1 }))
    for (const _ of [1, 2]) expect((await crib.remove(member(id))).status).toBe(204)
    expect(await members()).toEqual([])
    const entries = await db('audit_entries').where({ entity: 'crib', entity_id: shelf.cribId }).orderBy('id')
    expect(entries.map(({ action }) => action).filter((action) => action.includes('member'))).toEqual([
      'crib-member-added',
      'crib-member-removed',
    ])
  })

  it('are active people of a crib that there is', async () => {
    expect((await crib.send('PUT', member('999999999'))).status).toBe(404)
    expect((await crib.send('PUT', `/api/cribs/999999999/members/${crib.user.id}`)).status).toBe(404)
    expect((await crib.get('/api/cribs/999999999/members')).status).toBe(404)
    const id = await addPerson()
    await crib.send('PUT', member(id))
    const person = await db('users').where('id', id).first('version')
    await admin.send('PATCH', `/api/users/${id}`, { body: { version: person.version, isActive: false } })
    expect(await members()).toEqual([])
    expect((await crib.send('PUT', member(id))).status).toBe(404)
  })

  it('are who gets its mail', async () => {
    const id = await addPerson()
    await crib.send('PUT', member(id))
    const itemId = await createCutter(crib)
    await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 2 })
    await crib.send('PUT', `/api/reorder-points/${itemId}/${shelf.cribId}`, {
      body: { reorderPoint: 2, orderUpTo: 6 },
    })
    const mails = await db('outbox').where('crib_id', shelf.cribId)
    expect(mails.map(({ user_id }) => user_id)).toEqual([id])
  })
})
