'use client'

import useSWR from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { callApi, getJson } from '@/lib/api-client'
import type {
  DuplicatesResponse,
  ItemMerges,
  MergeItemsRequest,
  MergeItemsResponse,
} from '@/schemas/duplicate'

/** The groups of items of a kind that measure the same. */
export function useDuplicates(kind: CatalogueKind) {
  const { data, error, mutate } = useSWR<DuplicatesResponse, Error>(`/api/duplicates?kind=${kind}`, getJson)
  return { data, error, refresh: () => mutate() }
}

/** What an item went into, and what went into it. */
export function useItemMerges(itemId: string) {
  const { data } = useSWR<ItemMerges, Error>(`/api/items/${itemId}/merges`, getJson)
  return data
}

/** Makes one item of two; the key makes a repeat harmless. */
export function mergeItems(request: MergeItemsRequest, idempotencyKey: string): Promise<MergeItemsResponse> {
  return callApi<MergeItemsResponse>('POST', '/api/duplicates/merge', { body: request, idempotencyKey })
}
