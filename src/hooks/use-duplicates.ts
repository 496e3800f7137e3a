'use client'

import useSWR from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { callApi, getJson } from '@/lib/api-client'
import type {
  DuplicatesResponse,
  ItemMerges,
  MergeItemsRequest,
  MergeItemsResponse,
  MergePreview,
} from '@/schemas/duplicate'
import { refreshReordering } from './use-alerts'

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

/** What a merge would do as things stand; asked anew each time it is looked at. */
export function useMergePreview({ keptItemId, mergedItemId }: MergeItemsRequest) {
  const query = new URLSearchParams({ keptItemId, mergedItemId })
  const { data, error, isValidating, mutate } = useSWR<MergePreview, Error>(
    `/api/duplicates/merge?${query}`,
    getJson,
    { revalidateOnFocus: false },
  )
  return { preview: isValidating ? undefined : data, error, refresh: () => mutate() }
}

/** Makes one item of two; the key makes a repeat harmless. */
export async function mergeItems(
  request: MergeItemsRequest,
  idempotencyKey: string,
): Promise<MergeItemsResponse> {
  const merged = await callApi<MergeItemsResponse>('POST', '/api/duplicates/merge', {
    body: request,
    idempotencyKey,
  })
  await refreshReordering()
  return merged
}
