import type { Metadata } from 'next'
import { ExtensionsPage } from '@/components/extensions/extensions-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Extensions' }

export default async function Page() {
  await requireActor('see')
  return <ExtensionsPage />
}
