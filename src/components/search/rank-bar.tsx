'use client'

import { useCribs } from '@/hooks/use-cribs'
import { useMachines, useSetUps } from '@/hooks/use-machines'
import type { SearchRanking } from '@/schemas/reach-search'
import { useCan } from '../layout/shop-context'
import { SelectField } from '../ui/select-field'
import type { SearchChoices } from './search-question'

export interface RankBarProps {
  choices: SearchChoices
  onChoices: (change: Partial<SearchChoices>) => void
}

const rankings: readonly { value: SearchRanking; label: string }[] = [
  { value: 'stiffness', label: 'Stiffest' },
  { value: 'stock', label: 'In stock now' },
  { value: 'built', label: 'Built already' },
]

/** What the list is ranked by, and whose stock counts: each asks again at once. */
export function RankBar({ choices, onChoices }: RankBarProps) {
  const seesCosts = useCan('seeCosts')
  const { data } = useCribs()
  const offered = seesCosts ? [...rankings, { value: 'cost' as const, label: 'Least cost' }] : rankings
  return (
    <div className="grid grid-cols-2 items-end gap-x-4 gap-y-2 sm:flex sm:flex-wrap">
      <SelectField
        label="First comes"
        className="sm:w-44"
        value={choices.rankBy}
        options={offered}
        onChange={(event) => onChoices({ rankBy: event.target.value as SearchRanking })}
      />
      <SelectField
        label="Crib"
        className="sm:w-52"
        value={choices.cribId ?? ''}
        options={[
          { value: '', label: 'All cribs' },
          ...(data?.rows ?? []).map(({ id, code, name }) => ({ value: id, label: `${code} · ${name}` })),
        ]}
        onChange={(event) => onChoices({ cribId: event.target.value || null })}
      />
      <MachineField choices={choices} onChoices={onChoices} />
      <label className="flex min-h-10 items-center gap-2 pointer-coarse:min-h-11">
        <input
          type="checkbox"
          className="accent-accent size-5"
          checked={choices.isInStockOnly}
          onChange={(event) => onChoices({ isInStockOnly: event.target.checked })}
        />
        Only what is in stock
      </label>
    </div>
  )
}

/** A machine, or one of its set-ups: what its spindle takes, and what its window does. Nothing where there is none. */
function MachineField({ choices, onChoices }: RankBarProps) {
  const machines = useMachines()
  const setUps = useSetUps('all')
  if (machines.rows.length === 0) return null
  const { machineId, setUpId } = choices
  return (
    <SelectField
      label="Machine and set-up"
      className="sm:w-64"
      value={setUpId ? `setup:${setUpId}` : machineId ? `machine:${machineId}` : ''}
      options={[
        { value: '', label: 'Any machine' },
        ...machines.rows.flatMap((machine) => [
          { value: `machine:${machine.id}`, label: `${machine.code} · ${machine.name}` },
          ...setUps.rows
            .filter((setUp) => setUp.machineId === machine.id)
            .map((setUp) => ({
              value: `setup:${setUp.id}`,
              label: `${machine.code} · set-up ${setUp.name}`,
            })),
        ]),
      ]}
      onChange={(event) => {
        const [kind, id = null] = event.target.value.split(':')
        onChoices({ machineId: kind === 'machine' ? id : null, setUpId: kind === 'setup' ? id : null })
      }}
    />
  )
}
