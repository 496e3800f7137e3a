import type { Metadata } from 'next'
import { StartingSpeedsPage } from '@/components/starting-speeds/starting-speeds-page'
import { requireActor } from '@/server/auth/require-actor'
import { listStartingSpeeds } from '@/server/services/starting-speeds/list-starting-speeds'

export const metadata: Metadata = { title: 'Starting speeds' }

export default async function Page() {
  await requireActor('see')
  const { rows } = await listStartingSpeeds()
  return <StartingSpeedsPage firstRows={rows} />
}
