import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'

export interface ItemFields {
  code?: string | undefined
  maker?: string | null | undefined
  partNumber?: string | null | undefined
  description?: string | undefined
  unitCost?: number | null | undefined
}

/** The id of the new item. Its geometry follows in the same transaction. */
export async function createItem(trx: Knex, kind: CatalogueKind, fields: ItemFields): Promise<string> {
  const [row] = await trx('items')
    .insert({ kind, ...itemColumns(fields) })
    .returning('id')
  return row.id
}

/** What is absent is left alone; a row that stays as it was keeps its version. */
export async function updateItem(trx: Knex, id: string, fields: ItemFields): Promise<void> {
  const columns = itemColumns(fields)
  if (Object.keys(columns).length > 0) await trx('items').where('id', id).update(columns)
}

/** Holds the item until the transaction ends, against other changes and not against movements; false where there is none. */
export async function lockItem(trx: Knex, kind: CatalogueKind, id: string): Promise<boolean> {
  const row = await trx('items').where({ id, kind }).forNoKeyUpdate().first('id')
  return row !== undefined
}

/** Holds many items as `lockItem` holds one, always in the same order, so that two such calls never wait for each other. */
export async function lockItems(trx: Knex, kind: CatalogueKind, ids: readonly string[]): Promise<void> {
  await trx('items')
    .where('kind', kind)
    .whereRaw('id = any(?::bigint[])', [[...ids]])
    .orderBy('id')
    .forNoKeyUpdate()
    .select('id')
}

export async function archiveItem(trx: Knex, id: string): Promise<void> {
  await trx('items').where('id', id).whereNull('archived_at').update({ archived_at: trx.fn.now() })
}

export async function restoreItem(trx: Knex, id: string): Promise<void> {
  await trx('items').where('id', id).whereNotNull('archived_at').update({ archived_at: null })
}

export interface ItemInBrief {
  id: string
  code: string
  isTrackedByPiece: boolean
  isArchived: boolean
}

/** Of these, of any kind, those that are not archived. */
export async function findItemsInUse(db: Knex, ids: readonly string[]): Promise<Set<string>> {
  const rows: { id: string }[] = await db('items').whereIn('id', ids).whereNull('archived_at').select('id')
  return new Set(rows.map(({ id }) => id))
}

/** An item of any kind, with geometry or without. */
export async function findItem(db: Knex, id: string): Promise<ItemInBrief | null> {
  const row = await db('items').where('id', id).first('id', 'code', 'is_tracked_by_piece', 'archived_at')
  if (!row) return null
  return {
    id: row.id,
    code: row.code,
    isTrackedByPiece: row.is_tracked_by_piece,
    isArchived: row.archived_at !== null,
  }
}

/** Makers of the items in use, of one kind or of all. */
export async function listMakers(db: Knex, kind: CatalogueKind | null): Promise<string[]> {
  const query = db('items').whereNull('archived_at').whereNotNull('maker')
  if (kind) query.where('kind', kind)
  const rows = await query.distinct('maker').orderBy('maker')
  return rows.map((row) => row.maker)
}

function itemColumns(fields: ItemFields): Record<string, unknown> {
  const columns = {
    code: fields.code,
    maker: fields.maker,
    part_number: fields.partNumber,
    description: fields.description,
    unit_cost_minor: fields.unitCost,
  }
  return Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined))
}
