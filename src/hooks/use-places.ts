'use client'

import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { LocationResponse } from '@/schemas/location'

interface PlacePage {
  rows: LocationResponse[]
  total?: number
}

/** Places of one kind, by what their code holds; null asks nothing yet. */
export function usePlaces(kind: 'machine' | 'bin' | 'person' | null, code = '') {
  const search = code.trim() === '' ? '' : `&code=${encodeURIComponent(code.trim())}`
  const { data, error, isLoading } = useSWR<PlacePage, Error>(
    kind ? `/api/locations?kind=${kind}&limit=200${search}` : null,
    getJson,
    { keepPreviousData: true },
  )
  return { places: data?.rows ?? [], total: data?.total, error, isLoading }
}
