import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { readDuplicateGroups } from '@/server/db/read-models/duplicate-groups'
import { createPerson } from '../support/books'
import { createCutter } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase
let userId: string

beforeAll(async () => {
  database = await createTestDatabase()
  userId = await createPerson(database.db, 'merges@leadline.example')
})
afterAll(() => database.drop())

const archive = (id: string) =>
  database.db('items').where({ id }).update({ archived_at: database.db.fn.now() })
const merge = (itemId: string, keptItemId: string) =>
  database.db('item_merges').insert({ item_id: itemId, kept_item_id: keptItemId, merged_by: userId })

describe('a merge on the books', () => {
  test('it is never of an item with itself, and once only', async () => {
    const [one, other] = [await createCutter(database.db), await createCutter(database.db)]
    await expectRefusal(merge(one, one), '23514', 'item_merges_into_another')
    await merge(one, other)
    await expectRefusal(merge(one, other), '23505', 'item_merges_pkey')
  })

  test('it is forgotten when the item is brought back, and only then', async () => {
    const [one, other] = [await createCutter(database.db), await createCutter(database.db)]
    await archive(one)
    await merge(one, other)
    await database.db('items').where({ id: one }).update({ description: 'was merged' })
    expect(await database.db('item_merges').where({ item_id: one })).toHaveLength(1)
    await database.db('items').where({ id: one }).update({ archived_at: null })
    expect(await database.db('item_merges').where({ item_id: one })).toEqual([])
  })
})

describe('duplicates', () => {
  test('they take a length that came by way of inches for the same, and leave out what is archived', async () => {
    const one = await createCutter(database.db, { overall_length_mm: 76.2 })
    const other = await createCutter(database.db, { overall_length_mm: 76.2000000001 })
    const archived = await createCutter(database.db, { overall_length_mm: 76.2 })
    await createCutter(database.db, { overall_length_mm: 76.2001 })
    await archive(archived)
    const { groups } = await readDuplicateGroups(database.db, 'cutter')
    const ids = groups.map((group) => group.map(({ id }) => id).sort())
    expect(ids).toContainEqual([one, other].sort())
  })
})
