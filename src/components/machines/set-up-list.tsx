'use client'

import { CircleX } from 'lucide-react'
import { formatLength } from '@/lib/format-length'
import type { SetUpResponse } from '@/schemas/set-up'
import { useShop } from '../layout/shop-context'

export interface SetUpListProps {
  setUps: readonly SetUpResponse[]
  chosenId: string
  onChoose: (id: string) => void
}

/** The set-ups of a machine, each with the gauge lengths it takes. */
export function SetUpList({ setUps, chosenId, onChoose }: SetUpListProps) {
  return (
    <section aria-labelledby="set-ups" className="min-w-0">
      <h2 id="set-ups" className="border-ink border-b pb-1 text-lg">
        Set-ups
      </h2>
      <ul>
        {setUps.map((setUp) => {
          const isChosen = setUp.id === chosenId
          return (
            <li key={setUp.id} className="border-hairline border-b">
              <button
                type="button"
                aria-current={isChosen ? 'true' : undefined}
                className={`flex min-h-11 w-full flex-col px-3 py-2 text-left ${isChosen ? 'border-accent bg-accent-wash border-l-4' : 'hover:bg-accent-wash border-l-4 border-transparent'}`}
                onClick={() => onChoose(setUp.id)}
              >
                <span className="font-semibold">{setUp.name}</span>
                <WindowWords setUp={setUp} />
              </button>
            </li>
          )
        })}
      </ul>
    </section>
  )
}

function WindowWords({ setUp: { window } }: { setUp: SetUpResponse }) {
  const { unit } = useShop()
  if (!window?.possible) {
    return (
      <span className="text-collision flex items-center gap-1.5 text-sm font-semibold">
        <CircleX aria-hidden="true" className="size-4" />
        {window === null
          ? 'Heights that cannot be'
          : window.tableStrikeMm > 0
            ? 'Strikes the table'
            : 'No tool fits'}
      </span>
    )
  }
  const { shortest, longest } = window.gaugeLengthMm
  const from = shortest > 0 ? `${formatLength(shortest, unit, { withUnit: false })} to ` : 'up to '
  return (
    <span className="text-ink-soft text-sm">
      Gauge length {from}
      {formatLength(longest, unit)}
    </span>
  )
}
