import type { Knex } from 'knex'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, createShelf, siteDatabase } from '../support/api-stock'

let db: Knex
let crib: ApiClient

beforeAll(async () => {
  db = siteDatabase()
  crib = await signedInAs('cribManager')
})
afterAll(() => db.destroy())

async function made(more: object = {}) {
  return (await crib.post('/api/suppliers', { name: uniqueCode('Supplier'), ...more })).body
}

const change = (id: string, body: object) => crib.send('PATCH', `/api/suppliers/${id}`, { body })

describe('a supplier', () => {
  it('is refused with a taken name and with an address that is none', async () => {
    const { name } = await made({ email: 'desk@supplier.example' })
    const twice = await crib.post('/api/suppliers', { name: String(name).toUpperCase() })
    expect([twice.status, faultPaths(twice)]).toEqual([409, ['name']])
    const wrong = await crib.post('/api/suppliers', { name: uniqueCode('S'), email: 'not an address' })
    expect(faultPaths(wrong)).toEqual(['email'])
  })

  it('is changed field by field, and what is absent stays', async () => {
    const supplier = await made({ email: 'desk@supplier.example', leadTimeDays: 6 })
    const after = await change(supplier.id, { version: 1, phone: '555-0101', contactName: 'Ada Quill' })
    expect([after.status, after.body]).toMatchObject([
      200,
      {
        ...{ version: 2, email: 'desk@supplier.example', leadTimeDays: 6 },
        ...{ phone: '555-0101', contactName: 'Ada Quill', accountNumber: null, isArchived: false },
      },
    ])
    const cleared = await change(supplier.id, { version: 2, email: '', leadTimeDays: null })
    expect(cleared.body).toMatchObject({ email: null, leadTimeDays: null, phone: '555-0101' })
  })

  it('is refused beside its field where it cannot be', async () => {
    const { id } = await made()
    for (const [body, status, path] of [
      [{ name: ' ' }, 400, 'name'],
      [{ email: 'desk' }, 400, 'email'],
      [{ leadTimeDays: -1 }, 422, 'leadTimeDays'],
      [{ leadTimeDays: 2.5 }, 422, 'leadTimeDays'],
      [{ leadTimeDays: 4000 }, 422, 'leadTimeDays'],
      [{ phone: 'x'.repeat(101) }, 400, 'phone'],
    ] as const) {
      const refused = await change(id, { version: 1, ...body })
      expect([refused.status, faultPaths(refused)], JSON.stringify(body)).toEqual([status, [path]])
    }
    expect((await change(id, { phone: '1' })).status).toBe(400)
    expect((await change('999999999', { version: 1, phone: '1' })).status).toBe(404)
    const other = await made()
    const taken = await change(id, { version: 1, name: other.name })
    expect([taken.status, faultPaths(taken)]).toEqual([409, ['name']])
  })

  it('is refused to the second of two who changed it, who gets what is there', async () => {
    const { id } = await made()
    await change(id, { version: 1, phone: '1' })
    const late = await change(id, { version: 1, phone: '2' })
    expect([late.status, late.body.code, late.body.current]).toMatchObject([
      409,
      'stale-version',
      { phone: '1', version: 2 },
    ])
  })

  it('is not archived while a reorder point names it, and then names nobody new', async () => {
    const { id, name } = await made()
    const { cribId } = await createShelf(crib)
    const itemId = await createCutter(crib)
    const put = (body: object) =>
      crib.send('PUT', `/api/reorder-points/${itemId}/${cribId}`, {
        body: { reorderPoint: 1, orderUpTo: 3, ...body },
      })
    await put({ supplierId: id })
    const refused = await change(id, { version: 1, isArchived: true })
    expect([refused.status, refused.body.code]).toEqual([409, 'still-in-use'])
    expect(refused.body.detail).toBe(`One reorder point names ${name}. Give it another supplier first.`)
    await put({ supplierId: null })
    expect((await change(id, { version: 1, isArchived: true })).body).toMatchObject({ isArchived: true })
    expect((await put({ supplierId: id })).status).toBe(422)
    const ids = async (archived: string) =>
      (await crib.get(`/api/suppliers?archived=${archived}`)).body.rows.map((row) => row.id)
    expect(await ids('no')).not.toContain(id)
    expect(await ids('only')).toContain(id)
    expect((await change(id, { version: 2, isArchived: false })).body).toMatchObject({ isArchived: false })
    expect(await ids('no')).toContain(id)
  })

  it('is never archived under a reorder point that names it at the same moment', async () => {
    const { cribId } = await createShelf(crib)
    for (let round = 0; round < 10; round += 1) {
      const { id } = await made()
      const itemId = await createCutter(crib)
      const [archived, named] = await Promise.all([
        change(id, { version: 1, isArchived: true }),
        crib.send('PUT', `/api/reorder-points/${itemId}/${cribId}`, {
          body: { reorderPoint: 1, orderUpTo: 3, supplierId: id },
        }),
      ])
      expect([archived.status, named.status].sort()).toEqual(
        archived.status === 200 ? [200, 422] : [200, 409],
      )
    }
  })

  it('is written down with who changed it', async () => {
    const { id } = await made()
    await change(id, { version: 1, phone: '7' })
    await change(id, { version: 2, phone: '7' })
    const entries = await db('audit_entries').where({ entity: 'supplier', entity_id: id }).orderBy('id')
    expect(entries.map(({ action }) => action)).toEqual(['supplier-created', 'supplier-changed'])
    expect(entries[1]).toMatchObject({ before: { phone: null }, after: { phone: '7' } })
  })
})
