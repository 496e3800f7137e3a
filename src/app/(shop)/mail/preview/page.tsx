import type { Metadata } from 'next'
import { PageHeading } from '@/components/layout/page-heading'
import { MailSheet } from '@/components/mail/mail-sheet'
import { ButtonLink } from '@/components/ui/button'
import { requireActor } from '@/server/auth/require-actor'
import { previewMails } from '@/server/services/mail/preview-mail'

export const metadata: Metadata = { title: 'Mail templates' }

export default async function Page() {
  await requireActor('administer')
  const mails = await previewMails()
  return (
    <>
      <PageHeading title="Mail templates" note="As the crib’s members get them, with made-up figures.">
        <ButtonLink href="/mail">All mail</ButtonLink>
      </PageHeading>
      {mails.map(({ name, content }) => (
        <MailSheet key={name} {...content} />
      ))}
    </>
  )
}
