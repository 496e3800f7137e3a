import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createImportSite, type ImportSite } from '../support/import-site'

let site: ImportSite
let cribId: string
let supplierId: string

beforeAll(async () => {
  site = await createImportSite()
  const crib = async (code: string) => {
    const [row] = await site.db('cribs').insert({ code, name: code, time_zone: 'UTC' }).returning('id')
    return row.id as string
  }
  cribId = await crib('MAIN')
  await crib('NORTH')
  await site.db('crib_members').insert({ crib_id: cribId, user_id: site.actor.id })
  const [supplier] = await site.db('suppliers').insert({ name: 'Tolliver Tool Supply' }).returning('id')
  supplierId = supplier.id
  await site.db('suppliers').insert({ name: 'Gone Cutlery', archived_at: site.db.fn.now() })
})
afterAll(() => site.close())

const head = 'Crib,Item,Reorder point,Order up to,Pack,Smallest order,Supplier,Supplier no.,Lead time (days)'

function file(...rows: string[]): string {
  return [head, ...rows].join('\r\n')
}

async function items(...codes: string[]): Promise<void> {
  await site.db('items').insert(codes.map((code) => ({ kind: 'cutter', code })))
}

function point(code: string, crib = 'MAIN'): Promise<Record<string, unknown> | undefined> {
  return site
    .db('reorder_points')
    .join('items', 'items.id', 'reorder_points.item_id')
    .join('cribs', 'cribs.id', 'reorder_points.crib_id')
    .where({ 'items.code': code, 'cribs.code': crib })
    .first('reorder_points.*')
}

const kind = 'reorderPoints' as const

describe('reorder points by file', () => {
  it('it sets what is new, changes what is there, and leaves a value alone where the cell is blank', async () => {
    await items('RA-1', 'RA-2')
    const first = await site.committed({
      kind,
      content: file('MAIN,RA-1,4,12,5,10,tolliver tool supply,T-77,6', 'north,ra-2,0,3,,,,,'),
    })
    expect(first).toMatchObject({ state: 'committed', added: 2, rejected: [], warnings: [] })
    expect(await point('RA-1')).toMatchObject({
      ...{ reorder_point: 4, order_up_to: 12, pack_size: 5, minimum_order: 10, supplier_id: supplierId },
      ...{ supplier_part_number: 'T-77', lead_time_days: 6, version: 1 },
    })
    expect(await point('RA-2', 'NORTH')).toMatchObject({
      ...{ reorder_point: 0, order_up_to: 3, pack_size: 1, minimum_order: 1, supplier_id: null, version: 1 },
    })
    const second = await site.committed({ kind, content: file('MAIN,RA-1,3,,,,,,') })
    expect(second).toMatchObject({ added: 0, changed: 1, rejectedCount: 0 })
    expect(await point('RA-1')).toMatchObject({ reorder_point: 3, order_up_to: 12, pack_size: 5, version: 2 })
  })

  it('it changes nothing when the same file comes again', async () => {
    await items('RB-1', 'RB-2')
    const content = file('MAIN,RB-1,4,12,5,10,Tolliver Tool Supply,T-1,6', 'NORTH,RB-2,1,2,,,,,')
    await site.committed({ kind, content })
    const again = await site.committed({ kind, content })
    expect(again).toMatchObject({
      state: 'committed',
      added: 0,
      changed: 0,
      unchanged: 2,
      rejectedCount: 0,
    })
    expect(await point('RB-1')).toMatchObject({ version: 1 })
  })

  it('it finds the item by maker and part number too, under the headings shops use', async () => {
    await site.db('items').insert({ kind: 'collet', code: 'RC-1', maker: 'Kollin', part_number: 'K-9' })
    const content = 'Mfr;Mfr P/N;Crib;Min;Max;MOQ;Vendor;Delivery time\nkollin;k-9;MAIN;2;8;4;;5 days\n'
    expect(await site.committed({ kind, content })).toMatchObject({ added: 1 })
    expect(await point('RC-1')).toMatchObject({ reorder_point: 2, minimum_order: 4, lead_time_days: 5 })
  })

  it('it refuses what cannot be, each with line, column, value and a plain sentence', async () => {
    await items('RD-1', 'RD-2')
    await site.db('items').insert({ kind: 'cutter', code: 'RD-3', archived_at: site.db.fn.now() })
    const checked = await site.checked({
      kind,
      content: file(
        'MAIN,RD-1,9,3,,,,,',
        'MAIN,RD-1,-2,3,,,,,',
        'MAIN,RD-1,1.5,3,,,,,',
        'MAIN,RD-1,1,2000000,,,,,',
        'MAIN,RD-1,,3,,,,,',
        'MAIN,RD-2,1,3,0,,,,',
        'MAIN,RD-2,1,3,,,Toliver Tool,,',
        'MAIN,RD-2,1,3,,,gone cutlery,,',
        'SOUTH,RD-2,1,3,,,,,',
        ',RD-2,1,3,,,,,',
        'MAIN,RD-9,1,3,,,,,',
        'MAIN,RD-3,1,3,,,,,',
        'MAIN,RD-2,1,3,,,,,2 weeks',
        'MAIN,RD-2,1,3,,,,,4000',
        'MAIN,,1,3,,,,,',
      ),
    })
    const doubled = / gives the same item and crib\.$/
    const own = checked.rejected.map(({ line, column, value, message }) => [line, column, value, message])
    expect(checked).toMatchObject({ added: 0, rejectedCount: 15 })
    expect(own.filter(([, , , message]) => !doubled.test(String(message)))).toEqual([
      [2, 'Reorder point', '9', 'The reorder point is above the order-up-to level.'],
      [3, 'Reorder point', '-2', "A count can't be negative."],
      [4, 'Reorder point', '1.5', '“1.5” is not a whole number. Write digits alone, like 12.'],
      [5, 'Order up to', '2000000', 'More than a million pieces: check the number.'],
      [6, 'Reorder point', '', 'Give the reorder point.'],
      [7, 'Pack', '0', 'At least 1.'],
      [8, 'Supplier', 'Toliver Tool', 'There is no supplier Toliver Tool. Add them first, or mend the name.'],
      [
        ...[9, 'Supplier', 'gone cutlery'],
        'Gone Cutlery is archived. Restore them first, or name another supplier.',
      ],
      [10, 'Crib', 'SOUTH', 'There is no crib SOUTH.'],
      [11, 'Crib', '', 'Give the crib.'],
      [12, 'Item', 'RD-9', 'The catalogue has no RD-9. Import it first.'],
      [13, 'Item', 'RD-3', 'RD-3 is archived. Restore it first, or use another code.'],
      [14, 'Lead time (days)', '2 weeks', '“2 weeks” is not a whole number. Write digits alone, like 12.'],
      [15, 'Lead time (days)', '4000', 'More than ten years: check the number.'],
      [16, 'Item', '', 'Give the own code, or the maker and the part number.'],
    ])
    expect(await point('RD-1')).toBeUndefined()
  })

  it('it holds a blank cell of a point that is there to the figure kept', async () => {
    await items('RE-1')
    await site.committed({ kind, content: file('MAIN,RE-1,4,12,,,,,') })
    const checked = await site.checked({ kind, content: file('MAIN,RE-1,13,,,,,,') })
    expect(checked.rejected).toMatchObject([{ line: 2, column: 'Reorder point', value: '13' }])
  })

  it('it refuses rows of one item and crib, each naming the other, and takes one item in two cribs', async () => {
    await items('RF-1', 'RF-2')
    const checked = await site.checked({
      kind,
      content: file('MAIN,RF-1,1,3,,,,,', 'main,rf-1,2,3,,,,,', 'MAIN,RF-2,1,3,,,,,', 'NORTH,RF-2,1,3,,,,,'),
    })
    expect(checked).toMatchObject({ added: 2, rejectedCount: 2 })
    expect(checked.rejected.map(({ message }) => message)).toEqual([
      'Line 3 gives the same item and crib.',
      'Line 2 gives the same item and crib.',
    ])
  })

  it('it takes an order-up-to level that is the reorder point, with a word of caution at its cell', async () => {
    await items('RG-1')
    const checked = await site.checked({ kind, content: file('MAIN,RG-1,5,5,,,,,') })
    expect(checked).toMatchObject({ added: 1, rejectedCount: 0, warningCount: 1 })
    expect(checked.warnings).toMatchObject([{ line: 2, column: 'Order up to', value: '5' }])
    expect(checked.warnings[0]?.message).toContain('its alert stays open')
  })

  it('it takes no lead time in weeks for days', async () => {
    const checked = await site.checked({ kind, content: 'Crib,Item,Lead time (weeks)\nMAIN,RG-1,2\n' })
    expect(checked.columns[2]).toMatchObject({
      field: null,
      note: 'This is in weeks; lead times are kept in days.',
    })
  })

  it('it stops at rejects unless told to skip them, and leaves nothing where it is cancelled', async () => {
    await items('RH-1', 'RH-2')
    const content = file('MAIN,RH-1,1,3,,,,,', 'MAIN,RH-2,4,3,,,,,')
    const cancelled = await site.checked({ kind, content })
    await site.cancel(cancelled.id)
    const { id } = await site.checked({ kind, content })
    await expect(site.commit(id)).rejects.toMatchObject({ code: 'import-has-rejects' })
    expect(await point('RH-1')).toBeUndefined()
    await site.commit(id, 'skip')
    await site.apply(id)
    expect(await site.get(id)).toMatchObject({ state: 'committed', added: 1, rejectedCount: 1 })
    expect(await point('RH-1')).toBeDefined()
    expect(await point('RH-2')).toBeUndefined()
  })

  it('it checks again at the commit what was set, changed or archived meanwhile', async () => {
    await items('RI-1', 'RI-2', 'RI-3')
    await site.committed({ kind, content: file('MAIN,RI-1,4,12,,,,,', 'MAIN,RI-2,4,12,,,,,') })
    const { id } = await site.checked({
      kind,
      content: file('MAIN,RI-1,8,,,,,,', 'MAIN,RI-2,5,,,,,,', 'MAIN,RI-3,1,2,,,,,'),
    })
    await site.commit(id)
    const lowered = site
      .db('reorder_points')
      .whereIn('item_id', site.db('items').where('code', 'RI-1').select('id'))
    await lowered.update({ reorder_point: 2, order_up_to: 6 })
    await site.apply(id)
    expect(await site.get(id)).toMatchObject({ state: 'checked', added: 1, changed: 1, rejectedCount: 1 })
    expect((await site.get(id)).rejected).toMatchObject([{ line: 2, column: 'Reorder point', value: '8' }])
    expect(await point('RI-2')).toMatchObject({ reorder_point: 4 })
    expect(await point('RI-3')).toBeUndefined()
  })

  it('it writes one audit entry', async () => {
    await items('RJ-1')
    const { id } = await site.committed({ kind, content: file('MAIN,RJ-1,1,3,,,,,') })
    const entries = await site.db('audit_entries').where({ entity: 'import', entity_id: id })
    expect(entries).toMatchObject([{ action: 'import-committed', after: { kind, added: 1 } }])
  })
})

describe('five thousand lines at once', () => {
  const codes = Array.from({ length: 5000 }, (_, at) => `RK-${at}`)

  it('they open an alert for each item that is low and send a member one mail of them all', async () => {
    await site.db.raw(
      `insert into items (kind, code) select 'cutter', 'RK-' || n from generate_series(0, 4999) as n`,
    )
    const mails = () => site.db('outbox').where('crib_id', cribId)
    const before = (await mails()).length
    const done = await site.committed({
      kind,
      content: file(...codes.map((code) => `MAIN,${code},2,9,,,,,`)),
    })
    expect(done).toMatchObject({ state: 'committed', added: 5000, rejectedCount: 0 })
    const after = await mails()
    expect(after).toHaveLength(before + 1)
    const event = after.map((mail) => Number(mail.event_id)).sort((one, other) => other - one)[0]
    expect(await site.db('alerts').where({ opened_event: event, crib_id: cribId })).toHaveLength(5000)
  })

  it('they close them again the same way, and write no mail of it', async () => {
    const stock = await site.db('locations').where({ crib_id: cribId, kind: 'crib' }).first('id')
    const [bin] = await site
      .db('locations')
      .insert({ kind: 'bin', code: 'A1', name: 'A1', crib_id: cribId, parent_id: stock.id })
      .returning('id')
    const far = await site.db('locations').where('kind', 'supplier').first('id')
    await site.db.raw(
      `insert into movements (kind, item_id, quantity, from_location_id, from_condition, to_location_id,
        to_condition, actor_id)
        select 'receipt', id, 2, ?, 'new', ?, 'new', ? from items where code like 'RK-%' order by id`,
      [far.id, bin.id, site.actor.id],
    )
    const open = () =>
      site
        .db('alerts')
        .where('crib_id', cribId)
        .whereNull('closed_at')
        .whereIn('item_id', site.db('items').whereLike('code', 'RK-%').select('id'))
    expect(await open()).toHaveLength(5000)
    const mails = (await site.db('outbox')).length
    const done = await site.committed({ kind, content: file(...codes.map((code) => `MAIN,${code},1,,,,,,`)) })
    expect(done).toMatchObject({ state: 'committed', changed: 5000 })
    expect(await open()).toHaveLength(0)
    expect(await site.db('outbox')).toHaveLength(mails)
  })
})

describe('at once', () => {
  it('a file and single changes of the same points wait for each other, and none is lost', async () => {
    const { putReorderPoint } = await import('@/server/services/reordering/put-reorder-point')
    const codes = Array.from({ length: 40 }, (_, at) => `RL-${at}`)
    await items(...codes)
    await site.committed({ kind, content: file(...codes.map((code) => `MAIN,${code},2,9,,,,,`)) })
    const rows = await site.db('items').whereIn('code', codes).select('id')
    const { id } = await site.checked({ kind, content: file(...codes.map((code) => `MAIN,${code},3,,,,,,`)) })
    await site.commit(id)
    await Promise.all([
      site.apply(id),
      ...rows.map((row) =>
        putReorderPoint(
          site.actor,
          { itemId: row.id, cribId },
          { reorderPoint: 1, orderUpTo: 9, packSize: 4 },
        ),
      ),
    ])
    expect(await site.get(id)).toMatchObject({ state: 'committed', rejectedCount: 0 })
    const after = await site.db('reorder_points').whereIn(
      'item_id',
      rows.map((row) => row.id),
    )
    expect(after.every(({ pack_size }) => pack_size === 4)).toBe(true)
    expect(after.every(({ reorder_point }) => [1, 3].includes(reorder_point))).toBe(true)
  })
})
