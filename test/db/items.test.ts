import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { createBooks, createItem, post, receive } from '../support/books'
import { createCutter, createHolder } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())

async function versionOf(itemId: string): Promise<number> {
  return (await database.db('items').where('id', itemId).first('version')).version
}

describe('the code of an item', () => {
  test('it stands once, in capitals or not', async () => {
    await createItem(database.db, { code: 'EM-100' })
    await expectRefusal(
      createItem(database.db, { code: 'em-100', kind: 'holder' }),
      '23505',
      'items_code_idx',
    )
  })

  test('it is neither empty nor padded nor endless', async () => {
    for (const code of ['', ' EM-1', 'EM-1 ', 'x'.repeat(101)]) {
      await expectRefusal(createItem(database.db, { code }), '23514', 'items_code_check')
    }
  })

  test('one maker’s number may stand on two items until they are merged', async () => {
    await createItem(database.db, { code: 'TWIN-1', maker: 'Kestrel', part_number: '77' })
    await createItem(database.db, { code: 'TWIN-2', maker: 'KESTREL', part_number: '77' })
  })
})

describe('the version of an item', () => {
  test('it begins at one with its geometry', async () => {
    expect(await versionOf(await createCutter(database.db))).toBe(1)
  })

  test('it rises with the item and with its geometry', async () => {
    const itemId = await createCutter(database.db)
    await database.db('items').where('id', itemId).update({ description: 'long reach' })
    expect(await versionOf(itemId)).toBe(2)
    await database.db('cutters').where('item_id', itemId).update({ overall_length_mm: 61 })
    expect(await versionOf(itemId)).toBe(3)
  })

  test('it rises with a holder’s segments, added, changed and removed', async () => {
    const itemId = await createHolder(database.db)
    const segment = { item_id: itemId, position: 1, part: 'nut', length_mm: 20, nose_diameter_mm: 28 }
    await database.db('holder_segments').insert({ ...segment, spindle_diameter_mm: 28 })
    expect(await versionOf(itemId)).toBe(2)
    await database.db('holder_segments').where('item_id', itemId).update({ length_mm: 18 })
    expect(await versionOf(itemId)).toBe(3)
    await database.db('holder_segments').where('item_id', itemId).delete()
    expect(await versionOf(itemId)).toBe(4)
  })

  test('it stays where nothing changes', async () => {
    const itemId = await createCutter(database.db, { corner_radius_mm: null })
    await database
      .db('cutters')
      .where('item_id', itemId)
      .update({ overall_length_mm: 60, corner_radius_mm: null })
    await database.db('items').where('id', itemId).update({ description: '' })
    expect(await versionOf(itemId)).toBe(1)
  })

  test('a statement over many raises those it changes', async () => {
    const short = await createCutter(database.db, { overall_length_mm: 50 })
    const long = await createCutter(database.db, { overall_length_mm: 90 })
    await database.db('cutters').whereIn('item_id', [short, long]).update({ overall_length_mm: 90 })
    expect([await versionOf(short), await versionOf(long)]).toEqual([2, 1])
  })

  test('it cannot be set by hand', async () => {
    const itemId = await createCutter(database.db)
    await database.db('items').where('id', itemId).update({ version: 40 })
    expect(await versionOf(itemId)).toBe(2)
  })
})

describe('archiving an item', () => {
  const archive = (itemId: string) =>
    database.db('items').where('id', itemId).update({ archived_at: new Date() })

  test('it is refused while any of it is left, also in someone’s hands', async () => {
    const books = await createBooks(database.db)
    await receive(database.db, books, 1)
    await expectRefusal(archive(books.itemId), 'LL016', 'items_archived_without_stock')
    await post(database.db, books, { kind: 'issue', from: books.binId, to: books.personId })
    await expectRefusal(archive(books.itemId), 'LL016', 'items_archived_without_stock')
    await post(database.db, books, { kind: 'scrap', from: books.personId, to: books.scrapId })
    expect(await archive(books.itemId)).toBe(1)
  })
})
