'use client'

import Link from 'next/link'
import type { ReactNode } from 'react'
import { useCatalogueRows } from '@/hooks/use-catalogue-rows'
import { reorderPointsApiPath } from '@/hooks/use-reorder-points'
import { itemPagePath } from '@/lib/catalogue-paths'
import type { ReorderPointRow } from '@/schemas/reordering'
import { useEndReached } from '../catalogue/use-end-reached'
import { Button } from '../ui/button'

export interface ReorderPointListProps {
  list: ReturnType<typeof useReorderPointList>
  /** What stands where there is no row. */
  state: ReactNode
  /** Present for those who may change a row. */
  onEdit: ((row: ReorderPointRow) => void) | undefined
}

export function useReorderPointList(query: string) {
  return useCatalogueRows<ReorderPointRow>(reorderPointsApiPath, query)
}

/** The same rows for a thumb: what, where, how many there are, and when it is low. */
export function ReorderPointList({ list, state, onEdit }: ReorderPointListProps) {
  const end = useEndReached(list.hasMore && !list.isLoadingMore && !list.error, list.loadMore)
  if (list.rows.length === 0) return state
  return (
    <>
      <p className="text-ink-soft px-4 py-1.5 text-sm" role="status">
        {list.total ?? list.rows.length} {list.total === 1 ? 'reorder point' : 'reorder points'}
      </p>
      <ul className="border-ink bg-sheet border-t-2">
        {list.rows.map((row) => (
          <li key={row.id} className="border-hairline border-b">
            <ListRow row={row} onEdit={onEdit} />
          </li>
        ))}
      </ul>
      <div ref={end} className="flex min-h-16 items-center gap-3 px-4 py-3" role="status">
        {list.error ? (
          <>
            <span>The next rows could not be loaded.</span>
            <Button onClick={list.retry}>Try again</Button>
          </>
        ) : list.hasMore ? (
          'Loading more …'
        ) : (
          <span className="text-ink-soft text-sm">That is all.</span>
        )}
      </div>
    </>
  )
}

const rowClass =
  'active:bg-accent-wash grid min-h-11 w-full grid-cols-[1fr_auto] gap-x-3 px-4 py-2.5 text-left'

function ListRow({ row, onEdit }: { row: ReorderPointRow; onEdit: ReorderPointListProps['onEdit'] }) {
  if (onEdit) {
    return (
      <button type="button" className={rowClass} onClick={() => onEdit(row)}>
        <RowFacts row={row} />
      </button>
    )
  }
  if (!row.itemKind) {
    return (
      <div className={rowClass}>
        <RowFacts row={row} />
      </div>
    )
  }
  return (
    <Link href={itemPagePath(row.itemKind, row.itemId)} prefetch={false} className={rowClass}>
      <RowFacts row={row} />
    </Link>
  )
}

function RowFacts({ row }: { row: ReorderPointRow }) {
  const isLow = row.position <= row.reorderPoint
  const days = row.leadTimeDays === null ? '' : `, ${row.leadTimeDays} days`
  return (
    <>
      <span className="text-accent truncate font-semibold">
        {row.itemCode} <span className="text-ink-soft font-normal">in {row.cribCode}</span>
      </span>
      <span className="text-right">
        {isLow ? <span className="text-caution mr-2 text-sm font-semibold">Low</span> : null}
        <span className="font-semibold">{row.position}</span>
      </span>
      <span className="min-w-0 truncate">{row.description}</span>
      <span className="text-ink-soft text-right text-sm">
        low at {row.reorderPoint}, up to {row.orderUpTo}
      </span>
      <span className="text-ink-soft col-span-2 truncate text-sm">
        {row.supplierName ? `${row.supplierName}${days}` : 'No supplier named'}
      </span>
      {row.caution ? <span className="text-caution col-span-2 text-sm">{row.caution}</span> : null}
    </>
  )
}
