'use client'

import useSWR from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { callApi, getJson } from '@/lib/api-client'
import type { SavedViewResponse } from '@/schemas/saved-view'

/** The views of a list that this person may open, and what they may do with their own. */
export function useSavedViews(kind: CatalogueKind) {
  const { data, error, mutate } = useSWR<{ rows: SavedViewResponse[] }, Error>(
    `/api/saved-views?kind=${kind}`,
    getJson,
  )
  async function call(method: 'POST' | 'PATCH' | 'DELETE', path: string, body?: object): Promise<void> {
    await callApi(method, `/api/saved-views${path}`, body ? { body } : {})
    await mutate()
  }
  return {
    views: data?.rows,
    error,
    retry: () => void mutate(),
    create: (view: { name: string; isShared: boolean; query: string }) => call('POST', '', { kind, ...view }),
    update: ({ id, version }: SavedViewResponse, change: object) =>
      call('PATCH', `/${id}`, { version, ...change }),
    remove: ({ id }: SavedViewResponse) => call('DELETE', `/${id}`),
  }
}
