'use client'

import useSWR from 'swr'
import useSWRInfinite from 'swr/infinite'
import type { CatalogueKind } from '@/core/stock/kinds'
import { getJson } from '@/lib/api-client'
import { itemApiPath } from '@/lib/catalogue-paths'
import type { MovementResponse } from '@/schemas/movement'
import type { ItemStockResponse } from '@/schemas/stock'

/** The item as it is now; the page comes with it, so there is no first wait. */
export function useItem<Row extends { id: string }>(kind: CatalogueKind, first: Row): Row {
  const { data } = useSWR<Row, Error>(itemApiPath(kind, first.id), getJson, { fallbackData: first })
  return data ?? first
}

/** Null asks nothing yet. */
export function useItemStock(itemId: string | null) {
  const { data, error, isLoading, mutate } = useSWR<ItemStockResponse, Error>(
    itemId === null ? null : `/api/items/${itemId}/stock`,
    getJson,
  )
  return { stock: data, error, isLoading, retry: () => mutate() }
}

interface MovementPage {
  rows: MovementResponse[]
  nextCursor: string | null
  total?: number
}

/** The first page of an item's movements; also the name of the whole list among what SWR keeps. */
export function itemMovementsUrl(itemId: string): string {
  return `/api/items/${itemId}/movements?limit=20`
}

/** What happened to an item, newest first, a page more whenever asked. */
export function useItemMovements(itemId: string) {
  const { data, error, isLoading, size, setSize, mutate } = useSWRInfinite<MovementPage, Error>(
    (_index: number, before: MovementPage | null) => {
      if (before === null) return itemMovementsUrl(itemId)
      if (before.nextCursor === null) return null
      return `${itemMovementsUrl(itemId)}&cursor=${encodeURIComponent(before.nextCursor)}`
    },
    getJson,
  )
  return {
    movements: data?.flatMap((page) => page.rows) ?? [],
    total: data?.[0]?.total,
    error,
    isLoading,
    hasMore: data?.at(-1)?.nextCursor != null,
    isLoadingMore: size > (data?.length ?? 0),
    loadMore: () => setSize(size + 1),
    refresh: () => mutate(),
  }
}
