import type { Metadata } from 'next'
import { HoldersPage } from '@/components/holders/holders-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Holders' }

export default async function Page() {
  await requireActor('see')
  return <HoldersPage />
}
