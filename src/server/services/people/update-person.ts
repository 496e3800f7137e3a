import { AppError } from '@/lib/app-error'
import type { Person, UpdatePersonRequest } from '@/schemas/person'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { endSessionsOfUser } from '../../db/stores/session-store'
import { countActiveAdmins, findPerson, updateUser } from '../../db/stores/user-store'
import { inTransaction } from '../../db/transaction'

/** Changes a person. Made inactive, all their sessions end at once; the last admin stays one. */
export async function updatePerson(actor: Actor, id: string, request: UpdatePersonRequest): Promise<Person> {
  return inTransaction(db(), async (trx) => {
    const before = await getPerson(trx, id)
    const { version, ...change } = request
    await refuseLosingLastAdmin(trx, before, request)
    if (!(await updateUser(trx, id, version, change))) {
      throw new AppError('stale-version', 'Someone changed this person meanwhile.', {
        extra: { current: before },
      })
    }
    if (request.isActive === false) await endSessionsOfUser(trx, id, null)
    const after = await getPerson(trx, id)
    await createAuditEntry(trx, {
      actorId: actor.id,
      action: 'person-changed',
      entity: 'user',
      entityId: id,
      before,
      after,
    })
    return after
  })
}

export async function getPerson(trx: Database, id: string): Promise<Person> {
  const person = await findPerson(trx, id)
  if (!person) throw new AppError('not-found', 'There is no such person.')
  return person
}

async function refuseLosingLastAdmin(
  trx: Database,
  before: Person,
  request: UpdatePersonRequest,
): Promise<void> {
  const staysAdmin = (request.role ?? before.role) === 'admin' && (request.isActive ?? before.isActive)
  if (before.role !== 'admin' || !before.isActive || staysAdmin) return
  if ((await countActiveAdmins(trx)) > 1) return
  const message = 'This is the last admin; make someone else an admin first.'
  throw new AppError('still-in-use', message, {
    errors: [{ path: request.isActive === false ? 'isActive' : 'role', message }],
  })
}
