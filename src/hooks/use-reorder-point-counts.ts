'use client'

import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { CatalogueCounts } from '@/schemas/catalogue-counts'
import { reorderPointsApiPath } from './use-reorder-points'

/**
 * How many reorder points each choice of the filters would leave; the last known until the next are there, none where
 * they can't be had. They wait until they are wanted: the rows themselves come first.
 */
export function useReorderPointCounts(query: string, isWanted: boolean): CatalogueCounts {
  const { data } = useSWR<{ counts: CatalogueCounts }, Error>(
    isWanted ? `${reorderPointsApiPath}/counts?${query}` : null,
    getJson,
    { keepPreviousData: true },
  )
  return data?.counts ?? {}
}
