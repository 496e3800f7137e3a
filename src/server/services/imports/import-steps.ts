import type { ImportKind } from '@/schemas/import-fields'
import type { Database } from '../../db/connection'
import {
  applyItems,
  applyOpeningStock,
  applyReorderPoints,
  listStaleLines,
  listStaleReorderPointLines,
  listStaleStockLines,
  lockCatalogue,
  lockStagedItems,
} from '../../db/stores/import-apply-store'
import type { ImportRecord } from '../../db/stores/import-store'
import { lockReorderPoints } from '../../db/stores/reorder-point-store'
import { itemKinds } from '../../imports/check-records'

/** What a commit does that differs from kind to kind. */
export interface ImportSteps {
  /** Keeps what the rows were held against as it is until the transaction ends. */
  lock: (trx: Database, importId: string) => Promise<void>
  /** The lines whose verdict is no longer certain. */
  listStale: (trx: Database, importId: string) => Promise<number[]>
  apply: (trx: Database, found: ImportRecord) => Promise<void>
}

const stock: ImportSteps = {
  lock: lockStagedItems,
  listStale: listStaleStockLines,
  apply: (trx, { id, createdBy }) =>
    applyOpeningStock(trx, id, { actorId: createdBy, note: `Opening stock, import ${id}` }),
}

const reorderPoints: ImportSteps = {
  lock: lockReorderPoints,
  listStale: listStaleReorderPointLines,
  apply: (trx, { id }) => applyReorderPoints(trx, id),
}

function items(kind: keyof typeof itemKinds): ImportSteps {
  return {
    lock: lockCatalogue,
    listStale: listStaleLines,
    apply: (trx, { id }) => applyItems(trx, id, itemKinds[kind]),
  }
}

export const importSteps: Readonly<Record<ImportKind, ImportSteps>> = {
  cutters: items('cutters'),
  holders: items('holders'),
  collets: items('collets'),
  extensions: items('extensions'),
  stock,
  reorderPoints,
}
