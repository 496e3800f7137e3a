import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest'
import {
  type Books,
  createBooks,
  createPlace,
  createPlaceApart,
  locationOf,
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

const place = (kind: string, code: string, parentId?: string) =>
  createPlace(database.db, { kind, code, cribId: books.cribId, ...(parentId ? { parentId } : {}) })

describe('the tree of a crib', () => {
  test('it begins with a root that carries the name of the crib', async () => {
    const root = () => database.db('locations').where({ kind: 'crib', crib_id: books.cribId })
    const crib = () => database.db('cribs').where('id', books.cribId)
    expect(await root().select('name')).toEqual([await crib().first('name')])
    await crib().update({ code: `NEW-${books.cribId}`, name: 'New hall' })
    expect(await root().select('code', 'name')).toEqual([{ code: `NEW-${books.cribId}`, name: 'New hall' }])
    const second = { kind: 'crib', code: 'ROOT', name: 'Root', crib_id: books.cribId }
    await expectRefusal(database.db('locations').insert(second), '23505', 'locations_one_root_of_crib_idx')
  })

  test('it goes from crib to cabinet to drawer to bin, and may leave one out', async () => {
    const cabinet = await place('cabinet', 'C')
    const drawer = await place('drawer', 'D', cabinet)
    await place('bin', 'B1', drawer)
    await place('bin', 'B2', cabinet)
    await place('drawer', 'D2')
  })

  test('it refuses to be turned round, so that it has no rings', async () => {
    const cabinet = await place('cabinet', 'C')
    const drawer = await place('drawer', 'D', cabinet)
    const bin = await place('bin', 'B', drawer)
    for (const [kind, parent] of [
      ['bin', bin],
      ['drawer', drawer],
      ['drawer', bin],
      ['cabinet', drawer],
    ] as const) {
      await expectRefusal(place(kind, 'X', parent), 'LL003', 'locations_ranks_of_tree')
    }
    const turned = database.db('locations').where('id', cabinet).update({ parent_id: drawer })
    await expectRefusal(turned, 'LL003', 'locations_ranks_of_tree')
  })

  test('it stays within its crib', async () => {
    const elsewhere = await locationOf(database.db, { kind: 'crib', crib_id: books.secondCribId })
    await expectRefusal(place('bin', 'B', elsewhere), '23503', 'locations_parent_in_crib')
  })

  test('it has no bin outside a crib and no machine inside one', async () => {
    await expectRefusal(createPlaceApart(database.db, 'bin', 'LOOSE'), '23514')
    await expectRefusal(place('machine', 'M1'), '23514')
  })

  test('a code stands once in a crib, in capitals or not, and may stand in another', async () => {
    await place('bin', 'Z9')
    await expectRefusal(place('drawer', 'z9'), '23505', 'locations_crib_id_code_idx')
    await createPlace(database.db, { kind: 'bin', code: 'Z9', cribId: books.secondCribId })
    await createPlaceApart(database.db, 'machine', `M-${books.cribId}`)
    const twice = createPlaceApart(database.db, 'regrind', `m-${books.cribId}`)
    await expectRefusal(twice, '23505', 'locations_crib_id_code_idx')
  })
})

describe('a location', () => {
  const bin = () => database.db('locations').where('id', books.binId)

  test('it keeps its kind and its crib', async () => {
    await expectRefusal(bin().update({ kind: 'drawer' }), 'LL003', 'locations_keep_kind_and_crib')
    const parent = await locationOf(database.db, { kind: 'crib', crib_id: books.secondCribId })
    const moved = bin().update({ crib_id: books.secondCribId, parent_id: parent })
    await expectRefusal(moved, 'LL003', 'locations_keep_kind_and_crib')
  })

  test('it is archived only when it is empty', async () => {
    await receive(database.db, books, 1)
    await expectRefusal(bin().update({ archived_at: new Date() }), 'LL016', 'locations_archived_when_empty')
    await post(database.db, books, { kind: 'scrap', from: books.binId, to: books.scrapId })
    expect(await bin().update({ archived_at: new Date() })).toBe(1)
  })

  test('it is archived after what stands in it, and takes nothing new then', async () => {
    const cabinet = await place('cabinet', 'C')
    const drawer = await place('drawer', 'D', cabinet)
    const archive = (id: string) =>
      database.db('locations').where('id', id).update({ archived_at: new Date() })
    await expectRefusal(archive(cabinet), 'LL016')
    await archive(drawer)
    await archive(cabinet)
    await expectRefusal(place('bin', 'B', cabinet), 'LL003', 'locations_parent_in_use')
  })

  test('it raises its version when it is renamed', async () => {
    await bin().update({ name: 'Small ones' })
    expect(await bin().first('version')).toEqual({ version: 2 })
  })
})

describe('a person', () => {
  test('they have one place, which follows their name and address', async () => {
    const own = () => database.db('locations').where('user_id', books.userId)
    expect(await own().select('kind')).toEqual([{ kind: 'person' }])
    const address = `New.${books.userId}@leadline.example`
    await database.db('users').where('id', books.userId).update({ name: 'Ida Kern', email: address })
    expect(await own().select('code', 'name')).toEqual([{ code: address.toLowerCase(), name: 'Ida Kern' }])
  })

  test('no place is a second one of theirs, and no person place is nobody’s', async () => {
    const second = { kind: 'person', code: 'second', name: 'Second', user_id: books.userId }
    await expectRefusal(database.db('locations').insert(second), '23505', 'locations_user_id_key')
    await expectRefusal(
      createPlaceApart(database.db, 'person', 'nobody'),
      '23514',
      'locations_user_of_person',
    )
  })
})

describe('the far ends of the books', () => {
  test('there is one of each', async () => {
    const outside = await database.db('locations').where('is_outside', true).orderBy('kind').select('kind')
    expect(outside.map((row) => row.kind)).toEqual(['count_adjustment', 'scrap', 'supplier'])
    await expectRefusal(
      createPlaceApart(database.db, 'supplier', 'another'),
      '23505',
      'locations_one_outside_of_kind_idx',
    )
  })

  test('they are never archived', async () => {
    const supplier = database.db('locations').where('kind', 'supplier')
    await expectRefusal(supplier.update({ archived_at: new Date() }), 'LL016')
  })
})
