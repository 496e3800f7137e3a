import { AppError } from '@/lib/app-error'
import type { AcceptInvitationRequest } from '@/schemas/person'
import { hashPassword } from '../../auth/password'
import { hashToken } from '../../auth/secret-token'
import { db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { endSessionsOfUser } from '../../db/stores/session-store'
import { updateUserPassword } from '../../db/stores/user-store'
import { consumeUserToken, isUserTokenOpen, type UserTokenPurpose } from '../../db/stores/user-token-store'
import { inTransaction } from '../../db/transaction'

const purposes: readonly UserTokenPurpose[] = ['invitation', 'password_reset']

const expired = () =>
  new AppError('link-expired', 'This address was used already or is too old. Ask an admin for a new one.')

/** Sets the password of the person a one-time address was made for; whoever was signed in as them no longer is. */
export async function acceptInvitation(request: AcceptInvitationRequest): Promise<void> {
  const tokenHash = hashToken(request.token)
  // Hashing takes half a second: an address that does not open is refused before it.
  if (!(await isUserTokenOpen(db(), tokenHash, purposes))) throw expired()
  const passwordHash = await hashPassword(request.password)
  await inTransaction(db(), async (trx) => {
    const used = await consumeUserToken(trx, tokenHash, purposes)
    if (!used?.userId) throw expired()
    await updateUserPassword(trx, used.userId, passwordHash)
    await endSessionsOfUser(trx, used.userId, null)
    await createAuditEntry(trx, {
      actorId: used.userId,
      action: 'password-set',
      entity: 'user',
      entityId: used.userId,
    })
  })
}

/** Whether a one-time address still opens. */
export function isInvitationOpen(token: string): Promise<boolean> {
  return isUserTokenOpen(db(), hashToken(token), purposes)
}
