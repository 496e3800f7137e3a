import type { Metadata } from 'next'
import { FirstDayPage } from '@/components/first-day/first-day-page'
import { requireActor } from '@/server/auth/require-actor'
import { getFirstDay } from '@/server/services/first-day/get-first-day'

export const metadata: Metadata = { title: 'First day' }

export default async function Page() {
  await requireActor('keepCrib')
  return <FirstDayPage first={await getFirstDay()} />
}
