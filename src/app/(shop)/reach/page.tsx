import type { Metadata } from 'next'
import { ReachPage } from '@/components/reach/reach-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Reach' }

export interface ReachRouteProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>
}

export default async function Page({ searchParams }: ReachRouteProps) {
  await requireActor('see')
  const entries = Object.entries(await searchParams).flatMap(([name, value]) =>
    typeof value === 'string' ? [[name, value]] : [],
  )
  const date = new Date().toISOString().slice(0, 10)
  return <ReachPage query={new URLSearchParams(entries).toString()} date={date} />
}
