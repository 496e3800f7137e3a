'use client'

import useSWR from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { getJson } from '@/lib/api-client'
import type { SavedViewResponse } from '@/schemas/saved-view'

/** Whatever the order in which filters were set. */
function settled(query: string): string {
  return [...new URLSearchParams(query)].map(String).sort().join('&')
}

/** What the saved view is called that a list shows just now; a list that is as usual asks for none. */
export function useViewName(kind: CatalogueKind, query: string): string | undefined {
  const { data } = useSWR<{ rows: SavedViewResponse[] }, Error>(
    query === '' ? null : `/api/saved-views?kind=${kind}`,
    getJson,
  )
  return data?.rows.find((view) => settled(view.query) === settled(query))?.name
}
