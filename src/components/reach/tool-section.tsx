'use client'

import type { ReactNode } from 'react'
import { ItemPicker } from './item-picker'
import { PickedItem } from './picked-item'
import type { ToolSlot } from './reach-fields'
import type { InputsProps } from './reach-inputs'

export interface ToolSectionProps extends InputsProps {
  slot: ToolSlot
  title: string
  pickedId: string | null
  loadError: Error | undefined
  filter?: Readonly<Record<string, string>>
  filterNote?: string | null
  /** How the fields are called while they are folded away. */
  summary: string
  isOpen: boolean
  children: ReactNode
}

/** One tool of the check: pick it from the crib, or type what it measures. */
export function ToolSection(props: ToolSectionProps) {
  const {
    slot,
    title,
    pickedId,
    rows,
    loadError,
    reading,
    onChange,
    filter,
    filterNote,
    summary,
    isOpen,
    children,
  } = props
  return (
    <section
      aria-labelledby={`reach-${slot}`}
      className="border-hairline flex flex-col gap-3 border-t px-4 py-3"
    >
      <h2 id={`reach-${slot}`} className="text-lg">
        {title}
      </h2>
      {pickedId === null ? (
        <ItemPicker
          slot={slot}
          label="Pick from the crib"
          unit={reading.unit}
          onPick={(id) => onChange({ type: 'pick', slot, id })}
          {...(filter ? { filter } : {})}
          {...(filterNote ? { filterNote } : {})}
        />
      ) : (
        <PickedItem
          slot={slot}
          id={pickedId}
          row={rows[slot] ?? null}
          error={loadError}
          unit={reading.unit}
          onRemove={() => onChange({ type: 'pick', slot, id: null })}
        />
      )}
      <details key={`${slot}-${isOpen}`} open={isOpen} className="group">
        <summary className="text-accent flex min-h-9 cursor-pointer items-center font-semibold pointer-coarse:min-h-11">
          {summary}
        </summary>
        <div className="grid grid-cols-2 gap-x-3 gap-y-3 pt-2">{children}</div>
      </details>
    </section>
  )
}
