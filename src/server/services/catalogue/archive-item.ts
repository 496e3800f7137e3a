import type { CatalogueKind } from '@/core/stock/kinds'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { lockItem, archiveItem as writeArchived } from '../../db/stores/item-store'
import { inTransaction } from '../../db/transaction'
import { explainingRefusals } from './explain-refusal'
import { readItem } from './get-item'
import { auditedItem } from './visible-item'

/** Archives an item that is nowhere in the shop any more; done again, it changes nothing. */
export async function archiveItem(actor: Actor, kind: CatalogueKind, id: string): Promise<void> {
  await explainingRefusals(undefined, () =>
    inTransaction(db(), async (trx) => {
      await lockItem(trx, kind, id)
      const before = await readItem(trx, kind, id)
      if (before.archivedAt !== null) return
      await writeArchived(trx, id)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: `${kind}-archived`,
        entity: 'item',
        entityId: id,
        before: auditedItem(before),
        after: auditedItem(await readItem(trx, kind, id)),
      })
    }),
  )
}
