import { AppError } from '@/lib/app-error'
import type { CreatePersonRequest, PersonLink } from '@/schemas/person'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { brokenConstraint } from '../../db/database-errors'
import { createAuditEntry } from '../../db/stores/audit-store'
import { createUser, findPerson } from '../../db/stores/user-store'
import { inTransaction } from '../../db/transaction'
import { makePersonLink } from './person-link'

/** Adds a person and answers the one-time address at which they set their password. */
export async function createPerson(actor: Actor, request: CreatePersonRequest): Promise<PersonLink> {
  try {
    return await inTransaction(db(), async (trx) => {
      const id = await createUser(trx, {
        ...request,
        homeCribId: request.homeCribId ?? null,
        passwordHash: null,
      })
      const person = await findPerson(trx, id)
      if (!person) throw new Error(`user ${id} vanished while it was made`)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: 'person-added',
        entity: 'user',
        entityId: id,
        after: person,
      })
      return { person, link: await makePersonLink(trx, person, actor.id) }
    })
  } catch (error) {
    if (brokenConstraint(error) !== 'users_email_idx') throw error
    const message = 'Someone with this e-mail address is here already.'
    throw new AppError('email-taken', message, { errors: [{ path: 'email', message }] })
  }
}
