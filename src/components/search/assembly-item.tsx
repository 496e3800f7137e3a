'use client'

import type { ReactNode } from 'react'
import { itemSizes } from '../reach/item-words'
import { useReading } from '../reach/use-reach-check'
import { ButtonLink } from '../ui/button'
import { AssemblyFigures } from './assembly-figures'
import { FetchList } from './fetch-list'
import { KeepAssembly } from './keep-assembly'
import {
  type AssemblyListing,
  reachCheckPath,
  type SearchedAssembly,
  sceneOfAssembly,
} from './listed-assembly'
import { OptionCut } from './option-cut'
import { OptionDrawing } from './option-drawing'

export interface AssemblyItemProps {
  assembly: SearchedAssembly
  /** Its place among what reaches; null where it falls short. */
  place: number | null
  listing: AssemblyListing
  /** What stands under the figures: why it is here. */
  children: ReactNode
}

/** One assembly of the answer: its section, what to set, what to fetch, and what can be done with it. */
export function AssemblyItem({ assembly, place, listing, children }: AssemblyItemProps) {
  const { unit, draft, isChosen, isFull, onChoose } = listing
  const reading = useReading()
  const { cutter, key, cautions } = assembly
  const name = `${cutter.code} in ${assembly.holder.code}`
  const scene = sceneOfAssembly(assembly, listing)
  const isPicked = isChosen(key)
  const cut = place === null ? null : <OptionCut estimate={assembly.estimate} unit={unit} />
  return (
    <li className="border-hairline grid grid-cols-[6.5rem_minmax(0,1fr)] gap-x-4 gap-y-3 border-b py-4 lg:grid-cols-[7.5rem_minmax(0,1fr)_17rem]">
      <div className="max-lg:row-span-1">
        {scene ? (
          <OptionDrawing
            name={`option-${key.replaceAll('.', '-')}`}
            scene={scene}
            answer={assembly.reach}
            unit={unit}
          />
        ) : null}
      </div>
      <div className="flex min-w-0 flex-col gap-2">
        <h3 className="text-lg">
          {place === null ? null : <span className="text-ink-soft font-normal">{place}. </span>}
          {name}
        </h3>
        <p className="text-ink-soft text-[0.9375rem] max-sm:hidden">{itemSizes(cutter, unit)}</p>
        <AssemblyFigures
          assembly={assembly}
          stickOutLabel={stickOutLabel(assembly, place)}
          material={draft.choices.material}
          unit={unit}
        />
        <div className="max-lg:hidden">{cut}</div>
        <div className="max-lg:hidden">{children}</div>
        <Cautions cautions={cautions} className="max-lg:hidden" />
      </div>
      <div className="flex min-w-0 flex-col gap-2 max-lg:col-span-2">
        <div className="lg:hidden">{cut}</div>
        <FetchList assembly={assembly} />
        <div className="lg:hidden">{children}</div>
        <Cautions cautions={cautions} className="lg:hidden" />
        <div className="flex flex-wrap items-center gap-2">
          {place === null ? null : <KeepAssembly assembly={assembly} listing={listing} />}
          <ButtonLink
            href={reachCheckPath(assembly, listing, reading)}
            prefetch={false}
            className="max-lg:min-h-16 max-lg:flex-1"
            aria-label={`Check and draw ${name}`}
          >
            Check and draw
          </ButtonLink>
          <label className="flex min-h-11 items-center gap-2 px-2 max-lg:min-h-16">
            <input
              type="checkbox"
              className="accent-accent size-5"
              checked={isPicked}
              disabled={isFull && !isPicked}
              onChange={() => onChoose(key)}
              aria-label={`Compare ${name}`}
            />
            Compare
          </label>
        </div>
      </div>
    </li>
  )
}

function stickOutLabel(assembly: SearchedAssembly, place: number | null) {
  if (place === null) return 'Stick-out as drawn'
  return 'builtAs' in assembly && assembly.builtAs ? 'Stick-out as built' : 'Stick-out to set'
}

function Cautions({ cautions, className }: { cautions: readonly string[]; className: string }) {
  return cautions.length === 0 ? null : (
    <ul className={`text-caution flex flex-col gap-0.5 text-[0.9375rem] ${className}`}>
      {cautions.map((text) => (
        <li key={text}>{text}</li>
      ))}
    </ul>
  )
}
