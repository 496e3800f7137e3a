import type { Knex } from 'knex'
import type { Condition, LocationKind, MovementKind } from '@/core/stock/kinds'
import type { MovementResponse } from '@/schemas/movement'
import type { PageQuery } from '@/schemas/paging'
import { enumFromDb, enumToDb } from '../enum-case'
import { type KeyPage, readKeyPage } from '../key-page'
import type { MovementsRow } from '../row-types'

/** A movement as it is shown, before it is known who asks. */
export interface MovementRow extends Omit<MovementResponse, 'canReverse'> {
  /** It was recorded on the day it is now at the crib it touches, or at the home crib of who posted it. */
  isOfToday: boolean
  /** Half of a merge, which is not reversed by itself. */
  isOfMerge: boolean
}

/** One block of the ids of an item's movements, newest first. */
export function readMovementKeys(
  db: Knex,
  itemId: string,
  query: PageQuery & { kind?: MovementKind[] | undefined; q?: string | undefined },
): Promise<KeyPage> {
  const matching = db('movements').where('movements.item_id', itemId)
  if (query.kind) matching.whereIn('movements.kind', query.kind.map(enumToDb))
  if (query.q) {
    matching.join('users', 'users.id', 'movements.actor_id').where((either) => {
      either
        .whereRaw('strpos(lower(movements.note), lower(?)) > 0', [query.q ?? ''])
        .orWhereRaw('strpos(lower(users.name), lower(?)) > 0', [query.q ?? ''])
    })
  }
  return readKeyPage(db, matching, { sql: 'movements.id', isDescending: true }, [], query)
}

export async function readMovementRows(db: Knex, ids: string[]): Promise<MovementRow[]> {
  if (ids.length === 0) return []
  const { rows } = await db.raw(
    `select movement.*, items.code as item_code, users.name as actor_name, reversal.id as reversed_by_id,
        source.kind as source_kind, source.code as source_code, source.name as source_name,
        source.is_outside as source_is_outside, source_crib.code as source_crib_code,
        target.kind as target_kind, target.code as target_code, target.name as target_name,
        target.is_outside as target_is_outside, target_crib.code as target_crib_code,
        (movement.recorded_at at time zone zone.name)::date = (now() at time zone zone.name)::date as is_of_today
      from movements as movement
      join items on items.id = movement.item_id
      join users on users.id = movement.actor_id
      join locations as source on source.id = movement.from_location_id
      join locations as target on target.id = movement.to_location_id
      left join cribs as source_crib on source_crib.id = source.crib_id
      left join cribs as target_crib on target_crib.id = target.crib_id
      left join cribs as home on home.id = users.home_crib_id
      left join movements as reversal on reversal.reverses_id = movement.id
      cross join lateral (
        select coalesce(target_crib.time_zone, source_crib.time_zone, home.time_zone, 'UTC') as name
      ) as zone
      where movement.id = any(?::bigint[])
      order by movement.id desc`,
    [ids],
  )
  return rows.map(fromRow)
}

type End = 'source' | 'target'

type JoinedRow = MovementsRow & {
  item_code: string
  actor_name: string
  reversed_by_id: string | null
  is_of_today: boolean
} & Record<`${End}_kind` | `${End}_code` | `${End}_name`, string> &
  Record<`${End}_is_outside`, boolean> &
  Record<`${End}_crib_code`, string | null>

function fromRow(row: JoinedRow): MovementRow {
  return {
    id: row.id,
    kind: enumFromDb(row.kind) as MovementKind,
    itemId: row.item_id,
    itemCode: row.item_code,
    pieceId: row.piece_id,
    quantity: row.quantity,
    fromLocationId: row.source_is_outside ? null : row.from_location_id,
    from: endFromRow(row, 'source'),
    fromCondition: row.from_condition as Condition,
    toLocationId: row.target_is_outside ? null : row.to_location_id,
    to: endFromRow(row, 'target'),
    toCondition: row.to_condition as Condition,
    note: row.note,
    actorId: row.actor_id,
    actorName: row.actor_name,
    occurredAt: row.occurred_at.toISOString(),
    recordedAt: row.recorded_at.toISOString(),
    reversesId: row.reverses_id,
    reversedById: row.reversed_by_id,
    isOfToday: row.is_of_today,
    isOfMerge: row.merged_item_id !== null,
  }
}

function endFromRow(row: JoinedRow, end: End): MovementResponse['from'] {
  return {
    kind: enumFromDb(row[`${end}_kind`]) as LocationKind,
    code: row[`${end}_is_outside`] ? null : row[`${end}_code`],
    name: row[`${end}_name`],
    cribCode: row[`${end}_crib_code`],
  }
}
