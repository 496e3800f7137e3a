import type { Knex } from 'knex'
import { catalogueKinds } from '@/core/stock/kinds'
import type { ItemSize } from '@/schemas/item-size'
import { geometryFromRow, geometryTables } from '../geometry-tables'

/** What these items measure at a glance; one that carries no geometry has no entry. */
export async function readItemSizes(db: Knex, itemIds: readonly string[]): Promise<Map<string, ItemSize>> {
  const sizes = new Map<string, ItemSize>()
  for (const kind of catalogueKinds) {
    const table = geometryTables[kind]
    const rows: Record<string, unknown>[] = await db(table.name).whereRaw('item_id = any(?::bigint[])', [
      [...itemIds],
    ])
    for (const row of rows) {
      sizes.set(String(row.item_id), { kind, ...geometryFromRow(table, row) } as ItemSize)
    }
  }
  return sizes
}
