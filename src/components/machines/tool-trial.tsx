'use client'

import type { CatalogueTypes } from '@/schemas/catalogue'
import { useShop } from '../layout/shop-context'
import { ItemPicker } from '../reach/item-picker'
import { PickedItem } from '../reach/picked-item'
import { LengthField } from '../ui/length-field'
import { Notice } from '../ui/notice'

type TrialSlot = 'cutter' | 'holder' | 'extension'

interface Picked<Slot extends TrialSlot> {
  row: CatalogueTypes[Slot]['row'] | null
  error: Error | undefined
}

export interface ToolTrialProps {
  cutter: Picked<'cutter'>
  holder: Picked<'holder'>
  extension: Picked<'extension'>
  ids: Readonly<Record<TrialSlot, string | null>>
  stickOutText: string
  problem: string | null
  onStickOut: (text: string) => void
  onPick: (slot: TrialSlot, id: string | null) => void
}

const slots: readonly { slot: TrialSlot; label: string }[] = [
  { slot: 'holder', label: 'Holder' },
  { slot: 'extension', label: 'Extension, where there is one' },
  { slot: 'cutter', label: 'Cutter, for the drawing' },
]

/** A tool to be tried in the daylight: a holder and a stick-out are enough. */
export function ToolTrial(props: ToolTrialProps) {
  const { unit, decimalComma } = useShop()
  const { ids, stickOutText, problem, onStickOut, onPick } = props
  return (
    <section aria-labelledby="try-a-tool" className="flex flex-col gap-3">
      <h2 id="try-a-tool" className="border-ink border-b pb-1 text-lg">
        Try a tool
      </h2>
      <div className="grid items-start gap-4 sm:grid-cols-2 xl:grid-cols-4">
        {slots.map(({ slot, label }) => {
          const id = ids[slot]
          return id === null ? (
            <ItemPicker
              key={slot}
              slot={slot}
              label={label}
              unit={unit}
              onPick={(picked) => onPick(slot, picked)}
            />
          ) : (
            <div key={slot}>
              <p className="mb-1 text-[0.9375rem] font-semibold">{label}</p>
              <PickedItem
                slot={slot}
                id={id}
                row={props[slot].row}
                error={props[slot].error}
                unit={unit}
                onRemove={() => onPick(slot, null)}
              />
            </div>
          )
        })}
        <LengthField
          label="Stick-out"
          value={stickOutText}
          onTextChange={onStickOut}
          unit={unit}
          decimalComma={decimalComma}
          drillSizes={false}
          hint="Nose face to tip."
        />
      </div>
      {problem ? (
        <Notice kind="caution" isAnnounced>
          {problem}
        </Notice>
      ) : null}
    </section>
  )
}
