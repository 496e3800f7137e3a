import type { Metadata } from 'next'
import { NewImportPage } from '@/components/imports/new-import-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Import a file' }

export default async function Page() {
  await requireActor('keepCrib')
  return <NewImportPage />
}
