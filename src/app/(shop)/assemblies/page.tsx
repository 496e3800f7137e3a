import type { Metadata } from 'next'
import { Suspense } from 'react'
import { AssembliesPage } from '@/components/assemblies/assemblies-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Assemblies' }

export default async function Page() {
  await requireActor('see')
  return (
    <Suspense>
      <AssembliesPage />
    </Suspense>
  )
}
