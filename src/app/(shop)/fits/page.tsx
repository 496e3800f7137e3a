import type { Metadata } from 'next'
import { FitsPage } from '@/components/fits/fits-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'What fits' }

export default async function Page() {
  await requireActor('see')
  return <FitsPage />
}
