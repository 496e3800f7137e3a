import type { Knex } from 'knex'

export interface AuditEntry {
  /** Null for what the program itself did. */
  actorId: string | null
  /** What was done, as a fact: `cutter-changed`, `import-committed`. */
  action: string
  entity: string
  entityId: string | null
  before?: unknown
  after?: unknown
}

/** Writes down who changed what, in the transaction of the change itself. */
export function createAuditEntry(trx: Knex, entry: AuditEntry): Promise<void> {
  return createAuditEntries(trx, [entry])
}

/** Many at once, for what changes many. */
export async function createAuditEntries(trx: Knex, entries: readonly AuditEntry[]): Promise<void> {
  if (entries.length === 0) return
  await trx('audit_entries').insert(
    entries.map((entry) => ({
      actor_id: entry.actorId,
      action: entry.action,
      entity: entry.entity,
      entity_id: entry.entityId,
      before: entry.before === undefined ? null : JSON.stringify(entry.before),
      after: entry.after === undefined ? null : JSON.stringify(entry.after),
    })),
  )
}
