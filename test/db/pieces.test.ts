import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest'
import { type Books, balanceAt, createBooks, createItem, type Posting, post, receive } from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase
let books: Books
let pieceId: string

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())
beforeEach(async () => {
  const made = await createBooks(database.db)
  const itemId = await createItem(database.db, { code: `TRACKED-${made.itemId}`, is_tracked_by_piece: true })
  books = { ...made, itemId }
  pieceId = await createPiece(`TAG-${itemId}`)
})

async function createPiece(tag: string, itemId = books.itemId): Promise<string> {
  const [row] = await database.db('pieces').insert({ item_id: itemId, tag }).returning('id')
  return row.id
}

const piece = () => database.db('pieces').where('id', pieceId)
const arrival = (): Posting => ({ kind: 'receipt', pieceId, from: books.supplierId, to: books.binId })

describe('a tagged piece', () => {
  test('it is where its last movement brought it, in that condition', async () => {
    expect(await piece().first('location_id', 'condition')).toEqual({ location_id: null, condition: null })
    await post(database.db, books, arrival())
    expect(await piece().first('location_id', 'condition')).toEqual({
      location_id: books.binId,
      condition: 'new',
    })
    const issue = { kind: 'issue', pieceId, from: books.binId, to: books.personId, toCondition: 'used' }
    await post(database.db, books, issue)
    expect(await piece().first('location_id', 'condition')).toEqual({
      location_id: books.personId,
      condition: 'used',
    })
  })

  test('it leaves only from where it is', async () => {
    await post(database.db, books, arrival())
    const other = await createPiece(`OTHER-${books.itemId}`)
    await post(database.db, books, { ...arrival(), pieceId: other, to: books.secondBinId })
    const fromTheOthersBin = { kind: 'issue', pieceId, from: books.secondBinId, to: books.personId }
    await expectRefusal(
      post(database.db, books, fromTheOthersBin),
      'LL015',
      'pieces_move_from_where_they_are',
    )
  })

  test('it leaves only in the condition it is in', async () => {
    await post(database.db, books, arrival())
    const other = await createPiece(`WORN-${books.itemId}`)
    await post(database.db, books, { ...arrival(), pieceId: other, fromCondition: 'worn' })
    const asWorn = { kind: 'issue', pieceId, from: books.binId, to: books.personId, fromCondition: 'worn' }
    await expectRefusal(post(database.db, books, asWorn), 'LL015')
  })

  test('it comes in from outside first', async () => {
    const other = await createPiece(`IN-${books.itemId}`)
    await post(database.db, books, { ...arrival(), pieceId: other })
    const fromNowhere = { kind: 'issue', pieceId, from: books.binId, to: books.personId }
    await expectRefusal(post(database.db, books, fromNowhere), 'LL015')
  })

  test('it may take several steps in one statement, in their order', async () => {
    await post(
      database.db,
      books,
      arrival(),
      { kind: 'issue', pieceId, from: books.binId, to: books.personId },
      { kind: 'return', pieceId, from: books.personId, to: books.secondBinId, toCondition: 'used' },
    )
    expect(await piece().first('location_id', 'condition')).toEqual({
      location_id: books.secondBinId,
      condition: 'used',
    })
    const jump = [
      { kind: 'issue', pieceId, from: books.secondBinId, to: books.personId, fromCondition: 'used' },
      { kind: 'return', pieceId, from: books.secondPersonId, to: books.binId, fromCondition: 'used' },
    ]
    const other = await createPiece(`HAND-${books.itemId}`)
    await post(
      database.db,
      books,
      { ...arrival(), pieceId: other },
      { kind: 'issue', pieceId: other, from: books.binId, to: books.secondPersonId, toCondition: 'used' },
    )
    await expectRefusal(post(database.db, books, ...jump), 'LL015')
  })

  test('it is one: a movement of two is refused', async () => {
    const two = { ...arrival(), quantity: 2 }
    await expectRefusal(post(database.db, books, two), '23514', 'movements_one_of_a_piece')
  })

  test('it goes back by a reversal', async () => {
    const [receipt] = await post(database.db, books, arrival())
    const reversal = {
      kind: 'reversal',
      pieceId,
      from: books.binId,
      to: books.supplierId,
      reversesId: receipt ?? '',
    }
    await post(database.db, books, reversal)
    expect(await piece().first('location_id')).toEqual({ location_id: books.supplierId })
    await post(database.db, books, arrival())
    expect(await balanceAt(database.db, books, books.binId)).toBe(1)
  })

  test('it is placed by movements alone and stays of its item', async () => {
    await post(database.db, books, arrival())
    await expectRefusal(piece().update({ location_id: books.secondBinId }), 'LL002')
    await expectRefusal(piece().update({ condition: 'worn' }), 'LL002')
    const other = await createItem(database.db, {
      code: `SIBLING-${books.itemId}`,
      is_tracked_by_piece: true,
    })
    await expectRefusal(piece().update({ item_id: other }), 'LL002')
    const placed = { item_id: books.itemId, tag: 'PLACED', location_id: books.binId, condition: 'new' }
    await expectRefusal(database.db('pieces').insert(placed), 'LL002')
  })

  test('it takes measurements, and its version rises', async () => {
    await piece().update({ cutting_diameter_mm: 5.98, corner_radius_mm: 0.5 })
    expect(await piece().first('version', 'cutting_diameter_mm')).toEqual({
      version: 2,
      cutting_diameter_mm: 5.98,
    })
    const round = piece().update({ corner_radius_mm: 3 })
    await expectRefusal(round, '23514', 'pieces_corner_radius_within_half_diameter')
  })

  test('its tag is its own, in capitals or not', async () => {
    await expectRefusal(createPiece(`tag-${books.itemId}`), '23505', 'pieces_tag_idx')
  })
})

describe('an item tracked piece by piece', () => {
  test('it is moved only by the piece, and no other item is', async () => {
    await expectRefusal(receive(database.db, books, 1), 'LL012')
    const plain = await createBooks(database.db)
    const tagged = await createPiece(`PLAIN-${books.itemId}`, plain.itemId)
    const posting = { kind: 'receipt', pieceId: tagged, from: plain.supplierId, to: plain.binId }
    await expectRefusal(post(database.db, plain, posting), 'LL012')
  })

  test('it takes no piece of another item', async () => {
    const other = await createItem(database.db, {
      code: `STRANGE-${books.itemId}`,
      is_tracked_by_piece: true,
    })
    const strange = await createPiece(`STRANGE-${books.itemId}`, other)
    await expectRefusal(
      post(database.db, books, { ...arrival(), pieceId: strange }),
      'LL012',
      'movements_piece_of_item',
    )
  })

  test('it stays so once it has moved', async () => {
    const item = () => database.db('items').where('id', books.itemId)
    await item().update({ is_tracked_by_piece: false })
    await item().update({ is_tracked_by_piece: true })
    await post(database.db, books, arrival())
    await expectRefusal(item().update({ is_tracked_by_piece: false }), 'LL012', 'items_keep_their_tracking')
  })
})
