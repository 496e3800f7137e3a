import type { Metadata } from 'next'
import { SetupForm } from '@/components/setup/setup-form'
import { ButtonLink } from '@/components/ui/button'
import { isSetupOpen } from '@/server/services/people/set-up-shop'

export const metadata: Metadata = { title: 'Set up the shop', referrer: 'no-referrer' }

export default async function SetupPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params
  if (await isSetupOpen(token)) return <SetupForm token={token} />
  return (
    <div className="flex flex-col items-start gap-4">
      <h1 className="text-2xl">This address no longer opens</h1>
      <p>
        It was used already or is too old. Starting Leadline prints a new one while the shop has no admin.
      </p>
      <ButtonLink href="/sign-in">Sign in</ButtonLink>
    </div>
  )
}
