import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'

export interface SavedViewRecord {
  id: string
  version: number
  ownerId: string
  ownerName: string
  kind: CatalogueKind
  name: string
  isShared: boolean
  query: string
}

export interface SavedViewFields {
  name?: string | undefined
  isShared?: boolean | undefined
  query?: string | undefined
}

/** A person's own views of a list and those shared by others, by name. */
export async function listSavedViews(
  db: Knex,
  ownerId: string,
  kind: CatalogueKind,
): Promise<SavedViewRecord[]> {
  const rows = await views(db)
    .where('saved_views.kind', kind)
    .where((mine) => mine.where('owner_id', ownerId).orWhere('is_shared', true))
    .orderByRaw('lower(saved_views.name), saved_views.id')
  return rows.map(fromRow)
}

export async function findSavedView(db: Knex, id: string): Promise<SavedViewRecord | null> {
  const row = await views(db).where('saved_views.id', id).first()
  return row ? fromRow(row) : null
}

/** Holds the view until the transaction ends, against other changes. */
export async function lockSavedView(trx: Knex, id: string): Promise<void> {
  await trx('saved_views').where({ id }).forUpdate().first('id')
}

export async function createSavedView(
  trx: Knex,
  view: { ownerId: string; kind: CatalogueKind; name: string; isShared: boolean; query: string },
): Promise<string> {
  const [row] = await trx('saved_views')
    .insert({ owner_id: view.ownerId, kind: view.kind, ...toColumns(view) })
    .returning('id')
  return row.id
}

export async function updateSavedView(trx: Knex, id: string, fields: SavedViewFields): Promise<void> {
  const columns = toColumns(fields)
  if (Object.keys(columns).length > 0) await trx('saved_views').where({ id }).update(columns)
}

export async function removeSavedView(trx: Knex, id: string): Promise<void> {
  await trx('saved_views').where({ id }).delete()
}

function views(db: Knex) {
  return db('saved_views')
    .join('users', 'users.id', 'saved_views.owner_id')
    .select('saved_views.*', 'users.name as owner_name')
}

function toColumns({ name, isShared, query }: SavedViewFields): Record<string, unknown> {
  const columns = { name, is_shared: isShared, query }
  return Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined))
}

function fromRow(row: Record<string, unknown>): SavedViewRecord {
  return {
    id: String(row.id),
    version: Number(row.version),
    ownerId: String(row.owner_id),
    ownerName: String(row.owner_name),
    kind: row.kind as CatalogueKind,
    name: String(row.name),
    isShared: row.is_shared === true,
    query: String(row.query),
  }
}
