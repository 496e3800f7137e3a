import { db } from '../../db/connection'
import type { MailRow } from '../../db/read-models/mail-rows'
import { readMails } from '../../db/read-models/mail-rows'
import { hasMailServer } from './has-mail-server'

/** The mail of the shop, and whether it goes anywhere. */
export async function listMails(): Promise<{ rows: MailRow[]; total: number; hasServer: boolean }> {
  return { ...(await readMails(db())), hasServer: hasMailServer() }
}
