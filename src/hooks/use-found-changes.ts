'use client'

import useSWR, { useSWRConfig } from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { callApi, getJson } from '@/lib/api-client'
import { catalogueApiPath, cataloguePaths } from '@/lib/catalogue-paths'
import type { FoundChange, FoundRehearsal } from '@/schemas/found-change'

export interface FoundRequest {
  /** As the list's address has them. */
  filters: Record<string, string>
  change: Record<string, unknown>
}

const listUrl = (kind: CatalogueKind) => `/api/found-changes?kind=${kind}`

/** One's own last changes of everything found that can still be taken back. */
export function useFoundChanges(kind: CatalogueKind) {
  const { data, error } = useSWR<{ rows: FoundChange[] }, Error>(listUrl(kind), getJson)
  return { changes: data?.rows, error }
}

/** Changes everything a filter finds, once it was rehearsed, and takes such a change back. */
export function useChangeFound(kind: CatalogueKind) {
  const { mutate } = useSWRConfig()
  const path = `${catalogueApiPath(kind)}/found-changes`

  /** What is kept of the items and of the list of changes is asked for anew. */
  async function forget(): Promise<void> {
    await mutate(
      (key) =>
        typeof key === 'string' && (key === listUrl(kind) || key.startsWith(`/api${cataloguePaths[kind]}`)),
    )
  }

  return {
    rehearse: (request: FoundRequest) =>
      callApi<FoundRehearsal>('POST', `${path}/rehearsal`, { body: request }),
    change: async (request: FoundRequest, { total, mark }: FoundRehearsal, key: string) => {
      const body = { ...request, total, mark }
      const change = await callApi<FoundChange>('POST', path, { body, idempotencyKey: key })
      await forget()
      return change
    },
    undo: async (id: string) => {
      const change = await callApi<FoundChange>('POST', `/api/found-changes/${id}/undo`)
      await forget()
      return change
    },
  }
}
