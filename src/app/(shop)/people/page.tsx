import type { Metadata } from 'next'
import { PeoplePage } from '@/components/people/people-page'
import { requireActor } from '@/server/auth/require-actor'
import { listPeople } from '@/server/services/people/list-people'

export const metadata: Metadata = { title: 'People' }

export default async function Page() {
  await requireActor('administer')
  const { rows } = await listPeople()
  return <PeoplePage initialRows={rows} />
}
