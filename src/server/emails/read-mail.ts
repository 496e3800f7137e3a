import { simpleParser } from 'mailparser'

export interface ReadMail {
  messageId: string | null
  subject: string
  text: string
  html: string | null
}

/** What stands in a mail as it went over the wire. */
export async function readMail(source: Buffer): Promise<ReadMail> {
  const mail = await simpleParser(source, { skipImageLinks: true })
  return {
    messageId: mail.messageId ?? null,
    subject: mail.subject ?? '',
    text: mail.text ?? '',
    html: mail.html || null,
  }
}
