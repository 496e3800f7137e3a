import type { Person } from '@/schemas/person'
import { makeSecretToken } from '../../auth/secret-token'
import type { Database } from '../../db/connection'
import { createUserToken } from '../../db/stores/user-token-store'
import { env } from '../../env'

const hoursToAccept = 7 * 24

/** A one-time address at which this person sets a password; an earlier one stops working. */
export async function makePersonLink(trx: Database, person: Person, actorId: string): Promise<string> {
  const { token, tokenHash } = makeSecretToken()
  await createUserToken(trx, {
    purpose: person.hasPassword ? 'password_reset' : 'invitation',
    userId: person.id,
    tokenHash,
    createdBy: actorId,
    hours: hoursToAccept,
  })
  return `${env().publicUrl}/invitation/${token}`
}
