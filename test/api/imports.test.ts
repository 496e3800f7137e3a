import { beforeAll, describe, expect, it } from 'vitest'
import { importLimits } from '@/schemas/import-limits'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { checkedImport, importIn, upload } from '../support/api-imports'

let crib: ApiClient
beforeAll(async () => {
  crib = await signedInAs('cribManager')
})

const head = 'Tool #,Type,Dia,LOC,OAL,Shank Dia\n'
const row = (code: string, oal = '3') => `${code},Square,1/2,1,${oal},1/2\n`

async function findCutter(code: string) {
  const { body } = await crib.get(`/api/cutters?code=${code}`)
  return body.rows[0]
}

describe('an import that can be', () => {
  it('it is taken at once, checked by the worker, committed as a whole, and unchanged the second time', async () => {
    const [first, second] = [uniqueCode('IMP'), uniqueCode('IMP')]
    const content = head + row(first) + row(second)
    const sent = await upload(crib, { kind: 'cutters', unit: 'in' }, content)
    expect(sent.status).toBe(202)
    const checked = await importIn(crib, sent.body.id, 'checked')
    expect(checked).toMatchObject({
      kind: 'cutters',
      unit: 'in',
      rows: 2,
      rowsRead: 2,
      added: 2,
      changed: 0,
      unchanged: 0,
      rejectedCount: 0,
      rejected: [],
    })
    expect(await findCutter(first)).toBeUndefined()
    expect((await crib.post(`/api/imports/${checked.id}/commit`, {})).status).toBe(202)
    await importIn(crib, checked.id, 'committed')
    expect(await findCutter(first)).toMatchObject({
      cuttingDiameterMm: 12.7,
      overallLengthMm: 76.2,
      version: 1,
    })
    expect(await findCutter(second)).toBeDefined()
    expect(await checkedImport(crib, { kind: 'cutters', unit: 'in' }, content)).toMatchObject({
      added: 0,
      changed: 0,
      unchanged: 2,
    })
  })

  it('it takes a mapping with the upload, and another one with a second check', async () => {
    const code = uniqueCode('IMP')
    const mapping = JSON.stringify({ Welche: 'code' })
    const content = `Welche,form,Dick,apmx,oal,dmm\n${code},square,6,12,57,6\n`
    const checked = await checkedImport(crib, { kind: 'cutters', unit: 'mm', mapping }, content)
    expect(checked).toMatchObject({ rejectedCount: 1, added: 0 })
    const again = await crib.post(`/api/imports/${checked.id}/check`, {
      mapping: { Welche: 'code', Dick: { field: 'cuttingDiameterMm', unit: 'mm' } },
    })
    expect(again.status).toBe(202)
    expect(await importIn(crib, checked.id, 'checked')).toMatchObject({ rejectedCount: 0, added: 1 })
    const rows = await crib.get(`/api/imports/${checked.id}/rows?outcome=added`)
    expect(rows.body.rows).toMatchObject([{ line: 2, code, outcome: 'added', problems: [] }])
    await crib.remove(`/api/imports/${checked.id}`)
  })

  it('it stands in the list, newest first', async () => {
    const { id } = await checkedImport(crib, { kind: 'collets' }, 'code,series\nx,ER11\n')
    const { body } = await crib.get('/api/imports?limit=200')
    const ids = body.rows.map((listed) => Number(listed.id))
    expect(ids).toContain(Number(id))
    expect(ids).toEqual([...ids].sort((a, b) => b - a))
    await crib.remove(`/api/imports/${id}`)
  })
})

describe('rejects', () => {
  it('they stop the commit with 422 and change nothing; skipped they stay out', async () => {
    const [good, bad] = [uniqueCode('IMP'), uniqueCode('IMP')]
    const { id, rejected } = await checkedImport(
      crib,
      { kind: 'cutters', unit: 'in' },
      head + row(good) + row(bad, 'long'),
    )
    expect(rejected).toMatchObject([{ line: 3, column: 'OAL', value: 'long' }])
    const stopped = await crib.post(`/api/imports/${id}/commit`, { rejects: 'stop' })
    expect([stopped.status, stopped.body.code]).toEqual([422, 'import-has-rejects'])
    expect((await importIn(crib, id, 'checked')).added).toBe(1)
    expect((await crib.post(`/api/imports/${id}/commit`, { rejects: 'skip' })).status).toBe(202)
    await importIn(crib, id, 'committed')
    expect(await findCutter(good)).toBeDefined()
    expect(await findCutter(bad)).toBeUndefined()
  })

  it('they download as CSV, the reason last', async () => {
    const code = uniqueCode('IMP')
    const { id } = await checkedImport(crib, { kind: 'cutters', unit: 'in' }, head + row(code, '-'))
    const { headers, status } = await crib.get(`/api/imports/${id}/rejects`)
    expect(status).toBe(200)
    expect(headers.get('content-type')).toBe('text/csv; charset=utf-8')
    expect(headers.get('content-disposition')).toBe('attachment; filename="list-rejects.csv"')
    await crib.remove(`/api/imports/${id}`)
  })
})

describe('an upload that cannot be', () => {
  it('it is refused without a file, without a kind, with a field or column that is not there', async () => {
    const faults = async (fields: Record<string, string>, content: string | null) => {
      const answer = await upload(crib, fields, content)
      return [answer.status, ...faultPaths(answer)]
    }
    expect(await faults({ kind: 'cutters' }, null)).toEqual([400, 'file'])
    expect(await faults({}, head)).toEqual([400, 'kind'])
    expect(await faults({ kind: 'bolts' }, head)).toEqual([400, 'kind'])
    expect(await faults({ kind: 'cutters', unit: 'feet' }, head)).toEqual([400, 'unit'])
    expect(await faults({ kind: 'cutters', mapping: 'no json' }, head)).toEqual([400, 'mapping'])
    expect(await faults({ kind: 'cutters', mapping: '{"Nope":"code"}' }, head)).toEqual([400, 'mapping.Nope'])
    expect(await faults({ kind: 'cutters', mapping: '{"Dia":"wings"}' }, head)).toEqual([400, 'mapping.Dia'])
    expect(await faults({ kind: 'cutters' }, 'PK\x03\x04 and so on')).toEqual([422, 'file'])
    expect((await crib.post('/api/imports', { kind: 'cutters' })).status).toBe(400)
  })

  it('it is refused with 413 beyond 50 MB', async () => {
    const answer = await upload(crib, { kind: 'cutters' }, `${head}${'x'.repeat(importLimits.fileBytes)}`)
    expect([answer.status, answer.body.code]).toEqual([413, 'too-large'])
  })
})

describe('a cancel', () => {
  it('it ends an import, twice without harm, and keeps it from being committed', async () => {
    const code = uniqueCode('IMP')
    const { id } = await checkedImport(crib, { kind: 'cutters', unit: 'in' }, head + row(code))
    expect((await crib.remove(`/api/imports/${id}`)).status).toBe(204)
    expect((await crib.remove(`/api/imports/${id}`)).status).toBe(204)
    expect((await crib.get(`/api/imports/${id}`)).body).toMatchObject({ state: 'cancelled', added: 0 })
    const late = await crib.post(`/api/imports/${id}/commit`, {})
    expect([late.status, late.body.code]).toEqual([409, 'import-not-ready'])
    expect(await findCutter(code)).toBeUndefined()
  })

  it('it is 409 once committed, and so is a second commit', async () => {
    const { id } = await checkedImport(crib, { kind: 'cutters', unit: 'in' }, head + row(uniqueCode('IMP')))
    await crib.post(`/api/imports/${id}/commit`, {})
    await importIn(crib, id, 'committed')
    for (const late of [
      await crib.remove(`/api/imports/${id}`),
      await crib.post(`/api/imports/${id}/commit`, {}),
    ]) {
      expect([late.status, late.body.code]).toEqual([409, 'import-already-committed'])
    }
  })

  it('it is 404 for an import that is not there', async () => {
    for (const path of ['999999999', 'none']) {
      expect((await crib.remove(`/api/imports/${path}`)).status).toBe(404)
      expect((await crib.get(`/api/imports/${path}`)).status).toBe(404)
    }
    expect((await crib.get('/api/imports/999999999/rejects')).status).toBe(404)
  })
})
