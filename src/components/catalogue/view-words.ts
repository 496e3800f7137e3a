import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'
import type { CatalogueCounts } from '@/schemas/catalogue-counts'
import type { CatalogueFilter } from './catalogue-filter'
import type { CatalogueView } from './catalogue-view'

/** What a list is narrowed by, in a sentence that stands without the page; empty where it is not. */
export function viewWords(
  { q, filters: values }: Pick<CatalogueView, 'q' | 'filters'>,
  filters: readonly CatalogueFilter[],
  { unit }: { unit: LengthUnit },
  known: Readonly<Record<string, CatalogueCounts[string] | undefined>> = {},
): string {
  const parts = filters.flatMap((filter) => {
    const words = filterWords(filter, values, unit, known[filter.name])
    return words ? [`${filter.label}: ${words}`] : []
  })
  const all = q ? [`Search: “${q}”`, ...parts] : parts
  return all.length > 0 ? `${all.join('. ')}.` : ''
}

function filterWords(
  filter: CatalogueFilter,
  values: Readonly<Record<string, string>>,
  unit: LengthUnit,
  known: CatalogueCounts[string] | undefined,
): string {
  if (filter.kind === 'lengthRange') {
    const [from, to] = ['min', 'max'].map((bound) => values[`${filter.name}.${bound}`])
    return [from && `from ${lengthWords(from, unit)}`, to && `to ${lengthWords(to, unit)}`]
      .filter(Boolean)
      .join(' ')
  }
  const value = values[filter.name]
  if (!value) return ''
  if (filter.kind === 'choice')
    return value
      .split(',')
      .map((one) => filter.options.find((option) => option.value === one)?.label ?? one)
      .join(', ')
  if (filter.kind === 'counted')
    return known?.find((choice) => choice.value === value)?.label ?? filter.unknownLabel
  return value
}

function lengthWords(text: string, unit: LengthUnit): string {
  const mm = Number(text)
  return Number.isFinite(mm) ? formatLength(mm, unit) : text
}
