import Papa from 'papaparse'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createImportSite, type ImportSite } from '../support/import-site'

let site: ImportSite
beforeAll(async () => {
  site = await createImportSite()
})
afterAll(() => site.close())

describe('holders', () => {
  it('it takes one row a segment, wherever the rows of a holder stand', async () => {
    const content = [
      'Code,Taper,Gauge length,Collet,Bore depth,Min grip,Part,Length,Nose dia,Spindle dia,Seg no',
      'H-1,CAT40,100,ER16,50,20,nut,18,28,28,1',
      'H-2,CAT40,70,ER32,60,25,nut,22,50,50,1',
      'H-1,,,,,,holder,60,30,40,3',
      'H-1,,,,,,holder,10,28,30,2',
      'H-2,,,,,,holder,30,50,50,2',
    ].join('\n')
    const done = await site.committed({ kind: 'holders', content })
    expect(done).toMatchObject({ rows: 5, rowsRead: 5, added: 2, rejectedCount: 0 })
    const pieces = await site
      .db('holder_segments')
      .join('items', 'items.id', 'holder_segments.item_id')
      .where('code', 'H-1')
      .orderBy('position')
      .select('part', 'length_mm', 'nose_diameter_mm', 'spindle_diameter_mm')
    expect(pieces.map((piece) => Object.values(piece))).toEqual([
      ['nut', 18, 28, 28],
      ['holder', 10, 28, 30],
      ['holder', 60, 30, 40],
    ])
    const again = await site.checked({ kind: 'holders', content })
    expect(again).toMatchObject({ added: 0, changed: 0, unchanged: 2 })
  })

  it('it takes a holder whole or not at all', async () => {
    const content = [
      'Code,Gauge length,Collet,Bore depth,Min grip,Part,Length,Nose dia,Spindle dia',
      'H-3,100,ER16,50,20,nut,18,28,28',
      'H-3,,,,,holder,sixty,30,40',
      'H-4,100,ER16,50,20,nut,18,28,28',
      'H-4,90,,,,holder,20,28,28',
    ].join('\n')
    const checked = await site.checked({ kind: 'holders', content })
    expect(checked).toMatchObject({ added: 0, rejectedCount: 2 })
    expect(checked.rejected.map(({ line, column }) => [line, column])).toEqual([
      [3, 'Length'],
      [5, 'Gauge length'],
    ])
    const { data } = Papa.parse<string[]>(await site.rejects(checked.id))
    expect(data.slice(1, 5).map((row) => row.at(-1))).toEqual([
      'Belongs to line 3.',
      'Length: “sixty” is not a length. Write it like 3.175 mm, 0.125 in or 1/8.',
      'Belongs to line 5.',
      'Gauge length: Line 4 says otherwise of the same item.',
    ])
  })

  it('it takes a nut and a body, or a nose alone, in one row', async () => {
    const content = [
      'Code;Gauge;Collet size;Bore;Bore depth;Min grip;Nut Ø;Nut len;Nose Ø;Nose length;Body Ø;Body length',
      'H-5;100;ER20;;50;20;34;20;;;40;60',
      'H-6;80;;12;45;30;;;26;80;;',
      'H-7;90;ER11;;40;15;19;12;;;30;',
    ].join('\n')
    const done = await site.committed({ kind: 'holders', content })
    expect(done).toMatchObject({ added: 3, rejectedCount: 0 })
    const pieces = await site
      .db('holder_segments')
      .join('items', 'items.id', 'holder_segments.item_id')
      .whereIn('code', ['H-5', 'H-6', 'H-7'])
      .orderBy(['code', 'position'])
      .select('code', 'part', 'length_mm', 'nose_diameter_mm')
    expect(pieces.map((piece) => Object.values(piece))).toEqual([
      ['H-5', 'nut', 20, 34],
      ['H-5', 'holder', 60, 40],
      ['H-6', 'holder', 80, 26],
      ['H-7', 'nut', 12, 19],
      ['H-7', 'holder', 78, 30],
    ])
  })

  it('it changes a bore from collet to fixed, and nothing else of the holder', async () => {
    const head = 'Code,Gauge length,Collet,Bore dia,Bore depth,Min grip,Nose dia,Nose length\n'
    await site.committed({ kind: 'holders', content: `${head}H-8,80,ER16,,45,20,28,60\n` })
    const done = await site.committed({ kind: 'holders', content: 'Code,Bore dia\nH-8,10\n' })
    expect(done).toMatchObject({ changed: 1 })
    const holder = await site.db('holders').join('items', 'items.id', 'item_id').where('code', 'H-8').first()
    expect(holder).toMatchObject({
      bore_kind: 'fixed',
      bore_diameter_mm: 10,
      bore_series: null,
      bore_depth_mm: 45,
    })
  })
})
