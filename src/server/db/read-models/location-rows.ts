import type { Knex } from 'knex'
import { outsideLocationKinds, type ShopLocationKind } from '@/core/stock/kinds'
import type { CribResponse, LocationResponse } from '@/schemas/location'
import type { PageQuery } from '@/schemas/paging'
import { enumFromDb, enumToDb } from '../enum-case'
import { type KeyPage, readKeyPage, type SortKey } from '../key-page'
import type { LocationsRow } from '../row-types'

export interface LocationQuery extends PageQuery {
  kind?: ShopLocationKind[] | undefined
  cribId?: string | undefined
  parentId?: string | undefined
  code?: string | undefined
  archived: 'no' | 'only' | 'all'
}

const sortColumns: Record<string, string> = {
  code: 'lower(locations.code)',
  name: 'lower(locations.name)',
  kind: 'locations.kind',
  cribCode: 'lower(cribs.code)',
}

const usualSort = [
  { field: 'cribCode', isDescending: false },
  { field: 'code', isDescending: false },
]

/** The ids of one block of the shop's locations; the far ends of the books are never among them. */
export function readLocationKeys(db: Knex, query: LocationQuery): Promise<KeyPage> {
  const matching = db('locations')
    .leftJoin('cribs', 'cribs.id', 'locations.crib_id')
    .whereNotIn('locations.kind', outsideLocationKinds.map(enumToDb))
  if (query.kind) matching.whereIn('locations.kind', query.kind.map(enumToDb))
  if (query.cribId) matching.where('locations.crib_id', query.cribId)
  if (query.parentId) matching.where('locations.parent_id', query.parentId)
  if (query.archived === 'no') matching.whereNull('locations.archived_at')
  if (query.archived === 'only') matching.whereNotNull('locations.archived_at')
  whereHolds(matching, ['locations.code'], query.code)
  whereHolds(matching, ['locations.code', 'locations.name'], query.q)
  const sort = (query.sort?.length ? query.sort : usualSort).map(
    (term): SortKey => ({
      sql: sortColumns[term.field] ?? 'locations.id',
      isNumber: false,
      isDescending: term.isDescending,
    }),
  )
  return readKeyPage(db, matching, { sql: 'locations.id' }, sort, query)
}

/** Every word stands in one of the columns. */
function whereHolds(matching: Knex.QueryBuilder, columns: readonly string[], text: string | undefined): void {
  for (const word of text?.split(/\s+/).filter(Boolean) ?? []) {
    matching.where((any) => {
      for (const column of columns) any.orWhereRaw(`strpos(lower(${column}), lower(?)) > 0`, [word])
    })
  }
}

export async function readLocationRows(db: Knex, ids: string[]): Promise<LocationResponse[]> {
  const rows = await db('locations')
    .leftJoin('cribs', 'cribs.id', 'locations.crib_id')
    .whereRaw('locations.id = any(?::bigint[])', [ids])
    .select('locations.*', { crib_code: 'cribs.code' })
  const byId = new Map(rows.map((row): [string, LocationResponse] => [row.id, locationFromRow(row)]))
  return ids.flatMap((id) => byId.get(id) ?? [])
}

function locationFromRow(row: LocationsRow & { crib_code: string | null }): LocationResponse {
  return {
    id: row.id,
    version: row.version,
    code: row.code,
    kind: enumFromDb(row.kind) as ShopLocationKind,
    cribId: row.crib_id,
    cribCode: row.crib_code,
    name: row.name,
    parentId: row.parent_id,
    archivedAt: row.archived_at?.toISOString() ?? null,
  }
}

/** Every crib with the location that is its root, by code. */
export async function readCribs(db: Knex): Promise<CribResponse[]> {
  const rows = await db('cribs')
    .join('locations', (join) => {
      join.on('locations.crib_id', 'cribs.id').andOnVal('locations.kind', 'crib')
    })
    .orderByRaw('lower(cribs.code)')
    .select('cribs.id', 'cribs.code', 'cribs.name', 'cribs.time_zone', {
      location_id: 'locations.id',
      members: db.raw(`(select count(*)::int from crib_members
        join users on users.id = crib_members.user_id and users.is_active
        where crib_members.crib_id = cribs.id)`),
    })
  return rows.map((row) => ({
    id: row.id,
    code: row.code,
    name: row.name,
    timeZone: row.time_zone,
    locationId: row.location_id,
    members: row.members,
  }))
}
