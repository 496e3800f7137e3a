import { AppError } from '@/lib/app-error'
import type { SetupRequest } from '@/schemas/person'
import { hashPassword } from '../../auth/password'
import { hashToken, makeSecretToken } from '../../auth/secret-token'
import { db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { createCrib } from '../../db/stores/crib-store'
import { completeSetup } from '../../db/stores/shop-settings-store'
import { countActiveAdmins, createUser } from '../../db/stores/user-store'
import { consumeUserToken, createUserToken, isUserTokenOpen } from '../../db/stores/user-token-store'
import { inTransaction } from '../../db/transaction'
import { env } from '../../env'

const hoursToSetUp = 72

const expired = () =>
  new AppError(
    'link-expired',
    'This address was used already or is too old. Start Leadline again for a new one.',
  )

/** Makes the shop's first admin, its name, unit and first crib, by the one-time address that the start printed. */
export async function setUpShop(request: SetupRequest): Promise<void> {
  const tokenHash = hashToken(request.token)
  if (!(await isUserTokenOpen(db(), tokenHash, ['setup']))) throw expired()
  if (!knownTimeZone(request.timeZone)) {
    const message = 'This time zone is not known; write it like Europe/Berlin or America/Chicago.'
    throw new AppError('impossible', message, { errors: [{ path: 'timeZone', message }] })
  }
  const passwordHash = await hashPassword(request.password)
  await inTransaction(db(), async (trx) => {
    if (!(await consumeUserToken(trx, tokenHash, ['setup']))) throw expired()
    if ((await countActiveAdmins(trx)) > 0)
      throw new AppError('setup-done', 'This shop has an admin already.')
    const cribId = await createCrib(trx, {
      code: request.cribCode,
      name: request.cribName,
      timeZone: request.timeZone,
    })
    const userId = await createUser(trx, {
      email: request.email,
      name: request.name,
      role: 'admin',
      homeCribId: cribId,
      passwordHash,
    })
    await completeSetup(trx, request)
    await createAuditEntry(trx, {
      actorId: userId,
      action: 'shop-set-up',
      entity: 'shop',
      entityId: null,
      after: { shopName: request.shopName, cribCode: request.cribCode },
    })
  })
}

export function isSetupOpen(token: string): Promise<boolean> {
  return isUserTokenOpen(db(), hashToken(token), ['setup'])
}

/** A fresh one-time address for making the first admin, or null where the shop has one. */
export async function firstAdminAddress(): Promise<string | null> {
  return inTransaction(db(), async (trx) => {
    if ((await countActiveAdmins(trx)) > 0) return null
    const { token, tokenHash } = makeSecretToken()
    await createUserToken(trx, {
      purpose: 'setup',
      userId: null,
      tokenHash,
      createdBy: null,
      hours: hoursToSetUp,
    })
    return `${env().publicUrl}/setup/${token}`
  })
}

function knownTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: name })
    return true
  } catch {
    return false
  }
}
