import type { Knex } from 'knex'

/** Two cribs with bins, two people, and one item on no shelf yet; enough to post any movement. */
export interface Books {
  userId: string
  personId: string
  secondPersonId: string
  cribId: string
  secondCribId: string
  binId: string
  secondBinId: string
  /** In the second crib. */
  farBinId: string
  supplierId: string
  scrapId: string
  countAdjustmentId: string
  itemId: string
}

export interface Posting {
  kind: string
  itemId?: string
  pieceId?: string
  quantity?: number
  from: string
  to: string
  fromCondition?: string
  toCondition?: string
  reversesId?: string
  /** Half of the merge of this item. */
  mergedItemId?: string
}

let serial = 0

export async function createBooks(db: Knex): Promise<Books> {
  serial += 1
  const userId = await createPerson(db, `one-${serial}@leadline.example`)
  const secondUserId = await createPerson(db, `two-${serial}@leadline.example`)
  const cribId = await createCrib(db, `CRIB-${serial}`)
  const secondCribId = await createCrib(db, `FAR-${serial}`)
  return {
    userId,
    personId: await locationOf(db, { user_id: userId }),
    secondPersonId: await locationOf(db, { user_id: secondUserId }),
    cribId,
    secondCribId,
    binId: await createPlace(db, { kind: 'bin', code: 'A1', cribId }),
    secondBinId: await createPlace(db, { kind: 'bin', code: 'A2', cribId }),
    farBinId: await createPlace(db, { kind: 'bin', code: 'A1', cribId: secondCribId }),
    supplierId: await locationOf(db, { kind: 'supplier' }),
    scrapId: await locationOf(db, { kind: 'scrap' }),
    countAdjustmentId: await locationOf(db, { kind: 'count_adjustment' }),
    itemId: await createItem(db, { code: `ITEM-${serial}` }),
  }
}

export async function createPerson(db: Knex, email: string): Promise<string> {
  const [row] = await db('users').insert({ email, name: 'Ada Kern', role: 'machinist' }).returning('id')
  return row.id
}

export async function createCrib(db: Knex, code: string): Promise<string> {
  const [row] = await db('cribs')
    .insert({ code, name: `Crib ${code}`, time_zone: 'Europe/Berlin' })
    .returning('id')
  return row.id
}

/** A cabinet, drawer or bin; straight under the crib's root unless it is told where. */
export async function createPlace(
  db: Knex,
  place: { kind: string; code: string; cribId: string; parentId?: string },
): Promise<string> {
  const parentId = place.parentId ?? (await locationOf(db, { kind: 'crib', crib_id: place.cribId }))
  const [row] = await db('locations')
    .insert({
      kind: place.kind,
      code: place.code,
      name: place.code,
      crib_id: place.cribId,
      parent_id: parentId,
    })
    .returning('id')
  return row.id
}

/** A place outside any crib's tree: a machine, a grinder, a transfer. */
export async function createPlaceApart(db: Knex, kind: string, code: string): Promise<string> {
  const [row] = await db('locations').insert({ kind, code, name: code }).returning('id')
  return row.id
}

export async function locationOf(db: Knex, where: Record<string, string>): Promise<string> {
  const row = await db('locations').where(where).first('id')
  return row.id
}

export async function createItem(db: Knex, item: Record<string, unknown>): Promise<string> {
  const [row] = await db('items')
    .insert({ kind: 'cutter', ...item })
    .returning('id')
  return row.id
}

export async function post(db: Knex, books: Books, ...postings: Posting[]): Promise<string[]> {
  const rows = postings.map((posting) => ({
    kind: posting.kind,
    item_id: posting.itemId ?? books.itemId,
    piece_id: posting.pieceId ?? null,
    quantity: posting.quantity ?? 1,
    from_location_id: posting.from,
    from_condition: posting.fromCondition ?? 'new',
    to_location_id: posting.to,
    to_condition: posting.toCondition ?? posting.fromCondition ?? 'new',
    reverses_id: posting.reversesId ?? null,
    merged_item_id: posting.mergedItemId ?? null,
    actor_id: books.userId,
  }))
  const answer = await db('movements').insert(rows).returning('id')
  return answer.map((row) => row.id)
}

export function receive(db: Knex, books: Books, quantity: number, to = books.binId): Promise<string[]> {
  return post(db, books, { kind: 'receipt', quantity, from: books.supplierId, to })
}

export async function balanceAt(
  db: Knex,
  books: Books,
  locationId: string,
  condition = 'new',
): Promise<number> {
  const row = await db('balances')
    .where({ item_id: books.itemId, location_id: locationId, condition })
    .first()
  return row?.quantity ?? 0
}

export async function onHand(db: Knex, books: Books, cribId = books.cribId): Promise<number> {
  const row = await db('stock_levels').where({ item_id: books.itemId, crib_id: cribId }).first()
  return row?.on_hand ?? 0
}
