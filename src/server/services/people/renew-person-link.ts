import type { PersonLink } from '@/schemas/person'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { inTransaction } from '../../db/transaction'
import { makePersonLink } from './person-link'
import { getPerson } from './update-person'

/** A fresh one-time address for someone who lost the invitation or the password. */
export async function renewPersonLink(actor: Actor, id: string): Promise<PersonLink> {
  return inTransaction(db(), async (trx) => {
    const person = await getPerson(trx, id)
    const link = await makePersonLink(trx, person, actor.id)
    await createAuditEntry(trx, {
      actorId: actor.id,
      action: 'person-link-renewed',
      entity: 'user',
      entityId: id,
    })
    return { person, link }
  })
}
