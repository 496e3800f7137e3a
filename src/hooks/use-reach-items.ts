'use client'

import useSWR from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { getJson } from '@/lib/api-client'
import { catalogueApiPath, itemApiPath } from '@/lib/catalogue-paths'
import type { CatalogueTypes } from '@/schemas/catalogue'

/** The row of what is picked for a check; nothing is asked while nothing is picked. */
export function useReachItem<Kind extends CatalogueKind>(kind: Kind, id: string | null) {
  const { data, error, isLoading } = useSWR<CatalogueTypes[Kind]['row'], Error>(
    id === null ? null : itemApiPath(kind, id),
    getJson,
    { revalidateOnFocus: false },
  )
  return { row: data ?? null, error, isLoading }
}

const offered = 12

/** What the crib offers for a search, with a filter of the list's own where there is one; null asks nothing. */
export function useReachOffers<Kind extends CatalogueKind>(
  kind: Kind,
  search: string | null,
  filter: Readonly<Record<string, string>> = {},
) {
  const query = new URLSearchParams({ ...filter, limit: String(offered) })
  if (search) query.set('q', search)
  const { data, error, isLoading } = useSWR<{ rows: CatalogueTypes[Kind]['row'][] }, Error>(
    search === null ? null : `${catalogueApiPath(kind)}?${query}`,
    getJson,
    { keepPreviousData: true, revalidateOnFocus: false },
  )
  return { rows: data?.rows ?? [], error, isLoading }
}
