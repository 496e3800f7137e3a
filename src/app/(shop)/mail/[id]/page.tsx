import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { PageHeading } from '@/components/layout/page-heading'
import { MailSheet } from '@/components/mail/mail-sheet'
import { ButtonLink } from '@/components/ui/button'
import { requireActor } from '@/server/auth/require-actor'
import { findCaughtMail } from '@/server/services/mail/find-caught-mail'

export const metadata: Metadata = { title: 'A mail' }

export default async function Page({ params }: { params: Promise<{ id: string }> }) {
  await requireActor('administer')
  const mail = await findCaughtMail((await params).id)
  if (!mail) notFound()
  return (
    <>
      <PageHeading title="A mail that was kept here" note={`To ${mail.recipients.join(', ')}`}>
        <ButtonLink href="/mail">All mail</ButtonLink>
      </PageHeading>
      <MailSheet subject={mail.subject} text={mail.text} html={mail.html} />
    </>
  )
}
