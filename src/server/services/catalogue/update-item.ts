import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { findLastChangerName } from '../../db/read-models/last-change'
import { createAuditEntry } from '../../db/stores/audit-store'
import { lockItem } from '../../db/stores/item-store'
import { inTransaction } from '../../db/transaction'
import { explainingRefusals } from './explain-refusal'
import { readItem } from './get-item'
import { changedFields, impossibleFields, writeChange } from './item-change'
import { kindWords } from './kind-words'
import { auditedItem, visibleItem } from './visible-item'

/**
 * Changes an item: absent leaves alone, null clears. The rules of geometry are asked of the row as it will be. A change
 * that changes nothing raises no version and is not written down.
 */
export async function updateItem<Kind extends CatalogueKind>(
  actor: Actor,
  kind: Kind,
  id: string,
  request: CatalogueTypes[Kind]['update'],
): Promise<CatalogueTypes[Kind]['row']> {
  return explainingRefusals(request.code, () =>
    inTransaction(db(), async (trx) => {
      await lockItem(trx, kind, id)
      const before = await readItem(trx, kind, id)
      await refuseStale(trx, actor, kind, before, request.version)
      const change = changedFields(before, request)
      const errors = impossibleFields(kind, { ...before, ...change })
      if (errors.length > 0) {
        throw new AppError('impossible', 'Some fields cannot be taken as they are.', { errors })
      }
      await writeChange(trx, kind, id, change)
      const after = await readItem(trx, kind, id)
      if (after.version !== before.version) {
        await createAuditEntry(trx, {
          actorId: actor.id,
          action: `${kind}-changed`,
          entity: 'item',
          entityId: id,
          before: auditedItem<Kind>(before),
          after: auditedItem<Kind>(after),
        })
      }
      return visibleItem<Kind>(actor, after)
    }),
  )
}

/** With the row as it is now and, where it is known, who made it so: the form shows both sides. */
async function refuseStale<Kind extends CatalogueKind>(
  trx: Database,
  actor: Actor,
  kind: Kind,
  before: CatalogueTypes[Kind]['row'],
  version: number,
): Promise<void> {
  if (before.version === version) return
  throw new AppError('stale-version', `Someone changed this ${kindWords[kind].one} meanwhile.`, {
    extra: {
      current: visibleItem<Kind>(actor, before),
      changedBy: await findLastChangerName(trx, before.id),
    },
  })
}
