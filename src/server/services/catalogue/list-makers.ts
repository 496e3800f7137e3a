import type { CatalogueKind } from '@/core/stock/kinds'
import { db } from '../../db/connection'
import { listMakers as readMakers } from '../../db/stores/item-store'

/** Makers to choose from, of one kind of item or of all. */
export async function listMakers(kind: CatalogueKind | null): Promise<{ rows: string[] }> {
  return { rows: await readMakers(db(), kind) }
}
