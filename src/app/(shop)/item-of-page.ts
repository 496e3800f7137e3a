import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { cache } from 'react'
import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import type { CatalogueTypes } from '@/schemas/catalogue'
import { idSchema } from '@/schemas/fields'
import { requireActor } from '@/server/auth/require-actor'
import { getItem } from '@/server/services/catalogue/get-item'

export interface ItemPageProps {
  params: Promise<{ id: string }>
}

/** Read once a request, for the title and for the page. */
const readItem = cache(async (kind: CatalogueKind, id: string) => {
  const actor = await requireActor('see')
  if (!idSchema.safeParse(id).success) notFound()
  try {
    return await getItem(actor, kind, id)
  } catch (error) {
    if (error instanceof AppError && error.code === 'not-found') notFound()
    throw error
  }
})

/** The item of an address; an address without one leads to the page that says so. */
export async function getItemOfPage<Kind extends CatalogueKind>(
  kind: Kind,
  params: ItemPageProps['params'],
): Promise<CatalogueTypes[Kind]['row']> {
  return readItem(kind, (await params).id) as Promise<CatalogueTypes[Kind]['row']>
}

export async function itemMetadata(kind: CatalogueKind, params: ItemPageProps['params']): Promise<Metadata> {
  const { code } = await readItem(kind, (await params).id)
  return { title: code }
}
