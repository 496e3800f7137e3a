import type { SelectOption } from '@/components/ui/select-field'
import { conditions } from '@/core/stock/kinds'
import { conditionNames } from './stock-words'

interface FilterName {
  /** The API's. */
  name: string
  label: string
  /** Out of sight until it is asked for or in use. */
  isMore?: boolean
}

/** One way to narrow a list. A range of lengths has `name.min` and `name.max`. */
export type CatalogueFilter = FilterName &
  /** What counts nothing widens the list instead of narrowing it. */
  (
    | { kind: 'choice'; anyLabel: string; options: readonly SelectOption[]; isUncounted?: true }
    /** The choices are what the counts have. */
    | { kind: 'counted'; anyLabel: string; unknownLabel: string }
    /** What the counts have is offered while typing. */
    | { kind: 'text' }
    /** The sizes there are most of are offered while typing; what is worked out for each row has none to offer. */
    | { kind: 'lengthRange'; isWorkedOut?: true }
  )

export function filterParamNames(filters: readonly CatalogueFilter[]): string[] {
  return filters.flatMap(({ kind, name }) =>
    kind === 'lengthRange' ? [`${name}.min`, `${name}.max`] : [name],
  )
}

/** Every kind of item is narrowed by these too. */
export const itemFilters: readonly CatalogueFilter[] = [
  { kind: 'text', name: 'maker', label: 'Maker' },
  {
    kind: 'counted',
    name: 'cribId',
    label: 'Stock of',
    anyLabel: 'All cribs',
    unknownLabel: 'The crib in the address',
  },
  {
    kind: 'choice',
    name: 'stockState',
    label: 'Stock',
    anyLabel: 'Any',
    options: [
      { value: 'inStock', label: 'In stock' },
      { value: 'low', label: 'Low' },
      { value: 'out', label: 'Out' },
    ],
  },
  {
    kind: 'counted',
    name: 'locationId',
    label: 'Location',
    anyLabel: 'Anywhere',
    unknownLabel: 'The place in the address',
  },
  {
    kind: 'choice',
    name: 'condition',
    label: 'Condition',
    anyLabel: 'Any',
    isMore: true,
    options: conditions.map((condition) => ({ value: condition, label: conditionNames[condition] })),
  },
  {
    kind: 'choice',
    name: 'archived',
    isMore: true,
    isUncounted: true,
    label: 'Archived',
    anyLabel: 'Left out',
    options: [
      { value: 'all', label: 'Shown too' },
      { value: 'only', label: 'Only these' },
    ],
  },
]
