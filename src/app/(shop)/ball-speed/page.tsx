import type { Metadata } from 'next'
import { BallSpeedPage } from '@/components/ball-end/ball-speed-page'
import { requireActor } from '@/server/auth/require-actor'

export const metadata: Metadata = { title: 'Ball-end speed' }

export default async function Page() {
  await requireActor('see')
  return <BallSpeedPage />
}
