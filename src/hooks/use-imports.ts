import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { ImportListRow } from '@/schemas/import'

const whileBusyMs = 2000

/** The newest imports; looked at again while one of them is under way. */
export function useImports(initialRows: ImportListRow[]) {
  const { data, error, isLoading, mutate } = useSWR<{ rows: ImportListRow[] }, Error>(
    '/api/imports?limit=100',
    getJson,
    {
      fallbackData: { rows: initialRows },
      refreshInterval: (latest) => ((latest?.rows ?? initialRows).some(isUnderWay) ? whileBusyMs : 0),
    },
  )
  return { rows: data?.rows ?? [], error, isLoading, refresh: mutate }
}

export function isUnderWay({ state }: Pick<ImportListRow, 'state'>): boolean {
  return state === 'reading' || state === 'committing'
}
