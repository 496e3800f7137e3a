import type { Metadata } from 'next'
import { MachinesPage } from '@/components/machines/machines-page'
import { requireActor } from '@/server/auth/require-actor'
import { listMachines } from '@/server/services/machines/list-machines'

export const metadata: Metadata = { title: 'Machines' }

export default async function Page() {
  await requireActor('see')
  const { rows } = await listMachines('no')
  return <MachinesPage firstRows={rows} />
}
