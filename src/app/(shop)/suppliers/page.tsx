import type { Metadata } from 'next'
import { SuppliersPage } from '@/components/suppliers/suppliers-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Suppliers' }

export default async function Page() {
  await requireActor('see')
  return <SuppliersPage />
}
