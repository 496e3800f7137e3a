'use client'

import type { BallSpeed } from '@/hooks/use-ball-speed'
import { formatRpm } from '@/lib/format-speed'
import { speedLimitSentence } from '@/lib/speed-limit-words'
import { useShop } from '../layout/shop-context'
import { ItemPicker } from '../reach/item-picker'
import { PickedItem } from '../reach/picked-item'

/** A ball or a rounded corner of the crib, whose sizes and highest speed count from then on. */
export function CutterPick({ ballSpeed }: { ballSpeed: BallSpeed }) {
  const { unit } = useShop()
  const { cutter, pickCutter } = ballSpeed
  if (cutter.id === null) {
    return (
      <div className="col-span-2">
        <ItemPicker
          slot="cutter"
          label="Pick from the crib"
          unit={unit}
          filter={{ form: 'ball,cornerRadius' }}
          filterNote="Ball ends and corner radii. The sizes can be typed by hand too."
          onPick={(_, row) => pickCutter(row)}
        />
      </div>
    )
  }
  const typedMm = ballSpeed.reading.values.cuttingDiameterMm
  const isAnother = cutter.row !== null && Math.abs((typedMm ?? 0) - cutter.row.cuttingDiameterMm) > 1e-6
  return (
    <div className="col-span-2 flex flex-col gap-1">
      <PickedItem
        slot="cutter"
        id={cutter.id}
        row={cutter.row}
        error={cutter.error}
        unit={unit}
        onRemove={() => pickCutter(null)}
      />
      {isAnother ? (
        <p role="status" className="text-caution text-sm font-semibold">
          The diameter below is not this cutter’s: pick it again, or take it out.
        </p>
      ) : null}
    </div>
  )
}

/** The holder of the crib, for its highest speed, and which of the three caps the speed. */
export function HolderPick({ ballSpeed }: { ballSpeed: BallSpeed }) {
  const { unit } = useShop()
  const { cutter, holder, pickHolder, reading } = ballSpeed
  return (
    <div className="col-span-2 flex flex-col gap-2">
      <HolderChoice holder={holder} unit={unit} onPick={pickHolder} />
      <p className="text-[0.9375rem]" role="status">
        {speedLimitSentence({
          spindle: reading.values.maximumRpm ?? null,
          holder: holder.row?.maximumRpm ?? null,
          cutter: cutter.row?.maximumRpm ?? null,
        })}
      </p>
    </div>
  )
}

/** A holder to pick, or the one picked with what it may turn. */
export function HolderChoice({
  holder,
  unit,
  onPick,
}: {
  holder: BallSpeed['holder']
  unit: 'mm' | 'in'
  onPick: (id: string | null) => void
}) {
  const { id, row, error } = holder
  if (id === null) {
    return (
      <ItemPicker
        slot="holder"
        label="Holder, from the crib"
        unit={unit}
        onPick={(picked) => onPick(picked)}
      />
    )
  }
  return (
    <div>
      <p className="mb-1 text-[0.9375rem] font-semibold">Holder, from the crib</p>
      <PickedItem slot="holder" id={id} row={row} error={error} unit={unit} onRemove={() => onPick(null)} />
      {row ? (
        <p className={row.maximumRpm === null ? 'text-caution mt-1 text-sm font-semibold' : 'mt-1 text-sm'}>
          {row.maximumRpm === null
            ? 'The catalogue has no highest speed (RPMX) for this holder: ask its maker.'
            : `Highest speed (RPMX) ${formatRpm(row.maximumRpm)}.`}
        </p>
      ) : null}
    </div>
  )
}
