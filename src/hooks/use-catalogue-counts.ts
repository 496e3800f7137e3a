'use client'

import useSWR from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { getJson } from '@/lib/api-client'
import { catalogueApiPath } from '@/lib/catalogue-paths'
import type { CatalogueCounts } from '@/schemas/catalogue-counts'

/**
 * How many rows each choice of one filter would leave; the last known until the next are there, none where they can't
 * be had. They wait until they are wanted: the rows themselves come first.
 */
export function useCatalogueCounts(
  kind: CatalogueKind,
  narrowing: string,
  facet: string,
  isWanted: boolean,
): CatalogueCounts[string] | undefined {
  const { data } = useSWR<{ counts: CatalogueCounts }, Error>(
    isWanted ? `${catalogueApiPath(kind)}/counts?${narrowing}${narrowing ? '&' : ''}of=${facet}` : null,
    getJson,
    { keepPreviousData: true },
  )
  return data?.counts[facet]
}
