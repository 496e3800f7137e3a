import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest'
import { ledgerFaults } from '@/server/db/ledger-faults'
import { readStockSummaries } from '@/server/db/read-models/stock-summaries'
import { inTransaction } from '@/server/db/transaction'
import { addMember, alertsOf, recipientsOf, setReorderPoint } from '../support/alerts'
import { type Books, createBooks, createItem, post, receive } from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase
let db: Knex
let books: Books

beforeAll(async () => {
  database = await createTestDatabase()
  db = database.db
})
afterAll(() => database.drop())
beforeEach(async () => {
  books = await createBooks(db)
  await addMember(db, books.cribId, books.userId)
  await receive(db, books, 10)
})

const issue = (quantity: number, on: Knex = db) =>
  post(on, books, { kind: 'issue', quantity, from: books.binId, to: books.personId })

const openOnes = async () => (await alertsOf(db, books)).filter((alert) => alert.isOpen)

async function memberAddress(): Promise<string> {
  const user = await db('users').where('id', books.userId).first('email')
  return user.email
}

describe('an alert', () => {
  test('it opens when a movement brings the position to the reorder point, not before', async () => {
    await setReorderPoint(db, books, 4)
    await issue(5)
    expect(await alertsOf(db, books)).toEqual([])
    await issue(1)
    expect(await alertsOf(db, books)).toMatchObject([{ isOpen: true, openedPosition: 4 }])
    expect(await recipientsOf(db, books.cribId)).toEqual([await memberAddress()])
  })

  test('it stays the one alert, told of once, however far the position falls', async () => {
    await setReorderPoint(db, books, 4)
    await issue(6)
    await issue(1)
    await issue(3)
    expect(await alertsOf(db, books)).toHaveLength(1)
    expect(await recipientsOf(db, books.cribId)).toHaveLength(1)
  })

  test('it closes when the position is above the point again, and the next fall is another', async () => {
    await setReorderPoint(db, books, 4)
    await issue(6)
    await receive(db, books, 1)
    expect(await alertsOf(db, books)).toMatchObject([{ isOpen: false, closedPosition: 5 }])
    await issue(2)
    expect(await alertsOf(db, books)).toMatchObject([{ isOpen: false }, { isOpen: true, openedPosition: 3 }])
    expect(await recipientsOf(db, books.cribId)).toHaveLength(2)
  })

  test('it stays open at the point itself', async () => {
    await setReorderPoint(db, books, 4)
    await issue(7)
    await receive(db, books, 1)
    expect(await openOnes()).toHaveLength(1)
  })

  test('it opens and closes with the reorder point alone', async () => {
    await setReorderPoint(db, books, 10)
    expect(await openOnes()).toMatchObject([{ openedPosition: 10 }])
    await setReorderPoint(db, books, 9)
    expect(await openOnes()).toEqual([])
    await setReorderPoint(db, books, 12)
    expect(await openOnes()).toHaveLength(1)
    await db('reorder_points').where('item_id', books.itemId).delete()
    expect(await openOnes()).toEqual([])
  })

  test('it opens for what never came to the crib', async () => {
    await setReorderPoint(db, books, 0, { cribId: books.secondCribId })
    expect(await openOnes()).toMatchObject([{ openedPosition: 0 }])
  })

  test('it counts what is reserved and what is coming', async () => {
    await setReorderPoint(db, books, 4)
    const level = (values: object) =>
      db.transaction(async (trx) => {
        await trx.raw('alter table stock_levels disable trigger stock_levels_guarded')
        await trx('stock_levels').where('item_id', books.itemId).update(values)
        await trx.raw('alter table stock_levels enable trigger stock_levels_guarded')
      })
    await level({ reserved: 6 })
    expect(await openOnes()).toMatchObject([{ openedPosition: 4 }])
    await level({ coming: 1 })
    expect(await openOnes()).toEqual([])
  })

  test('it counts no worn pieces', async () => {
    await setReorderPoint(db, books, 9)
    await issue(1)
    await post(db, books, {
      kind: 'return',
      from: books.personId,
      to: books.binId,
      fromCondition: 'new',
      toCondition: 'worn',
    })
    expect(await openOnes()).toHaveLength(1)
  })

  test('it is each crib’s own', async () => {
    await setReorderPoint(db, books, 4)
    await setReorderPoint(db, books, 4, { cribId: books.secondCribId })
    expect(await openOnes()).toHaveLength(1)
    await issue(6)
    expect(await openOnes()).toHaveLength(2)
  })

  test('it ends when the item is archived and comes back with it, since its shelf is empty', async () => {
    await setReorderPoint(db, books, 4)
    await issue(10)
    await post(db, books, { kind: 'scrap', quantity: 10, from: books.personId, to: books.scrapId })
    const archive = (archivedAt: Date | null) =>
      db('items').where('id', books.itemId).update({ archived_at: archivedAt })
    await archive(new Date())
    expect(await openOnes()).toEqual([])
    expect((await readStockSummaries(db, [books.itemId], null)).get(books.itemId)?.isLow).toBe(false)
    await archive(null)
    expect(await openOnes()).toHaveLength(1)
  })

  test('it is written by the database alone', async () => {
    await setReorderPoint(db, books, 10)
    await expectRefusal(db('alerts').where('item_id', books.itemId).delete(), 'LL002', 'alerts_guarded')
    await expectRefusal(
      db('reorder_points').where('item_id', books.itemId).update({ crib_id: books.secondCribId }),
      'LL017',
      'reorder_points_keep_item_and_crib',
    )
  })
})

describe('a transaction', () => {
  test('it leaves no alert and no mail where it makes good what it took', async () => {
    await setReorderPoint(db, books, 4)
    await inTransaction(db, async (trx) => {
      await issue(8, trx)
      await receive(trx, books, 8)
    })
    expect(await alertsOf(db, books)).toEqual([])
    expect(await recipientsOf(db, books.cribId)).toEqual([])
  })

  test('it neither ends an alert nor opens another where it only passes above the point', async () => {
    await setReorderPoint(db, books, 4)
    await issue(8)
    const before = await alertsOf(db, books)
    await inTransaction(db, async (trx) => {
      await receive(trx, books, 8)
      await issue(8, trx)
    })
    expect(await alertsOf(db, books)).toEqual(before)
    expect(await recipientsOf(db, books.cribId)).toHaveLength(1)
  })

  test('it leaves nothing behind where it is undone', async () => {
    await setReorderPoint(db, books, 4)
    const trx = await db.transaction()
    await issue(8, trx)
    await trx.rollback()
    expect(await alertsOf(db, books)).toEqual([])
    expect(await recipientsOf(db, books.cribId)).toEqual([])
  })
})

describe('the mail', () => {
  test('it goes once to each active member of the crib and to nobody else', async () => {
    const [second, gone] = await db('users')
      .insert([
        { email: `b-${books.itemId}@leadline.example`, name: 'Bea Holm', role: 'machinist' },
        {
          email: `c-${books.itemId}@leadline.example`,
          name: 'Cy Marl',
          role: 'crib_manager',
          is_active: false,
        },
      ])
      .returning('id')
    await addMember(db, books.cribId, second.id)
    await addMember(db, books.cribId, gone.id)
    await setReorderPoint(db, books, 10)
    expect(await recipientsOf(db, books.cribId)).toEqual(
      [`b-${books.itemId}@leadline.example`, await memberAddress()].sort(),
    )
  })

  test('it goes to whoever keeps cribs where the crib has no member', async () => {
    const email = `keeper-${books.itemId}@leadline.example`
    await db('users').insert({ email, name: 'Kit Sorrel', role: 'crib_manager' })
    await setReorderPoint(db, books, 4, { cribId: books.secondCribId })
    expect(await recipientsOf(db, books.secondCribId)).toContain(email)
    expect(await recipientsOf(db, books.secondCribId)).not.toContain(await memberAddress())
  })

  test('it is one for all that one transaction brings low, and names none of them twice', async () => {
    const others = await Promise.all(
      ['x', 'y', 'z'].map((suffix) => createItem(db, { code: `${suffix}-${books.itemId}` })),
    )
    await inTransaction(db, async (trx) => {
      for (const itemId of others) await setReorderPoint(trx, books, 2, { itemId })
    })
    const mails = await db('outbox').where('crib_id', books.cribId)
    expect(mails).toHaveLength(1)
    const told = await db('alerts').where({ opened_event: mails[0].event_id, crib_id: books.cribId })
    expect(told.map((alert) => alert.item_id).sort()).toEqual([...others].sort())
  })
})

describe('at once', () => {
  test('twenty takers open one alert', async () => {
    await setReorderPoint(db, books, 4)
    await Promise.all(Array.from({ length: 10 }, () => issue(1)))
    expect(await alertsOf(db, books)).toHaveLength(1)
    expect(await recipientsOf(db, books.cribId)).toHaveLength(1)
  })

  test('a movement and a changed reorder point see each other, whichever comes first', async () => {
    for (let round = 0; round < 15; round += 1) {
      const own = await createBooks(db)
      await receive(db, own, 10)
      await setReorderPoint(db, own, 2)
      await Promise.all([
        post(db, own, { kind: 'issue', quantity: 4, from: own.binId, to: own.personId }),
        setReorderPoint(db, own, 7),
      ])
      expect((await alertsOf(db, own)).filter((alert) => alert.isOpen)).toHaveLength(1)
    }
  })

  test('movements and reorder points of many items end with exactly what is low', async () => {
    const items = await Promise.all(
      Array.from({ length: 6 }, (_, index) => createItem(db, { code: `many-${index}-${books.itemId}` })),
    )
    for (const itemId of items) {
      await post(db, books, {
        kind: 'receipt',
        itemId,
        quantity: 20,
        from: books.supplierId,
        to: books.binId,
      })
    }
    const work = Array.from({ length: 40 }, (_, index) => {
      const itemId = items[index % items.length] ?? books.itemId
      return index % 3 === 0
        ? setReorderPoint(db, books, (index * 7) % 20, { itemId })
        : post(db, books, { kind: 'issue', itemId, quantity: 2, from: books.binId, to: books.personId })
    })
    await Promise.all(work)
    expect((await ledgerFaults(db)).faults).toEqual([])
  })
})

describe('twenty thousand at once', () => {
  test('they are settled by one statement, and agree with what lists call low', async () => {
    const prefix = `bulk-${books.itemId}`
    await db.raw(
      `insert into items (kind, code) select 'cutter', ? || '-' || n from generate_series(1, 20000) as n`,
      [prefix],
    )
    await db.raw(
      `insert into movements (kind, item_id, quantity, from_location_id, from_condition, to_location_id, to_condition,
        actor_id) select 'receipt', id, 1 + id % 7, ?, 'new', ?, 'new', ? from items where code like ?`,
      [books.supplierId, books.binId, books.userId, `${prefix}-%`],
    )
    const started = performance.now()
    await db.raw(
      `insert into reorder_points (item_id, crib_id, reorder_point, order_up_to)
        select id, ?, 3, 9 from items where code like ?`,
      [books.cribId, `${prefix}-%`],
    )
    expect(performance.now() - started).toBeLessThan(20_000)
    const [{ low, alerts }] = (
      await db.raw(
        `select count(*) filter (where 1 + items.id % 7 <= 3)::int as low, count(alerts.id)::int as alerts
          from items left join alerts on alerts.item_id = items.id and closed_at is null where code like ?`,
        [`${prefix}-%`],
      )
    ).rows
    expect(alerts).toBe(low)
    expect(low).toBeGreaterThan(8000)
    expect(await recipientsOf(db, books.cribId)).toHaveLength(1)
    await db('reorder_points').where('crib_id', books.cribId).update({ reorder_point: 0 })
    expect(await db('alerts').where('crib_id', books.cribId).whereNull('closed_at')).toEqual([])
  })

  test('lists and alerts agree over every item of the database', async () => {
    await setReorderPoint(db, books, 10)
    const ids = (await db('items').select('id').orderBy('id', 'desc').limit(400)).map((row) => row.id)
    const summaries = await readStockSummaries(db, ids, null)
    const open = new Set(
      (await db('alerts').whereNull('closed_at').select('item_id')).map((row) => row.item_id),
    )
    expect(ids.filter((id) => summaries.get(id)?.isLow)).toEqual(ids.filter((id) => open.has(id)))
    expect(open.size).toBeGreaterThan(0)
    expect((await ledgerFaults(db)).faults).toEqual([])
  })
})
