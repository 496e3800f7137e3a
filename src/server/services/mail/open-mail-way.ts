import { db } from '../../db/connection'
import { keepCaughtMail } from '../../db/stores/outbox-store'
import { startMailCatcher } from '../../emails/mail-catcher'
import { createMailSender, type MailSender } from '../../emails/mail-sender'
import { readMail } from '../../emails/read-mail'
import { env } from '../../env'

/** The way mail goes: to the shop's server, or to the catcher of this process where the shop has none. */
export async function openMailWay(): Promise<MailSender> {
  const { SMTP_URL: shopServer, mailFrom } = env()
  if (shopServer) return createMailSender(shopServer, mailFrom)
  const catcher = await startMailCatcher(async ({ recipients, source }) => {
    const { messageId } = await readMail(source)
    await keepCaughtMail(db(), { messageId, recipients, source })
  })
  return createMailSender(catcher.smtpUrl, mailFrom)
}
