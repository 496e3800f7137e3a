import { beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { type AnswerBody, type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter } from '../support/api-stock'

let crib: ApiClient
let rows: AnswerBody[]

beforeAll(async () => {
  crib = await signedInAs('cribManager')
})
beforeEach(async () => {
  rows = []
  for (let index = 0; index < 3; index += 1) {
    const id = await createCutter(crib, { form: 'cornerRadius', cornerRadiusMm: 1 })
    rows.push((await crib.get(`/api/cutters/${id}`)).body)
  }
})

const now = async () => {
  const answers = await Promise.all(rows.map(({ id }) => crib.get(`/api/cutters/${id}`)))
  return answers.map(({ body }) => body)
}
const send = (changes: object[]) => crib.post('/api/cutters/bulk', { changes })
const each = (change: object) => rows.map(({ id, version }) => ({ id, version, ...change }))

describe('a change of many rows', () => {
  it('changes them all and answers them in the order they were sent', async () => {
    const answer = await send(each({ maker: 'Northgate Tools' }).toReversed())
    expect(answer.status).toBe(200)
    expect(answer.body.rows.map(({ id }) => id)).toEqual(rows.map(({ id }) => id).toReversed())
    for (const row of await now()) expect(row).toMatchObject({ maker: 'Northgate Tools', version: 2 })
  })

  it('changes none where one cannot be, and says which and why', async () => {
    const answer = await send(
      each({}).map((row, index) => ({ ...row, cornerRadiusMm: index === 1 ? 4 : 0.5 })),
    )
    expect(answer.status).toBe(422)
    expect(answer.body.detail).toBe('1 of 3 cutters cannot be changed so; nothing was changed.')
    expect(faultPaths(answer)).toEqual(['changes.1.cornerRadiusMm'])
    expect(await now()).toEqual(rows)
  })

  it('changes none in a rehearsal, which answers the rows as they are or what stands against it', async () => {
    const rehearse = (changes: object[]) => crib.post('/api/cutters/bulk', { changes, isRehearsal: true })
    const answer = await rehearse(each({ maker: 'Northgate Tools' }))
    expect(answer.status).toBe(200)
    expect(answer.body.rows).toEqual(rows)
    const refused = await rehearse(each({ cornerRadiusMm: 400 }))
    expect(refused.status).toBe(422)
    expect(faultPaths(refused)).toHaveLength(3)
    expect(await now()).toEqual(rows)
  })

  it('changes none where someone changed one meanwhile', async () => {
    await crib.patch(`/api/cutters/${rows[2]?.id}`, { version: 1, description: 'theirs' })
    const answer = await send(each({ description: 'mine' }))
    expect(answer.status).toBe(409)
    expect(answer.body.code).toBe('stale-version')
    expect(faultPaths(answer)).toEqual(['changes.2.version'])
    expect((await now()).map(({ description }) => description)).toEqual(['', '', 'theirs'])
  })

  it('changes none where a code is taken, an id is not there or a value is no value', async () => {
    const taken = await send(
      each({}).map((row, index) => ({ ...row, code: index ? rows[0]?.code : uniqueCode('B') })),
    )
    expect(taken.status).toBe(409)
    expect(taken.body.code).toBe('code-taken')
    const missing = await send([...each({ maker: 'x' }), { id: '999999999999', version: 1, maker: 'x' }])
    expect(faultPaths(missing)).toEqual(['changes.3.id'])
    const shapeless = await send(each({ overallLengthMm: 'long' }))
    expect(shapeless.status).toBe(400)
    expect(faultPaths(shapeless)).toContain('changes.0.overallLengthMm')
    const twice = await send([...each({}), ...each({})])
    expect(faultPaths(twice)).toEqual(['changes'])
    expect(await now()).toEqual(rows)
  })
})
