import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { FoundChange, FoundChangeRequest } from '@/schemas/found-change'
import { foundChangeDays } from '@/schemas/found-change-limits'
import type { Actor } from '../../auth/actor'
import type { Database } from '../../db/connection'
import { readFoundVersions } from '../../db/read-models/catalogue-keys'
import { readCatalogueRows } from '../../db/read-models/catalogue-rows'
import { createAuditEntries } from '../../db/stores/audit-store'
import {
  createFoundChange,
  noteFoundVersions,
  removeFoundChangesBefore,
  writeFieldOfMany,
} from '../../db/stores/found-change-store'
import { lockItems } from '../../db/stores/item-store'
import { onceInTransaction, type RepeatableCall } from '../idempotency'
import { getFoundChange } from './found-change-rules'
import { type Foreseen, foreseeChange, foundMark, refuseTooMany } from './found-rows'
import { kindWords } from './kind-words'
import { auditedItem, refuseHiddenCosts } from './visible-item'

type Row = CatalogueTypes[CatalogueKind]['row']

const rowsAPiece = 500

/**
 * Changes one field of everything a filter finds, exactly the rows of a rehearsal and exactly as they were then: all of
 * them or none. What stood there before is kept, so that it can be taken back.
 */
export async function changeFound(
  actor: Actor,
  kind: CatalogueKind,
  request: FoundChangeRequest,
  call: RepeatableCall,
): Promise<FoundChange> {
  refuseHiddenCosts(actor, request.filters)
  return onceInTransaction(actor, call, async (trx) => {
    const ids = await lockFound(trx, kind, request)
    const foreseen = await foreseeChange(trx, kind, ids, request.change)
    refuseImpossible(kind, foreseen, ids.length)
    const [[field = '', value] = []] = Object.entries(request.change)
    const changing = foreseen.changing.map((row) => row.id)
    await removeFoundChangesBefore(trx, foundChangeDays)
    const id = await createFoundChange(trx, { actorId: actor.id, kind, field, value, itemIds: changing })
    await writeFieldOfMany(trx, kind, changing, field, value)
    await noteFoundVersions(trx, id)
    await writeDownMany(trx, actor, kind, foreseen.changing)
    return getFoundChange(trx, actor, id)
  })
}

/** The rows, held against other changes, as long as they are those that were seen. */
async function lockFound(trx: Database, kind: CatalogueKind, request: FoundChangeRequest): Promise<string[]> {
  const first = await readFoundVersions(trx, kind, request.filters)
  refuseTooMany(kind, first)
  await lockItems(
    trx,
    kind,
    first.map(({ id }) => id),
  )
  // Once more: whoever held one of them until now may have changed it.
  const found = await readFoundVersions(trx, kind, request.filters)
  const { many } = kindWords[kind]
  if (found.length !== request.total) {
    const [now, then] = [found.length, request.total].map((figure) => figure.toLocaleString('en'))
    throw new AppError(
      'found-changed',
      `${now} ${many} are found now, not ${then}. Nothing was changed; look again first.`,
    )
  }
  if (foundMark(found) !== request.mark) {
    throw new AppError(
      'found-changed',
      `Someone changed some of these ${many} meanwhile. Nothing was changed; look again first.`,
    )
  }
  return found.map(({ id }) => id)
}

function refuseImpossible(kind: CatalogueKind, foreseen: Foreseen, total: number): void {
  if (foreseen.refusedCount === 0) return
  const [refused, all] = [foreseen.refusedCount, total].map((figure) => figure.toLocaleString('en'))
  throw new AppError(
    'impossible',
    `${refused} of ${all} ${kindWords[kind].many} cannot be changed so; nothing was changed.`,
    { errors: foreseen.refused.map(({ code, path, message }) => ({ path: `${code}.${path}`, message })) },
  )
}

/** One entry a row, as if each had been changed by itself. */
export async function writeDownMany(
  trx: Database,
  actor: Actor,
  kind: CatalogueKind,
  before: readonly Row[],
): Promise<void> {
  for (let done = 0; done < before.length; done += rowsAPiece) {
    const piece = before.slice(done, done + rowsAPiece)
    const rows = await readCatalogueRows(
      trx,
      kind,
      piece.map(({ id }) => id),
    )
    const after = new Map(rows.map((row) => [row.id, row]))
    await createAuditEntries(
      trx,
      piece.map((row) => ({
        actorId: actor.id,
        action: `${kind}-changed`,
        entity: 'item',
        entityId: row.id,
        before: auditedItem(row),
        after: auditedItem(after.get(row.id) ?? row),
      })),
    )
  }
}
