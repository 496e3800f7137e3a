import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createImportSite, type ImportSite } from '../support/import-site'

let site: ImportSite
beforeAll(async () => {
  site = await createImportSite()
})
afterAll(() => site.close())

describe('collets and extensions', () => {
  it('it takes collets with their range in two columns or one', async () => {
    const content = 'Part #,Mfg,Code,Series,From,To,Range\n1,Kollin,C-1,ER16,5,6,\n2,Kollin,C-2,ER16,,,4-3\n'
    expect(await site.committed({ kind: 'collets', content })).toMatchObject({ added: 2, rejectedCount: 0 })
    const collets = await site
      .db('collets')
      .join('items', 'items.id', 'item_id')
      .whereIn('code', ['C-1', 'C-2'])
      .orderBy('code')
    expect(collets.map((collet) => [collet.series, collet.minimum_mm, collet.maximum_mm])).toEqual([
      ['ER16', 5, 6],
      ['ER16', 3, 4],
    ])
  })

  it('it takes extensions', async () => {
    const content = [
      'Code,Projection,Shank diameter,Bore dia,Bore depth,Min grip,Nose diameter,Nose length,Body diameter,Body length',
      'E-1,120,20,6,36,20,10,40,16,80',
    ].join('\n')
    expect(await site.committed({ kind: 'extensions', content })).toMatchObject({
      added: 1,
      rejectedCount: 0,
    })
    expect(await site.db('extension_segments').count()).toEqual([{ count: '2' }])
    expect(await site.db('extensions').pluck('shank_diameter_mm')).toEqual([20])
    expect(await site.checked({ kind: 'extensions', content })).toMatchObject({ unchanged: 1, changed: 0 })
  })
})
