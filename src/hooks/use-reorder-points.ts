import { catalogueKinds } from '@/core/stock/kinds'
import { callApi, getJson } from '@/lib/api-client'
import { catalogueApiPath } from '@/lib/catalogue-paths'
import type { ReorderPointResponse, ReorderPointRow } from '@/schemas/reordering'
import { type CatalogueBlock, catalogueBlockUrl } from './use-catalogue-rows'

export const reorderPointsApiPath = '/api/reorder-points'

/** One block of the list, for a grid that jumps. */
export function readReorderPointBlock(
  query: string,
  offset: number,
): Promise<CatalogueBlock<ReorderPointRow>> {
  return getJson(catalogueBlockUrl(reorderPointsApiPath, query, offset))
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

/** Changes many rows, all of them or none; answers them as they have become, in the same order. */
export async function saveReorderPoints(
  changes: readonly { row: ReorderPointRow; change: ReorderPointChange }[],
): Promise<ReorderPointRow[]> {
  const rows = changes.map(({ row: { itemId, cribId, version, reorderPoint, orderUpTo }, change }) => ({
    ...{ itemId, cribId, version, reorderPoint, orderUpTo },
    ...change,
  }))
  const saved = await callApi<{ rows: ReorderPointResponse[] }>('PUT', reorderPointsApiPath, {
    body: { rows },
  })
  return changes.map(({ row }, index) => ({ ...row, ...saved.rows[index] }))
}

export async function removeReorderPoint(row: ReorderPointRow): Promise<void> {
  await callApi('DELETE', reorderPointUrl(row))
}

function reorderPointUrl({ itemId, cribId }: { itemId: string; cribId: string }): string {
  return `${reorderPointsApiPath}/${itemId}/${cribId}`
}

/**
 * Sets a first reorder point for the item of this code, of whichever kind it is; false where none in use has the code.
 * What cannot be is thrown, with its fields.
 */
export async function createReorderPoint(
  code: string,
  cribId: string,
  values: ReorderPointChange,
): Promise<boolean> {
  const itemId = code === '' ? null : await findItemId(code)
  if (itemId === null) return false
  await callApi('PUT', reorderPointUrl({ itemId, cribId }), { body: values })
  return true
}

async function findItemId(code: string): Promise<string | null> {
  for (const kind of catalogueKinds) {
    // Many codes may hold this one; the list is read on until it is found.
    for (let offset = 0; ; ) {
      const query = new URLSearchParams({ code, sort: 'code' }).toString()
      const { rows } = await getJson<CatalogueBlock<{ id: string; code: string }>>(
        catalogueBlockUrl(catalogueApiPath(kind), query, offset, mostRows),
      )
      const item = rows.find((row) => row.code.toLowerCase() === code.toLowerCase())
      if (item) return item.id
      if (rows.length < mostRows) break
      offset += mostRows
    }
  }
  return null
}

const mostRows = 500
