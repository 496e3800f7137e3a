import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { Person } from '@/schemas/person'

/** Everyone of the shop. */
export function usePeople(initialRows?: Person[]) {
  const { data, error, isLoading, mutate } = useSWR<{ rows: Person[]; total: number }>(
    '/api/users',
    getJson,
    {
      ...(initialRows ? { fallbackData: { rows: initialRows, total: initialRows.length } } : {}),
    },
  )
  return { data, error, isLoading, refresh: mutate }
}
