import { randomUUID } from 'node:crypto'
import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest'
import { ledgerFaults } from '@/server/db/ledger-faults'
import {
  type AssemblyRecords,
  createAssemblyRecord,
  createMachineRecord,
  insertAssembly,
  putTogether,
  takeRechecks,
} from '../support/assembly-records'
import { type Books, createBooks, post } from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase
let db: Knex
let books: Books
let assembly: AssemblyRecords

beforeAll(async () => {
  database = await createTestDatabase()
  db = database.db
})
afterAll(() => database.drop())
beforeEach(async () => {
  books = await createBooks(db)
  assembly = await createAssemblyRecord(db, books, 2)
})

const change = (columns: Record<string, unknown>) => db('assemblies').where('id', assembly.id).update(columns)
const inMachine = (machineId: string, columns: Record<string, unknown>, id = assembly.id) =>
  db.transaction(async (trx) => {
    const machine = await trx('machines').where('id', machineId).first()
    await trx('assembly_parts').where('assembly_id', id).update({ location_id: machine.location_id })
    await trx('assemblies')
      .where('id', id)
      .update({ machine_id: machineId, ...columns })
  })

describe('an assembly', () => {
  test('it has a cutter and a holder, each of its own kind', async () => {
    const make = (parts: Record<string, string>) =>
      db.transaction(async (trx) => {
        const [row] = await trx('assemblies')
          .insert({ stick_out_mm: 30, gauge_length_mm: 90, created_by: books.userId })
          .returning('id')
        await trx('assembly_parts').insert(
          Object.entries(parts).map(([kind, itemId]) => ({
            assembly_id: row.id,
            kind,
            item_id: itemId,
            geometry: '{}',
          })),
        )
      })
    const { cutterId, holderId } = assembly
    await make({ cutter: cutterId, holder: holderId })
    await expectRefusal(make({ cutter: cutterId }), '23503', 'assemblies_has_holder')
    await expectRefusal(make({ holder: holderId }), '23503', 'assemblies_has_cutter')
    await expectRefusal(make({ cutter: holderId, holder: holderId }), '23503', 'assembly_parts_item_of_kind')
  })

  test('it keeps its parts', async () => {
    const parts = db('assembly_parts').where({ assembly_id: assembly.id, kind: 'cutter' })
    const other = await createAssemblyRecord(db, books)
    await expectRefusal(parts.clone().update({ item_id: other.cutterId }), 'LL019', 'assembly_parts_stay')
    await expectRefusal(parts.clone().delete(), 'LL019', 'assembly_parts_stay')
  })

  test('it is planned, built, broken down and built again, in that order', async () => {
    await expectRefusal(
      change({ state: 'broken_down', built_at: new Date(), broken_down_at: new Date() }),
      'LL019',
      'assemblies_states_in_order',
    )
    await putTogether(db, books, assembly)
    await expectRefusal(change({ state: 'planned', built_at: null }), 'LL019', 'assemblies_states_in_order')
    await db.transaction(async (trx) => {
      await trx('assembly_parts')
        .where('assembly_id', assembly.id)
        .update({ home_location_id: null, location_id: null, condition: null })
      await trx('assemblies')
        .where('id', assembly.id)
        .update({ state: 'broken_down', broken_down_at: trx.fn.now() })
    })
    await change({ archived_at: new Date() })
    expect(await db('assemblies').where('id', assembly.id).first('state')).toEqual({ state: 'broken_down' })
  })

  test('it is built with every part in one place, in hands or on a machine', async () => {
    await expectRefusal(
      change({ state: 'built', built_at: new Date() }),
      'LL019',
      'assembly_parts_follow_state',
    )
    await putTogether(db, books, assembly)
    const place = (locationId: string | null, kind: string) =>
      db('assembly_parts').where({ assembly_id: assembly.id, kind }).update({ location_id: locationId })
    await expectRefusal(place(books.secondPersonId, 'cutter'), 'LL019', 'assembly_parts_follow_state')
    await expectRefusal(
      db('assembly_parts').where('assembly_id', assembly.id).update({ location_id: books.binId }),
      'LL019',
      'assembly_parts_follow_state',
    )
    await expectRefusal(place(null, 'cutter'), '23514', 'assembly_parts_placed_whole')
  })

  test('it is not archived while it is built', async () => {
    await putTogether(db, books, assembly)
    await expectRefusal(change({ archived_at: new Date() }), '23514', 'assemblies_archived_not_built')
  })

  test('it raises its version by what is changed of it alone', async () => {
    const version = async () => (await db('assemblies').where('id', assembly.id).first('version')).version
    expect(await version()).toBe(1)
    await change({ tool_number: 7 })
    expect(await version()).toBe(2)
    await change({ tool_number: 7 })
    expect(await version()).toBe(2)
  })

  test('it shares no tagged piece with another built one', async () => {
    const { cutterId, holderId, colletId } = assembly
    const second = {
      id: await insertAssembly(db, books, { cutterId, holderId, colletId }),
      cutterId,
      holderId,
      colletId,
    }
    const [piece] = await db('pieces').insert({ item_id: cutterId, tag: randomUUID() }).returning('id')
    await db('assembly_parts').where({ kind: 'cutter', item_id: cutterId }).update({ piece_id: piece.id })
    await putTogether(db, books, assembly)
    await expectRefusal(putTogether(db, books, second), '23505', 'assembly_parts_one_place_of_piece_idx')
  })
})

describe('an assembly in a machine', () => {
  test('it is built, where the machine is, alone in its pocket and in its tool number', async () => {
    const machine = await createMachineRecord(db, 10)
    await expectRefusal(change({ machine_id: machine.id }), '23514', 'assemblies_in_machine_when_built')
    await putTogether(db, books, assembly)
    await expectRefusal(change({ machine_id: machine.id }), 'LL019', 'assembly_parts_follow_state')
    await expectRefusal(change({ pocket: 3 }), '23514', 'assemblies_pocket_of_machine')
    await expectRefusal(inMachine(machine.id, { pocket: 11 }), 'LL019', 'assemblies_pocket_there')
    await inMachine(machine.id, { pocket: 10, tool_number: 5 })

    const { cutterId, holderId, colletId } = assembly
    const second = {
      id: await insertAssembly(db, books, { cutterId, holderId, colletId }),
      cutterId,
      holderId,
      colletId,
    }
    await putTogether(db, books, second)
    await expectRefusal(
      inMachine(machine.id, { pocket: 10 }, second.id),
      '23505',
      'assemblies_one_of_pocket_idx',
    )
    await expectRefusal(
      inMachine(machine.id, { tool_number: 5 }, second.id),
      '23505',
      'assemblies_one_of_tool_number_idx',
    )
    const other = await createMachineRecord(db, null)
    await inMachine(other.id, { pocket: 500, tool_number: 5 }, second.id)
  })
})

describe('another look', () => {
  test('it is asked for by a corrected size, not by a row that stays as it was', async () => {
    const holder = db('holders').where('item_id', assembly.holderId)
    await holder.clone().update({ gauge_length_mm: 61 })
    expect(await takeRechecks(db, assembly.id)).toBe(1)
    await holder.clone().update({ gauge_length_mm: 61 })
    expect(await takeRechecks(db, assembly.id)).toBe(0)
    await db('holder_segments').insert({
      item_id: assembly.holderId,
      position: 1,
      part: 'nut',
      length_mm: 18,
      nose_diameter_mm: 28,
      spindle_diameter_mm: 28,
    })
    expect(await takeRechecks(db, assembly.id)).toBe(1)
  })

  test('it is asked for by an archived item, and not of an archived assembly', async () => {
    const spare = await createAssemblyRecord(db, books, 1)
    await post(db, books, { kind: 'scrap', itemId: spare.colletId, from: books.binId, to: books.scrapId })
    await db('items').where('id', spare.colletId).update({ archived_at: db.fn.now() })
    expect(await takeRechecks(db, spare.id)).toBe(1)
    await db('assemblies').where('id', spare.id).update({ archived_at: db.fn.now() })
    await db('cutters').where('item_id', spare.cutterId).update({ overall_length_mm: 61 })
    expect(await takeRechecks(db, spare.id)).toBe(0)
  })

  test('it is asked for by a piece that was measured', async () => {
    const [piece] = await db('pieces')
      .insert({ item_id: assembly.cutterId, tag: randomUUID() })
      .returning('id')
    await db('assembly_parts')
      .where({ assembly_id: assembly.id, kind: 'cutter' })
      .update({ piece_id: piece.id })
    await db('pieces').where('id', piece.id).update({ note: 'looked at' })
    expect(await takeRechecks(db, assembly.id)).toBe(0)
    await db('pieces').where('id', piece.id).update({ cutting_diameter_mm: 5.9, regrind_count: 1 })
    expect(await takeRechecks(db, assembly.id)).toBe(1)
  })

  test('it is asked for by a movement from where it is or to there, naming the movement', async () => {
    await putTogether(db, books, assembly)
    await takeRechecks(db, assembly.id)
    const { holderId: itemId } = assembly
    const [away] = await post(db, books, { kind: 'return', itemId, from: books.personId, to: books.binId })
    const [request] = await db('assembly_rechecks').where('assembly_id', assembly.id)
    expect(request).toMatchObject({ movement_id: away })
    await takeRechecks(db, assembly.id)
    await post(db, books, { kind: 'issue', itemId, from: books.binId, to: books.personId })
    expect(await takeRechecks(db, assembly.id)).toBe(1)
    await post(db, books, { kind: 'issue', itemId, from: books.binId, to: books.secondPersonId })
    expect(await takeRechecks(db, assembly.id)).toBe(0)
  })

  test('it is asked for once of an assembly, however many movements one statement posts', async () => {
    await putTogether(db, books, assembly)
    await takeRechecks(db, assembly.id)
    const back = (itemId: string) => ({ kind: 'return', itemId, from: books.personId, to: books.binId })
    await post(db, books, back(assembly.holderId), back(assembly.colletId), back(assembly.cutterId))
    expect(await takeRechecks(db, assembly.id)).toBe(1)
    const again = (itemId: string) => ({ kind: 'issue', itemId, from: books.binId, to: books.personId })
    await post(db, books, again(assembly.holderId), again(assembly.colletId), again(assembly.cutterId))
    expect(await takeRechecks(db, assembly.id)).toBe(1)
  })

  test('it is asked for of everything by a clearance of the shop, and of nothing by its name', async () => {
    await db('shop_settings').update({ shop_name: 'Under Bridge Works' })
    expect(await takeRechecks(db, assembly.id)).toBe(0)
    await db('shop_settings').update({ holder_clearance_mm: 0.6 })
    expect(await takeRechecks(db, assembly.id)).toBe(1)
  })

  test('it is not asked for by what was undone', async () => {
    await db
      .transaction(async (trx) => {
        await trx('cutters').where('item_id', assembly.cutterId).update({ overall_length_mm: 62 })
        throw new Error('undone')
      })
      .catch(() => null)
    expect(await takeRechecks(db, assembly.id)).toBe(0)
  })
})

test('it measures in a book that is only added to', async () => {
  await db('assembly_measurements').insert({
    assembly_id: assembly.id,
    gauge_length_mm: 90.02,
    expected_gauge_length_mm: 90,
    expected_diameter_mm: 6,
    source: 'by_hand',
    actor_id: books.userId,
  })
  await expectRefusal(db('assembly_measurements').update({ gauge_length_mm: 1 }), 'LL001')
  await expectRefusal(db('assembly_measurements').delete(), 'LL001')
})

test('it leaves the books right', async () => {
  expect((await ledgerFaults(db)).faults).toEqual([])
})
