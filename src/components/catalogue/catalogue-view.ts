import type { CatalogueKind } from '@/core/stock/kinds'
import { catalogueApiPath } from '@/lib/catalogue-paths'

/** What of a catalogue is looked at, and how. All of it stands in the address bar. */
export interface CatalogueView {
  q: string
  /** `field,-field`, as the API takes it. */
  sort: string
  /** By the names of the API: `form`, `cuttingDiameterMm.min`, … */
  filters: Readonly<Record<string, string>>
  /** Ids in their order; null shows the usual ones. */
  columns: readonly string[] | null
}

const columnsParam = 'columns'

export function readView(params: URLSearchParams, filterNames: readonly string[]): CatalogueView {
  const filters: Record<string, string> = {}
  for (const name of filterNames) {
    const value = params.get(name)
    if (value) filters[name] = value
  }
  return {
    q: params.get('q') ?? '',
    sort: params.get('sort') ?? '',
    filters,
    columns: params.get(columnsParam)?.split(',').filter(Boolean) ?? null,
  }
}

export function viewParams(view: CatalogueView): URLSearchParams {
  const params = queryParams(view)
  if (view.columns) params.set(columnsParam, view.columns.join(','))
  return params
}

/** What the API is asked: everything but the columns. */
export function queryParams(view: Omit<CatalogueView, 'columns'>): URLSearchParams {
  const params = new URLSearchParams()
  if (view.q) params.set('q', view.q)
  for (const [name, value] of Object.entries(view.filters)) params.set(name, value)
  if (view.sort) params.set('sort', view.sort)
  return params
}

/** Whose stock the figures are of: it leaves every row in the list. */
const figuresOnly = 'cribId'

export function isNarrowed(view: CatalogueView): boolean {
  return view.q !== '' || hasFilters(view)
}

export function hasFilters({ filters }: CatalogueView): boolean {
  return Object.keys(filters).some((name) => name !== figuresOnly)
}

/** The search and the filters alone, as the API is asked what they leave. */
export function narrowingText(view: CatalogueView): string {
  return queryParams({ ...view, sort: '' }).toString()
}

/** Where the same rows are to be had as a file, with these columns. */
export function exportPath(kind: CatalogueKind, view: CatalogueView, columns: readonly string[]): string {
  return `${catalogueApiPath(kind)}/export?${viewParams({ ...view, columns })}`
}
