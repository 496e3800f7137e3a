import type { Metadata } from 'next'
import { ImportsPage } from '@/components/imports/imports-page'
import { requireActor } from '@/server/auth/require-actor'
import { listImports } from '@/server/services/imports/list-imports'

export const metadata: Metadata = { title: 'Imports' }

export default async function Page() {
  await requireActor('keepCrib')
  const { rows } = await listImports({ limit: 100 })
  return <ImportsPage initialRows={rows} />
}
