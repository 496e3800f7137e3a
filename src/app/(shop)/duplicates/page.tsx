import type { Metadata } from 'next'
import { DuplicatesPage } from '@/components/duplicates/duplicates-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Duplicates' }

export default async function Page() {
  await requireActor('keepCrib')
  return <DuplicatesPage />
}
