import type { Knex } from 'knex'
import type { Books } from './books'

/** A reorder point of the item of these books, or of another one. */
export async function setReorderPoint(
  db: Knex,
  books: Books,
  reorderPoint: number,
  where: { itemId?: string; cribId?: string } = {},
): Promise<void> {
  await db('reorder_points')
    .insert({
      item_id: where.itemId ?? books.itemId,
      crib_id: where.cribId ?? books.cribId,
      reorder_point: reorderPoint,
      order_up_to: reorderPoint + 10,
    })
    .onConflict(['item_id', 'crib_id'])
    .merge(['reorder_point', 'order_up_to'])
}

export async function alertsOf(
  db: Knex,
  books: Books,
): Promise<{ id: string; isOpen: boolean; openedPosition: number; closedPosition: number | null }[]> {
  const rows = await db('alerts').where('item_id', books.itemId).orderBy('id')
  return rows.map((row) => ({
    id: row.id,
    isOpen: row.closed_at === null,
    openedPosition: row.opened_position,
    closedPosition: row.closed_position,
  }))
}

/** The addresses written to about a crib of these books, one for each mail. */
export async function recipientsOf(db: Knex, cribId: string): Promise<string[]> {
  const rows = await db('outbox').where('crib_id', cribId).orderBy(['recipient', 'id']).select('recipient')
  return rows.map((row) => row.recipient)
}

export async function addMember(db: Knex, cribId: string, userId: string): Promise<void> {
  await db('crib_members').insert({ crib_id: cribId, user_id: userId })
}
