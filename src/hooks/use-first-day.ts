'use client'

import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { FirstDay } from '@/schemas/first-day'

/** How far the shop's first day has come; asked only of those who keep the crib. */
export function useFirstDay(isAsked: boolean, first?: FirstDay) {
  const { data, mutate } = useSWR<FirstDay, Error>(
    isAsked ? '/api/first-day' : null,
    getJson,
    first ? { fallbackData: first } : {},
  )
  return { firstDay: data, refresh: () => mutate() }
}
