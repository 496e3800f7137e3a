import { db } from '../../db/connection'
import type { MailRow } from '../../db/read-models/mail-rows'
import { readMails } from '../../db/read-models/mail-rows'
import { env } from '../../env'

/** The mail of the shop, and whether it goes anywhere. */
export async function listMails(): Promise<{ rows: MailRow[]; total: number; hasServer: boolean }> {
  return { ...(await readMails(db())), hasServer: env().SMTP_URL !== undefined }
}
