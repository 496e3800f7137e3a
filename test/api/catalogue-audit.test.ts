import type { Knex } from 'knex'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, putOnShelf, siteDatabase, squareCutter } from '../support/api-stock'

let db: Knex
let crib: ApiClient

beforeAll(async () => {
  db = siteDatabase()
  crib = await signedInAs('cribManager')
})
afterAll(() => db.destroy())

const entriesOf = (itemId: string) =>
  db('audit_entries')
    .where({ entity: 'item', entity_id: itemId })
    .orderBy('id')
    .select('action', 'actor_id', 'before', 'after')

describe('the audit', () => {
  it('holds who added, changed, archived and brought back an item, before and after', async () => {
    const id = await createCutter(crib, { description: 'first' })
    const changed = await crib.patch(`/api/cutters/${id}`, {
      version: 1,
      description: 'second',
      lengthOfCutMm: 13,
    })
    await crib.remove(`/api/cutters/${id}`)
    const archived = await crib.get(`/api/cutters/${id}`)
    await crib.patch(`/api/cutters/${id}`, { version: archived.body.version, archivedAt: null })
    const entries = await entriesOf(id)
    expect(entries.map((entry) => entry.action)).toEqual([
      'cutter-added',
      'cutter-changed',
      'cutter-archived',
      'cutter-changed',
    ])
    expect(new Set(entries.map((entry) => entry.actor_id))).toEqual(new Set([crib.user.id]))
    expect(entries[0]).toMatchObject({ before: null, after: { description: 'first', lengthOfCutMm: 12 } })
    expect(entries[1]).toMatchObject({
      before: { description: 'first', lengthOfCutMm: 12, version: 1 },
      after: { description: 'second', lengthOfCutMm: 13, version: changed.body.version },
    })
    expect(entries[2].after.archivedAt).not.toBeNull()
    expect(entries[3].after.archivedAt).toBeNull()
  })

  it('holds nothing of what was refused or changed nothing', async () => {
    const id = await createCutter(crib)
    const shelf = await createShelf(crib)
    await putOnShelf(db, crib, { itemId: id, binId: shelf.binId, quantity: 1 })
    const refusals = [
      await crib.patch(`/api/cutters/${id}`, { version: 99, description: 'stale' }),
      await crib.patch(`/api/cutters/${id}`, { version: 1, overallLengthMm: 1 }),
      await crib.patch(`/api/cutters/${id}`, { version: 1, code: await takenCode() }),
      await crib.remove(`/api/cutters/${id}`),
    ]
    expect(refusals.map((answer) => answer.status)).toEqual([409, 422, 409, 409])
    expect((await crib.patch(`/api/cutters/${id}`, { version: 1 })).status).toBe(200)
    expect(await entriesOf(id)).toHaveLength(1)
    expect((await crib.get(`/api/cutters/${id}`)).body.version).toBe(1)
  })

  it('leaves no half of an item whose code was taken', async () => {
    const code = await takenCode()
    const before = await db('items').count({ items: '*' }).whereRaw('lower(code) = lower(?)', [code])
    await crib.post('/api/cutters', squareCutter({ code }))
    expect(await db('items').count({ items: '*' }).whereRaw('lower(code) = lower(?)', [code])).toEqual(before)
  })
})

async function takenCode(): Promise<string> {
  const code = uniqueCode('TAKEN')
  await createCutter(crib, { code })
  return code
}
