import type { CatalogueKind } from '@/core/stock/kinds'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { createGeometry } from '../../db/stores/geometry-store'
import { createItem as insertItem } from '../../db/stores/item-store'
import { inTransaction } from '../../db/transaction'
import { explainingRefusals } from './explain-refusal'
import { readItem } from './get-item'
import { auditedItem, visibleItem } from './visible-item'

/** Adds an item to the catalogue. The request is taken to have passed its schema, rules of geometry included. */
export async function createItem<Kind extends CatalogueKind>(
  actor: Actor,
  kind: Kind,
  request: CatalogueTypes[Kind]['create'],
): Promise<CatalogueTypes[Kind]['row']> {
  const row = await explainingRefusals(request.code, () =>
    inTransaction(db(), async (trx) => {
      const id = await insertItem(trx, kind, request)
      await createGeometry(trx, kind, id, { ...request })
      const added = await readItem(trx, kind, id)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: `${kind}-added`,
        entity: 'item',
        entityId: id,
        after: auditedItem<Kind>(added),
      })
      return added
    }),
  )
  return visibleItem<Kind>(actor, row)
}
