import type { Database } from '../../db/connection'
import { db } from '../../db/connection'
import { readAlertsOfEvent } from '../../db/read-models/alert-rows'
import type { OutboxRow } from '../../db/row-types'
import { findDueMail, markMailSent, postponeMail } from '../../db/stores/outbox-store'
import { lowStockMail } from '../../emails/low-stock-mail'
import type { MailContent } from '../../emails/mail-content'
import { MailNotSent, type MailSender } from '../../emails/mail-sender'
import { log } from '../../log'
import { lowStockOf } from './low-stock-of'
import { retryDelaySeconds } from './retry-delay'

/** Sends what is due, one after another, until nothing is or the server cannot be reached. */
export async function sendDueMail(sender: MailSender): Promise<void> {
  while ((await sendNextMail(sender)) === 'goOn');
}

/**
 * The mail stays locked while it is on the wire, so that no two workers send it. It goes twice only where the connection
 * or this process dies between the last byte and the note that it went, and then with the same Message-ID.
 */
async function sendNextMail(sender: MailSender): Promise<'goOn' | 'rest'> {
  let due: OutboxRow | null = null
  try {
    return await db().transaction(async (trx) => {
      due = await findDueMail(trx)
      if (!due) return 'rest'
      await sender.send({
        ...(await contentOf(trx, due)),
        to: due.recipient,
        messageId: due.message_id,
        date: due.created_at,
      })
      await markMailSent(trx, due.id)
      return 'goOn'
    })
  } catch (error) {
    if (!due) throw error
    return afterFailure(due, error)
  }
}

async function afterFailure(due: OutboxRow, error: unknown): Promise<'goOn' | 'rest'> {
  const fault = error instanceof MailNotSent ? error.fault : 'later'
  const reason = error instanceof Error ? error.message : String(error)
  const delaySeconds = retryDelaySeconds(fault, due.attempts + 1)
  log.warn({ mailId: due.id, attempt: due.attempts + 1, fault, reason, delaySeconds }, 'mail not sent')
  await postponeMail(db(), due.id, { reason, delaySeconds })
  return fault === 'unreachable' ? 'rest' : 'goOn'
}

async function contentOf(trx: Database, mail: OutboxRow): Promise<MailContent> {
  const alerts = await readAlertsOfEvent(trx, mail.event_id, mail.crib_id)
  return lowStockMail(await lowStockOf(trx, mail.crib_id, alerts))
}
