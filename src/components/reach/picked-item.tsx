'use client'

import { X } from 'lucide-react'
import Link from 'next/link'
import type { LengthUnit } from '@/core/units/length-unit'
import { itemPagePath } from '@/lib/catalogue-paths'
import type { CatalogueTypes } from '@/schemas/catalogue'
import { itemSizes, stockPlace } from './item-words'
import type { ToolSlot } from './reach-fields'

export interface PickedItemProps {
  slot: ToolSlot
  id: string
  row: CatalogueTypes[ToolSlot]['row'] | null
  error: Error | undefined
  unit: LengthUnit
  onRemove: () => void
}

/** What was picked from the crib: its code, its sizes, how many there are and the bin they lie in. */
export function PickedItem({ slot, id, row, error, unit, onRemove }: PickedItemProps) {
  return (
    <div className="border-accent bg-accent-wash flex items-start justify-between gap-2 border-l-4 py-1.5 pr-1 pl-3">
      <div className="min-w-0">
        {row ? (
          <PickedRow slot={slot} row={row} unit={unit} />
        ) : (
          <p role="status" className={error ? 'text-collision font-semibold' : 'text-ink-soft'}>
            {error ? error.message : `Reading ${slot} ${id} from the crib…`}
          </p>
        )}
      </div>
      <button
        type="button"
        className="hover:bg-sheet grid size-9 shrink-0 place-items-center rounded-[3px] pointer-coarse:size-11"
        aria-label={`Remove the ${slot} picked${row ? `, ${row.code}` : ''}`}
        onClick={onRemove}
      >
        <X aria-hidden="true" className="size-4.5" />
      </button>
    </div>
  )
}

function PickedRow({
  slot,
  row,
  unit,
}: Pick<PickedItemProps, 'slot' | 'unit'> & { row: CatalogueTypes[ToolSlot]['row'] }) {
  const place = stockPlace(row.stock)
  return (
    <>
      <p>
        <Link
          href={itemPagePath(slot, row.id)}
          className="text-accent inline-flex min-h-6 items-center font-semibold underline underline-offset-2"
        >
          {row.code}
        </Link>
        {row.archivedAt ? <span className="text-caution font-semibold"> · archived</span> : null}
      </p>
      <p className="text-sm">{itemSizes(row, unit)}</p>
      <p className={place.isOut ? 'text-collision text-sm font-semibold' : 'text-sm'}>{place.text}</p>
    </>
  )
}
