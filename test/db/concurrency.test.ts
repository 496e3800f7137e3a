import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest'
import { databaseErrorCode } from '@/server/db/database-errors'
import { ledgerFaults } from '@/server/db/ledger-faults'
import { inTransaction } from '@/server/db/transaction'
import {
  type Books,
  balanceAt,
  createBooks,
  createItem,
  onHand,
  type Posting,
  post,
  receive,
} from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase
let books: Books

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())
beforeEach(async () => {
  books = await createBooks(database.db)
})

const issueTo = (to: string): Posting => ({ kind: 'issue', from: books.binId, to })

/** Resolves once a connection of this database waits for a lock. */
async function someoneWaits(): Promise<void> {
  for (let tries = 0; tries < 500; tries += 1) {
    const waiting = await database.db('pg_stat_activity').whereRaw('datname = current_database()').where({
      wait_event_type: 'Lock',
    })
    if (waiting.length > 0) return
    await new Promise((resolve) => setTimeout(resolve, 10))
  }
  throw new Error('nobody waits for a lock')
}

async function outcome(work: Promise<unknown>): Promise<string> {
  return work.then(
    () => 'done',
    (error: unknown) => databaseErrorCode(error) ?? String(error),
  )
}

describe('two at once', () => {
  test('they cannot both have the last piece', async () => {
    await receive(database.db, books, 1)
    const first = await database.db.transaction()
    await post(first, books, issueTo(books.personId))
    const second = outcome(post(database.db, books, issueTo(books.secondPersonId)))
    await someoneWaits()
    await first.commit()
    expect(await second).toBe('LL014')
    expect(await balanceAt(database.db, books, books.binId)).toBe(0)
    expect(await balanceAt(database.db, books, books.secondPersonId)).toBe(0)
  })

  test('the second has the last piece where the first thinks better of it', async () => {
    await receive(database.db, books, 1)
    const first = await database.db.transaction()
    await post(first, books, issueTo(books.personId))
    const second = outcome(post(database.db, books, issueTo(books.secondPersonId)))
    await someoneWaits()
    await first.rollback()
    expect(await second).toBe('done')
    expect(await balanceAt(database.db, books, books.secondPersonId)).toBe(1)
  })

  test('of thirty takers of ten pieces ten have one', async () => {
    await receive(database.db, books, 10)
    const takers = Array.from({ length: 30 }, () =>
      outcome(post(database.db, books, issueTo(books.personId))),
    )
    const outcomes = await Promise.all(takers)
    expect(outcomes.filter((one) => one === 'done')).toHaveLength(10)
    expect(outcomes.filter((one) => one === 'LL014')).toHaveLength(20)
    expect(await onHand(database.db, books)).toBe(0)
  })

  test('moves that cross do not lock each other out, whatever order they are written in', async () => {
    const second = { ...books, itemId: await createItem(database.db, { code: `SECOND-${books.itemId}` }) }
    for (const each of [books, second]) {
      await receive(database.db, each, 50)
      await receive(database.db, each, 50, books.secondBinId)
    }
    const there = { kind: 'relocation', from: books.binId, to: books.secondBinId }
    const back = { kind: 'relocation', from: books.secondBinId, to: books.binId }
    const own = { itemId: second.itemId }
    const rounds = Array.from({ length: 20 }, (_, round) =>
      outcome(
        round % 2 === 0
          ? post(database.db, books, there, { ...back, ...own })
          : post(database.db, books, { ...there, ...own }, back),
      ),
    )
    expect(new Set(await Promise.all(rounds))).toEqual(new Set(['done']))
    expect((await ledgerFaults(database.db)).faults).toEqual([])
  })

  test('the same movement is reversed once', async () => {
    await receive(database.db, books, 5)
    const [issue] = await post(database.db, books, issueTo(books.personId))
    await post(database.db, books, issueTo(books.personId))
    const reversal = { kind: 'reversal', from: books.personId, to: books.binId, reversesId: issue ?? '' }
    const outcomes = await Promise.all([1, 2, 3].map(() => outcome(post(database.db, books, reversal))))
    expect(outcomes.sort()).toEqual(['23505', '23505', 'done'])
    expect(await balanceAt(database.db, books, books.binId)).toBe(4)
  })
})

describe('archiving beside a movement', () => {
  const archive = (db: Knex) => db('items').where('id', books.itemId).update({ archived_at: new Date() })
  const archiveBin = (db: Knex) =>
    db('locations').where('id', books.binId).update({ archived_at: new Date() })

  test.each([
    ['item', archive],
    ['bin', archiveBin],
  ])('it waits for a movement under way and is refused (%s)', async (_, archiveIt) => {
    const moving = await database.db.transaction()
    await receive(moving, books, 1)
    const archiving = outcome(archiveIt(database.db))
    await someoneWaits()
    await moving.commit()
    expect(await archiving).toBe('LL016')
  })

  test.each([
    ['item', archive],
    ['bin', archiveBin],
  ])('it is seen by the movement that comes during it (%s)', async (_, archiveIt) => {
    const archiving = await database.db.transaction()
    await archiveIt(archiving)
    const moving = outcome(receive(database.db, books, 1))
    await someoneWaits()
    await archiving.commit()
    expect(await moving).toBe('LL013')
  })
})

describe('inTransaction', () => {
  test('it runs the work again where it was broken off by another', async () => {
    let attempts = 0
    await receive(database.db, books, 4)
    await inTransaction(
      database.db,
      async (trx) => {
        attempts += 1
        await trx('balances').where('item_id', books.itemId)
        if (attempts === 1) await post(database.db, books, issueTo(books.personId))
        await post(trx, books, issueTo(books.secondPersonId))
      },
      { isolation: 'repeatable read' },
    )
    expect(attempts).toBe(2)
    expect(await balanceAt(database.db, books, books.binId)).toBe(2)
  })

  test('it gives up after a few attempts, and at once on any other error', async () => {
    let attempts = 0
    const failing = (code: string) =>
      inTransaction(database.db, async (trx) => {
        attempts += 1
        await trx.raw(`do $$ begin raise exception 'as asked' using errcode = '${code}'; end $$`)
      })
    await expectRefusal(failing('40P01'), '40P01')
    expect(attempts).toBe(4)
    await expectRefusal(failing('LL014'), 'LL014')
    expect(attempts).toBe(5)
  })

  test('it leaves nothing of work that fails', async () => {
    const failed = inTransaction(database.db, async (trx) => {
      await receive(trx, books, 3)
      throw new Error('no')
    })
    await expect(failed).rejects.toThrow('no')
    expect(await balanceAt(database.db, books, books.binId)).toBe(0)
  })
})
