import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { siteDatabase } from '../support/api-stock'

let crib: ApiClient
const db = siteDatabase()

beforeAll(async () => {
  crib = await signedInAs('cribManager')
})
afterAll(() => db.destroy())

const speed = (change: Record<string, unknown> = {}) => ({
  isoGroup: 'N',
  material: uniqueCode('Alloy'),
  substrate: 'carbide',
  lowMPerMin: 200,
  highMPerMin: 400,
  sourceNote: 'What ran here.',
  ...change,
})

const put = (id: unknown, body: unknown) => crib.send('PUT', `/api/starting-speeds/${id}`, { body })

describe('the shop’s starting speeds', () => {
  it('are read by everyone, in the order of ISO 513', async () => {
    const { status, body } = await (await signedInAs('machinist')).get('/api/starting-speeds')
    expect(status).toBe(200)
    const groups = body.rows.map((row) => String(row.isoGroup))
    expect(groups).toEqual([...groups].sort((one, other) => 'PMKNSH'.indexOf(one) - 'PMKNSH'.indexOf(other)))
  })

  it('take a material, change it and give it up again, with an entry in the audit for each', async () => {
    const sent = speed()
    const made = await crib.post('/api/starting-speeds', sent)
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({ ...sent, version: 1 })
    const { id } = made.body
    const changed = await put(id, { ...sent, highMPerMin: 380, version: 1 })
    expect(changed.body).toMatchObject({ highMPerMin: 380, version: 2 })
    expect((await crib.remove(`/api/starting-speeds/${id}`)).status).toBe(204)
    const { body } = await crib.get('/api/starting-speeds')
    expect(body.rows.map((row) => row.id)).not.toContain(id)
    const entries = await db('audit_entries')
      .where({ entity: 'starting-speed', entity_id: id })
      .orderBy('id')
      .select('action', 'actor_id')
    expect(entries).toEqual(
      ['added', 'changed', 'removed'].map((act) => ({
        action: `starting-speed-${act}`,
        actor_id: crib.user.id,
      })),
    )
  })

  it('refuse a stale version and answer the row as it is', async () => {
    const sent = speed()
    const { id } = (await crib.post('/api/starting-speeds', sent)).body
    await put(id, { ...sent, lowMPerMin: 210, version: 1 })
    const stale = await put(id, { ...sent, lowMPerMin: 190, version: 1 })
    expect(stale.status).toBe(409)
    expect(stale.body.current).toMatchObject({ id, lowMPerMin: 210, version: 2 })
    await crib.remove(`/api/starting-speeds/${id}`)
  })

  it.each([
    [{ lowMPerMin: 401 }, 'highMPerMin', 422],
    [{ lowMPerMin: 0 }, 'lowMPerMin', 422],
    [{ highMPerMin: 20_000 }, 'highMPerMin', 422],
    [{ highMPerMin: 'fast' }, 'highMPerMin', 400],
    [{ isoGroup: 'X' }, 'isoGroup', 400],
    [{ substrate: 'ceramic' }, 'substrate', 400],
    [{ material: ' ' }, 'material', 400],
  ])('refuse %j beside its field', async (change, path, status) => {
    const answer = await crib.post('/api/starting-speeds', speed(change))
    expect(answer.status).toBe(status)
    expect(faultPaths(answer)).toEqual([path])
  })

  it('refuse a second row of a material and substrate, in capitals or not', async () => {
    const sent = speed()
    const { id } = (await crib.post('/api/starting-speeds', sent)).body
    const twin = await crib.post('/api/starting-speeds', { ...sent, material: sent.material.toUpperCase() })
    expect(twin.status).toBe(409)
    expect(twin.body.code).toBe('code-taken')
    expect(faultPaths(twin)).toEqual(['material'])
    await crib.remove(`/api/starting-speeds/${id}`)
  })

  it('know no row that is not there', async () => {
    expect((await put('999999999', { ...speed(), version: 1 })).status).toBe(404)
    expect((await crib.remove('/api/starting-speeds/999999999')).status).toBe(404)
  })
})
