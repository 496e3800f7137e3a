import { readdirSync, readFileSync } from 'node:fs'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { ImportKind } from '@/schemas/import-fields'
import { createImportSite, type ImportSite } from '../support/import-site'

const folder = 'public/examples'
const examples: [file: string, kind: ImportKind, unit: 'mm' | 'in', items: number][] = [
  ['cutters-inch.csv', 'cutters', 'in', 22],
  ['cutters-mm-iso.csv', 'cutters', 'mm', 19],
  ['holders-by-segment.csv', 'holders', 'mm', 5],
  ['holders-one-row.csv', 'holders', 'in', 5],
  ['collets.csv', 'collets', 'mm', 17],
  ['extensions.csv', 'extensions', 'mm', 3],
  ['reorder-points.csv', 'reorderPoints', 'mm', 6],
  ['opening-stock.csv', 'stock', 'mm', 14],
]

let site: ImportSite
beforeAll(async () => {
  site = await createImportSite()
  await site.db('shop_settings').update({ currency: 'USD' })
  const [crib] = await site
    .db('cribs')
    .insert({ code: 'MAIN', name: 'Main crib', time_zone: 'UTC' })
    .returning('id')
  const root = await site.db('locations').where({ crib_id: crib.id, kind: 'crib' }).first('id')
  const codes = Array.from({ length: 12 }, (_, at) => `A1-${String(at + 1).padStart(2, '0')}`)
  const bins = codes.map((code) => ({ kind: 'bin', code, name: code, crib_id: crib.id, parent_id: root.id }))
  await site.db('locations').insert(bins)
})
afterAll(() => site.close())

describe('the example files', () => {
  it('it tries every file that lies in the folder', () => {
    expect(readdirSync(folder).sort()).toEqual(examples.map(([file]) => file).sort())
  })

  it.each(examples)('it takes %s as it is, every row and every column', async (file, kind, unit, items) => {
    const done = await site.committed({ kind, unit, content: readFileSync(`${folder}/${file}`) })
    expect(done.rejected).toEqual([])
    expect(done).toMatchObject({ state: 'committed', added: items })
    expect(done.columns.filter(({ field }) => field === null).map(({ heading }) => heading)).toEqual([])
  })

  it.each(examples.slice(0, -1))(
    'it changes nothing with %s a second time',
    async (file, kind, unit, items) => {
      const again = await site.checked({ kind, unit, content: readFileSync(`${folder}/${file}`) })
      expect(again).toMatchObject({ added: 0, changed: 0, unchanged: items, rejectedCount: 0 })
    },
  )
})
