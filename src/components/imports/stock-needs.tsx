'use client'

import Link from 'next/link'
import { useFirstDay } from '@/hooks/use-first-day'
import { Notice } from '../ui/notice'

/** Opening stock names a bin and an item in every row: says so before the file is sent where there are none. */
export function StockNeeds() {
  const { firstDay } = useFirstDay(true)
  if (!firstDay) return null
  const items = firstDay.cutters + firstDay.holders + firstDay.collets + firstDay.extensions
  if (firstDay.bins > 0 && items > 0) return null
  const missing = firstDay.bins === 0 ? (items === 0 ? 'bins and no items' : 'bins') : 'items'
  return (
    <Notice kind="caution" isAnnounced>
      There are no {missing} yet, so every row of opening stock would be rejected.{' '}
      <Link href="/first-day" className="text-accent font-semibold underline">
        What comes first
      </Link>
    </Notice>
  )
}
