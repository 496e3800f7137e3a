import { isDeepStrictEqual } from 'node:util'
import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import { type CatalogueTypes, geometryProblemsOf } from '@/schemas/catalogue'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { findLastChangerName } from '../../db/read-models/last-change'
import { createAuditEntry } from '../../db/stores/audit-store'
import { updateGeometry } from '../../db/stores/geometry-store'
import { lockItem, restoreItem, updateItem as writeItem } from '../../db/stores/item-store'
import { inTransaction } from '../../db/transaction'
import { explainingRefusals } from './explain-refusal'
import { readItem } from './get-item'
import { kindWords } from './kind-words'
import { auditedItem, visibleItem } from './visible-item'

type Fields = Record<string, unknown>

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
      refuseImpossible(kind, { ...before, ...change })
      const after = await applyChange(trx, kind, id, change)
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

/** Of what was sent, what differs from the row: sending a value again is no change. */
function changedFields(before: Fields, request: Fields): Fields {
  const { version: _, archivedAt, ...fields } = request
  const changed = Object.entries(fields).filter(
    ([field, value]) => value !== undefined && !isDeepStrictEqual(value, before[field]),
  )
  const isRestored = archivedAt === null && before.archivedAt !== null
  return { ...Object.fromEntries(changed), ...(isRestored ? { archivedAt } : {}) }
}

function refuseImpossible<Kind extends CatalogueKind>(kind: Kind, row: Fields): void {
  const problems = geometryProblemsOf[kind](row as CatalogueTypes[Kind]['create'])
  if (problems.length === 0) return
  throw new AppError('impossible', 'Some fields cannot be taken as they are.', {
    errors: problems.map(({ path, message }) => ({ path: path.join('.'), message })),
  })
}

async function applyChange<Kind extends CatalogueKind>(
  trx: Database,
  kind: Kind,
  id: string,
  change: Fields,
): Promise<CatalogueTypes[Kind]['row']> {
  if (change.archivedAt === null) await restoreItem(trx, id)
  await writeItem(trx, id, change)
  await updateGeometry(trx, kind, id, change)
  return readItem(trx, kind, id)
}
