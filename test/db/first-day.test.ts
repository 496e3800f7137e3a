import { afterAll, beforeAll, expect, test } from 'vitest'
import { readFirstDayCounts, readIsFirstDayOpen } from '@/server/db/read-models/first-day-counts'
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

test('the first day is open until bins, cutters, holders and stock are there, people or not', async () => {
  const empty = await createTestDatabase()
  const { db } = empty
  try {
    expect(await readIsFirstDayOpen(db)).toBe(true)
    const books = await createBooks(db)
    const cutterId = await createCutter(db)
    expect(await readIsFirstDayOpen(db)).toBe(true)
    await receive(db, { ...books, itemId: cutterId }, 1)
    expect(await readIsFirstDayOpen(db)).toBe(true)
    await createHolder(db)
    expect(await readIsFirstDayOpen(db)).toBe(false)
  } finally {
    await empty.drop()
  }
})
