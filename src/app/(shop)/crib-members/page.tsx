import type { Metadata } from 'next'
import { CribMembersPage } from '@/components/crib-members/crib-members-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Who gets the mail' }

export default async function Page() {
  await requireActor('keepCrib')
  return <CribMembersPage />
}
