'use client'

import { useSWRConfig } from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { callApi } from '@/lib/api-client'
import { catalogueApiPath, itemApiPath } from '@/lib/catalogue-paths'

export interface SaveItemOptions {
  /** Null adds a new one. */
  existing: { id: string; version: number } | null
  body: Record<string, unknown>
}

/** Adds an item, or changes the one that still has the version it was read with; its page shows the answer at once. */
export function useSaveItem<Row extends { id: string }>(kind: CatalogueKind) {
  const { mutate } = useSWRConfig()
  return async ({ existing, body }: SaveItemOptions): Promise<Row> => {
    const row = existing
      ? await callApi<Row>('PATCH', itemApiPath(kind, existing.id), {
          body: { ...body, version: existing.version },
        })
      : await callApi<Row>('POST', catalogueApiPath(kind), { body })
    await mutate(itemApiPath(kind, row.id), row, { revalidate: false })
    return row
  }
}
