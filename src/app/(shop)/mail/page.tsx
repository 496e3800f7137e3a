import type { Metadata } from 'next'
import { MailPage } from '@/components/mail/mail-page'
import { requireActor } from '@/server/auth/require-actor'
import { listMails } from '@/server/services/mail/list-mails'

export const metadata: Metadata = { title: 'Mail' }

export default async function Page() {
  await requireActor('administer')
  return <MailPage {...(await listMails())} />
}
