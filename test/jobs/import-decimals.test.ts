import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { readImportRowPage } from '@/server/db/read-models/import-views'
import { createImportSite, type ImportSite } from '../support/import-site'

let site: ImportSite
beforeAll(async () => {
  site = await createImportSite()
})
afterAll(() => site.close())

const head = 'Code;Form;Ø;Corner R;Cut length;Total length;Shank;Price\n'
const radiusOf = async (id: string, code: string) => {
  const row = await site
    .db('import_rows')
    .where('import_id', id)
    .whereRaw(`field_values ->> 'code' = ?`, [code])
    .first()
  return row?.field_values
}

describe('the decimals of a file', () => {
  it('they are commas where its numbers leave no doubt, whatever the shop writes, and it says so', async () => {
    const content = `${head}D-1;corner radius;4;0,5;11;50;4;14,90\n`
    const checked = await site.checked({ kind: 'cutters', content })
    expect(checked).toMatchObject({ added: 1, decimals: 'comma', decimalsOrigin: 'guessed', warningCount: 0 })
    expect(await radiusOf(checked.id, 'D-1')).toMatchObject({ corner_radius_mm: 0.5, unit_cost_minor: 1490 })
    await site.commit(checked.id)
    await site.apply(checked.id)
    const item = await site.db('items').where('code', 'D-1').first('id')
    expect(Number((await site.db('cutters').where('item_id', item.id).first()).corner_radius_mm)).toBe(0.5)
  })

  it('they are the shop’s where the file has both kinds, or none that is certain', async () => {
    const both = await site.checked({
      kind: 'cutters',
      content: `${head}D-2;square;4;0;11,5;50.5;4;1\n`,
    })
    expect(both).toMatchObject({ decimals: 'point', decimalsOrigin: 'shop', rejectedCount: 1 })
    expect(both.rejected[0]?.message).toContain('say so under Columns')
    const doubtful = await site.checked({ kind: 'cutters', content: `${head}D-3;square;4;0;1,234;50;4;1\n` })
    expect(doubtful).toMatchObject({ decimalsOrigin: 'shop', rejectedCount: 1 })
    expect(doubtful.rejected[0]?.message).toContain('Write 1234 or 1.234.')
  })

  it('a guess says where a number may be a thousand', async () => {
    const content = `${head}D-4;corner radius;4;0,5;11;50;4;1\nD-5;square;3,175;0;11;50;3;1\n`
    const checked = await site.checked({ kind: 'cutters', content })
    expect(checked.warnings).toEqual([
      {
        line: 3,
        column: 'Ø',
        value: '3,175',
        message: 'The “,” is read as the decimal sign, as in the rest of the file. Is it one of thousands?',
      },
    ])
  })

  it('they can be set at the upload and changed after the check, and are read again by it', async () => {
    const content = `${head}D-6;corner radius;4;0,5;11;50;4;14,90\n`
    const checked = await site.checked({ kind: 'cutters', content, decimals: 'point' })
    expect(checked).toMatchObject({ added: 0, rejectedCount: 1, decimals: 'point', decimalsOrigin: 'set' })
    await site.recheck(checked.id, { decimals: 'comma' })
    await site.check(checked.id)
    expect(await site.get(checked.id)).toMatchObject({ added: 1, decimals: 'comma', decimalsOrigin: 'set' })
    await site.recheck(checked.id, { unit: 'mm' })
    await site.check(checked.id)
    expect(await site.get(checked.id)).toMatchObject({ added: 1, decimals: 'comma', decimalsOrigin: 'set' })
  })
})

describe('the rows it would add', () => {
  it('they show their sizes as read: a quarter of an inch is 6.35', async () => {
    const { id } = await site.checked({ kind: 'cutters', content: `${head}D-7;square;1/4";0;19;64;1/4";1\n` })
    const { rows } = await readImportRowPage(site.db, id, { limit: 10, outcome: 'added' })
    expect(rows[0]?.sizes).toEqual([
      { field: 'form', value: 'square' },
      { field: 'cuttingDiameterMm', value: 6.35 },
      { field: 'cornerRadiusMm', value: 0 },
      { field: 'lengthOfCutMm', value: 19 },
      { field: 'shankDiameterMm', value: 6.35 },
      { field: 'overallLengthMm', value: 64 },
    ])
  })
})
