import type { Metadata } from 'next'
import { AlertsPage } from '@/components/reordering/alerts-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Low stock' }

export default async function Page() {
  await requireActor('see')
  return <AlertsPage />
}
