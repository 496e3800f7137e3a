import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createImportSite, type ImportSite } from '../support/import-site'

let site: ImportSite
let bins: Record<string, string>

beforeAll(async () => {
  site = await createImportSite()
  const [crib] = await site
    .db('cribs')
    .insert({ code: 'MAIN', name: 'Main crib', time_zone: 'UTC' })
    .returning('id')
  const root = await site.db('locations').where({ crib_id: crib.id, kind: 'crib' }).first('id')
  const made = await site
    .db('locations')
    .insert(
      ['A1-01', 'A1-02'].map((code) => ({
        kind: 'bin',
        code,
        name: code,
        crib_id: crib.id,
        parent_id: root.id,
      })),
    )
    .returning(['id', 'code'])
  bins = Object.fromEntries(made.map(({ id, code }) => [code, id]))
  const rows = Array.from({ length: 9 }, (_, at) => `S-${at + 1},square,6,12,57,6,Lager,L-${at + 1}`)
  await site.committed({
    kind: 'cutters',
    content: ['code,form,dc,apmx,oal,dmm,maker,part number', ...rows].join('\n'),
  })
})
afterAll(() => site.close())

const head = 'Crib,Code,Where,Qty,Condition\n'

function balances(code: string) {
  return site
    .db('balances')
    .join('items', 'items.id', 'balances.item_id')
    .where({ code, is_outside: false })
    .orderBy('location_id')
    .select('location_id', 'condition', 'quantity')
}

describe('opening stock', () => {
  it('it posts what lies in the bins as adjustments, and the books balance', async () => {
    const content = `${head}MAIN,S-1,A1-01,5,new\nmain,s-1,a1-02,2,used\n,S-2,A1-02,7,\n`
    const done = await site.committed({ kind: 'stock', content })
    expect(done).toMatchObject({ state: 'committed', added: 3, rejectedCount: 0 })
    expect(await balances('S-1')).toEqual([
      { location_id: bins['A1-01'], condition: 'new', quantity: 5 },
      { location_id: bins['A1-02'], condition: 'used', quantity: 2 },
    ])
    const movements = await site.db('movements').select('kind', 'actor_id', 'note')
    expect(movements).toEqual(
      Array(3).fill({
        kind: 'adjustment',
        actor_id: site.actor.id,
        note: `Opening stock, import ${done.id}`,
      }),
    )
    const sums = await site.db('balances').groupBy('item_id').sum('quantity')
    expect(sums.map(({ sum }) => sum)).toEqual(['0', '0'])
  })

  it('it refuses an item that already has movements, so the same file changes nothing', async () => {
    const content = `${head}MAIN,S-3,A1-01,5,new\n`
    await site.committed({ kind: 'stock', content })
    const again = await site.checked({ kind: 'stock', content })
    expect(again).toMatchObject({ added: 0, changed: 0, rejectedCount: 1 })
    expect(again.rejected[0]).toMatchObject({ line: 2, column: 'Code', value: 'S-3' })
    expect(again.rejected[0]?.message).toContain('has movements already')
  })

  it('it refuses what it cannot place or count, each at its cell', async () => {
    const content = `${head}MAIN,S-4,B9,1,\nNORTH,S-4,A1-01,1,\nMAIN,NONE,A1-01,1,\nMAIN,S-4,A1-01,-1,\nMAIN,S-4,A1-01,1.5,\nMAIN,S-4,A1-01,,\nMAIN,S-4,MAIN,1,\nMAIN,S-4,A1-01,1,shiny\n`
    const checked = await site.checked({ kind: 'stock', content })
    expect(checked.rejected.map(({ column, value }) => [column, value])).toEqual([
      ['Where', 'B9'],
      ['Crib', 'NORTH'],
      ['Code', 'NONE'],
      ['Qty', '-1'],
      ['Qty', '1.5'],
      ['Qty', ''],
      ['Where', 'MAIN'],
      ['Condition', 'shiny'],
    ])
    expect(checked.rejected[6]?.message).toBe(
      'MAIN is a crib: only bins hold stock. Its 2 bins are A1-01 … A1-02.',
    )
  })

  it('it refuses the same item, bin and condition twice, and takes nothing for a quantity of 0', async () => {
    const content = `${head}MAIN,S-5,A1-01,1,new\nMAIN,S-5,A1-01,2,new\nMAIN,S-6,A1-01,0,new\n`
    const checked = await site.checked({ kind: 'stock', content })
    expect(checked).toMatchObject({ added: 0, unchanged: 1, rejectedCount: 2 })
    expect(checked.rejected[0]?.message).toBe('Line 3 gives the same item, bin and condition.')
  })

  it('it finds the item by maker and part number too', async () => {
    const content = 'Crib,Maker,Part number,Bin,Qty\nMAIN,lager,l-7,A1-01,4\n'
    expect(await site.committed({ kind: 'stock', content })).toMatchObject({ added: 1 })
    expect(await balances('S-7')).toHaveLength(1)
  })

  it('it checks again at the commit: an item that moved meanwhile is not posted over', async () => {
    const content = `${head}MAIN,S-8,A1-01,4,new\nMAIN,S-9,A1-01,4,new\n`
    const [first, second] = [
      await site.checked({ kind: 'stock', content }),
      await site.checked({ kind: 'stock', content }),
    ]
    await site.commit(first.id)
    await site.commit(second.id)
    await site.apply(first.id)
    await site.apply(second.id)
    expect(await site.get(second.id)).toMatchObject({ state: 'checked', added: 0, rejectedCount: 2 })
    expect((await site.get(second.id)).message).toContain('Nothing was changed.')
    expect(await balances('S-8')).toEqual([{ location_id: bins['A1-01'], condition: 'new', quantity: 4 }])
  })
})
