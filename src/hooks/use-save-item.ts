'use client'

import { useSWRConfig } from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { callApi } from '@/lib/api-client'
import { catalogueApiPath, itemApiPath } from '@/lib/catalogue-paths'

/** Every list and page that shows an item's kind reads again, and the item itself shows the answer at once. */
export function useItemRefresh(kind: CatalogueKind) {
  const { mutate } = useSWRConfig()
  return async (row?: { id: string }) => {
    const apiPath = catalogueApiPath(kind)
    if (row) await mutate(itemApiPath(kind, row.id), row, { revalidate: false })
    await mutate((key) => typeof key === 'string' && key.includes(`${apiPath}?`))
  }
}

export interface SaveItemOptions {
  kind: CatalogueKind
  /** Null adds a new one. */
  existing: { id: string; version: number } | null
  body: Record<string, unknown>
}

/** Adds an item, or changes the one that still has the version it was read with. */
export function useSaveItem<Row extends { id: string }>(kind: CatalogueKind) {
  const refresh = useItemRefresh(kind)
  return async ({ existing, body }: Omit<SaveItemOptions, 'kind'>): Promise<Row> => {
    const row = existing
      ? await callApi<Row>('PATCH', itemApiPath(kind, existing.id), {
          body: { ...body, version: existing.version },
        })
      : await callApi<Row>('POST', catalogueApiPath(kind), { body })
    await refresh(row)
    return row
  }
}
