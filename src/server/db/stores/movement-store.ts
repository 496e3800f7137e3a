import type { Knex } from 'knex'
import type { Condition, MovementKind } from '@/core/stock/kinds'
import { enumFromDb, enumToDb } from '../enum-case'

export interface NewMovement {
  kind: MovementKind
  itemId: string
  pieceId: string | null
  quantity: number
  fromLocationId: string
  fromCondition: Condition
  toLocationId: string
  toCondition: Condition
  note: string
  actorId: string
  reversesId: string | null
}

/** Posts a movement; balances, levels and pieces follow by trigger, which refuses what cannot be. */
export async function createMovement(trx: Knex, movement: NewMovement): Promise<string> {
  const [row] = await trx('movements').insert(movementColumns(movement)).returning('id')
  return row.id
}

/** Posts several by one statement, which takes its locks in one order; all of them or none. */
export async function createMovements(trx: Knex, movements: readonly NewMovement[]): Promise<void> {
  if (movements.length > 0) await trx('movements').insert(movements.map(movementColumns))
}

function movementColumns(movement: NewMovement): Record<string, unknown> {
  return {
    kind: enumToDb(movement.kind),
    item_id: movement.itemId,
    piece_id: movement.pieceId,
    quantity: movement.quantity,
    from_location_id: movement.fromLocationId,
    from_condition: movement.fromCondition,
    to_location_id: movement.toLocationId,
    to_condition: movement.toCondition,
    note: movement.note,
    actor_id: movement.actorId,
    reverses_id: movement.reversesId,
  }
}

export interface MovementRecord extends NewMovement {
  id: string
  isReversed: boolean
}

export async function findMovement(db: Knex, id: string): Promise<MovementRecord | null> {
  const row = await db('movements')
    .leftJoin('movements as reversal', 'reversal.reverses_id', 'movements.id')
    .where('movements.id', id)
    .first('movements.*', { reversal_id: 'reversal.id' })
  if (!row) return null
  return {
    id: row.id,
    kind: enumFromDb(row.kind) as MovementKind,
    itemId: row.item_id,
    pieceId: row.piece_id,
    quantity: row.quantity,
    fromLocationId: row.from_location_id,
    fromCondition: row.from_condition,
    toLocationId: row.to_location_id,
    toCondition: row.to_condition,
    note: row.note,
    actorId: row.actor_id,
    reversesId: row.reverses_id,
    isReversed: row.reversal_id !== null,
  }
}

/** The item a piece is one of; null where there is no such piece. */
export async function findItemOfPiece(db: Knex, pieceId: string): Promise<string | null> {
  const row = await db('pieces').where('id', pieceId).first('item_id')
  return row?.item_id ?? null
}
