import type { Metadata } from 'next'
import { CuttersPage } from '@/components/cutters/cutters-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Cutters' }

export default async function Page() {
  await requireActor('see')
  return <CuttersPage />
}
