import type { Knex } from 'knex'

export interface SignInTry {
  email: string
  remoteAddress: string
}

/** Writes a try down before it is judged, as one that failed: those that come at the same moment see each other. */
export async function createSignInTry(db: Knex, attempt: SignInTry): Promise<string> {
  const [row] = await db('sign_in_attempts')
    .insert({ email: attempt.email, address: attempt.remoteAddress, succeeded: false })
    .returning('id')
  return row.id
}

/** Failed tries for this address or this account, whichever is more. */
export async function countFailedSignIns(db: Knex, of: SignInTry, seconds: number): Promise<number> {
  const row = await db('sign_in_attempts')
    .where('succeeded', false)
    .whereRaw("attempted_at > now() - ? * interval '1 second'", [seconds])
    .where((either) => either.where('email', of.email).orWhere('address', of.remoteAddress))
    .first(
      db.raw(
        'greatest(count(*) filter (where email = ?), count(*) filter (where address = ?))::int as tries',
        [of.email, of.remoteAddress],
      ),
    )
  return row?.tries ?? 0
}

export async function markSignInSucceeded(db: Knex, id: string): Promise<void> {
  await db('sign_in_attempts').where('id', id).update({ succeeded: true })
}

/** A try that was not even judged does not hold the door shut any longer. */
export async function removeSignInTry(db: Knex, id: string): Promise<void> {
  await db('sign_in_attempts').where('id', id).delete()
}
