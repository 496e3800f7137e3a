import type { Metadata } from 'next'
import { AlertsPage } from '@/components/reordering/alerts-page'
import { requireActor } from '@/server/auth/require-actor'
import { hasMailServer } from '@/server/services/mail/has-mail-server'

export const metadata: Metadata = { title: 'Low stock' }

export default async function Page() {
  await requireActor('see')
  return <AlertsPage hasMailServer={hasMailServer()} />
}
