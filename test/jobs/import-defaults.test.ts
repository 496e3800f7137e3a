import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createImportSite, type ImportSite } from '../support/import-site'

let site: ImportSite
beforeAll(async () => {
  site = await createImportSite()
  for (const code of ['MAIN', 'NORTH']) {
    const [crib] = await site.db('cribs').insert({ code, name: code, time_zone: 'UTC' }).returning('id')
    const root = await site.db('locations').where({ crib_id: crib.id, kind: 'crib' }).first('id')
    await site
      .db('locations')
      .insert({ kind: 'bin', code: 'A1-01', name: 'A1-01', crib_id: crib.id, parent_id: root.id })
  }
})
afterAll(() => site.close())

const cutters = 'code,dc,apmx,oal,dmm,description\n'
const formOf = async (code: string) =>
  (await site.db('cutters').join('items', 'items.id', 'cutters.item_id').where({ code }).first('form'))?.form

describe('what holds for all rows', () => {
  it('a form is given to the rows of a file without one, after the check', async () => {
    const { id, rejectedCount } = await site.checked({
      kind: 'cutters',
      content: `${cutters}F-1,6,12,57,6,\n`,
    })
    expect(rejectedCount).toBe(1)
    await site.recheck(id, { defaults: { form: 'ball' } })
    await site.check(id)
    expect(await site.get(id)).toMatchObject({ added: 1, rejectedCount: 0, defaults: { form: 'ball' } })
    await site.recheck(id, { unit: 'mm' })
    await site.check(id)
    await site.commit(id)
    await site.apply(id)
    expect(await formOf('F-1')).toBe('ball')
  })

  it('a row with a form of its own keeps it, and so does an item that is there', async () => {
    const content = 'code,form,dc,apmx,oal,dmm\nF-2,square,6,12,57,6\nF-3,,6,12,57,6\n'
    await site.committed({ kind: 'cutters', content, defaults: { form: 'Ball nose' } })
    expect([await formOf('F-2'), await formOf('F-3')]).toEqual(['square', 'ball'])
    const update = await site.checked({
      kind: 'cutters',
      content: `${cutters}F-2,6,12,57,6,again\n`,
      defaults: { form: 'corner radius' },
    })
    expect(update).toMatchObject({ changed: 1 })
    await site.commit(update.id)
    await site.apply(update.id)
    expect(await formOf('F-2')).toBe('square')
  })

  it('a crib is given to opening stock and reorder points that name none', async () => {
    const stock = 'Code,Bin,Qty\nF-1,A1-01,5\n'
    expect(await site.checked({ kind: 'stock', content: stock })).toMatchObject({ rejectedCount: 1 })
    await site.committed({ kind: 'stock', content: stock, defaults: { crib: 'north' } })
    const [balance] = await site
      .db('balances')
      .join('locations', 'locations.id', 'balances.location_id')
      .join('cribs', 'cribs.id', 'locations.crib_id')
      .where({ 'locations.code': 'A1-01' })
      .select('cribs.code', 'quantity')
    expect(balance).toEqual({ code: 'NORTH', quantity: 5 })
    const points = 'Crib,Code,Reorder point,Order up to\n,F-1,2,6\nMAIN,F-1,3,6\n'
    expect(
      await site.committed({ kind: 'reorderPoints', content: points, defaults: { crib: 'NORTH' } }),
    ).toMatchObject({ added: 2, rejectedCount: 0 })
  })

  it('it refuses a form nobody knows, and a field that is not said for all rows', async () => {
    const upload = { kind: 'cutters' as const, content: `${cutters}F-9,6,12,57,6,\n` }
    await expect(site.upload({ ...upload, defaults: { form: 'spoon' } })).rejects.toMatchObject({
      options: { errors: [{ path: 'defaults.form', message: '“spoon” is not a form.' }] },
    })
    await expect(site.upload({ ...upload, defaults: { shankDiameterMm: '6' } })).rejects.toMatchObject({
      options: {
        errors: [
          { path: 'defaults.shankDiameterMm', message: 'Only form can be given for all rows of cutters.' },
        ],
      },
    })
  })
})

describe('the first check', () => {
  it('it says all faults of a row: the missing form, a radius no form can have, and a price that is none', async () => {
    const content = 'code,dc,cr,apmx,oal,dmm,price\nG-1,10,6,22,72,10,x\nG-2,6,3,13,57,6,1\n'
    const { rejected } = await site.checked({ kind: 'cutters', content })
    expect(rejected.map((first) => [first, ...first.further].map(({ column }) => column))).toEqual([
      ['price', 'Form', 'cr'],
      ['Form'],
    ])
    expect(rejected[0]?.further[1]?.message).toBe('The corner radius is more than half the cutting diameter.')
  })

  it('it draws nothing from a size that could not be read', async () => {
    const content = 'code,dc,cr,apmx,oal,dmm\nG-3,ten,6,22,72,10\n'
    const { rejected } = await site.checked({ kind: 'cutters', content })
    expect(rejected.map((first) => [first, ...first.further].map(({ column }) => column))).toEqual([
      ['dc', 'Form'],
    ])
  })
})
