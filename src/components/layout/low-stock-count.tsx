'use client'

import { TriangleAlert } from 'lucide-react'
import Link from 'next/link'
import { useOpenAlertCount } from '@/hooks/use-alerts'
import { useCan } from './shop-context'

/** How many items are low, for those who keep the crib, where the navigation has no room of its own. */
export function LowStockCount() {
  const count = useOpenAlertCount(useCan('keepCrib'))
  if (!count) return null
  return (
    <Link
      href="/alerts"
      className="text-caution hover:bg-accent-wash inline-flex min-h-11 items-center gap-1.5 rounded-[3px] px-2 text-[0.9375rem] font-semibold whitespace-nowrap min-[90rem]:hidden"
    >
      <TriangleAlert aria-hidden="true" className="size-4" />
      {count} low
    </Link>
  )
}

/** The same as a figure behind the name of the list. */
export function LowStockFigure() {
  const count = useOpenAlertCount(useCan('keepCrib'))
  if (!count) return null
  return (
    <span className="bg-caution-wash text-caution ml-1.5 px-1.5 text-sm font-semibold">
      {count}
      <span className="sr-only"> low</span>
    </span>
  )
}
