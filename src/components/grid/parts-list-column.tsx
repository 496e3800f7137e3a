import type { ColDef } from 'ag-grid-community'
import type { CustomCellRendererProps } from 'ag-grid-react'
import type { ComponentType } from 'react'
import { PartsListHeading } from './parts-list-heading'

export interface PartsListColumn<Row> {
  id: string
  heading: string
  name: string
  /** Under a symbol, what a shop calls it. */
  word?: string | undefined
  unitText: string
  width: number
  isFigure: boolean
  isSortable: boolean
  isShown: boolean
  isPinned?: boolean
  text: (row: Row) => string
  /** Where plain text is not enough. */
  Cell?: ComponentType<{ row: Row }>
  /** While the list is being edited, and only for what can be. */
  edit?: CellEdit<Row>
}

export interface CellEdit<Row> {
  isEditable: (row: Row) => boolean
  /** The value as it would be typed. */
  text: (row: Row) => string
  /** Where one of a few is chosen instead. */
  choices?: readonly { value: string; label: string }[]
  /** What was typed and why it was not taken, until it is mended or taken back. */
  refusal: (row: Row) => { text: string; message: string } | undefined
}

export function columnDef<Row>(column: PartsListColumn<Row>, initialSort: string): ColDef<Row> {
  const sorted = sortState(initialSort).find((state) => state.colId === column.id)
  const { Cell, edit } = column
  return {
    colId: column.id,
    headerName: column.heading,
    type: column.isFigure ? 'rightAligned' : undefined,
    headerComponentParams: {
      innerHeaderComponent: PartsListHeading,
      innerHeaderComponentParams: { unitText: column.unitText, word: column.word, fullName: column.name },
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
    ...(edit ? editedCell(column, edit) : { valueGetter: ({ data }) => (data ? column.text(data) : '') }),
    cellRenderer:
      Cell && !edit
        ? ({ data }: CustomCellRendererProps<Row>) => (data ? <Cell row={data} /> : '…')
        : undefined,
  }
}

/** A cell that can be typed into opens with the value as it would be typed, not as it is shown rounded. */
function editedCell<Row>(column: PartsListColumn<Row>, edit: CellEdit<Row>): Partial<ColDef<Row>> {
  const { choices } = edit
  return {
    editable: ({ data }) => data !== undefined && edit.isEditable(data),
    valueGetter: ({ data }) => (data ? (edit.refusal(data)?.text ?? edit.text(data)) : ''),
    valueFormatter: choices
      ? ({ value }) => choices.find((choice) => choice.value === value)?.label ?? String(value ?? '')
      : ({ data }) => (data ? (edit.refusal(data)?.text ?? column.text(data)) : ''),
    cellEditor: choices ? 'agSelectCellEditor' : 'agTextCellEditor',
    cellEditorParams: choices ? { values: choices.map((choice) => choice.value) } : { useFormatter: false },
    cellClassRules: {
      'parts-list-editable': ({ data }) => data !== undefined && edit.isEditable(data),
      'parts-list-refused': ({ data }) => data !== undefined && edit.refusal(data) !== undefined,
    },
    tooltipValueGetter: ({ data }) => (data ? edit.refusal(data)?.message : undefined),
  }
}

export function sortState(sort: string) {
  return sort
    .split(',')
    .filter(Boolean)
    .map((term, sortIndex) => ({
      colId: term.replace(/^-/, ''),
      sort: term.startsWith('-') ? ('desc' as const) : ('asc' as const),
      sortIndex,
    }))
}
