import type { Metadata } from 'next'
import { InvitationForm } from '@/components/setup/invitation-form'
import { ButtonLink } from '@/components/ui/button'
import { isInvitationOpen } from '@/server/services/people/accept-invitation'

export const metadata: Metadata = { title: 'Set your password', referrer: 'no-referrer' }

export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params
  if (await isInvitationOpen(token)) return <InvitationForm token={token} />
  return (
    <div className="flex flex-col items-start gap-4">
      <h1 className="text-2xl">This address no longer opens</h1>
      <p>It was used already or is too old. Ask an admin of your shop for a new one.</p>
      <ButtonLink href="/sign-in">Sign in</ButtonLink>
    </div>
  )
}
