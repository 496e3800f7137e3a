'use client'

import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { FixtureResponse } from '@/schemas/fixture'

/** The fixtures of the crib, by code: as many as a set-up is chosen from. */
export function useFixtures() {
  const { data, error, isLoading } = useSWR<{ rows: FixtureResponse[] }, Error>(
    '/api/fixtures?limit=500&sort=code',
    getJson,
    { revalidateOnFocus: false },
  )
  return { rows: data?.rows ?? [], error, isLoading }
}
