'use client'

import Link from 'next/link'
import { useRouter } from 'next/navigation'
import { type RefObject, useCallback, useMemo, useState } from 'react'
import type { PartsListColumn } from '@/components/grid/parts-list-column'
import { PartsListGrid, type PartsListHandle } from '@/components/grid/parts-list-grid'
import { useShop } from '@/components/layout/shop-context'
import { blockSize, type CatalogueBlock } from '@/hooks/use-catalogue-rows'
import { getJson } from '@/lib/api-client'
import { itemPagePath } from '@/lib/catalogue-paths'
import { type CatalogueColumn, isFigure } from './catalogue-column'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { CatalogueState } from './catalogue-state'
import { type CatalogueView, queryParams } from './catalogue-view'
import { type FirstBlock, listBlockUrl } from './first-block'
import { StockWord } from './stock-word'
import type { GridEditing } from './use-grid-editing'

export interface CatalogueGridProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  columns: readonly CatalogueColumn<Row>[]
  shownIds: readonly string[]
  view: CatalogueView
  onViewChange: (change: Partial<CatalogueView>) => void
  onTotal: (total: number | null) => void
  onClear: () => void
  onReset: () => void
  onAdd: () => void
  handleRef: RefObject<PartsListHandle | null>
  firstBlock: FirstBlock
  /** Present while the list is being edited. */
  editing: GridEditing<Row> | undefined
}

type LoadState = { state: 'loading' | 'ready' | 'empty' } | { state: 'failed'; failure: Error }

export default function CatalogueGrid<Row extends CatalogueRow>(props: CatalogueGridProps<Row>) {
  const { definition, columns, shownIds, view, handleRef, firstBlock, editing, onViewChange, onTotal } = props
  const router = useRouter()
  const [load, setLoad] = useState<LoadState>({ state: 'loading' })
  const gridColumns = useGridColumns(columns, shownIds, editing?.cellEdit)
  const narrowing = queryParams({ ...view, sort: '' }).toString()

  const loadBlock = useCallback(
    (offset: number, sort: string) => {
      const url = listBlockUrl(definition.kind, narrowing, sort, offset)
      return firstBlock.take<Row>(url) ?? getJson<CatalogueBlock<Row>>(url)
    },
    [definition.kind, narrowing, firstBlock],
  )
  const handleLoad = useCallback(
    (total: number) => {
      setLoad({ state: total === 0 ? 'empty' : 'ready' })
      onTotal(total)
    },
    [onTotal],
  )
  const handleFailure = useCallback(
    (error: unknown) => {
      setLoad({ state: 'failed', failure: error instanceof Error ? error : new Error(String(error)) })
      onTotal(null)
    },
    [onTotal],
  )

  return (
    <div className="relative min-h-0 flex-1">
      <PartsListGrid<Row>
        columns={gridColumns}
        sort={view.sort}
        blockSize={blockSize}
        label={definition.title}
        loadBlock={loadBlock}
        onSortChange={(sort) => onViewChange({ sort })}
        onOrderChange={(ids) => onViewChange({ columns: ids })}
        onOpen={(row) => router.push(itemPagePath(row.kind, row.id))}
        onLoad={handleLoad}
        onFailure={handleFailure}
        handleRef={handleRef}
        editing={editing && { onEdit: editing.handleEdit, onSelect: editing.handleSelect }}
      />
      {load.state === 'ready' ? null : (
        <div className="bg-sheet absolute inset-0 top-[46px] z-10">
          <CatalogueState
            {...props}
            state={load.state}
            failure={load.state === 'failed' ? load.failure : null}
            onRetry={() => {
              setLoad({ state: 'loading' })
              handleRef.current?.reload()
            }}
          />
        </div>
      )}
    </div>
  )
}

const unitTexts: Partial<Record<CatalogueColumn<unknown>['kind'], string>> = { angle: 'deg' }

function useGridColumns<Row extends CatalogueRow>(
  columns: readonly CatalogueColumn<Row>[],
  shownIds: readonly string[],
  cellEdit: GridEditing<Row>['cellEdit'] | undefined,
): PartsListColumn<Row>[] {
  const { unit, currency } = useShop()
  return useMemo(() => {
    const byId = new Map(columns.map((column) => [column.id, column]))
    const shown = shownIds.flatMap((id) => byId.get(id) ?? [])
    const hidden = columns.filter((column) => !shownIds.includes(column.id))
    return [...shown, ...hidden].map((column) => ({
      id: column.id,
      heading: column.heading,
      name: column.name,
      word: column.word,
      unitText: column.kind === 'length' ? unit : (unitTexts[column.kind] ?? ''),
      width: column.width,
      isFigure: isFigure(column.kind),
      isSortable: column.isSortable,
      isShown: shownIds.includes(column.id),
      isPinned: column.kind === 'code',
      text: (row: Row) => column.text(row, { unit, currency }),
      Cell: column.kind === 'code' ? CodeCell : column.kind === 'onHand' ? OnHandCell : undefined,
      edit: cellEdit?.(column.id),
    }))
  }, [columns, shownIds, unit, currency, cellEdit])
}

function CodeCell({ row }: { row: CatalogueRow }) {
  return (
    <span className="flex items-baseline gap-2">
      <Link
        href={itemPagePath(row.kind, row.id)}
        prefetch={false}
        tabIndex={-1}
        className="text-accent truncate font-semibold hover:underline"
      >
        {row.code}
      </Link>
      {row.archivedAt ? <span className="text-ink-soft text-sm">archived</span> : null}
    </span>
  )
}

function OnHandCell({ row }: { row: CatalogueRow }) {
  return (
    <span className="flex items-baseline justify-between gap-2">
      <StockWord stock={row.stock} className="text-sm" />
      <span className="ml-auto">{row.stock.onHand}</span>
    </span>
  )
}
