'use client'

import useSWR from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { getJson } from '@/lib/api-client'
import { catalogueApiPath } from '@/lib/catalogue-paths'
import type { CatalogueCounts } from '@/schemas/catalogue-counts'

/**
 * How many rows each choice of the filters would leave; the last known until the next are there, none where they can't
 * be had. They wait until they are wanted: the rows themselves come first.
 */
export function useCatalogueCounts(kind: CatalogueKind, query: string, isWanted: boolean): CatalogueCounts {
  const { data } = useSWR<{ counts: CatalogueCounts }, Error>(
    isWanted ? `${catalogueApiPath(kind)}/counts?${query}` : null,
    getJson,
    { keepPreviousData: true },
  )
  return data?.counts ?? {}
}
