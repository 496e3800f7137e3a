'use client'

import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { CatalogueCounts } from '@/schemas/catalogue-counts'

/**
 * How many rows each choice of a list's filters would leave; the last known until the next are there, none where they
 * can't be had. They wait until they are wanted: the rows themselves come first.
 */
export function useListCounts(apiPath: string, query: string, isWanted: boolean): CatalogueCounts {
  const { data } = useSWR<{ counts: CatalogueCounts }, Error>(
    isWanted ? `${apiPath}/counts?${query}` : null,
    getJson,
    { keepPreviousData: true },
  )
  return data?.counts ?? {}
}
