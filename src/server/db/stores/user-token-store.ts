import type { Knex } from 'knex'

export type UserTokenPurpose = 'setup' | 'invitation' | 'password_reset'

export interface NewUserToken {
  purpose: UserTokenPurpose
  userId: string | null
  tokenHash: string
  createdBy: string | null
  hours: number
}

/** Makes a token and uses up those of the same purpose and person that were still open: one address holds at a time. */
export async function createUserToken(trx: Knex, token: NewUserToken): Promise<void> {
  await trx('user_tokens')
    .where({ purpose: token.purpose, user_id: token.userId })
    .whereNull('used_at')
    .update({ used_at: trx.fn.now() })
  await trx('user_tokens').insert({
    purpose: token.purpose,
    user_id: token.userId,
    token_hash: token.tokenHash,
    created_by: token.createdBy,
    expires_at: trx.raw("now() + ? * interval '1 hour'", [token.hours]),
  })
}

/** Uses a token up: the person it was for, or null where it is unknown, used or too old. Twice at once, one wins. */
export async function consumeUserToken(
  trx: Knex,
  tokenHash: string,
  purposes: readonly UserTokenPurpose[],
): Promise<{ userId: string | null } | null> {
  const [row] = await trx('user_tokens')
    .where('token_hash', tokenHash)
    .whereIn('purpose', purposes)
    .whereNull('used_at')
    .whereRaw('expires_at > now()')
    .update({ used_at: trx.fn.now() })
    .returning('user_id')
  return row ? { userId: row.user_id } : null
}

/** Whether an address still opens, without using it up. */
export async function isUserTokenOpen(
  db: Knex,
  tokenHash: string,
  purposes: readonly UserTokenPurpose[],
): Promise<boolean> {
  const row = await db('user_tokens')
    .where('token_hash', tokenHash)
    .whereIn('purpose', purposes)
    .whereNull('used_at')
    .whereRaw('expires_at > now()')
    .first('id')
  return row !== undefined
}
