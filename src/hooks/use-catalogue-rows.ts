'use client'

import useSWRInfinite from 'swr/infinite'
import { getJson } from '@/lib/api-client'

export interface CatalogueBlock<Row> {
  rows: Row[]
  nextCursor: string | null
  total?: number
}

export const blockSize = 100

export function catalogueBlockUrl(apiPath: string, query: string, offset: number, limit = blockSize): string {
  return `${apiPath}?${query}${query ? '&' : ''}limit=${limit}&offset=${offset}`
}

/** A catalogue's rows one block after another, for a list that grows as it is scrolled. */
export function useCatalogueRows<Row>(apiPath: string, query: string) {
  const { data, error, isLoading, isValidating, size, setSize, mutate } = useSWRInfinite<
    CatalogueBlock<Row>,
    Error
  >((index: number) => catalogueBlockUrl(apiPath, query, index * blockSize), getJson)
  const rows = data?.flatMap((block) => block.rows) ?? []
  const total = data?.[0]?.total
  const isLastLoaded = data !== undefined && data.length === size
  return {
    rows,
    total,
    error,
    isLoading,
    isLoadingMore: isValidating && !isLastLoaded,
    hasMore: isLastLoaded && (data.at(-1)?.rows.length ?? 0) === blockSize && rows.length !== total,
    loadMore: () => setSize(size + 1),
    retry: () => mutate(),
  }
}
