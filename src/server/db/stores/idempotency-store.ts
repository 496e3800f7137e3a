import type { Knex } from 'knex'

export interface KeyedCall {
  actorId: string
  route: string
  key: string
}

/**
 * Claims a key for this call: true where nobody had it. A twin still under way is waited for: when it commits this
 * answers false, when it fails the key is free again.
 */
export async function claimKey(trx: Knex, call: KeyedCall, bodyHash: string): Promise<boolean> {
  const claimed = await trx('idempotency_keys')
    .insert({ actor_id: call.actorId, route: call.route, key: call.key, body_hash: bodyHash })
    .onConflict(['actor_id', 'route', 'key'])
    .ignore()
    .returning('key')
  return claimed.length > 0
}

export async function keepAnswer(trx: Knex, call: KeyedCall, status: number, answer: unknown): Promise<void> {
  await trx('idempotency_keys')
    .where({ actor_id: call.actorId, route: call.route, key: call.key })
    .update({ status, answer: JSON.stringify(answer) })
}

export async function findKeptAnswer(
  trx: Knex,
  call: KeyedCall,
): Promise<{ bodyHash: string; answer: unknown } | null> {
  const row = await trx('idempotency_keys')
    .where({ actor_id: call.actorId, route: call.route, key: call.key })
    .first('body_hash', 'answer')
  return row ? { bodyHash: row.body_hash, answer: row.answer } : null
}
