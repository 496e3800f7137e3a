import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { findLockedLocation, archiveLocation as writeArchived } from '../../db/stores/location-store'
import { inTransaction } from '../../db/transaction'
import { explainingLocationRefusals } from './explain-location-refusal'
import { readLocation } from './read-location'
import { refuseKeptLocation } from './refuse-kept-location'

/** Archives a location that holds nothing; done again, it changes nothing. */
export async function archiveLocation(actor: Actor, id: string): Promise<void> {
  await explainingLocationRefusals(undefined, () =>
    inTransaction(db(), async (trx) => {
      const location = refuseKeptLocation(await findLockedLocation(trx, id))
      if (location.isArchived) return
      const before = await readLocation(trx, id)
      await writeArchived(trx, id)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: 'location-archived',
        entity: 'location',
        entityId: id,
        before,
        after: await readLocation(trx, id),
      })
    }),
  )
}
