import { execFile } from 'node:child_process'
import { fileURLToPath } from 'node:url'
import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest'
import { ledgerFaults } from '@/server/db/ledger-faults'
import { createAssemblyRecord, putTogether } from '../support/assembly-records'
import { type Books, createBooks, createItem, post, receive } from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'

const projectFolder = fileURLToPath(new URL('../..', import.meta.url))

let database: TestDatabase
let books: Books

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())
beforeEach(async () => {
  books = await createBooks(database.db)
  await receive(database.db, books, 5)
  await post(database.db, books, { kind: 'issue', quantity: 2, from: books.binId, to: books.personId })
})

/** The faults that appear when someone writes past every trigger and foreign key; undone afterwards. */
async function faultsAfter(tampering: (trx: Knex) => Promise<unknown>): Promise<string[]> {
  const trx = await database.db.transaction()
  try {
    await trx.raw("set local session_replication_role = 'replica'")
    await tampering(trx)
    await trx.raw("set local session_replication_role = 'origin'")
    return (await ledgerFaults(trx)).faults
  } finally {
    await trx.rollback()
  }
}

function run(url: string): Promise<{ exitCode: number; output: string }> {
  const argv = ['--conditions=react-server', '--import', 'tsx', 'src/server/db/check-ledger.ts']
  return new Promise((resolve) => {
    const options = { cwd: projectFolder, env: { ...process.env, DATABASE_URL: url } }
    const child = execFile(process.execPath, argv, options, (_, output) =>
      resolve({ exitCode: child.exitCode ?? -1, output }),
    )
  })
}

const inBin = (trx: Knex) => trx('balances').where({ item_id: books.itemId, location_id: books.binId })

describe('the check of the ledger', () => {
  test('it finds nothing in books that were kept by movements', async () => {
    expect((await ledgerFaults(database.db)).faults).toEqual([])
  })

  test('it finds a balance that is no sum of its movements', async () => {
    const faults = await faultsAfter((trx) => inBin(trx).update({ quantity: 4 }))
    expect(faults.some((fault) => fault.endsWith('at A1, new: balance 4, movements 3'))).toBe(true)
    expect(faults.some((fault) => fault.endsWith('its balances sum to 1, not zero'))).toBe(true)
  })

  test('it finds a balance that is missing', async () => {
    const faults = await faultsAfter((trx) => inBin(trx).delete())
    expect(faults.some((fault) => fault.endsWith('at A1, new: balance 0, movements 3'))).toBe(true)
  })

  test('it finds a movement that reached no balance', async () => {
    const faults = await faultsAfter((trx) =>
      post(trx, books, { kind: 'scrap', from: books.binId, to: books.scrapId }),
    )
    expect(faults.some((fault) => fault.endsWith('at A1, new: balance 3, movements 2'))).toBe(true)
    expect(faults.some((fault) => fault.endsWith('level 3 on hand, movements 2'))).toBe(true)
  })

  test('it finds an alert that is missing, and one for what is not low', async () => {
    const point = { item_id: books.itemId, crib_id: books.cribId, reorder_point: 3, order_up_to: 9 }
    const missing = await faultsAfter((trx) => trx('reorder_points').insert(point))
    expect(missing).toHaveLength(1)
    expect(missing[0]).toContain('position 3, reorder point 3, but no alert is open')
    await database.db('reorder_points').insert(point)
    const idle = await faultsAfter((trx) =>
      trx('reorder_points').where('item_id', books.itemId).update({ reorder_point: 2 }),
    )
    expect(idle).toHaveLength(1)
    expect(idle[0]).toContain('position 3, reorder point 2, but an alert is open')
  })

  test('it finds a level that is off', async () => {
    const faults = await faultsAfter((trx) =>
      trx('stock_levels').where('item_id', books.itemId).update({ on_hand: 9 }),
    )
    expect(faults).toHaveLength(1)
    expect(faults[0]).toContain('level 9 on hand, movements 3')
  })

  test('it finds less than nothing', async () => {
    const faults = await faultsAfter(async (trx) => {
      await trx.raw('alter table balances drop constraint balances_not_below_zero')
      await inBin(trx).update({ quantity: -1 })
    })
    expect(faults.some((fault) => fault.endsWith('-1, less than nothing'))).toBe(true)
  })

  test('it finds stock in a place that holds none', async () => {
    const root = await database.db('locations').where({ kind: 'crib', crib_id: books.cribId }).first('id')
    const faults = await faultsAfter((trx) =>
      post(trx, books, { kind: 'relocation', from: books.binId, to: root.id }),
    )
    expect(faults.some((fault) => fault.endsWith('a crib holds no stock'))).toBe(true)
  })

  test('it finds a piece that is not where it was brought', async () => {
    const itemId = await createItem(database.db, {
      code: `TRACKED-${books.itemId}`,
      is_tracked_by_piece: true,
    })
    const [piece] = await database
      .db('pieces')
      .insert({ item_id: itemId, tag: `T-${itemId}` })
      .returning('id')
    await post(database.db, books, {
      kind: 'receipt',
      itemId,
      pieceId: piece.id,
      from: books.supplierId,
      to: books.binId,
    })
    const faults = await faultsAfter((trx) =>
      trx('pieces').where('id', piece.id).update({ location_id: books.secondBinId }),
    )
    expect(faults.some((fault) => fault === `piece T-${itemId}: said to be at A2, last moved to A1`)).toBe(
      true,
    )
    expect(faults.some((fault) => fault.endsWith('at A2, new: balance 0, tagged pieces 1'))).toBe(true)
  })

  test('it finds a reversal that is no mirror', async () => {
    const [issue] = await post(database.db, books, { kind: 'issue', from: books.binId, to: books.personId })
    const faults = await faultsAfter((trx) =>
      post(trx, books, {
        kind: 'reversal',
        from: books.personId,
        to: books.secondBinId,
        reversesId: issue ?? '',
      }),
    )
    expect(faults.some((fault) => fault.endsWith(`is no mirror of ${issue}, which it reverses`))).toBe(true)
  })

  test('it finds an assembly whose part is gone and that nobody is told of', async () => {
    const { db } = database
    const assembly = await createAssemblyRecord(db, books)
    await putTogether(db, books, assembly)
    const { holderId: itemId } = assembly
    await post(db, books, { kind: 'return', itemId, from: books.personId, to: books.binId })
    expect((await ledgerFaults(db)).faults).toEqual([])
    const { code } = await db('items').where('id', itemId).first('code')
    const unasked = await faultsAfter((trx) => trx('assembly_rechecks').delete())
    expect(unasked.some((fault) => fault.includes(`its ${code} is gone from`))).toBe(true)
    const told = await faultsAfter(async (trx) => {
      await trx('assembly_rechecks').delete()
      await trx('assembly_findings').insert({
        assembly_id: assembly.id,
        key: 'gone:holder',
        code: 'part_gone',
        is_fault: true,
        detail: '{}',
      })
    })
    expect(told).toEqual([])
  })

  test('it answers by its exit and says what is off', async () => {
    const right = await run(database.url)
    expect(right.output).toMatch(/^\d+ movements checked: the books are right\n$/)
    expect(right.exitCode).toBe(0)
    await database.db.transaction(async (trx) => {
      await trx.raw("set local session_replication_role = 'replica'")
      await inBin(trx).update({ quantity: 4 })
    })
    const wrong = await run(database.url)
    expect(wrong.output).toContain('balance 4, movements 3')
    expect(wrong.output).toMatch(/2 wrong\n$/)
    expect(wrong.exitCode).toBe(1)
  })
})
