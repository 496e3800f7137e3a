'use client'

import useSWR from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { getJson } from '@/lib/api-client'
import type { FitsItem, FittingCutter } from '@/schemas/fits'

interface FitsPage<Row> {
  rows: Row[]
  total?: number
}

/** Where what fits an item is asked. */
export function itemFitsUrl(itemId: string): string {
  return `/api/items/${itemId}/fits?`
}

/** What of one kind fits what the address asks about, the first few or as many as an answer holds. */
export function useFits(url: string, kind: CatalogueKind, limit: number) {
  const { data, error, isLoading, mutate } = useSWR<FitsPage<FitsItem>, Error>(
    `${url}${url.endsWith('?') ? '' : '&'}kind=${kind}&limit=${limit}`,
    getJson,
    { keepPreviousData: true },
  )
  return { rows: data?.rows ?? [], total: data?.total, error, isLoading, retry: () => mutate() }
}

/** The cutters for a pocket; nothing is asked while the query is null. */
export function useFittingCutters(query: string | null) {
  const { data, error, isLoading, mutate } = useSWR<FitsPage<FittingCutter>, Error>(
    query === null ? null : `/api/fits/cutters?${query}`,
    getJson,
    { keepPreviousData: true },
  )
  return { rows: data?.rows ?? [], total: data?.total, error, isLoading, retry: () => mutate() }
}
