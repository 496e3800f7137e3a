import type { Knex } from 'knex'
import type { OutboxRow } from '../row-types'

export interface MailRow {
  id: string
  recipient: string
  cribName: string
  createdAt: string
  sentAt: string | null
  attempts: number
  nextAttemptAt: string
  lastError: string | null
  /** Where the catcher has it, and so can show what it said. */
  caughtId: string | null
}

const mostShown = 300

type JoinedRow = OutboxRow & { crib_name: string; caught_id: string | null }

/** The outbox, what waits first and then the newest, and how many mails there are in all. */
export async function readMails(db: Knex): Promise<{ rows: MailRow[]; total: number }> {
  const [counted] = await db('outbox').select(db.raw('count(*)::int as total'))
  const rows: JoinedRow[] = await db('outbox')
    .join('cribs', 'cribs.id', 'outbox.crib_id')
    .select('outbox.*', {
      crib_name: 'cribs.name',
      caught_id: db.raw(
        '(select max(caught.id) from caught_mails as caught where caught.message_id = outbox.message_id)',
      ),
    })
    .orderByRaw('outbox.sent_at is not null, outbox.id desc')
    .limit(mostShown)
  return { rows: rows.map(mailRow), total: counted.total }
}

function mailRow(row: JoinedRow): MailRow {
  return {
    id: row.id,
    recipient: row.recipient,
    cribName: row.crib_name,
    createdAt: row.created_at.toISOString(),
    sentAt: row.sent_at?.toISOString() ?? null,
    attempts: row.attempts,
    nextAttemptAt: row.next_attempt_at.toISOString(),
    lastError: row.last_error,
    caughtId: row.caught_id,
  }
}

export async function findCaughtMail(
  db: Knex,
  id: string,
): Promise<{ recipients: string[]; source: Buffer; caughtAt: string } | null> {
  const row = await db('caught_mails').where('id', id).first()
  return row
    ? { recipients: row.recipients, source: row.source, caughtAt: row.caught_at.toISOString() }
    : null
}
