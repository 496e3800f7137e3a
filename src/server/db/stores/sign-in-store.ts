import type { Knex } from 'knex'

/** Whose account, and from where. */
export interface SignInTry {
  email: string
  remoteAddress: string
}

/** Failed tries for this address or this account, whichever is more. */
export async function countFailedSignIns(db: Knex, of: SignInTry, seconds: number): Promise<number> {
  const { rows } = await db.raw<{ rows: { tries: number }[] }>(
    `SELECT greatest(
       (SELECT count(*) FROM sign_in_attempts
         WHERE email = :email AND NOT succeeded AND attempted_at > now() - :seconds * interval '1 second'),
       (SELECT count(*) FROM sign_in_attempts
         WHERE address = :remoteAddress AND NOT succeeded AND attempted_at > now() - :seconds * interval '1 second')
     )::int AS tries`,
    { ...of, seconds },
  )
  return rows[0]?.tries ?? 0
}

export async function createSignInAttempt(db: Knex, of: SignInTry, succeeded: boolean): Promise<void> {
  await db('sign_in_attempts').insert({ email: of.email, address: of.remoteAddress, succeeded })
}
