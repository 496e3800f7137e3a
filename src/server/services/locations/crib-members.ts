import { AppError } from '@/lib/app-error'
import type { CribMember } from '@/schemas/crib-member'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import {
  removeCribMember as deleteMember,
  createCribMember as insertMember,
  readCribMembers,
} from '../../db/stores/crib-member-store'
import { findCrib } from '../../db/stores/crib-store'
import { findPerson } from '../../db/stores/user-store'
import { inTransaction } from '../../db/transaction'

interface MemberOf {
  /** Of the crib. */
  id: string
  userId: string
}

/** Every active person, and whether they are a member of the crib. */
export async function listCribMembers(cribId: string): Promise<{ rows: CribMember[] }> {
  await refuseUnknownCrib(db(), cribId)
  return { rows: await readCribMembers(db(), cribId) }
}

/** From now on the person gets the crib's mail. */
export async function addCribMember(actor: Actor, { id, userId }: MemberOf): Promise<void> {
  await inTransaction(db(), async (trx) => {
    await refuseUnknownCrib(trx, id)
    const person = await findPerson(trx, userId)
    if (!person?.isActive) throw new AppError('not-found', 'There is no such active person.')
    if (await insertMember(trx, id, userId))
      await writeDown(trx, actor, 'crib-member-added', { id, userId }, person.name)
  })
}

/** From now on the person gets no mail of the crib. */
export async function removeCribMember(actor: Actor, { id, userId }: MemberOf): Promise<void> {
  await inTransaction(db(), async (trx) => {
    await refuseUnknownCrib(trx, id)
    const person = await findPerson(trx, userId)
    if (!person) throw new AppError('not-found', 'There is no such person.')
    if (await deleteMember(trx, id, userId))
      await writeDown(trx, actor, 'crib-member-removed', { id, userId }, person.name)
  })
}

async function refuseUnknownCrib(trx: Database, cribId: string): Promise<void> {
  if (!(await findCrib(trx, cribId))) throw new AppError('not-found', 'There is no such crib.')
}

function writeDown(
  trx: Database,
  actor: Actor,
  action: 'crib-member-added' | 'crib-member-removed',
  { id, userId }: MemberOf,
  name: string,
): Promise<void> {
  return createAuditEntry(trx, {
    actorId: actor.id,
    action,
    entity: 'crib',
    entityId: id,
    after: { userId, name },
  })
}
