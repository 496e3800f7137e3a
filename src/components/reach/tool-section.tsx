'use client'

import type { ReactNode } from 'react'
import { FieldsFold } from './fields-fold'
import { ItemPicker } from './item-picker'
import { PickedItem } from './picked-item'
import type { ToolSlot } from './reach-fields'
import { hasFaultIn, type InputsProps } from './reach-inputs'

export interface ToolSectionProps extends InputsProps {
  slot: ToolSlot
  title: string
  pickedId: string | null
  loadError: Error | undefined
  filter?: Readonly<Record<string, string>>
  filterNote?: string | null
  /** What is to be known before anything is picked. */
  note?: string | null
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
    errors,
    loadError,
    reading,
    onChange,
    filter,
    filterNote,
    note,
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
      {note ? <p className="text-ink-soft text-sm">{note}</p> : null}
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
      <FieldsFold
        // What is picked comes folded; what is to be typed stands open.
        key={pickedId ?? 'typed'}
        summary={summary}
        isOpenAtFirst={isOpen}
        hasFault={hasFaultIn(errors, slot)}
        className="grid grid-cols-[repeat(auto-fill,minmax(10.5rem,1fr))] gap-3"
      >
        {children}
      </FieldsFold>
    </section>
  )
}
