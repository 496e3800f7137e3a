import type { Metadata } from 'next'
import { LocationsPage } from '@/components/locations/locations-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Locations' }

export default async function Page() {
  await requireActor()
  return <LocationsPage />
}
