import { idSchema } from '@/schemas/fields'
import { db } from '../../db/connection'
import { findCaughtMail as readCaughtMail } from '../../db/read-models/mail-rows'
import { readMail } from '../../emails/read-mail'

export interface CaughtMailToRead {
  recipients: string[]
  caughtAt: string
  subject: string
  text: string
  html: string | null
}

/** A mail that the catcher kept, as its reader would see it; null where there is none. */
export async function findCaughtMail(id: string): Promise<CaughtMailToRead | null> {
  const caught = idSchema.safeParse(id).success ? await readCaughtMail(db(), id) : null
  if (!caught) return null
  const { subject, text, html } = await readMail(caught.source)
  return { recipients: caught.recipients, caughtAt: caught.caughtAt, subject, text, html }
}
