import type { Knex } from 'knex'
import type { LocationKind } from '@/core/stock/kinds'
import { enumFromDb, enumToDb } from '../enum-case'
import type { LocationsRow } from '../row-types'

export interface LocationRecord {
  id: string
  version: number
  kind: LocationKind
  code: string
  name: string
  cribId: string | null
  parentId: string | null
  isArchived: boolean
}

const columns = ['id', 'version', 'kind', 'code', 'name', 'crib_id', 'parent_id', 'archived_at']

export async function findLocation(db: Knex, id: string): Promise<LocationRecord | null> {
  const row = await db('locations').where('id', id).first(columns)
  return row ? fromRow(row) : null
}

/** Held until the transaction ends, against other changes of the location. */
export async function findLockedLocation(trx: Knex, id: string): Promise<LocationRecord | null> {
  const row = await trx('locations').where('id', id).forNoKeyUpdate().first(columns)
  return row ? fromRow(row) : null
}

/** The one location where everything broken ends. */
export async function getScrapLocationId(db: Knex): Promise<string> {
  const row = await db('locations').where('kind', 'scrap').first('id')
  return row.id
}

export interface NewLocation {
  kind: LocationKind
  code: string
  name: string
  cribId: string | null
  parentId: string | null
}

export async function createLocation(trx: Knex, location: NewLocation): Promise<string> {
  const [row] = await trx('locations').insert(toColumns(location)).returning('id')
  return row.id
}

/** Many at once, in one statement. */
export async function createLocations(trx: Knex, locations: readonly NewLocation[]): Promise<void> {
  await trx('locations').insert(locations.map(toColumns))
}

/** Which of these codes a crib has already, in capitals or not, archived or in use. */
export async function listTakenCodes(db: Knex, cribId: string, codes: readonly string[]): Promise<string[]> {
  const rows = await db('locations')
    .where('crib_id', cribId)
    .whereRaw('lower(code) = any(?)', [codes.map((code) => code.toLowerCase())])
    .orderBy('id')
    .select('code')
  return rows.map((row) => row.code)
}

function toColumns(location: NewLocation) {
  return {
    kind: enumToDb(location.kind),
    code: location.code,
    name: location.name,
    crib_id: location.cribId,
    parent_id: location.parentId,
  }
}

/** What is absent is left alone. */
export async function updateLocation(
  trx: Knex,
  id: string,
  change: {
    code?: string | undefined
    name?: string | undefined
    parentId?: string | undefined
    isRestored?: boolean
  },
): Promise<void> {
  const { code, name, parentId, isRestored } = change
  const given = { code, name, parent_id: parentId, archived_at: isRestored ? null : undefined }
  const set = Object.fromEntries(Object.entries(given).filter(([, value]) => value !== undefined))
  if (Object.keys(set).length > 0) await trx('locations').where('id', id).update(set)
}

export async function archiveLocation(trx: Knex, id: string): Promise<void> {
  await trx('locations').where('id', id).whereNull('archived_at').update({ archived_at: trx.fn.now() })
}

function fromRow(row: LocationsRow): LocationRecord {
  return {
    id: row.id,
    version: row.version,
    kind: enumFromDb(row.kind) as LocationKind,
    code: row.code,
    name: row.name,
    cribId: row.crib_id,
    parentId: row.parent_id,
    isArchived: row.archived_at !== null,
  }
}
