import type { Knex } from 'knex'

/** Failed tries for this address or this account, whichever is more. */
export async function countFailedSignIns(
  db: Knex,
  of: { email: string; remoteAddress: string; seconds: number },
): Promise<number> {
  const row = await db('sign_in_attempts')
    .where('succeeded', false)
    .whereRaw("attempted_at > now() - ? * interval '1 second'", [of.seconds])
    .where((either) => either.where('email', of.email).orWhere('address', of.remoteAddress))
    .first(
      db.raw(
        'greatest(count(*) filter (where email = ?), count(*) filter (where address = ?))::int as tries',
        [of.email, of.remoteAddress],
      ),
    )
  return row?.tries ?? 0
}

export async function recordSignIn(
  db: Knex,
  attempt: { email: string; remoteAddress: string; succeeded: boolean },
): Promise<void> {
  await db('sign_in_attempts').insert({
    email: attempt.email,
    address: attempt.remoteAddress,
    succeeded: attempt.succeeded,
  })
}
