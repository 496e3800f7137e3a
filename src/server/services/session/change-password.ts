import { AppError } from '@/lib/app-error'
import type { ChangePasswordRequest } from '@/schemas/person'
import type { Actor } from '../../auth/actor'
import { hashPassword, isPasswordRight } from '../../auth/password'
import { db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { endSessionsOfUser } from '../../db/stores/session-store'
import { getPasswordHash, updateUserPassword } from '../../db/stores/user-store'
import { inTransaction } from '../../db/transaction'

/** Changes one's own password by the present one; every other session of this person ends. */
export async function changePassword(
  actor: Actor,
  request: ChangePasswordRequest,
  keptTokenHash: string | null,
): Promise<void> {
  const presentHash = await getPasswordHash(db(), actor.id)
  if (!(await isPasswordRight(request.currentPassword, presentHash))) {
    const message = 'This is not your present password.'
    throw new AppError('impossible', message, { errors: [{ path: 'currentPassword', message }] })
  }
  const passwordHash = await hashPassword(request.newPassword)
  await inTransaction(db(), async (trx) => {
    await updateUserPassword(trx, actor.id, passwordHash)
    await endSessionsOfUser(trx, actor.id, keptTokenHash)
    await createAuditEntry(trx, {
      actorId: actor.id,
      action: 'password-changed',
      entity: 'user',
      entityId: actor.id,
    })
  })
}
