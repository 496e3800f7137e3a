'use client'

import { ArrowDown, ArrowUp } from 'lucide-react'
import { Popover } from 'radix-ui'
import { type RefObject, useEffect, useRef } from 'react'
import { buttonClass } from '@/components/ui/button'

export interface ChoosableColumn {
  id: string
  name: string
}

export interface ColumnChooserProps {
  /** All there are, in the list's own order. */
  columns: readonly ChoosableColumn[]
  /** Ids of those shown, in their order. The first stays first. */
  shown: readonly string[]
  onChange: (shown: string[] | null) => void
  isUsual: boolean
  /** The button it hangs from. */
  anchor: RefObject<HTMLElement | null>
  onClose: () => void
}

/** Which columns stand in the list and in what order; also by keyboard, which dragging a heading is not. */
export default function ColumnChooser(props: ColumnChooserProps) {
  const { columns, shown, onChange, isUsual, anchor, onClose } = props
  const byId = new Map(columns.map((column) => [column.id, column]))
  const shownColumns = shown.flatMap((id) => byId.get(id) ?? [])
  const hiddenColumns = columns.filter((column) => !shown.includes(column.id))

  const { toggledId, listsRef } = useFollowedToggle()

  function handleToggle(id: string, next: string[]) {
    toggledId.current = id
    onChange(next)
  }

  function handleMove(id: string, by: 1 | -1) {
    const next = [...shown]
    const from = next.indexOf(id)
    const [moved] = next.splice(from, 1)
    if (moved === undefined) return
    next.splice(from + by, 0, moved)
    onChange(next)
  }

  return (
    <Popover.Root open onOpenChange={(isOpen) => !isOpen && onClose()}>
      <Popover.Anchor virtualRef={anchor as RefObject<HTMLElement>} />
      <Popover.Portal>
        <Popover.Content
          ref={listsRef}
          aria-label="Columns"
          align="end"
          sideOffset={6}
          collisionPadding={8}
          onCloseAutoFocus={(event) => {
            event.preventDefault()
            anchor.current?.focus()
          }}
          className="bg-sheet border-ink z-40 flex max-h-(--radix-popover-content-available-height) w-92 flex-col overflow-y-auto border py-2 shadow-xl"
        >
          <ul aria-label="Shown">
            {shownColumns.map((column, index) => (
              <li key={column.id} className="flex items-center px-3">
                <ColumnCheck
                  column={column}
                  isShown
                  isFixed={index === 0}
                  onToggle={() =>
                    handleToggle(
                      column.id,
                      shown.filter((id) => id !== column.id),
                    )
                  }
                />
                <MoveButton
                  label={`Move ${column.name} to the left`}
                  isOff={index <= 1}
                  onMove={() => handleMove(column.id, -1)}
                  Mark={ArrowUp}
                />
                <MoveButton
                  label={`Move ${column.name} to the right`}
                  isOff={index === 0 || index === shownColumns.length - 1}
                  onMove={() => handleMove(column.id, 1)}
                  Mark={ArrowDown}
                />
              </li>
            ))}
          </ul>
          <ul aria-label="Not shown" className="border-hairline mt-2 border-t pt-2">
            {hiddenColumns.map((column) => (
              <li key={column.id} className="flex px-3">
                <ColumnCheck
                  column={column}
                  isShown={false}
                  onToggle={() => handleToggle(column.id, [...shown, column.id])}
                />
              </li>
            ))}
          </ul>
          <div className="border-hairline mt-2 border-t px-3 pt-2">
            <button
              type="button"
              className={buttonClass({ variant: 'quiet', size: 'compact' }, '-ml-3')}
              disabled={isUsual}
              onClick={() => onChange(null)}
            >
              Back to the usual columns
            </button>
          </div>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  )
}

/** The column that was just ticked stands in the other list now, and the keyboard follows it there. */
function useFollowedToggle() {
  const toggledId = useRef<string | null>(null)
  const listsRef = useRef<HTMLDivElement>(null)
  useEffect(() => {
    if (toggledId.current === null) return
    const input = listsRef.current?.querySelector<HTMLInputElement>(`input[name="${toggledId.current}"]`)
    toggledId.current = null
    input?.focus()
  })
  return { toggledId, listsRef }
}

function ColumnCheck({
  column,
  isShown,
  isFixed,
  onToggle,
}: {
  column: ChoosableColumn
  isShown: boolean
  isFixed?: boolean
  onToggle: () => void
}) {
  return (
    <label className="flex min-h-8 min-w-0 flex-1 items-center gap-2.5 text-[0.9375rem] pointer-coarse:min-h-11">
      <input
        type="checkbox"
        name={column.id}
        className="accent-accent size-4"
        checked={isShown}
        disabled={isFixed}
        onChange={onToggle}
      />
      <span className="min-w-0 flex-1 truncate">{column.name}</span>
    </label>
  )
}

function MoveButton({
  label,
  isOff,
  onMove,
  Mark,
}: {
  label: string
  isOff: boolean
  onMove: () => void
  Mark: typeof ArrowUp
}) {
  return (
    <button
      type="button"
      aria-label={label}
      disabled={isOff}
      onClick={onMove}
      className="text-accent hover:bg-accent-wash grid size-8 place-items-center rounded-[3px] disabled:opacity-25 pointer-coarse:size-11"
    >
      <Mark aria-hidden="true" className="size-4" />
    </button>
  )
}
