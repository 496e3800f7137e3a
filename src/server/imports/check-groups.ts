import type { Knex } from 'knex'
import type { StagedRow } from '../db/stores/import-row-store'
import { checkItems } from './check-records'
import { checkReorderPoints } from './check-reorder-points'
import { checkStock } from './check-stock'
import type { ImportRow, RowReader } from './row-reader'

/** Holds what was read against the database as `db` sees it; each group is one item. */
export function checkGroups(
  db: Knex,
  groups: readonly (readonly ImportRow[])[],
  reader: RowReader,
): Promise<StagedRow[]> {
  const { kind } = reader.settings
  if (kind === 'stock') return checkStock(db, groups.flat(), reader)
  if (kind === 'reorderPoints') return checkReorderPoints(db, groups.flat(), reader)
  return checkItems(db, kind, groups, reader)
}
