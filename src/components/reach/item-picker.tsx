'use client'

import { type KeyboardEvent, useId, useRef, useState } from 'react'
import type { LengthUnit } from '@/core/units/length-unit'
import { useReachOffers } from '@/hooks/use-reach-items'
import type { CatalogueTypes } from '@/schemas/catalogue'
import { controlClass } from '../ui/field'
import { itemSizes, stockPlace } from './item-words'
import type { ToolSlot } from './reach-fields'
import { useDebounced } from './use-debounced'

export interface ItemPickerProps<Slot extends ToolSlot> {
  slot: Slot
  label: string
  unit: LengthUnit
  onPick: (id: string, row: CatalogueTypes[Slot]['row']) => void
  /** Narrows what is offered, and says so. */
  filter?: Readonly<Record<string, string>>
  filterNote?: string | null
}

const searchDelayMs = 120

/** Finds an item of the crib by what is typed, forgiving a slip; arrows move, Enter picks, Escape closes. */
export function ItemPicker<Slot extends ToolSlot>(props: ItemPickerProps<Slot>) {
  const { slot, label, unit, onPick, filter, filterNote } = props
  const id = useId()
  const input = useRef<HTMLInputElement>(null)
  const [text, setText] = useState('')
  const [isOpen, setIsOpen] = useState(false)
  const [active, setActive] = useState(0)
  const search = useDebounced(text.trim(), searchDelayMs)
  const { rows, error, isLoading } = useReachOffers(slot, isOpen ? search : null, filter)
  const current = Math.min(active, rows.length - 1)

  function pick(row: CatalogueTypes[Slot]['row'] | undefined) {
    if (!row) return
    onPick(row.id, row)
    setText('')
    setIsOpen(false)
  }

  function handleKeyDown(event: KeyboardEvent) {
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault()
      if (!isOpen) setIsOpen(true)
      else setActive(Math.max(0, Math.min(rows.length - 1, current + (event.key === 'ArrowDown' ? 1 : -1))))
    } else if (event.key === 'Enter' && isOpen) {
      event.preventDefault()
      pick(rows[current])
    } else if (event.key === 'Escape') {
      setIsOpen(false)
    }
  }

  return (
    <div className="relative">
      <label htmlFor={id} className="text-[0.9375rem] font-semibold">
        {label}
      </label>
      <input
        ref={input}
        id={id}
        role="combobox"
        aria-expanded={isOpen}
        aria-controls={`${id}-list`}
        aria-autocomplete="list"
        aria-activedescendant={isOpen && rows[current] ? `${id}-${rows[current].id}` : undefined}
        autoComplete="off"
        spellCheck={false}
        className={`${controlClass} mt-1`}
        placeholder="Code, maker, part number or size"
        value={text}
        onChange={(event) => {
          setText(event.target.value)
          setActive(0)
          setIsOpen(true)
        }}
        onFocus={() => setIsOpen(true)}
        onBlur={() => setIsOpen(false)}
        onKeyDown={handleKeyDown}
      />
      {isOpen ? (
        <div className="border-ink bg-sheet absolute inset-x-0 top-full z-30 max-h-80 overflow-y-auto border shadow-lg">
          {filterNote ? (
            <p className="text-ink-soft border-hairline border-b px-3 py-1.5 text-sm">{filterNote}</p>
          ) : null}
          <div id={`${id}-list`} role="listbox" aria-label={label}>
            {rows.map((row, index) => (
              <ItemOption
                key={row.id}
                id={`${id}-${row.id}`}
                row={row}
                unit={unit}
                isActive={index === current}
                onPick={() => pick(row)}
                onPoint={() => setActive(index)}
              />
            ))}
          </div>
          <PickerState
            isLoading={isLoading}
            error={error}
            isEmpty={rows.length === 0}
            search={search}
            slot={slot}
            isNarrowed={Object.keys(filter ?? {}).length > 0}
          />
        </div>
      ) : null}
    </div>
  )
}

interface ItemOptionProps {
  id: string
  row: CatalogueTypes[ToolSlot]['row']
  unit: LengthUnit
  isActive: boolean
  onPick: () => void
  onPoint: () => void
}

function ItemOption({ id, row, unit, isActive, onPick, onPoint }: ItemOptionProps) {
  const place = stockPlace(row.stock)
  return (
    <button
      type="button"
      tabIndex={-1}
      id={id}
      role="option"
      aria-selected={isActive}
      className={`border-hairline flex min-h-11 w-full flex-col justify-center border-b text-left px-3 py-1.5 ${isActive ? 'bg-accent-wash' : ''}`}
      onPointerDown={(event) => {
        // The field keeps the focus, so the list is still there when the finger lifts.
        event.preventDefault()
      }}
      onClick={onPick}
      onPointerMove={onPoint}
    >
      <span className="flex items-baseline justify-between gap-3">
        <span className="font-semibold">{row.code}</span>
        <span className={`text-sm ${place.isOut ? 'text-collision font-semibold' : 'text-ink-soft'}`}>
          {place.text}
        </span>
      </span>
      <span className="text-ink-soft text-sm">
        {itemSizes(row, unit)}
        {row.description ? ` · ${row.description}` : ''}
      </span>
    </button>
  )
}

function PickerState(props: {
  isLoading: boolean
  error: Error | undefined
  isEmpty: boolean
  search: string
  slot: ToolSlot
  isNarrowed: boolean
}) {
  const { isLoading, error, isEmpty, search, slot, isNarrowed } = props
  const sentence = error
    ? error.message
    : isLoading && isEmpty
      ? 'Looking in the crib…'
      : isEmpty
        ? search === ''
          ? isNarrowed
            ? 'Nothing in the crib fits here.'
            : `There are no ${slot}s in the catalogue yet: they come in from a file, under Imports. The figures can be typed by hand too.`
          : `Nothing found for “${search}”.`
        : null
  return sentence ? (
    <p role="status" className="text-ink-soft px-3 py-2.5 text-sm">
      {sentence}
    </p>
  ) : null
}
