import { afterAll, beforeAll, expect, test } from 'vitest'
import { readFirstDayCounts } from '@/server/db/read-models/first-day-counts'
import { type Books, createBooks, post, receive } from '../support/books'
import { createCollet, createCutter, createHolder } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'

let database: TestDatabase

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())

test('a new shop has nothing, and each thing counts once it is there', async () => {
  const { db } = database
  const nothing = await readFirstDayCounts(db)
  expect(nothing).toEqual({
    cribs: 0,
    bins: 0,
    cutters: 0,
    holders: 0,
    collets: 0,
    extensions: 0,
    piecesInBins: 0,
    people: 0,
    areSettingsSeen: false,
  })

  const books: Books = await createBooks(db)
  await createCutter(db)
  const archived = await createCutter(db)
  await db('items').where({ id: archived }).update({ archived_at: db.fn.now() })
  await createHolder(db)
  await createCollet(db)
  await receive(db, books, 5)
  await post(db, books, { kind: 'issue', quantity: 2, from: books.binId, to: books.personId })
  await db('audit_entries').insert({ action: 'settings-changed', entity: 'shop' })
  expect(await readFirstDayCounts(db)).toEqual({
    cribs: 2,
    bins: 3,
    // One of them is the books' own item.
    cutters: 2,
    holders: 1,
    collets: 1,
    extensions: 0,
    piecesInBins: 3,
    people: 2,
    areSettingsSeen: true,
  })
})
