import type { Knex } from 'knex'
import type { OutboxRow } from '../row-types'

/**
 * The next mail that is due, locked for this transaction: whoever else looks meanwhile takes another. Null where none is.
 */
export async function findDueMail(trx: Knex): Promise<OutboxRow | null> {
  const row: OutboxRow | undefined = await trx('outbox')
    .whereNull('sent_at')
    .where('next_attempt_at', '<=', trx.fn.now())
    .orderBy(['next_attempt_at', 'id'])
    .forUpdate()
    .skipLocked()
    .first()
  return row ?? null
}

export async function markMailSent(trx: Knex, id: string): Promise<void> {
  await trx('outbox')
    .where('id', id)
    .update({ sent_at: trx.raw('clock_timestamp()'), last_error: null })
    .increment('attempts', 1)
}

export async function postponeMail(
  db: Knex,
  id: string,
  { reason, delaySeconds }: { reason: string; delaySeconds: number },
): Promise<void> {
  await db('outbox')
    .where('id', id)
    .whereNull('sent_at')
    .update({
      last_error: reason.slice(0, 2000),
      next_attempt_at: db.raw(`clock_timestamp() + make_interval(secs => ?)`, [delaySeconds]),
    })
    .increment('attempts', 1)
}

export async function keepCaughtMail(
  db: Knex,
  mail: { messageId: string | null; recipients: string[]; source: Buffer },
): Promise<void> {
  await db('caught_mails').insert({
    message_id: mail.messageId,
    recipients: mail.recipients,
    source: mail.source,
  })
}
