'use client'

import dynamic from 'next/dynamic'
import { useMemo, useRef, useState } from 'react'
import { useReorderPointCounts } from '@/hooks/use-reorder-point-counts'
import { useSuppliers } from '@/hooks/use-suppliers'
import type { ReorderPointRow } from '@/schemas/reordering'
import type { SupplierResponse } from '@/schemas/supplier'
import { AddButton } from '../catalogue/add-button'
import { type CatalogueView, queryParams } from '../catalogue/catalogue-view'
import { FilterDrawer } from '../catalogue/filter-drawer'
import { SearchBox } from '../catalogue/search-box'
import { SortSelect } from '../catalogue/sort-select'
import { useCatalogueView } from '../catalogue/use-catalogue-view'
import type { PartsListHandle } from '../grid/parts-list-grid'
import { useCan } from '../layout/shop-context'
import { Button } from '../ui/button'
import { StateSentence } from '../ui/state-sentence'
import { useMediaQuery } from '../ui/use-media-query'
import { ChangeSelectedDialog } from './change-selected-dialog'
import { EditNotices } from './edit-notices'
import { MembersNotice } from './members-notice'
import { RemoveSelectedDialog } from './remove-selected-dialog'
import { ReorderPointDialog } from './reorder-point-dialog'
import { editedFields } from './reorder-point-fields'
import { isListNarrowed, ReorderPointFilters, reorderPointFilterNames } from './reorder-point-filters'
import { ReorderPointList, useReorderPointList } from './reorder-point-list'
import { ReorderPointMenu } from './reorder-point-menu'
import { ReorderPointsState } from './reorder-points-state'
import { useReorderPointEditing } from './use-reorder-point-editing'

/** The grid's code comes only where a grid is shown. */
const ReorderPointsGrid = dynamic(() => import('./reorder-points-grid'), {
  ssr: false,
  loading: () => <StateSentence sentence="Reading the reorder points …" />,
})

interface ShapeProps {
  view: CatalogueView
  onViewChange: (change: Partial<CatalogueView>) => void
  onClear: () => void
  suppliers: readonly SupplierResponse[]
}

/** When each item of each crib is low, edited in place. */
export function ReorderPointsPage() {
  const isWide = useMediaQuery('(min-width: 48rem)')
  const [view, onViewChange] = useCatalogueView(reorderPointFilterNames)
  const { data } = useSuppliers()
  const suppliers = useMemo(() => data?.rows ?? [], [data])
  const shared = {
    ...{ view, onViewChange, suppliers },
    onClear: () => onViewChange({ q: '', filters: {}, sort: '' }),
  }
  return (
    <div className="flex flex-1 flex-col md:h-[calc(100dvh-3.5rem)] md:flex-none lg:h-[calc(100dvh-3rem)]">
      {isWide === null ? <StateSentence sentence="Reading the reorder points …" /> : null}
      {isWide === true ? <WidePage {...shared} /> : null}
      {isWide === false ? <NarrowPage {...shared} /> : null}
    </div>
  )
}

function WidePage({ view, onViewChange, onClear, suppliers }: ShapeProps) {
  const canKeep = useCan('keepCrib')
  const grid = useRef<PartsListHandle>(null)
  const [total, setTotal] = useState<number | null>(null)
  const [open, setOpen] = useState<'add' | 'change' | 'remove' | null>(null)
  const editing = useReorderPointEditing(grid, canKeep)
  const counts = useCounts(view, total !== null)
  const close = () => setOpen(null)
  const reload = () => {
    close()
    grid.current?.clearSelection()
    grid.current?.reload()
  }
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 px-4 pt-3 pb-2 lg:px-6">
        <h1 className="text-2xl">Reorder points</h1>
        <p className="text-ink-soft mr-auto" role="status">
          {total === null ? '' : totalText(total, view)}
        </p>
        <SearchBox
          value={view.q}
          label="Search reorder points"
          onSearch={(q) => onViewChange({ q })}
          onLeaveDown={() => grid.current?.focusFirstRow()}
        />
        <ReorderPointMenu view={view} />
        <AddButton one="reorder point" onAdd={() => setOpen('add')} />
      </div>
      <div className="flex flex-wrap items-start gap-x-4 gap-y-2 px-4 pb-3 lg:px-6">
        <ReorderPointFilters
          shape="row"
          values={view.filters}
          counts={counts}
          onChange={(filters) => onViewChange({ filters })}
        />
        {isListNarrowed(view) ? (
          <Button variant="quiet" size="compact" className="self-end" onClick={onClear}>
            Clear all
          </Button>
        ) : null}
      </div>
      <MembersNotice cribId={view.filters.cribId ?? ''} />
      {canKeep ? (
        <EditNotices
          editing={editing}
          grid={grid}
          onChangeSelected={() => setOpen('change')}
          onRemoveSelected={() => setOpen('remove')}
        />
      ) : null}
      <ReorderPointsGrid
        {...{ view, onViewChange, onClear, suppliers }}
        editing={canKeep ? editing : undefined}
        onTotal={setTotal}
        onAdd={() => setOpen('add')}
        handleRef={grid}
      />
      {open === 'change' ? (
        <ChangeSelectedDialog
          rows={editing.selected}
          suppliers={suppliers}
          onChange={editing.changeSelected}
          onClose={close}
        />
      ) : null}
      {open === 'remove' ? (
        <RemoveSelectedDialog rows={editing.selected} onClose={close} onRemoved={reload} />
      ) : null}
      {open === 'add' ? (
        <ReorderPointDialog
          row={null}
          cribId={view.filters.cribId}
          suppliers={suppliers}
          onClose={close}
          onSaved={(itemCode) => {
            reload()
            if (itemCode) onViewChange(viewOf(itemCode))
          }}
        />
      ) : null}
    </>
  )
}

function NarrowPage({ view, onViewChange, onClear, suppliers }: ShapeProps) {
  const canKeep = useCan('keepCrib')
  const [edited, setEdited] = useState<ReorderPointRow | 'new' | null>(null)
  const [removed, setRemoved] = useState<ReorderPointRow | null>(null)
  const counts = useCounts(view, true)
  const list = useReorderPointList(queryParams(view).toString())
  const reload = () => {
    setEdited(null)
    setRemoved(null)
    void list.retry()
  }
  return (
    <>
      <div className="flex flex-col gap-2 px-4 pt-3 pb-2">
        <div className="flex items-center gap-2">
          <h1 className="mr-auto text-2xl">Reorder points</h1>
          <AddButton one="reorder point" onAdd={() => setEdited('new')} />
          <ReorderPointMenu view={view} isMarkAlone />
        </div>
        <div className="flex items-center gap-2">
          <SearchBox value={view.q} label="Search reorder points" onSearch={(q) => onViewChange({ q })} />
          <FilterDrawer
            count={Object.keys(view.filters).length + (view.sort ? 1 : 0)}
            found={list.error || list.isLoading ? null : (list.total ?? null)}
            onClear={() => onViewChange({ filters: {}, sort: '' })}
          >
            <SortSelect columns={sortColumns} value={view.sort} onChange={(sort) => onViewChange({ sort })} />
            <ReorderPointFilters
              shape="column"
              values={view.filters}
              counts={counts}
              onChange={(filters) => onViewChange({ filters })}
            />
          </FilterDrawer>
        </div>
      </div>
      <MembersNotice cribId={view.filters.cribId ?? ''} />
      <ReorderPointList
        list={list}
        onEdit={canKeep ? setEdited : undefined}
        state={
          <ReorderPointsState
            state={list.error ? 'failed' : list.isLoading ? 'loading' : 'empty'}
            failure={list.error}
            view={view}
            onRetry={() => void list.retry()}
            onClear={onClear}
            onAdd={() => setEdited('new')}
          />
        }
      />
      {edited ? (
        <ReorderPointDialog
          row={edited === 'new' ? null : edited}
          cribId={view.filters.cribId}
          suppliers={suppliers}
          onClose={() => setEdited(null)}
          onSaved={(itemCode) => {
            reload()
            if (itemCode) onViewChange(viewOf(itemCode))
          }}
          onRemove={(row) => {
            setEdited(null)
            setRemoved(row)
          }}
        />
      ) : null}
      {removed ? (
        <RemoveSelectedDialog rows={[removed]} onClose={() => setRemoved(null)} onRemoved={reload} />
      ) : null}
    </>
  )
}

/** The list as it surely shows the row of an item that was added. */
function viewOf(itemCode: string): Partial<CatalogueView> {
  return { q: itemCode, filters: {}, sort: '' }
}

const sortColumns = [
  { id: 'itemCode', name: 'Item', isSortable: true },
  { id: 'position', name: 'Available and coming', isSortable: true },
  ...editedFields.map(({ field, label }) => ({ id: field, name: label, isSortable: true })),
]

function useCounts(view: CatalogueView, isWanted: boolean) {
  return useReorderPointCounts(queryParams({ ...view, sort: '' }).toString(), isWanted)
}

function totalText(total: number, view: CatalogueView): string {
  const found = isListNarrowed(view) ? 'found' : total === 1 ? 'reorder point' : 'reorder points'
  return `${total.toLocaleString('en')} ${found}`
}
