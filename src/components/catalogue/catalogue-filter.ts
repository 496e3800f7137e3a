import type { SelectOption } from '@/components/ui/select-field'
import { makerListId } from './maker-list'

/** One way to narrow a list; `name` is the API's. A range of lengths has `name.min` and `name.max`. */
export type CatalogueFilter =
  | { kind: 'choice'; name: string; label: string; anyLabel: string; options: readonly SelectOption[] }
  | { kind: 'text'; name: string; label: string; listId?: string }
  | { kind: 'lengthRange'; name: string; label: string }

export function filterParamNames(filters: readonly CatalogueFilter[]): string[] {
  return filters.flatMap(({ kind, name }) =>
    kind === 'lengthRange' ? [`${name}.min`, `${name}.max`] : [name],
  )
}

/** Every kind of item is narrowed by these too. */
export const itemFilters: readonly CatalogueFilter[] = [
  { kind: 'text', name: 'maker', label: 'Maker', listId: makerListId },
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
    kind: 'choice',
    name: 'archived',
    label: 'Archived',
    anyLabel: 'Left out',
    options: [
      { value: 'all', label: 'Shown too' },
      { value: 'only', label: 'Only these' },
    ],
  },
]
