import Papa from 'papaparse'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createImportSite, type ImportSite } from '../support/import-site'

let site: ImportSite
beforeAll(async () => {
  site = await createImportSite()
})
afterAll(() => site.close())

const cutterHeadings =
  'Tool #,Type,Dia (in),Corner Rad.,LOC,OAL,Shank Dia,# Flutes,Material,Mfg,Mfr P/N,Price'

function cutterFile(...rows: string[]): string {
  return [cutterHeadings, ...rows].join('\r\n')
}

async function cutter(code: string): Promise<Record<string, unknown>> {
  return site.db('items').join('cutters', 'cutters.item_id', 'items.id').where('items.code', code).first()
}

describe('cutters', () => {
  it('it takes a messy inch file and keeps fractions to the last digit', async () => {
    const file = cutterFile(
      'CA-1,Square EM,1/2,,1 1/4,3,1/2,4,Carbide,Norrhult,N-500,"$1,024.50"',
      'CA-2,Ball nose,.25,,.75,2 1/2,.25,2FL,HSS,Norrhult,N-250,18.5',
      'CA-3,Bull nose,3/8,0.03,1,3,3/8,4,Solid carbide,,,',
    )
    const done = await site.committed({ kind: 'cutters', unit: 'in', content: file })
    expect(done).toMatchObject({
      state: 'committed',
      rows: 3,
      rowsRead: 3,
      added: 3,
      rejectedCount: 0,
      rejected: [],
    })
    expect(await cutter('CA-1')).toMatchObject({
      form: 'square',
      cutting_diameter_mm: 12.7,
      length_of_cut_mm: 31.75,
      overall_length_mm: 76.2,
      flute_count: 4,
      substrate: 'carbide',
      maker: 'Norrhult',
      part_number: 'N-500',
      unit_cost_minor: '102450',
      version: 1,
    })
    expect(await cutter('CA-3')).toMatchObject({
      form: 'corner_radius',
      corner_radius_mm: 0.762,
      maker: null,
    })
  })

  it('it changes nothing when the same file comes again', async () => {
    const file = cutterFile('CB-1,Square,1/4,,3/4,2.5,1/4,3,Carbide,Norrhult,B-1,12')
    await site.committed({ kind: 'cutters', unit: 'in', content: file })
    const again = await site.committed({ kind: 'cutters', unit: 'in', content: file })
    expect(again).toMatchObject({ state: 'committed', added: 0, changed: 0, unchanged: 1, rejectedCount: 0 })
    expect(await cutter('CB-1')).toMatchObject({ version: 1 })
  })

  it('it leaves a value alone where the cell is blank, and raises the version of what changes', async () => {
    await site.committed({
      kind: 'cutters',
      unit: 'in',
      content: cutterFile('CC-1,Square,1/4,,3/4,2.5,1/4,3,Carbide,Norrhult,C-1,12'),
    })
    const checked = await site.checked({
      kind: 'cutters',
      unit: 'in',
      content: cutterFile('cc-1,,,,,3,,,,,,'),
    })
    expect(checked).toMatchObject({ added: 0, changed: 1, unchanged: 0 })
    const { rows } = await import('@/server/services/imports/list-imports').then(({ listImportRows }) =>
      listImportRows(checked.id, { limit: 100, outcome: 'changed' }),
    )
    expect(rows[0]?.changes).toEqual([
      { field: 'code', before: 'CC-1', after: 'cc-1' },
      { field: 'overallLengthMm', before: 63.5, after: 76.2 },
    ])
    await site.commit(checked.id)
    await site.apply(checked.id)
    const after = await cutter('cc-1')
    expect(after).toMatchObject({ overall_length_mm: 76.2, cutting_diameter_mm: 6.35, part_number: 'C-1' })
    expect(Number(after.version)).toBeGreaterThan(1)
  })

  it('it matches by maker and part number where no item has the code', async () => {
    await site.committed({
      kind: 'cutters',
      unit: 'in',
      content: cutterFile('CD-1,Square,1/4,,3/4,2.5,1/4,3,Carbide,Norrhult,D-1,12'),
    })
    const without = await site.checked({
      kind: 'cutters',
      content: 'Mfg,Mfr P/N,OAL\nNORRHULT,d-1,70 mm\n',
    })
    expect(without).toMatchObject({ changed: 1, added: 0, rejectedCount: 0 })
  })

  it('it refuses a number that two items have, and says which', async () => {
    const twins = 'code,form,dc,apmx,oal,dmm,maker,part number\n'
    await site.committed({ kind: 'cutters', content: `${twins}CE-1,square,6,12,57,6,Elvered,E-1\n` })
    // The shop made the second one by hand.
    const [twin] = await site
      .db('items')
      .insert({ kind: 'cutter', code: 'CE-2', maker: 'Elvered', part_number: 'E-1' })
      .returning('id')
    const geometry = { form: 'square', cutting_diameter_mm: 6, length_of_cut_mm: 12, shank_diameter_mm: 6 }
    await site.db('cutters').insert({ item_id: twin.id, ...geometry, overall_length_mm: 57 })
    const checked = await site.checked({
      kind: 'cutters',
      content: 'maker,part number,oal\nElvered,E-1,60\n',
    })
    expect(checked.rejected).toEqual([
      {
        line: 2,
        column: 'part number',
        value: 'E-1',
        message: '2 items are Elvered E-1 (CE-1, CE-2). Give the own code.',
        further: [],
      },
    ])
  })

  it('it refuses what cannot be, with line, column, value and reason, and everything wrong in a row at once', async () => {
    const file = cutterFile(
      'CF-1,Square,1/4,,3/4,2.5,1/4,3,Carbide,,,',
      'CF-2,Bull nose,1/2,0.3,1,3,1/2,4,Carbide,,,',
      'CF-3,Square,big,,x,3,1/2,4,Carbide,,,',
      ',Square,1/2,,1,3,1/2,4,Carbide,,,',
      'CF-5,Center drill,1/2,,1,3,1/2,4,Carbide,,,',
      'CF-6,Square,1/2,,4,3,1/2,4,Carbide,,,',
      'CF-7,Square,,,1,3,1/2,4,Carbide,,,',
    )
    const checked = await site.checked({ kind: 'cutters', unit: 'in', content: file })
    expect(checked).toMatchObject({ added: 1, rejectedCount: 6, rows: 7 })
    expect(checked.rejected.map(({ line, column, value }) => [line, column, value])).toEqual([
      [3, 'Corner Rad.', '0.3'],
      [4, 'Dia (in)', 'big'],
      [5, 'Tool #', ''],
      [6, 'Type', 'Center drill'],
      [7, 'LOC', '4'],
      [8, 'Dia (in)', ''],
    ])
    expect(checked.rejected[1]?.further.map(({ column }) => column)).toEqual(['LOC'])
    expect(checked.rejected[0]?.message).toBe('The corner radius is more than half the cutting diameter.')
  })

  it('it refuses rows of one code, one number or one item, each naming the other line', async () => {
    await site.committed({
      kind: 'cutters',
      unit: 'in',
      content: cutterFile('CG-1,Square,1/4,,3/4,2.5,1/4,3,Carbide,Gimmel,G-1,'),
    })
    const file = cutterFile(
      'CG-2,Square,1/4,,3/4,2.5,1/4,3,Carbide,,,',
      'cg-2,Square,1/4,,3/4,3,1/4,3,Carbide,,,',
      'CG-3,Square,1/4,,3/4,2.5,1/4,3,Carbide,Gimmel,G-9,',
      'CG-4,Square,1/4,,3/4,3,1/4,3,Carbide,gimmel,g-9,',
      'CG-1,Square,1/4,,3/4,2.75,1/4,3,Carbide,,,',
      ',,,,,2.75,,,,Gimmel,G-1,',
    )
    const checked = await site.checked({ kind: 'cutters', unit: 'in', content: file })
    expect(checked.rejected.map(({ line, message }) => [line, message])).toEqual([
      [2, 'Line 3 gives the same code.'],
      [3, 'Line 2 gives the same code.'],
      [4, 'Line 5 gives the same maker and part number.'],
      [5, 'Line 4 gives the same maker and part number.'],
      [6, 'Line 7 gives the same code.'],
      [7, 'Line 6 gives the same code.'],
    ])
  })

  it('it refuses an archived item and one of another kind', async () => {
    await site.db('items').insert({ kind: 'cutter', code: 'CH-1', archived_at: site.db.fn.now() })
    await site.db('items').insert({ kind: 'accessory', code: 'CH-2' })
    const row = ',square,6,12,57,6\n'
    const content = `code,form,dc,apmx,oal,dmm\nCH-1${row}CH-2${row}`
    const checked = await site.checked({ kind: 'cutters', content })
    expect(checked.rejected.map(({ message }) => message)).toEqual([
      'CH-1 is archived. Restore it first, or use another code.',
      'An item of another kind (accessory) has this code or number.',
    ])
  })

  it('it stops at rejects unless told to skip them, and leaves nothing half done', async () => {
    const file = cutterFile(
      'CI-1,Square,1/4,,3/4,2.5,1/4,3,Carbide,,,',
      'CI-2,Square,1/4,,9,2.5,1/4,3,Carbide,,,',
    )
    const before = site.storedFiles()
    const { id } = await site.checked({ kind: 'cutters', unit: 'in', content: file })
    await expect(site.commit(id)).rejects.toMatchObject({ code: 'import-has-rejects' })
    expect(await cutter('CI-1')).toBeUndefined()
    await site.commit(id, 'skip')
    await site.apply(id)
    expect(await site.get(id)).toMatchObject({ state: 'committed', added: 1, rejectedCount: 1 })
    expect(await cutter('CI-1')).toBeDefined()
    expect(await cutter('CI-2')).toBeUndefined()
    expect(site.storedFiles()).toEqual(before)
  })

  it('it writes one audit entry an import', async () => {
    const { id } = await site.committed({
      kind: 'cutters',
      unit: 'in',
      content: cutterFile('CJ-1,Square,1/4,,3/4,2.5,1/4,3,Carbide,,,', 'CJ-2,Square,1/4,,3/4,2.5,1/4,3,,,,'),
    })
    const entries = await site.db('audit_entries').where({ entity: 'import', entity_id: id })
    expect(entries).toHaveLength(1)
    expect(entries[0]).toMatchObject({
      actor_id: site.actor.id,
      action: 'import-committed',
      after: { added: 2 },
    })
  })

  it('it reads a unit from cell, heading, a column of the row and the file, in this order', async () => {
    const content = [
      'Code,Type,Dia,LOC (mm),OAL,Shank,Units',
      'CK-1,square,1/2,25.4,3,.5,in',
      'CK-2,square,10,20,72,10,mm',
      'CK-3,square,.5 in,25.4,76.2,12.7,',
    ].join('\n')
    await site.committed({ kind: 'cutters', unit: 'mm', content })
    expect(await cutter('CK-1')).toMatchObject({
      cutting_diameter_mm: 12.7,
      length_of_cut_mm: 25.4,
      overall_length_mm: 76.2,
    })
    expect(await cutter('CK-2')).toMatchObject({
      cutting_diameter_mm: 10,
      length_of_cut_mm: 20,
      overall_length_mm: 72,
    })
    expect(await cutter('CK-3')).toMatchObject({ cutting_diameter_mm: 12.7, overall_length_mm: 76.2 })
  })
})

describe('a mapping', () => {
  const strange = 'Nummer,Was,Dick,Schnitt,Lang,Schaft\n'

  it('it is set, kept by the shop at the commit, and known the next time', async () => {
    const mapping = {
      Nummer: 'code',
      Was: 'form',
      Dick: { field: 'cuttingDiameterMm', unit: 'in' },
      Schnitt: 'lengthOfCutMm',
      Lang: 'overallLengthMm',
      Schaft: 'shankDiameterMm',
    }
    const first = await site.checked({
      kind: 'cutters',
      mapping,
      content: `${strange}M-1,square,1,30,100,25.4\n`,
    })
    expect(first).toMatchObject({ added: 1, rejectedCount: 0 })
    expect(first.columns.map(({ origin }) => origin)).toEqual(Array(6).fill('set'))
    const before = await site.checked({ kind: 'cutters', content: `${strange}M-2,square,1,30,100,25.4\n` })
    expect(before.columns.filter(({ origin }) => origin === 'kept')).toEqual([])
    await site.commit(first.id)
    await site.apply(first.id)
    const next = await site.checked({ kind: 'cutters', content: `${strange}M-2,square,1,30,100,25.4\n` })
    expect(next).toMatchObject({ added: 1, rejectedCount: 0 })
    expect(next.columns.map(({ origin }) => origin)).toEqual(Array(6).fill('kept'))
    expect(next.columns[2]).toMatchObject({ field: 'cuttingDiameterMm', unit: 'in' })
  })

  it('it can be changed after the check, and the file is checked again by it', async () => {
    const { id } = await site.checked({
      kind: 'cutters',
      content: 'Zeug,form,dc,apmx,oal,dmm\nN-1,square,6,12,57,6\n',
    })
    expect(await site.get(id)).toMatchObject({ rejectedCount: 1 })
    await site.recheck(id, { mapping: { Zeug: 'code' } })
    expect(await site.get(id)).toMatchObject({ state: 'reading', rejected: [] })
    await site.check(id)
    expect(await site.get(id)).toMatchObject({ state: 'checked', added: 1, rejectedCount: 0 })
  })

  it('it is refused at the upload where the file has no such column', async () => {
    const upload = { kind: 'cutters' as const, content: 'a,b\n1,2\n', mapping: { c: 'code' } }
    await expect(site.upload(upload)).rejects.toMatchObject({
      code: 'wrong-shape',
      options: { errors: [{ path: 'mapping.c', message: 'The file has no column “c”.' }] },
    })
  })
})

describe('the reject file', () => {
  it('it holds the rows as they stood, with the reason last, safe in a spreadsheet and readable again', async () => {
    const content = [
      'Code,Form,DC,APMX,OAL,DMM,Description,Note',
      '-X1,square,-5,12,57,6,"=HYPERLINK(""x"")",+1',
      '@X2,square,=1+1,12,57,6,"two ""words""",-3',
    ].join('\n')
    const { id } = await site.checked({ kind: 'cutters', content })
    expect(await site.rejects(id)).toBe(
      [
        'Code,Form,DC,APMX,OAL,DMM,Description,Note,Reason',
        `'-X1,square,-5,12,57,6,"'=HYPERLINK(""x"")",'+1,DC: A length can't be negative.`,
        `'@X2,square,'=1+1,12,57,6,"two ""words""",'-3,"DC: “=1+1” is not a length. Write it like 3.175 mm, 0.125 in or 1/8."`,
        '',
      ].join('\r\n'),
    )
    const corrected = (await site.rejects(id)).replace(',-5,', ',5,').replace(",'=1+1,", ',5,')
    const again = await site.committed({ kind: 'cutters', content: corrected })
    expect(again).toMatchObject({ added: 2, rejectedCount: 0 })
    expect(await cutter('-X1')).toMatchObject({ description: '=HYPERLINK("x")' })
  })
})

describe('holders, collets and extensions', () => {
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
