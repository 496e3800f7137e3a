import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { readCatalogueRows } from '../../db/read-models/catalogue-rows'
import { kindWords } from './kind-words'
import { visibleItem } from './visible-item'

/** One item with its geometry and stock, archived or not. */
export async function getItem<Kind extends CatalogueKind>(
  actor: Actor,
  kind: Kind,
  id: string,
  cribId: string | null = null,
): Promise<CatalogueTypes[Kind]['row']> {
  return visibleItem<Kind>(actor, await readItem(db(), kind, id, cribId))
}

/** The whole row, for services that change it. */
export async function readItem<Kind extends CatalogueKind>(
  database: Database,
  kind: Kind,
  id: string,
  cribId: string | null = null,
): Promise<CatalogueTypes[Kind]['row']> {
  const [row] = await readCatalogueRows(database, kind, [id], cribId)
  if (!row) throw new AppError('not-found', `There is no such ${kindWords[kind].one}.`)
  return row
}
