'use client'

import Link from 'next/link'
import { useRouter } from 'next/navigation'
import { type RefObject, useCallback, useMemo, useState } from 'react'
import { readReorderPointBlock, reorderPointBlockSize } from '@/hooks/use-reorder-points'
import { itemPagePath } from '@/lib/catalogue-paths'
import { faultSentence } from '@/lib/field-faults'
import type { ReorderPointRow } from '@/schemas/reordering'
import type { SupplierResponse } from '@/schemas/supplier'
import type { PartsListColumn } from '../grid/parts-list-column'
import { PartsListGrid, type PartsListHandle } from '../grid/parts-list-grid'
import { Button } from '../ui/button'
import { StateSentence } from '../ui/state-sentence'
import { type EditedField, editedFields, supplierChoices, typedText } from './reorder-point-fields'
import type { useReorderPointEditing } from './use-reorder-point-editing'

type Editing = ReturnType<typeof useReorderPointEditing>

export interface ReorderPointsGridProps {
  filters: { cribId: string; q: string }
  suppliers: readonly SupplierResponse[]
  editing: Editing | undefined
  handleRef: RefObject<PartsListHandle | null>
}

const unsorted = () => undefined

export default function ReorderPointsGrid({
  filters,
  suppliers,
  editing,
  handleRef,
}: ReorderPointsGridProps) {
  const router = useRouter()
  const [state, setState] = useState<'ready' | 'empty' | { failure: unknown }>('ready')
  const { cribId, q } = filters
  const columns = useColumns(suppliers, editing?.cellEdit)
  const loadBlock = useCallback((offset: number) => readReorderPointBlock({ cribId, q }, offset), [cribId, q])
  const handleLoad = useCallback((total: number) => setState(total === 0 ? 'empty' : 'ready'), [])
  const handleFailure = useCallback((failure: unknown) => setState({ failure }), [])
  return (
    <>
      <PartsListGrid<ReorderPointRow>
        columns={columns}
        sort=""
        blockSize={reorderPointBlockSize}
        label="Reorder points"
        loadBlock={loadBlock}
        onSortChange={unsorted}
        onOrderChange={unsorted}
        onOpen={(row) => router.push(row.itemKind ? itemPagePath(row.itemKind, row.itemId) : '/alerts')}
        onLoad={handleLoad}
        onFailure={handleFailure}
        handleRef={handleRef}
        editing={editing && { onEdit: editing.handleEdit, onSelect: editing.setSelected }}
      />
      {state === 'ready' ? null : (
        <div className="bg-sheet absolute inset-0 top-[46px] z-10">
          {state === 'empty' ? (
            <StateSentence sentence="No reorder point here. Add one, or search for less." />
          ) : (
            <StateSentence sentence={faultSentence(state.failure)}>
              <Button onClick={() => handleRef.current?.reload()}>Try again</Button>
            </StateSentence>
          )}
        </div>
      )}
    </>
  )
}

function useColumns(
  suppliers: readonly SupplierResponse[],
  cellEdit: Editing['cellEdit'] | undefined,
): PartsListColumn<ReorderPointRow>[] {
  return useMemo(
    () => [
      fixed('itemCode', 'Item', 140, (row) => row.itemCode, { isPinned: true, Cell: CodeCell }),
      fixed('description', 'Description', 240, (row) => row.description),
      fixed('cribCode', 'Crib', 90, (row) => row.cribCode),
      fixed('position', 'Available and coming', 170, (row) => String(row.position), { isFigure: true }),
      ...editedFields.map((field) => ({
        ...fixed(field.field, field.label, field.width, (row: ReorderPointRow) => shownText(row, field), {
          isFigure: field.kind === 'count' || field.kind === 'optionalCount',
        }),
        edit: cellEdit?.(field.field, field.kind === 'supplier' ? supplierChoices(suppliers) : undefined),
      })),
    ],
    [suppliers, cellEdit],
  )
}

function fixed(
  id: string,
  name: string,
  width: number,
  text: (row: ReorderPointRow) => string,
  more: Partial<PartsListColumn<ReorderPointRow>> = {},
): PartsListColumn<ReorderPointRow> {
  return {
    id,
    heading: name,
    name,
    unitText: '',
    width,
    isFigure: false,
    isSortable: false,
    isShown: true,
    text,
    ...more,
  }
}

function shownText(row: ReorderPointRow, { field, kind }: EditedField): string {
  return kind === 'supplier' ? (row.supplierName ?? '') : typedText(row, field)
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
