'use client'

import { useCribs } from '@/hooks/use-cribs'
import { useSuppliers } from '@/hooks/use-suppliers'
import type { CatalogueCounts } from '@/schemas/catalogue-counts'
import type { CatalogueView } from '../catalogue/catalogue-view'
import { classNames } from '../ui/class-names'
import { SelectField, type SelectOption } from '../ui/select-field'

/** By the names of the API. */
export const reorderPointFilterNames = ['cribId', 'stockState', 'supplierId'] as const
type FilterName = (typeof reorderPointFilterNames)[number]

const labels: Readonly<Record<FilterName, { label: string; any: string }>> = {
  cribId: { label: 'Crib', any: 'All cribs' },
  stockState: { label: 'Stock', any: 'Any' },
  supplierId: { label: 'Supplier', any: 'Any' },
}

const stateNames: Readonly<Record<string, string>> = {
  low: 'Low',
  above: 'Above the point',
  out: 'Out',
}

export interface ReorderPointFiltersProps {
  values: CatalogueView['filters']
  /** How many rows each choice would leave. */
  counts: CatalogueCounts
  onChange: (values: Record<string, string>) => void
  /** In one line over the list, or one under the other in a drawer. */
  shape: 'row' | 'column'
}

/** The ways to narrow the reorder points. */
export function ReorderPointFilters({ values, counts, onChange, shape }: ReorderPointFiltersProps) {
  function handleSet(name: FilterName, value: string) {
    const { [name]: _, ...others } = values
    onChange(value === '' ? others : { ...others, [name]: value })
  }
  const named = useNames()
  return reorderPointFilterNames.map((name) => (
    <SelectField
      key={name}
      label={labels[name].label}
      value={values[name] ?? ''}
      onChange={(event) => handleSet(name, event.target.value)}
      options={[
        { value: '', label: labels[name].any },
        ...choicesOf(counts[name] ?? [], values[name], (value) => named(name, value)),
      ]}
      className={classNames(shape === 'row' ? 'w-auto min-w-40 max-w-64' : 'w-full')}
    />
  ))
}

/** The cribs and suppliers there are: what no row has is a choice too, where the address asks for it. */
function useNames(): (name: FilterName, value: string) => string | undefined {
  const { data: cribs } = useCribs()
  const { data: suppliers } = useSuppliers({ withArchived: true })
  return (name, value) => {
    if (name === 'stockState') return stateNames[value]
    if (name === 'supplierId') return suppliers?.rows.find(({ id }) => id === value)?.name
    const crib = cribs?.rows.find(({ id }) => id === value)
    return crib && `${crib.code} · ${crib.name}`
  }
}

function choicesOf(
  counts: CatalogueCounts[string],
  chosen: string | undefined,
  nameOf: (value: string) => string | undefined,
): SelectOption[] {
  const options = counts.map(({ value, label, count }) => ({
    value,
    label: `${label ?? nameOf(value) ?? value} (${count.toLocaleString('en')})`,
  }))
  const isListed = chosen === undefined || options.some(({ value }) => value === chosen)
  return isListed
    ? options
    : [{ value: chosen, label: nameOf(chosen) ?? 'The one in the address' }, ...options]
}

/** Unlike in the catalogue, the crib narrows this list too. */
export function isListNarrowed({ q, filters }: CatalogueView): boolean {
  return q !== '' || Object.keys(filters).length > 0
}
