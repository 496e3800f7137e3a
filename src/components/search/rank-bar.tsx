'use client'

import { useCribs } from '@/hooks/use-cribs'
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
      <label className="col-span-2 flex min-h-10 items-center gap-2 pointer-coarse:min-h-11">
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
