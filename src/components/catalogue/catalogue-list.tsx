'use client'

import Link from 'next/link'
import { type RefObject, useEffect, useImperativeHandle } from 'react'
import { useShop } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { useCatalogueRows } from '@/hooks/use-catalogue-rows'
import { catalogueApiPath, itemPagePath } from '@/lib/catalogue-paths'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { CatalogueState } from './catalogue-state'
import { type CatalogueView, queryParams } from './catalogue-view'
import { placeCodes } from './columns'
import { StockWord } from './stock-word'
import { useEndReached } from './use-end-reached'

export interface CatalogueListProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  view: CatalogueView
  onClear: () => void
  onReset: () => void
  onAdd: () => void
  onTotal: (total: number | null) => void
  handleRef: RefObject<CatalogueListHandle<Row> | null>
}

export interface CatalogueListHandle<Row> {
  /** Reads again all that is loaded: something was changed. */
  reload: () => void
  loaded: () => { rows: Row[]; first: number; total: number }
}

/** The same rows for a thumb: what it is, what there is, where it lies. It grows as it is scrolled. */
export function CatalogueList<Row extends CatalogueRow>(props: CatalogueListProps<Row>) {
  const { definition, view, onTotal } = props
  const query = queryParams(view).toString()
  const { unit } = useShop()
  const list = useCatalogueRows<Row>(catalogueApiPath(definition.kind), query)
  useImperativeHandle(props.handleRef, () => ({
    reload: () => void list.retry(),
    loaded: () => ({ rows: list.rows, first: 0, total: list.total ?? list.rows.length }),
  }))
  const total = list.error || list.isLoading ? null : (list.total ?? null)
  useEffect(() => onTotal(total), [onTotal, total])
  const end = useEndReached(list.hasMore && !list.isLoadingMore && !list.error, list.loadMore)
  if (list.rows.length === 0)
    return (
      <CatalogueState
        {...props}
        state={list.error ? 'failed' : list.isLoading ? 'loading' : 'empty'}
        failure={list.error}
        onRetry={list.retry}
      />
    )
  return (
    <>
      <p className="text-ink-soft px-4 py-1.5 text-sm" role="status">
        {list.total ?? list.rows.length} {list.total === 1 ? definition.one : definition.many}
      </p>
      <ul className="border-ink bg-sheet border-t-2">
        {list.rows.map((row) => (
          <li key={row.id} className="border-hairline border-b">
            <ListRow row={row} facts={definition.facts(row, unit)} />
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

function ListRow({ row, facts }: { row: CatalogueRow; facts: string }) {
  const places = placeCodes(row.stock)
  const source = [row.maker, row.partNumber].filter(Boolean).join(' ')
  return (
    <Link
      href={itemPagePath(row.kind, row.id)}
      prefetch={false}
      className="active:bg-accent-wash grid min-h-11 grid-cols-[1fr_auto] gap-x-3 px-4 py-2.5"
    >
      <span className="flex min-w-0 items-baseline gap-2">
        <span className="text-accent truncate font-semibold">{row.code}</span>
        {row.archivedAt ? <span className="text-ink-soft text-sm">Archived</span> : null}
      </span>
      <span className="flex items-baseline justify-end gap-2">
        <StockWord stock={row.stock} />
        <span className="font-semibold">{row.stock.onHand}</span>
      </span>
      <span className="min-w-0 truncate">{facts}</span>
      <span className="text-ink-soft max-w-32 truncate text-right text-sm">{places}</span>
      {source ? <span className="text-ink-soft col-span-2 truncate text-sm">{source}</span> : null}
    </Link>
  )
}
