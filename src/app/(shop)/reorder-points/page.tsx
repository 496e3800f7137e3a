import type { Metadata } from 'next'
import { ReorderPointsPage } from '@/components/reordering/reorder-points-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Reorder points' }

export default async function Page() {
  await requireActor('see')
  return <ReorderPointsPage />
}
