import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { ImportPage } from '@/components/imports/import-page'
import { requireActor } from '@/server/auth/require-actor'
import { findImportView } from '@/server/services/imports/get-import'

export const metadata: Metadata = { title: 'Import' }

export default async function Page({ params }: { params: Promise<{ id: string }> }) {
  await requireActor('keepCrib')
  const found = await findImportView((await params).id)
  if (!found) notFound()
  return <ImportPage initial={found} />
}
