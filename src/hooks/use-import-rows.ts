import useSWRInfinite from 'swr/infinite'
import { getJson } from '@/lib/api-client'
import type { ImportRowResponse, RowOutcome } from '@/schemas/import'

interface Block {
  rows: ImportRowResponse[]
  nextCursor: string | null
}

/** The staged rows of one outcome, block after block in the order of the file. `checkedAt` tells one check from the next. */
export function useImportRows(id: string, outcome: RowOutcome, checkedAt: string | null) {
  const { data, error, isLoading, isValidating, setSize, mutate } = useSWRInfinite<Block, Error>(
    (index: number, before: Block | null) => {
      if (before && before.nextCursor === null) return null
      const cursor = before?.nextCursor ? `&cursor=${encodeURIComponent(before.nextCursor)}` : ''
      return [`/api/imports/${id}/rows?outcome=${outcome}&limit=100${cursor}`, checkedAt, index]
    },
    ([url]: [string]) => getJson<Block>(url),
    { revalidateFirstPage: false, revalidateOnFocus: false },
  )
  return {
    rows: data?.flatMap((block) => block.rows) ?? [],
    hasMore: data?.at(-1)?.nextCursor != null,
    error,
    isLoading,
    isLoadingMore: isValidating,
    more: () => void setSize((size) => size + 1),
    retry: () => void mutate(),
  }
}
