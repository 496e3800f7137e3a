import useSWR from 'swr'
import { catalogueKinds } from '@/core/stock/kinds'
import { callApi, getJson } from '@/lib/api-client'
import { catalogueApiPath } from '@/lib/catalogue-paths'
import type { ReorderPointResponse, ReorderPointRow } from '@/schemas/reordering'
import { refreshReordering } from './use-alerts'
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
  await refreshReordering()
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
  await refreshReordering()
  return changes.map(({ row }, index) => ({ ...row, ...saved.rows[index] }))
}

export async function removeReorderPoint(row: ReorderPointRow): Promise<void> {
  await callApi('DELETE', reorderPointUrl(row))
  await refreshReordering()
}

function reorderPointUrl({ itemId, cribId }: { itemId: string; cribId: string }): string {
  return `${reorderPointsApiPath}/${itemId}/${cribId}`
}

/** Sets a first reorder point; answers it as the list shows it. What cannot be is thrown, with its fields. */
export async function createReorderPoint(
  item: ItemOfCode,
  cribId: string,
  values: ReorderPointChange,
): Promise<Pick<ReorderPointRow, 'reorderPoint'> & Partial<ReorderPointRow>> {
  const pair = { itemId: item.id, cribId }
  const set = await callApi<ReorderPointResponse>('PUT', reorderPointUrl(pair), { body: values })
  await refreshReordering()
  // It is set: that its row cannot be read now does not undo it.
  const listed = await readItemReorderPoints(item.id).catch(() => null)
  return listed?.rows.find((row) => row.cribId === cribId) ?? set
}

/** Whether a first one would put itself over another. */
export async function hasReorderPoint(itemId: string, cribId: string): Promise<boolean> {
  const { rows } = await readItemReorderPoints(itemId)
  return rows.some((row) => row.cribId === cribId)
}

export interface ItemOfCode {
  id: string
  code: string
}

/** The item in use that has this code, of whichever kind it is; undefined until it is known, null where none has it. */
export function useItemOfCode(code: string): ItemOfCode | null | undefined {
  const { data } = useSWR(code === '' ? null : ['item-of-code', code], () => findItemOfCode(code))
  return data
}

/** Where this item has a reorder point, crib by crib. */
export function useItemReorderPoints(itemId: string) {
  const { data, error, mutate } = useSWR<CatalogueBlock<ReorderPointRow>, Error>(
    itemReorderPointsUrl(itemId),
    getJson,
  )
  return { rows: data?.rows, error, retry: () => mutate() }
}

function itemReorderPointsUrl(itemId: string): string {
  return `${reorderPointsApiPath}?itemId=${itemId}&sort=cribCode`
}

function readItemReorderPoints(itemId: string): Promise<CatalogueBlock<ReorderPointRow>> {
  return getJson(itemReorderPointsUrl(itemId))
}

export async function findItemOfCode(code: string): Promise<ItemOfCode | null> {
  for (const kind of catalogueKinds) {
    // Many codes may hold this one; the list is read on until it is found.
    for (let offset = 0; ; ) {
      const query = new URLSearchParams({ code, sort: 'code' }).toString()
      const { rows } = await getJson<CatalogueBlock<ItemOfCode>>(
        catalogueBlockUrl(catalogueApiPath(kind), query, offset, mostRows),
      )
      const item = rows.find((row) => row.code.toLowerCase() === code.toLowerCase())
      if (item) return item
      if (rows.length < mostRows) break
      offset += mostRows
    }
  }
  return null
}

const mostRows = 500
