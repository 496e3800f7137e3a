import type { Knex } from 'knex'
import type { Role } from '@/core/policies/permissions'
import type { Actor } from '../../auth/actor'
import { enumFromDb } from '../enum-case'

const idleLimit = '7 days'
/** Seeing a session is noted at most this often, so that reading pages does not write on every request. */
const seenInterval = '5 minutes'

export async function createSession(
  db: Knex,
  session: { userId: string; tokenHash: string; userAgent: string | null; absoluteLimitSeconds: number },
): Promise<void> {
  await db('sessions').insert({
    user_id: session.userId,
    token_hash: session.tokenHash,
    user_agent: session.userAgent?.slice(0, 300) ?? null,
    expires_at: db.raw("now() + ? * interval '1 second'", [session.absoluteLimitSeconds]),
  })
}

/** The person behind a live session. */
export async function findSessionActor(db: Knex, tokenHash: string): Promise<Actor | null> {
  const row = await db('sessions')
    .join('users', 'users.id', 'sessions.user_id')
    .join('locations', 'locations.user_id', 'users.id')
    .where('sessions.token_hash', tokenHash)
    .whereNull('sessions.ended_at')
    .where('users.is_active', true)
    .whereRaw('sessions.expires_at > now()')
    .whereRaw(`sessions.last_seen_at > now() - interval '${idleLimit}'`)
    .first(
      'users.id',
      'users.name',
      'users.email',
      'users.role',
      'users.length_unit',
      'users.home_crib_id',
      { location_id: 'locations.id' },
      db.raw(`sessions.last_seen_at < now() - interval '${seenInterval}' as is_seen_long_ago`),
    )
  if (!row) return null
  if (row.is_seen_long_ago) {
    await db('sessions').where('token_hash', tokenHash).update({ last_seen_at: db.fn.now() })
  }
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    role: enumFromDb(row.role) as Role,
    locationId: row.location_id,
    lengthUnit: row.length_unit,
    homeCribId: row.home_crib_id,
  }
}

export async function endSession(db: Knex, tokenHash: string): Promise<void> {
  await db('sessions').where('token_hash', tokenHash).whereNull('ended_at').update({ ended_at: db.fn.now() })
}

/** Ends every session of a person, but for the one that is kept. */
export async function endSessionsOfUser(
  db: Knex,
  userId: string,
  keptTokenHash: string | null,
): Promise<void> {
  await db('sessions')
    .where('user_id', userId)
    .whereNull('ended_at')
    .modify((query) => {
      if (keptTokenHash) query.whereNot('token_hash', keptTokenHash)
    })
    .update({ ended_at: db.fn.now() })
}
