import type { Knex } from 'knex'

/**
 * Who made an item as it is now; null where that cannot be said, as after an import, which is written down once for all
 * its rows. The row and its audit entry carry the moment of one transaction, so an older entry is never taken for it.
 */
export async function findLastChangerName(database: Knex, itemId: string): Promise<string | null> {
  const row = await database('audit_entries')
    .join('items', 'items.updated_at', 'audit_entries.recorded_at')
    .join('users', 'users.id', 'audit_entries.actor_id')
    .where({ 'items.id': itemId, 'audit_entries.entity': 'item', 'audit_entries.entity_id': itemId })
    .orderBy('audit_entries.id', 'desc')
    .first<{ name: string } | undefined>('users.name')
  return row?.name ?? null
}
