import type { Metadata } from 'next'
import { ColletsPage } from '@/components/collets/collets-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Collets' }

export default async function Page() {
  await requireActor('see')
  return <ColletsPage />
}
