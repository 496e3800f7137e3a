'use client'

import {
  type CellKeyDownEvent,
  CellStyleModule,
  type ColDef,
  ColumnApiModule,
  type ColumnMovedEvent,
  type GridApi,
  type IDatasource,
  type IGetRowsParams,
  InfiniteRowModelModule,
  ModuleRegistry,
  type RowClickedEvent,
  TooltipModule,
} from 'ag-grid-community'
import { AgGridReact, type CustomCellRendererProps } from 'ag-grid-react'
import {
  type ComponentType,
  type RefObject,
  useCallback,
  useEffect,
  useImperativeHandle,
  useMemo,
  useRef,
} from 'react'
import { useMediaQuery } from '@/components/ui/use-media-query'
import { PartsListHeading } from './parts-list-heading'
import { partsListTheme, partsListThemeForFingers } from './parts-list-theme'

ModuleRegistry.registerModules([InfiniteRowModelModule, CellStyleModule, ColumnApiModule, TooltipModule])

export interface PartsListColumn<Row> {
  id: string
  heading: string
  name: string
  unitText: string
  width: number
  isFigure: boolean
  isSortable: boolean
  isShown: boolean
  isPinned?: boolean
  text: (row: Row) => string
  /** Where plain text is not enough. */
  Cell?: ComponentType<{ row: Row }>
}

export interface PartsListHandle {
  /** Reads again what is on screen: something was saved. */
  refresh: () => void
  /** Reads all again: the last try failed. */
  reload: () => void
  focusFirstRow: () => void
}

export interface PartsListGridProps<Row extends { id: string }> {
  /** Shown ones in their order, then the hidden. */
  columns: PartsListColumn<Row>[]
  sort: string
  blockSize: number
  label: string
  loadBlock: (offset: number, sort: string) => Promise<{ rows: Row[]; total?: number }>
  onSortChange: (sort: string) => void
  onOrderChange: (ids: string[]) => void
  onOpen: (row: Row) => void
  onLoad: (total: number) => void
  onFailure: (error: unknown) => void
  handleRef: RefObject<PartsListHandle | null>
}

/** A list of any length, read a block at a time as it is scrolled. Enter and a click open the row. */
export function PartsListGrid<Row extends { id: string }>(props: PartsListGridProps<Row>) {
  const { columns, sort, blockSize, label, onSortChange, onOrderChange, onOpen } = props
  const api = useRef<GridApi<Row> | null>(null)
  const initialSort = useRef(sort)
  useHandle(props.handleRef, api)
  const datasource = useDatasource(props)
  const isForFingers = useMediaQuery('(pointer: coarse)') === true
  const columnDefs = useMemo(() => columns.map((column) => columnDef(column, initialSort.current)), [columns])

  useEffect(() => {
    // The address may change from outside, by Back or by clearing the search.
    const grid = api.current
    if (!grid || sortOf(grid) === sort) return
    grid.applyColumnState({ state: sortState(sort), defaultState: { sort: null } })
  }, [sort])

  const handleSortChanged = useCallback(
    ({ api: grid }: { api: GridApi<Row> }) => onSortChange(sortOf(grid)),
    [onSortChange],
  )
  const handleColumnMoved = useCallback(
    (event: ColumnMovedEvent<Row>) => {
      if (event.finished && event.source === 'uiColumnMoved')
        onOrderChange(event.api.getAllDisplayedColumns().map((column) => column.getColId()))
    },
    [onOrderChange],
  )
  const handleKey = useCallback(
    (event: CellKeyDownEvent<Row> | { event?: Event | null; data?: Row }) => {
      const key = event.event
      if (key instanceof KeyboardEvent && key.key === 'Enter' && event.data) onOpen(event.data)
    },
    [onOpen],
  )
  const handleClick = useCallback(
    (event: RowClickedEvent<Row>) => {
      const target = event.event?.target
      if (!event.data || (target instanceof Element && target.closest('a'))) return
      onOpen(event.data)
    },
    [onOpen],
  )

  return (
    <section className="h-full" aria-label={label}>
      <AgGridReact<Row>
        theme={isForFingers ? partsListThemeForFingers : partsListTheme}
        rowModelType="infinite"
        cacheBlockSize={blockSize}
        maxBlocksInCache={20}
        cacheOverflowSize={2}
        infiniteInitialRowCount={1}
        blockLoadDebounceMillis={60}
        datasource={datasource}
        columnDefs={columnDefs}
        getRowId={rowId}
        tooltipShowDelay={300}
        suppressDragLeaveHidesColumns
        onGridReady={(event) => {
          api.current = event.api
        }}
        onSortChanged={handleSortChanged}
        onColumnMoved={handleColumnMoved}
        onCellKeyDown={handleKey}
        onRowClicked={handleClick}
        suppressNoRowsOverlay
      />
    </section>
  )
}

function rowId(params: { data: { id: string } }): string {
  return params.data.id
}

function useDatasource<Row extends { id: string }>({
  loadBlock,
  onLoad,
  onFailure,
}: Pick<PartsListGridProps<Row>, 'loadBlock' | 'onLoad' | 'onFailure'>): IDatasource {
  return useMemo(() => {
    let total: number | undefined
    return {
      getRows: async (params: IGetRowsParams<Row>) => {
        const sort = params.sortModel
          .map(({ colId, sort: direction }) => (direction === 'desc' ? `-${colId}` : colId))
          .join(',')
        try {
          const block = await loadBlock(params.startRow, sort)
          total = block.total ?? total
          params.successCallback(block.rows, total)
          if (params.startRow === 0) onLoad(total ?? block.rows.length)
        } catch (error) {
          params.failCallback()
          onFailure(error)
        }
      },
    }
  }, [loadBlock, onLoad, onFailure])
}

function useHandle<Row>(
  handleRef: RefObject<PartsListHandle | null>,
  api: RefObject<GridApi<Row> | null>,
): void {
  useImperativeHandle(handleRef, () => ({
    refresh: () => api.current?.refreshInfiniteCache(),
    reload: () => api.current?.purgeInfiniteCache(),
    focusFirstRow: () => {
      const first = api.current?.getAllDisplayedColumns()[0]
      if (first) api.current?.setFocusedCell(0, first)
    },
  }))
}

function columnDef<Row>(column: PartsListColumn<Row>, initialSort: string): ColDef<Row> {
  const sorted = sortState(initialSort).find((state) => state.colId === column.id)
  const { Cell } = column
  return {
    colId: column.id,
    headerName: column.heading,
    headerTooltip: column.name,
    type: column.isFigure ? 'rightAligned' : undefined,
    headerComponentParams: {
      innerHeaderComponent: PartsListHeading,
      innerHeaderComponentParams: { unitText: column.unitText, fullName: column.name },
    },
    initialWidth: column.width,
    minWidth: 56,
    hide: !column.isShown,
    pinned: column.isPinned ? 'left' : undefined,
    lockPinned: true,
    lockPosition: column.isPinned ? 'left' : undefined,
    sortable: column.isSortable,
    initialSort: sorted?.sort ?? null,
    initialSortIndex: sorted?.sortIndex,
    suppressHeaderMenuButton: true,
    valueGetter: ({ data }) => (data ? column.text(data) : ''),
    cellRenderer: Cell
      ? ({ data }: CustomCellRendererProps<Row>) => (data ? <Cell row={data} /> : '…')
      : undefined,
  }
}

function sortState(sort: string) {
  return sort
    .split(',')
    .filter(Boolean)
    .map((term, sortIndex) => ({
      colId: term.replace(/^-/, ''),
      sort: term.startsWith('-') ? ('desc' as const) : ('asc' as const),
      sortIndex,
    }))
}

function sortOf<Row>(grid: GridApi<Row>): string {
  return grid
    .getColumnState()
    .filter((column) => column.sort)
    .sort((one, other) => (one.sortIndex ?? 0) - (other.sortIndex ?? 0))
    .map((column) => (column.sort === 'desc' ? `-${column.colId}` : column.colId))
    .join(',')
}
