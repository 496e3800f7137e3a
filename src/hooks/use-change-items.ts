'use client'

import { useSWRConfig } from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { callApi } from '@/lib/api-client'
import { catalogueApiPath, itemApiPath } from '@/lib/catalogue-paths'

export type ItemChange = { id: string; version: number } & Record<string, unknown>

/** Says what stands against a change of many items, and makes none. */
export async function rehearseItems<Row>(
  kind: CatalogueKind,
  changes: readonly ItemChange[],
): Promise<readonly Row[]> {
  const body = { changes, isRehearsal: true }
  return (await callApi<{ rows: Row[] }>('POST', `${catalogueApiPath(kind)}/bulk`, { body })).rows
}

/** Changes many items in one go, all or none; each one's page shows the answer at once. */
export function useChangeItems<Row extends { id: string }>(kind: CatalogueKind) {
  const { mutate } = useSWRConfig()
  return async (changes: readonly ItemChange[]): Promise<Row[]> => {
    const path = `${catalogueApiPath(kind)}/bulk`
    const { rows } = await callApi<{ rows: Row[] }>('POST', path, { body: { changes } })
    for (const row of rows) await mutate(itemApiPath(kind, row.id), row, { revalidate: false })
    return rows
  }
}
