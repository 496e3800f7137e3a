'use client'

import Link from 'next/link'
import { useState } from 'react'
import { isoGroupNames, isoGroups } from '@/core/speeds/iso-groups'
import type { BallSpeed } from '@/hooks/use-ball-speed'
import { useStartingSpeeds } from '@/hooks/use-starting-speeds'
import { substrateNames } from '@/lib/cutter-words'
import { formatSpeed, formatSpeedRange, speedInputText } from '@/lib/format-speed'
import type { StartingSpeed } from '@/schemas/starting-speed'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { controlClass, Field } from '../ui/field'

/** From a material and what the cutter is made of to the cutting speeds the shop starts with. */
export function MaterialSpeeds({ ballSpeed }: { ballSpeed: BallSpeed }) {
  const { rows, error } = useStartingSpeeds()
  const [chosenId, setChosenId] = useState('')
  const chosen = rows.find((row) => row.id === chosenId)
  return (
    <div className="col-span-2 flex flex-col gap-2">
      <Field label="Start from a material" hint={error ? error.message : undefined}>
        {(wiring) => (
          <select
            {...wiring}
            className={controlClass}
            value={chosen ? chosenId : ''}
            onChange={(event) => setChosenId(event.target.value)}
          >
            <option value="">None chosen</option>
            {isoGroups.map((group) => (
              <optgroup key={group} label={`${group} · ${isoGroupNames[group]}`}>
                {rows
                  .filter((row) => row.isoGroup === group)
                  .map((row) => (
                    <option key={row.id} value={row.id}>
                      {row.material} · {substrateNames[row.substrate]}
                    </option>
                  ))}
              </optgroup>
            ))}
          </select>
        )}
      </Field>
      {chosen ? <Offer speed={chosen} ballSpeed={ballSpeed} /> : null}
    </div>
  )
}

function Offer({ speed, ballSpeed }: { speed: StartingSpeed; ballSpeed: BallSpeed }) {
  const { unit, decimalComma } = useShop()
  const middle = (speed.lowMPerMin + speed.highMPerMin) / 2
  const ends = [
    { name: 'low', mPerMin: speed.lowMPerMin },
    { name: 'middle', mPerMin: middle },
    { name: 'high', mPerMin: speed.highMPerMin },
  ]
  return (
    <>
      <p className="text-[0.9375rem]" aria-live="polite">
        Starts at <strong>{formatSpeedRange(speed, unit)}</strong> on the largest effective diameter. A start,
        not a limit.{' '}
        <Link href="/starting-speeds" className="text-accent font-semibold hover:underline">
          The shop’s table
        </Link>
      </p>
      <div className="flex flex-wrap gap-2">
        {ends.map(({ name, mPerMin }) => (
          <Button
            key={name}
            size="compact"
            aria-label={`Take the ${name} speed, ${formatSpeed(mPerMin, unit)}`}
            onClick={() =>
              ballSpeed.type('wantedSpeedMPerMin', speedInputText(mPerMin, unit, { decimalComma }))
            }
          >
            {formatSpeed(mPerMin, unit)}
          </Button>
        ))}
      </div>
    </>
  )
}
