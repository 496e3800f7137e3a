import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { cache } from 'react'
import { MachinePage } from '@/components/machines/machine-page'
import { AppError } from '@/lib/app-error'
import { idSchema } from '@/schemas/fields'
import { requireActor } from '@/server/auth/require-actor'
import { getMachine } from '@/server/services/machines/get-machine'
import { listSetUps } from '@/server/services/set-ups/list-set-ups'

interface PageProps {
  params: Promise<{ id: string }>
}

/** Read once a request, for the title and for the page. */
const readMachine = cache(async (id: string) => {
  await requireActor('see')
  if (!idSchema.safeParse(id).success) notFound()
  try {
    return await getMachine(id)
  } catch (error) {
    if (error instanceof AppError && error.code === 'not-found') notFound()
    throw error
  }
})

export async function generateMetadata({ params }: PageProps): Promise<Metadata> {
  const { code } = await readMachine((await params).id)
  return { title: code }
}

export default async function Page({ params }: PageProps) {
  const machine = await readMachine((await params).id)
  const { rows } = await listSetUps(machine.id)
  return <MachinePage firstMachine={machine} firstSetUps={rows} />
}
