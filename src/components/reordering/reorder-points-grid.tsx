'use client'

import Link from 'next/link'
import { useRouter } from 'next/navigation'
import { type RefObject, useCallback, useMemo, useState } from 'react'
import { blockSize } from '@/hooks/use-catalogue-rows'
import { readReorderPointBlock } from '@/hooks/use-reorder-points'
import { itemPagePath } from '@/lib/catalogue-paths'
import type { ReorderPointRow } from '@/schemas/reordering'
import type { SupplierResponse } from '@/schemas/supplier'
import { type CatalogueView, queryParams } from '../catalogue/catalogue-view'
import type { PartsListColumn } from '../grid/parts-list-column'
import { PartsListGrid, type PartsListHandle } from '../grid/parts-list-grid'
import { editedFields, shownText, supplierChoices } from './reorder-point-fields'
import { ReorderPointsState } from './reorder-points-state'
import type { ReorderPointEditing } from './use-reorder-point-editing'

export interface ReorderPointsGridProps {
  view: CatalogueView
  onViewChange: (change: Partial<CatalogueView>) => void
  suppliers: readonly SupplierResponse[]
  /** Present for those who may change rows. */
  editing: ReorderPointEditing | undefined
  onTotal: (total: number | null) => void
  onClear: () => void
  onAdd: () => void
  handleRef: RefObject<PartsListHandle | null>
}

type LoadState = { state: 'loading' | 'ready' | 'empty' | 'failed'; failure?: unknown }

const unmoved = () => undefined

export default function ReorderPointsGrid(props: ReorderPointsGridProps) {
  const { view, onViewChange, suppliers, editing, onTotal, handleRef } = props
  const router = useRouter()
  const [load, setLoad] = useState<LoadState>({ state: 'loading' })
  const columns = useReorderPointColumns(suppliers, editing?.cellEdit)
  const narrowing = queryParams({ ...view, sort: '' }).toString()
  const loadBlock = useCallback(
    (offset: number, sort: string) => {
      const sorted = sort ? `${narrowing}${narrowing ? '&' : ''}sort=${sort}` : narrowing
      return readReorderPointBlock(sorted, offset)
    },
    [narrowing],
  )
  const handleLoad = useCallback(
    (total: number) => {
      setLoad({ state: total === 0 ? 'empty' : 'ready' })
      onTotal(total)
    },
    [onTotal],
  )
  const handleFailure = useCallback(
    (failure: unknown) => {
      setLoad({ state: 'failed', failure })
      onTotal(null)
    },
    [onTotal],
  )
  return (
    <div className="relative min-h-0 flex-1">
      <PartsListGrid<ReorderPointRow>
        columns={columns}
        sort={view.sort}
        blockSize={blockSize}
        label="Reorder points"
        loadBlock={loadBlock}
        onSortChange={(sort) => onViewChange({ sort })}
        onOrderChange={unmoved}
        onOpen={(row) => router.push(row.itemKind ? itemPagePath(row.itemKind, row.itemId) : '/alerts')}
        onLoad={handleLoad}
        onFailure={handleFailure}
        handleRef={handleRef}
        editing={editing && { onEdit: editing.handleEdit, onSelect: editing.setSelected }}
      />
      {load.state === 'ready' ? null : (
        <div className="bg-sheet absolute inset-0 top-[46px] z-10">
          <ReorderPointsState
            state={load.state}
            failure={load.failure}
            view={view}
            onRetry={() => {
              setLoad({ state: 'loading' })
              handleRef.current?.reload()
            }}
            onClear={props.onClear}
            onAdd={props.onAdd}
          />
        </div>
      )}
    </div>
  )
}

function useReorderPointColumns(
  suppliers: readonly SupplierResponse[],
  cellEdit: ReorderPointEditing['cellEdit'] | undefined,
): PartsListColumn<ReorderPointRow>[] {
  return useMemo(
    () =>
      reorderPointColumns.map((column) => {
        const field = editedFields.find((one) => one.field === column.id)
        const choices = field?.kind === 'supplier' ? supplierChoices(suppliers) : undefined
        return { ...column, edit: field ? cellEdit?.(field.field, choices) : undefined }
      }),
    [suppliers, cellEdit],
  )
}

function column(
  id: string,
  name: string,
  width: number,
  text: (row: ReorderPointRow) => string,
  more: Partial<PartsListColumn<ReorderPointRow>> = {},
): PartsListColumn<ReorderPointRow> {
  return {
    ...{ id, name, width, text, heading: name, unitText: '' },
    ...{ isFigure: false, isSortable: true, isShown: true },
    ...more,
  }
}

/** The columns, by the names the API sorts by. */
export const reorderPointColumns: readonly PartsListColumn<ReorderPointRow>[] = [
  column('itemCode', 'Item', 150, (row) => row.itemCode, { isPinned: true, Cell: CodeCell }),
  column('description', 'Description', 220, (row) => row.description),
  column('cribCode', 'Crib', 80, (row) => row.cribCode),
  column('onHand', 'On hand', 95, (row) => String(row.onHand), { isFigure: true }),
  column('position', 'Available and coming', 170, positionText, { isFigure: true, Cell: PositionCell }),
  ...editedFields.map((field) =>
    column(field.field, field.label, field.width, (row) => shownText(row, field), {
      isFigure: field.kind === 'count' || field.kind === 'optionalCount',
    }),
  ),
]

function positionText(row: ReorderPointRow): string {
  return row.position <= row.reorderPoint ? `${row.position}, low` : String(row.position)
}

function PositionCell({ row }: { row: ReorderPointRow }) {
  if (row.position > row.reorderPoint) return row.position
  return <span className="text-caution font-semibold">{positionText(row)}</span>
}

function CodeCell({ row }: { row: ReorderPointRow }) {
  if (!row.itemKind) return row.itemCode
  return (
    <Link
      href={itemPagePath(row.itemKind, row.itemId)}
      prefetch={false}
      tabIndex={-1}
      className="text-accent font-semibold hover:underline"
    >
      {row.itemCode}
    </Link>
  )
}
