import { type CatalogueView, readView } from './catalogue-view'

interface KnownColumn {
  id: string
  isSortable: boolean
}

/** A saved view as it can be shown today, and what of it means nothing any more, in words. */
export function openedView(
  query: string,
  filterNames: readonly string[],
  columns: readonly KnownColumn[],
): { view: CatalogueView; leftOut: string[] } {
  const params = new URLSearchParams(query)
  const view = readView(params, filterNames)
  const ids = new Set(columns.map(({ id }) => id))
  const sortable = new Set(columns.filter(({ isSortable }) => isSortable).map(({ id }) => id))
  const goneColumns = view.columns?.filter((id) => !ids.has(id)) ?? []
  const sort = view.sort.split(',').filter(Boolean)
  const goneSort = sort.filter((term) => !sortable.has(term.replace(/^-/, '')))
  const known = new Set(['q', 'sort', 'columns', ...filterNames])
  const goneFilters = [...params.keys()].filter((name) => !known.has(name))
  const kept = view.columns?.filter((id) => ids.has(id)) ?? null
  return {
    view: {
      ...view,
      columns: kept && kept.length > 0 ? kept : null,
      sort: sort.filter((term) => !goneSort.includes(term)).join(','),
    },
    leftOut: [
      ...goneColumns.map((id) => `the column “${id}”`),
      ...goneSort.map((term) => `the sorting by “${term.replace(/^-/, '')}”`),
      ...goneFilters.map((name) => `the filter “${name}”`),
    ],
  }
}
