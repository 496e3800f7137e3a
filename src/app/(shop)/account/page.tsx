import type { Metadata } from 'next'
import { AccountPage } from '@/components/account/account-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Your account' }

export default async function Page() {
  const { name, email, role } = await requireActor()
  return <AccountPage name={name} email={email} role={role} />
}
