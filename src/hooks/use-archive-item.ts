'use client'

import { useSWRConfig } from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { callApi } from '@/lib/api-client'
import { itemApiPath } from '@/lib/catalogue-paths'
import { refreshReordering } from './use-alerts'

/** Takes an item out of the lists, or brings it back. */
export function useArchiveItem(kind: CatalogueKind) {
  const { mutate } = useSWRConfig()
  return async (row: { id: string; version: number }, isArchived: boolean): Promise<void> => {
    const path = itemApiPath(kind, row.id)
    if (isArchived) await callApi('DELETE', path)
    else await callApi('PATCH', path, { body: { version: row.version, archivedAt: null } })
    await mutate(path)
    await refreshReordering()
  }
}
