'use client'

import {
  type CellEditRequestEvent,
  type CellKeyDownEvent,
  CellStyleModule,
  ColumnApiModule,
  type ColumnMovedEvent,
  type GridApi,
  type IDatasource,
  type IGetRowsParams,
  InfiniteRowModelModule,
  ModuleRegistry,
  RenderApiModule,
  RowApiModule,
  type RowClickedEvent,
  RowSelectionModule,
  type RowSelectionOptions,
  SelectEditorModule,
  type SelectionColumnDef,
  TextEditorModule,
  TooltipModule,
} from 'ag-grid-community'
import { AgGridReact } from 'ag-grid-react'
import { type RefObject, useCallback, useEffect, useImperativeHandle, useMemo, useRef } from 'react'
import { useMediaQuery } from '@/components/ui/use-media-query'
import { columnDef, type PartsListColumn, sortState } from './parts-list-column'
import { partsListTheme, partsListThemeForFingers } from './parts-list-theme'

ModuleRegistry.registerModules([
  InfiniteRowModelModule,
  CellStyleModule,
  ColumnApiModule,
  TooltipModule,
  RowApiModule,
  RenderApiModule,
  RowSelectionModule,
  TextEditorModule,
  SelectEditorModule,
])

const checkboxes: RowSelectionOptions = {
  mode: 'multiRow',
  headerCheckbox: false,
  enableClickSelection: false,
}

const checkboxColumn: SelectionColumnDef = {
  headerName: 'Select',
  width: 72,
  pinned: 'left',
  lockPosition: 'left',
  suppressHeaderMenuButton: true,
}

export interface PartsListHandle {
  /** Reads again what is on screen: something was saved. */
  refresh: () => void
  /** Reads all again: the last try failed. */
  reload: () => void
  focusFirstRow: () => void
  /** Shows rows as they have become, where they are loaded. */
  showRows: (rows: readonly { id: string }[]) => void
  /** Draws a row's cells again: what is known of them beside the row has changed. */
  redrawRow: (id: string) => void
  editCell: (id: string, columnId: string) => void
  clearSelection: () => void
  /** The rows loaded around the first one on screen, and how many come before them. */
  loadedRows: () => { first: number; rows: readonly { id: string }[] }
}

export interface PartsListEditing<Row> {
  /** Something was typed into a cell; the list shows it only once it is in the row. */
  onEdit: (row: Row, columnId: string, text: string) => void
  onSelect: (rows: Row[]) => void
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
  /** Present while cells are edited and rows selected: a click and Enter then open no row. */
  editing?: PartsListEditing<Row> | undefined
}

/** A list of any length, read a block at a time as it is scrolled. Enter and a click open the row. */
export function PartsListGrid<Row extends { id: string }>(props: PartsListGridProps<Row>) {
  const { columns, sort, blockSize, label, onSortChange, onOrderChange, onOpen, editing } = props
  const isEditing = editing !== undefined
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
      if (key instanceof KeyboardEvent && key.key === 'Enter' && event.data && !isEditing) onOpen(event.data)
    },
    [onOpen, isEditing],
  )
  const handleClick = useCallback(
    (event: RowClickedEvent<Row>) => {
      const target = event.event?.target
      if (!event.data || isEditing || (target instanceof Element && target.closest('a'))) return
      onOpen(event.data)
    },
    [onOpen, isEditing],
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
        blockLoadDebounceMillis={25}
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
        readOnlyEdit
        rowSelection={isEditing ? checkboxes : undefined}
        selectionColumnDef={checkboxColumn}
        stopEditingWhenCellsLoseFocus
        onCellEditRequest={(event: CellEditRequestEvent<Row>) => {
          if (event.data) editing?.onEdit(event.data, event.column.getColId(), String(event.newValue ?? ''))
        }}
        onSelectionChanged={(event) => editing?.onSelect(event.api.getSelectedRows())}
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
    showRows: (rows) => {
      for (const row of rows) api.current?.getRowNode(row.id)?.setData(row as Row)
    },
    redrawRow: (id) => {
      const node = api.current?.getRowNode(id)
      if (node) api.current?.refreshCells({ rowNodes: [node], force: true })
    },
    editCell: (id, columnId) => {
      const rowIndex = api.current?.getRowNode(id)?.rowIndex
      if (rowIndex == null) return
      api.current?.setFocusedCell(rowIndex, columnId)
      api.current?.startEditingCell({ rowIndex, colKey: columnId })
    },
    clearSelection: () => api.current?.deselectAll(),
    loadedRows: () => loadedRun(api.current),
  }))
}

/** A block further up or down may not be loaded: only what hangs together is answered. */
function loadedRun<Row>(grid: GridApi<Row> | null): { first: number; rows: { id: string }[] } {
  if (!grid) return { first: 0, rows: [] }
  const rowAt = (index: number) => grid.getDisplayedRowAtIndex(index)?.data as { id: string } | undefined
  const shown = Math.max(0, grid.getFirstDisplayedRowIndex())
  let first = shown
  while (first > 0 && rowAt(first - 1)) first -= 1
  const rows: { id: string }[] = []
  for (let row = rowAt(first); row; row = rowAt(first + rows.length)) rows.push(row)
  return { first, rows }
}

function sortOf<Row>(grid: GridApi<Row>): string {
  return grid
    .getColumnState()
    .filter((column) => column.sort)
    .sort((one, other) => (one.sortIndex ?? 0) - (other.sortIndex ?? 0))
    .map((column) => (column.sort === 'desc' ? `-${column.colId}` : column.colId))
    .join(',')
}
