import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { cache } from 'react'
import { AssemblyPage } from '@/components/assemblies/assembly-page'
import { AppError } from '@/lib/app-error'
import { idSchema } from '@/schemas/fields'
import { requireActor } from '@/server/auth/require-actor'
import { assemblyScanCode } from '@/server/services/assemblies/assembly-scan-code'
import { getAssembly } from '@/server/services/assemblies/read-assembly'

interface PageProps {
  params: Promise<{ id: string }>
}

/** Read once a request, for the title and for the page. */
const readPage = cache(async (id: string) => {
  await requireActor('see')
  if (!idSchema.safeParse(id).success) notFound()
  try {
    return await getAssembly(id)
  } catch (error) {
    if (error instanceof AppError && error.code === 'not-found') notFound()
    throw error
  }
})

export async function generateMetadata({ params }: PageProps): Promise<Metadata> {
  const { number } = await readPage((await params).id)
  return { title: `Assembly ${number}` }
}

export default async function Page({ params }: PageProps) {
  const assembly = await readPage((await params).id)
  const date = new Date().toISOString().slice(0, 10)
  return <AssemblyPage first={assembly} code={assemblyScanCode(assembly.id)} date={date} />
}
