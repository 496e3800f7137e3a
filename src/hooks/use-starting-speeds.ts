'use client'

import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { StartingSpeed } from '@/schemas/starting-speed'

/** The shop's table of starting speeds, whole. */
export function useStartingSpeeds(initialRows?: StartingSpeed[]) {
  const { data, error, isLoading, mutate } = useSWR<{ rows: StartingSpeed[] }, Error>(
    '/api/starting-speeds',
    getJson,
    initialRows ? { fallbackData: { rows: initialRows } } : {},
  )
  return { rows: data?.rows ?? [], error, isLoading, refresh: () => mutate() }
}
