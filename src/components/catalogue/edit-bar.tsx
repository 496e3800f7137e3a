'use client'

import { CircleX, ListChecks, Redo2, Undo2 } from 'lucide-react'
import { type RefObject, useState } from 'react'
import type { PartsListHandle } from '@/components/grid/parts-list-grid'
import { Button } from '@/components/ui/button'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import type { EditRefusal } from './edit-refusal'
import type { GridEditing } from './use-grid-editing'

export interface EditBarProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  editing: GridEditing<Row>
  grid: RefObject<PartsListHandle | null>
  /** How many the list has; null while nobody knows. */
  total: number | null
  isNarrowed: boolean
  onChangeSelected: () => void
  onChangeFound: () => void
  onDone: () => void
}

/** Over a list that is being edited: how, what can be taken back, what was not taken, and the rows selected. */
export default function EditBar<Row extends CatalogueRow>(props: EditBarProps<Row>) {
  const { definition, editing, grid, total } = props
  const { selected, refusals, undoName, redoName } = editing
  const [isHeld, setIsHeld] = useState(false)
  const refusal = refusals.at(-1)

  async function handleDone() {
    if ((await editing.settledRefusals()) > 0) setIsHeld(true)
    else props.onDone()
  }

  return (
    <div className="flex flex-col gap-1 px-4 pb-1 lg:px-6 print:hidden">
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2">
        <Button size="compact" disabled={!undoName || editing.isBusy} onClick={editing.undo}>
          <Undo2 aria-hidden="true" className="size-4.5 shrink-0" />
          <span className="max-w-72 truncate">Undo{undoName ? `: ${undoName}` : ''}</span>
        </Button>
        <Button
          size="compact"
          disabled={!redoName || editing.isBusy}
          title={redoName ?? undefined}
          onClick={editing.redo}
        >
          <Redo2 aria-hidden="true" className="size-4.5" />
          Redo
        </Button>
        <Button
          size="compact"
          className="ml-auto"
          disabled={selected.length === 0}
          onClick={props.onChangeSelected}
        >
          <ListChecks aria-hidden="true" className="size-4.5" />
          {selected.length === 0 ? 'Change the rows selected' : `Change ${selected.length} selected`}
        </Button>
        <Button size="compact" disabled={!total} onClick={props.onChangeFound}>
          Change all {total ? `${total.toLocaleString('en')} ` : ''}
          {props.isNarrowed ? 'found' : definition.many}
        </Button>
        <Button size="compact" variant="primary" onClick={() => void handleDone()}>
          Done editing
        </Button>
      </div>
      {/* As high with a refusal as without: the rows below stay under the pointer. */}
      <div className="flex h-12 items-center">
        {refusal ? (
          <RefusalLine
            key={`${refusal.row.id} ${refusal.columnId}`}
            {...{ refusal, editing, grid, isHeld }}
            onDone={props.onDone}
          />
        ) : (
          <p className="text-ink-soft line-clamp-2 text-sm">
            Editing: a double click, F2 or typing changes a cell; Enter keeps it, Esc leaves it. Space selects
            a row. {editing.isBusy ? <span role="status">Saving …</span> : null}
          </p>
        )}
      </div>
    </div>
  )
}

function RefusalLine<Row extends CatalogueRow>({
  refusal,
  editing,
  grid,
  isHeld,
  onDone,
}: {
  refusal: EditRefusal<Row>
  editing: GridEditing<Row>
  grid: RefObject<PartsListHandle | null>
  /** Done was pressed while it stood. */
  isHeld: boolean
  onDone: () => void
}) {
  const { row, columnId, text, message, isStale } = refusal
  const label = editing.fields.find(({ path }) => path === columnId)?.label ?? columnId
  const others = editing.refusals.length - 1
  return (
    <div className="border-collision bg-collision-wash flex h-full min-w-0 flex-1 items-center gap-2.5 border-l-4 px-3">
      <CircleX aria-hidden="true" className="text-collision size-5 shrink-0" />
      <p role="alert" className="line-clamp-2 min-w-0 flex-1 text-sm">
        {isHeld ? <strong>Not saved, so editing is not done. </strong> : null}
        <strong>
          {row.code}, {label}
        </strong>{' '}
        was not changed to “{text}”. {message}
        {others > 0 ? ` ${others} more ${others === 1 ? 'was' : 'were'} not taken.` : ''}
      </p>
      {isStale ? (
        <Button size="compact" onClick={() => editing.handleEdit(row, columnId, text)}>
          Put mine over it
        </Button>
      ) : (
        <Button size="compact" onClick={() => grid.current?.editCell(row.id, columnId)}>
          Correct it
        </Button>
      )}
      <Button size="compact" variant="quiet" onClick={() => editing.takeBack(refusal)}>
        Leave it as it was
      </Button>
      {isHeld ? (
        <Button
          size="compact"
          variant="quiet"
          onClick={() => {
            for (const one of editing.refusals) editing.takeBack(one)
            onDone()
          }}
        >
          Drop {others > 0 ? `all ${others + 1}` : 'it'} and finish
        </Button>
      ) : null}
    </div>
  )
}
