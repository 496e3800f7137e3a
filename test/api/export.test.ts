import Papa from 'papaparse'
import { beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { checkedImport } from '../support/api-imports'
import { createCutter } from '../support/api-stock'

/** Cutters of the test's own, under a maker that has the signs CSV and spreadsheets trip over. */
const maker = `=${uniqueCode('Maker')}, "Sons"`
const underMaker = `maker=${encodeURIComponent(maker)}`
let crib: ApiClient
let machinist: ApiClient
let codes: string[]

beforeAll(async () => {
  crib = await signedInAs('cribManager')
  machinist = await signedInAs('machinist')
  codes = []
  for (const [index, cuttingDiameterMm] of [6, 3, 4.7625].entries()) {
    const code = uniqueCode(`-X${index}`)
    codes.push(code)
    await createCutter(crib, {
      ...{ code, maker, cuttingDiameterMm, unitCost: 1050, partNumber: `'=P${index}` },
      description: 'Two lines,\nthe second "quoted"',
    })
  }
})

async function exported(client: ApiClient, query: string, kind = 'cutters') {
  const answer = await client.getText(`/api/${kind}/export?${query}`)
  return { ...answer, records: Papa.parse<string[]>(answer.text.slice(1).trimEnd()).data }
}

describe('an export', () => {
  it('is exactly what is filtered, as it is sorted, with the columns asked for', async () => {
    const { status, headers, records } = await exported(
      crib,
      `${underMaker}&cuttingDiameterMm.min=4&sort=cuttingDiameterMm&columns=code,cuttingDiameterMm`,
    )
    expect(status).toBe(200)
    expect(headers.get('content-disposition')).toBe('attachment; filename="cutters.csv"')
    expect(headers.get('content-type')).toContain('text/csv')
    expect(records.map((record) => record[0])).toEqual(['Own code', `'${codes[2]}`, `'${codes[0]}`])
    expect(records.every((record) => record.length === 2)).toBe(true)
  })

  it('changes nothing when it is imported again', async () => {
    const { text } = await exported(crib, underMaker)
    const checked = await checkedImport(crib, { kind: 'cutters' }, text)
    expect(checked).toMatchObject({ unchanged: 3, added: 0, changed: 0, rejectedCount: 0 })
    await crib.remove(`/api/imports/${checked.id}`)
  })

  it.each(['cutters', 'holders', 'collets', 'extensions'])(
    'of all %s changes nothing when it is imported again',
    async (kind) => {
      const { status, text, records } = await exported(crib, '', kind)
      expect(status).toBe(200)
      const listed = await crib.get(`/api/${kind}?limit=1`)
      expect(records.length - 1).toBe(listed.body.total)
      const checked = await checkedImport(crib, { kind }, text)
      expect(checked).toMatchObject({ unchanged: listed.body.total, changed: 0, rejectedCount: 0 })
      await crib.remove(`/api/imports/${checked.id}`)
    },
  )

  it('has costs only for those who see them', async () => {
    const [headings] = (await exported(machinist, underMaker)).records
    expect(headings?.some((heading) => /cost/i.test(heading))).toBe(false)
    const [ofCrib] = (await exported(crib, underMaker)).records
    expect(ofCrib?.some((heading) => heading.startsWith('Unit cost ('))).toBe(true)
    const asked = await machinist.get(`/api/cutters/export?${underMaker}&columns=code,unitCost`)
    expect(asked.status).toBe(403)
    expect((await machinist.get(`/api/cutters/export?unitCost.min=1`)).status).toBe(403)
  })

  it('refuses a column and a filter that are not there, and paging', async () => {
    const column = await crib.get('/api/cutters/export?columns=code,colour')
    expect(column.status).toBe(400)
    expect(faultPaths(column)).toEqual(['columns'])
    expect((await crib.get('/api/cutters/export?limit=5')).status).toBe(400)
    expect((await crib.get('/api/holders/export?form=ball')).status).toBe(400)
  })
})
