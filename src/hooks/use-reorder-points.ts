import { catalogueKinds } from '@/core/stock/kinds'
import { callApi, getJson } from '@/lib/api-client'
import { catalogueApiPath } from '@/lib/catalogue-paths'
import type { ReorderPointResponse, ReorderPointRow } from '@/schemas/reordering'

export const reorderPointBlockSize = 100

/** One block of the list, for a grid that jumps. */
export function readReorderPointBlock(
  filters: { cribId: string; q: string },
  offset: number,
): Promise<{ rows: ReorderPointRow[]; total?: number }> {
  const query = new URLSearchParams({ limit: String(reorderPointBlockSize), offset: String(offset) })
  if (filters.cribId) query.set('cribId', filters.cribId)
  if (filters.q) query.set('q', filters.q)
  return getJson(`/api/reorder-points?${query}`)
}

export type ReorderPointChange = Partial<
  Pick<
    ReorderPointRow,
    | 'reorderPoint'
    | 'orderUpTo'
    | 'packSize'
    | 'minimumOrder'
    | 'supplierId'
    | 'supplierPartNumber'
    | 'leadTimeDays'
  >
>

/** Changes some of a row's fields; answers the row as it has become, or throws what stands against it. */
export async function saveReorderPoint(
  row: ReorderPointRow,
  change: ReorderPointChange,
): Promise<ReorderPointRow> {
  const { version, reorderPoint, orderUpTo } = row
  const body = { version, reorderPoint, orderUpTo, ...change }
  const saved = await callApi<ReorderPointResponse>('PUT', reorderPointUrl(row), { body })
  return { ...row, ...saved }
}

export function reorderPointUrl({ itemId, cribId }: { itemId: string; cribId: string }): string {
  return `/api/reorder-points/${itemId}/${cribId}`
}

/**
 * Sets a first reorder point for the item of this code, of whichever kind it is; false where none in use has the code.
 * What cannot be is thrown, with its fields.
 */
export async function createReorderPoint(
  code: string,
  cribId: string,
  values: { reorderPoint: number | string; orderUpTo: number | string },
): Promise<boolean> {
  if (code === '') return false
  for (const kind of catalogueKinds) {
    const query = new URLSearchParams({ code, sort: 'code', limit: '100' })
    const { rows } = await getJson<{ rows: { id: string; code: string }[] }>(
      `${catalogueApiPath(kind)}?${query}`,
    )
    const item = rows.find((row) => row.code.toLowerCase() === code.toLowerCase())
    if (!item) continue
    await callApi('PUT', reorderPointUrl({ itemId: item.id, cribId }), { body: values })
    return true
  }
  return false
}
