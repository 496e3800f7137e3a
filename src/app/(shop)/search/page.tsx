import type { Metadata } from 'next'
import { SearchPage } from '@/components/search/search-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Find a tool' }

export default async function Page() {
  await requireActor('see')
  return <SearchPage />
}
