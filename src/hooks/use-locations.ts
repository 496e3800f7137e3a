import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { LocationContents, LocationResponse } from '@/schemas/location'

interface LocationPage {
  rows: LocationResponse[]
  nextCursor: string | null
}

/** Every place of the shop, read a block after another. */
async function readAll(url: string): Promise<LocationResponse[]> {
  const rows: LocationResponse[] = []
  let cursor: string | null = null
  do {
    const page: LocationPage = await getJson(cursor ? `${url}&cursor=${encodeURIComponent(cursor)}` : url)
    rows.push(...page.rows)
    cursor = page.nextCursor
  } while (cursor)
  return rows
}

export function useLocations() {
  const { data, error, isLoading, mutate } = useSWR<LocationResponse[]>('/api/locations?limit=500', readAll)
  return { data, error, isLoading, refresh: mutate }
}

/** The places that were archived; asked only of those who may bring one back. */
export function useArchivedLocations(isAsked: boolean) {
  const { data, error, mutate } = useSWR<LocationResponse[], Error>(
    isAsked ? '/api/locations?archived=only&limit=500' : null,
    readAll,
  )
  return { data, error, refresh: mutate }
}

/** What lies in a location and in all that stands in it. */
export function useLocationContents(id: string) {
  const { data, error, isLoading } = useSWR<LocationContents>(`/api/locations/${id}/contents`, getJson)
  return { data, error, isLoading }
}
