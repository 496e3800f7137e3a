import { randomUUID } from 'node:crypto'
import { beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { type AnswerBody, type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, siteDatabase } from '../support/api-stock'

let crib: ApiClient
let maker: string
let ids: string[]

beforeAll(async () => {
  crib = await signedInAs('cribManager')
})
/** Three end mills of 6 mm with a corner radius of 1 and one of 2 mm, of a maker of this test's own. */
beforeEach(async () => {
  maker = uniqueCode('Found')
  ids = []
  for (const cornerRadiusMm of [1, 1, 1, 2])
    ids.push(await createCutter(crib, { maker, form: 'cornerRadius', cornerRadiusMm }))
})

const now = async () =>
  (await Promise.all(ids.map((id) => crib.get(`/api/cutters/${id}`)))).map(({ body }) => body)
const rehearse = (change: object, filters: object = { maker }) =>
  crib.post('/api/cutters/found-changes/rehearsal', { filters, change })
const send = (request: object, key: string = randomUUID()) =>
  crib.post('/api/cutters/found-changes', request, key)

async function changed(change: object, filters: object = { maker }): Promise<AnswerBody> {
  const { total, mark } = (await rehearse(change, filters)).body
  const answer = await send({ filters, change, total, mark })
  expect(answer.status).toBe(201)
  return answer.body
}
const undo = (id: string) => crib.post(`/api/found-changes/${id}/undo`, {})

describe('a rehearsal', () => {
  it('says how many would change and changes nothing', async () => {
    const before = await now()
    const answer = await rehearse({ cornerRadiusMm: 2 })
    expect(answer.body).toMatchObject({ total: 4, changed: 3, unchanged: 1, refusedCount: 0, refused: [] })
    expect(await now()).toEqual(before)
  })

  it('names each row that cannot be so, with the field and the reason', async () => {
    await createCutter(crib, {
      maker,
      form: 'cornerRadius',
      cornerRadiusMm: 1,
      cuttingDiameterMm: 12,
      shankDiameterMm: 12,
    })
    const answer = await rehearse({ cornerRadiusMm: 4 })
    expect(answer.body).toMatchObject({ total: 5, changed: 1, refusedCount: 4 })
    const [first] = answer.body.refused as { code: string; path: string; message: string }[]
    expect(first).toMatchObject({ code: (await now())[0]?.code, path: 'cornerRadiusMm' })
    expect(first?.message).toContain('more than half the cutting diameter')
  })

  it('is refused with no field, with two, with a code and with a filter that is none', async () => {
    for (const change of [{}, { maker: 'a', description: 'b' }, { code: 'X' }])
      expect(faultPaths(await rehearse(change))).toEqual(['change'])
    expect(faultPaths(await rehearse({ maker: 'a' }, { maker, sort: 'code' }))).toEqual(['filters.sort'])
    expect((await rehearse({ overallLengthMm: 'long' })).status).toBe(400)
  })
})

describe('a change of everything found', () => {
  it('changes every row found and no other, each with its version and its entry', async () => {
    const other = await createCutter(crib, { maker: uniqueCode('Other') })
    const told = await changed({ description: 'for steel' })
    expect(told).toMatchObject({ kind: 'cutter', field: 'description', value: 'for steel', count: 4 })
    for (const row of await now()) expect(row).toMatchObject({ description: 'for steel', version: 2 })
    expect((await crib.get(`/api/cutters/${other}`)).body.description).toBe('')
    const db = siteDatabase()
    const entries = await db('audit_entries').where('action', 'cutter-changed').whereIn('entity_id', ids)
    await db.destroy()
    expect(entries.map(({ before, after }) => [before.description, after.description])).toEqual(
      ids.map(() => ['', 'for steel']),
    )
  })

  it('changes nothing where one row cannot be so', async () => {
    const filters = { maker }
    const change = { cornerRadiusMm: 4 }
    const { total, mark } = (await rehearse(change)).body
    const before = await now()
    const answer = await send({ filters, change, total, mark })
    expect(answer.status).toBe(422)
    expect(answer.body.detail).toBe('4 of 4 cutters cannot be changed so; nothing was changed.')
    expect(await now()).toEqual(before)
  })

  it('changes nothing where more is found than was seen, or someone changed one of them since', async () => {
    const filters = { maker }
    const change = { description: 'mine' }
    const seen = (await rehearse(change)).body
    await crib.patch(`/api/cutters/${ids[1]}`, { version: 1, description: 'theirs' })
    const stale = await send({ filters, change, total: seen.total, mark: seen.mark })
    expect([stale.status, stale.body.code]).toEqual([409, 'found-changed'])
    expect(stale.body.detail).toContain('Someone changed some of these cutters meanwhile')
    await createCutter(crib, { maker })
    const grown = await send({ filters, change, total: seen.total, mark: seen.mark })
    expect(grown.body.detail).toContain('5 cutters are found now, not 4')
    expect((await now()).map(({ description }) => description)).toEqual(['', 'theirs', '', ''])
  })

  it('happens once however often it is sent with its key', async () => {
    const filters = { maker }
    const change = { description: 'once' }
    const { total, mark } = (await rehearse(change)).body
    const key = randomUUID()
    const answers = await Promise.all([1, 2, 3].map(() => send({ filters, change, total, mark }, key)))
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201])
    expect(new Set(answers.map(({ body }) => body.id)).size).toBe(1)
    for (const row of await now()) expect(row.version).toBe(2)
    expect((await crib.post('/api/cutters/found-changes', { filters, change, total, mark })).status).toBe(400)
  })

  it('of two at one moment lets one through whole and refuses the other whole', async () => {
    const filters = { maker }
    const requests = await Promise.all(
      ['one', 'two'].map(async (description) => {
        const change = { description }
        const { total, mark } = (await rehearse(change)).body
        return { filters, change, total, mark }
      }),
    )
    const answers = await Promise.all(requests.map((request) => send(request)))
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409])
    expect(new Set((await now()).map(({ description }) => description)).size).toBe(1)
  })

  it('clears a field with null, and keeps costs from those who see none', async () => {
    await changed({ partNumber: 'PN-1' })
    await changed({ partNumber: null })
    for (const row of await now()) expect(row.partNumber).toBeNull()
    const machinist = await signedInAs('machinist')
    const request = { filters: { maker }, change: { maker: 'x' } }
    expect((await machinist.post('/api/cutters/found-changes/rehearsal', request)).status).toBe(403)
  })
})

describe('taking it back', () => {
  it('puts back into every row what stood there, whatever kind of field it was', async () => {
    const before = (await now()).map(({ version: _, updatedAt: __, ...row }) => row)
    for (const change of [
      { cornerRadiusMm: 0.5 },
      { form: 'faceMill' },
      { substrate: 'hss' },
      { unitCost: 1999 },
      { maker: `${maker}-B` },
    ]) {
      const told = await changed(change)
      expect((await now())[0]).toMatchObject(change)
      expect((await undo(told.id)).status).toBe(200)
      expect((await now()).map(({ version: _, updatedAt: __, ...row }) => row)).toEqual(before)
    }
  })

  it('is refused whole, naming the row, where someone changed one since; and a second time', async () => {
    const told = await changed({ description: 'for steel' })
    const [, second] = await now()
    await crib.patch(`/api/cutters/${second?.id}`, { version: second?.version, partNumber: 'theirs' })
    const refused = await undo(told.id)
    expect([refused.status, refused.body.code]).toEqual([409, 'stale-version'])
    expect(refused.body.detail).toContain(second?.code)
    for (const row of await now()) expect(row.description).toBe('for steel')
    const other = await changed({ partNumber: 'PN-2' })
    expect((await undo(other.id)).status).toBe(200)
    expect((await undo(other.id)).body.code).toBe('already-reversed')
  })

  it('is of one’s own changes alone, and they are listed until they are taken back', async () => {
    const told = await changed({ description: 'for steel' })
    const admin = await signedInAs('admin')
    expect((await admin.post(`/api/found-changes/${told.id}/undo`, {})).status).toBe(404)
    const listed = async (client: ApiClient) =>
      (await client.get('/api/found-changes?kind=cutter')).body.rows.map(({ id }) => id)
    expect(await listed(crib)).toContain(told.id)
    expect(await listed(admin)).not.toContain(told.id)
    await undo(told.id)
    expect(await listed(crib)).not.toContain(told.id)
  })
})

it('every kind of item is changed so', async () => {
  for (const [kind, request] of [
    ['holders', { taper: 'BT30' }],
    ['collets', { lengthMm: 30 }],
    ['extensions', { boreDepthMm: 40 }],
  ] as const) {
    const [row] = (await crib.get(`/api/${kind}?limit=1&sort=code`)).body.rows
    const filters = { code: row?.code }
    const rehearsed = await crib.post(`/api/${kind}/found-changes/rehearsal`, { filters, change: request })
    expect(rehearsed.status, kind).toBe(200)
    const { total, mark } = rehearsed.body
    const answer = await crib.post(
      `/api/${kind}/found-changes`,
      { filters, change: request, total, mark },
      randomUUID(),
    )
    expect(answer.status, kind).toBe(201)
    expect((await undo(answer.body.id)).status, kind).toBe(200)
    expect((await crib.get(`/api/${kind}/${row?.id}`)).body).toMatchObject({
      ...row,
      version: expect.any(Number),
      updatedAt: expect.any(String),
    })
  }
})
