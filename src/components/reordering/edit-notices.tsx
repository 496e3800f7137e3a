'use client'

import { ListChecks, Trash2, Undo2 } from 'lucide-react'
import type { RefObject } from 'react'
import type { ReorderPointRow } from '@/schemas/reordering'
import type { EditRefusal } from '../catalogue/edit-refusal'
import type { PartsListHandle } from '../grid/parts-list-grid'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { editedFields } from './reorder-point-fields'
import type { ReorderPointEditing } from './use-reorder-point-editing'

export interface EditNoticesProps {
  editing: ReorderPointEditing
  grid: RefObject<PartsListHandle | null>
  onChangeSelected: () => void
  onRemoveSelected: () => void
}

/** Over the grid: how to edit it, what can be taken back, what was not taken, and what to think of. */
export function EditNotices({ editing, grid, onChangeSelected, onRemoveSelected }: EditNoticesProps) {
  const { steps, selected, refusals, cautions } = editing
  const last = steps.at(-1)
  const count = selected.length
  return (
    <div className="flex flex-col gap-2 px-4 pb-2 lg:px-6">
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2">
        <p className="text-ink-soft mr-auto text-sm">
          A double click, F2 or typing changes a cell; Enter keeps it, Esc leaves it. Space selects a row.{' '}
          {editing.isBusy ? <span role="status">Saving …</span> : null}
        </p>
        <Button size="compact" disabled={!last || editing.isBusy} onClick={editing.undo}>
          <Undo2 aria-hidden="true" className="size-4.5" />
          Undo{last ? `: ${last.name}` : ''}
        </Button>
        <Button size="compact" disabled={count === 0} onClick={onChangeSelected}>
          <ListChecks aria-hidden="true" className="size-4.5" />
          {count === 0 ? 'Change the rows selected' : `Change ${count} selected`}
        </Button>
        <Button size="compact" variant="quiet" disabled={count === 0} onClick={onRemoveSelected}>
          <Trash2 aria-hidden="true" className="size-4.5" />
          Take away
        </Button>
      </div>
      {refusals.map((refusal) => (
        <RefusalNotice
          key={`${refusal.row.id} ${refusal.columnId}`}
          refusal={refusal}
          editing={editing}
          grid={grid}
        />
      ))}
      {cautions.length > 0 ? <CautionNotice rows={cautions} onLeave={editing.leaveCautions} /> : null}
    </div>
  )
}

function RefusalNotice({
  refusal,
  editing,
  grid,
}: {
  refusal: EditRefusal<ReorderPointRow>
  editing: ReorderPointEditing
  grid: RefObject<PartsListHandle | null>
}) {
  const { row, columnId, text, message, isStale } = refusal
  const label = editedFields.find(({ field }) => field === columnId)?.label ?? columnId
  return (
    <Notice kind="collision" isAnnounced>
      <p>
        <strong>
          {row.itemCode} in {row.cribCode}, {label}
        </strong>{' '}
        was not changed{label === 'Supplier' ? '' : ` to “${text}”`}. {message}
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

function CautionNotice({ rows, onLeave }: { rows: readonly ReorderPointRow[]; onLeave: () => void }) {
  const [first, ...others] = rows
  if (!first) return null
  return (
    <Notice kind="caution" isAnnounced>
      <p>
        <strong>
          {first.itemCode} in {first.cribCode}
          {others.length > 0 ? ` and ${others.length} more` : ''}
        </strong>{' '}
        {others.length > 0 ? 'are' : 'is'} kept so. {first.caution}
      </p>
      <Button size="compact" variant="quiet" onClick={onLeave} className="mt-1">
        Leave it so
      </Button>
    </Notice>
  )
}
