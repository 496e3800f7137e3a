'use client'

import { ListChecks, Undo2 } from 'lucide-react'
import type { RefObject } from 'react'
import type { PartsListHandle } from '@/components/grid/parts-list-grid'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
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
export function EditBar<Row extends CatalogueRow>(props: EditBarProps<Row>) {
  const { definition, editing, grid, total } = props
  const { steps, selected, refusals } = editing
  const last = steps.at(-1)
  return (
    <div className="flex flex-col gap-2 px-4 pb-2 lg:px-6 print:hidden">
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2">
        <p className="text-ink-soft mr-auto text-sm">
          Editing: a double click, F2 or typing changes a cell; Enter keeps it, Esc leaves it. Space selects a
          row. {editing.isBusy ? <span role="status">Saving …</span> : null}
        </p>
        <Button size="compact" disabled={!last || editing.isBusy} onClick={editing.undo}>
          <Undo2 aria-hidden="true" className="size-4.5" />
          Undo{last ? `: ${last.name}` : ''}
        </Button>
        <Button size="compact" disabled={selected.length === 0} onClick={props.onChangeSelected}>
          <ListChecks aria-hidden="true" className="size-4.5" />
          {selected.length === 0 ? 'Change the rows selected' : `Change ${selected.length} selected`}
        </Button>
        <Button size="compact" disabled={!total} onClick={props.onChangeFound}>
          Change all {total ? `${total.toLocaleString('en')} ` : ''}
          {props.isNarrowed ? 'found' : definition.many}
        </Button>
        <Button size="compact" variant="primary" onClick={props.onDone}>
          Done editing
        </Button>
      </div>
      {refusals.map((refusal) => (
        <RefusalNotice key={`${refusal.row.id} ${refusal.columnId}`} {...{ refusal, editing, grid }} />
      ))}
    </div>
  )
}

function RefusalNotice<Row extends CatalogueRow>({
  refusal,
  editing,
  grid,
}: {
  refusal: EditRefusal<Row>
  editing: GridEditing<Row>
  grid: RefObject<PartsListHandle | null>
}) {
  const { row, columnId, text, message, isStale } = refusal
  const label = editing.fields.find(({ path }) => path === columnId)?.label ?? columnId
  return (
    <Notice kind="collision" isAnnounced>
      <p>
        <strong>
          {row.code}, {label}
        </strong>{' '}
        was not changed to “{text}”. {message}
      </p>
      <div className="mt-1 flex flex-wrap gap-2">
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
      </div>
    </Notice>
  )
}
