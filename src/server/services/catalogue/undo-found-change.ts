import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { FoundChange } from '@/schemas/found-change'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { readCatalogueRows } from '../../db/read-models/catalogue-rows'
import {
  lockFoundChange,
  markFoundChangeUndone,
  readFoundChangeRows,
  restoreFoundRows,
} from '../../db/stores/found-change-store'
import { lockItems } from '../../db/stores/item-store'
import { inTransaction } from '../../db/transaction'
import { writeDownMany } from './change-found'
import { getOwnFoundChange, toldChange } from './found-change-rules'
import { kindWords } from './kind-words'

const namedCodes = 5
const rowsAPiece = 500

/**
 * Puts back into every row what stood there before. A row that someone changed since would lose that by it, so then
 * nothing is put back. The rows are as they once were, so no rule of geometry is asked again.
 */
export async function undoFoundChange(actor: Actor, id: string): Promise<FoundChange> {
  return inTransaction(db(), async (trx) => {
    await lockFoundChange(trx, id)
    const change = await getOwnFoundChange(trx, actor, id)
    if (change.isUndone) throw new AppError('already-reversed', 'This change was taken back already.')
    await lockItems(trx, change.kind, (await readFoundChangeRows(trx, id)).ids)
    const { ids, changedSince } = await readFoundChangeRows(trx, id)
    refuseChangedSince(change.kind, changedSince)
    const before = await readAll(trx, change.kind, ids)
    await restoreFoundRows(trx, change)
    await markFoundChangeUndone(trx, id)
    await writeDownMany(trx, actor, change.kind, before)
    return toldChange(change)
  })
}

async function readAll(trx: Database, kind: CatalogueKind, ids: readonly string[]) {
  const rows: CatalogueTypes[CatalogueKind]['row'][] = []
  for (let done = 0; done < ids.length; done += rowsAPiece)
    rows.push(...(await readCatalogueRows(trx, kind, ids.slice(done, done + rowsAPiece))))
  return rows
}

function refuseChangedSince(kind: CatalogueKind, codes: readonly string[]): void {
  if (codes.length === 0) return
  const named = codes.slice(0, namedCodes).join(', ')
  const rest =
    codes.length > namedCodes ? ` and ${(codes.length - namedCodes).toLocaleString('en')} more` : ''
  const words =
    codes.length === 1 ? `one of these ${kindWords[kind].many}` : `some of these ${kindWords[kind].many}`
  throw new AppError(
    'stale-version',
    `Nothing was taken back: ${words} changed again since (${named}${rest}).`,
  )
}
