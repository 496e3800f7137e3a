'use client'

import { useSWRConfig } from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { callApi } from '@/lib/api-client'
import { cataloguePaths } from '@/lib/catalogue-paths'
import type { MovementResponse } from '@/schemas/movement'

export interface MoveStockRequest {
  kind: 'issue' | 'return'
  itemId: string
  quantity: number
  fromLocationId: string
  fromCondition: string
  toLocationId: string
  toCondition: string
  note: string
}

/** Everything that shows an item's stock reads again. */
function useStockRefresh() {
  const { mutate } = useSWRConfig()
  return (itemId: string) =>
    mutate((key) => {
      if (typeof key !== 'string') return false
      const isOfItem =
        key.includes(`/api/items/${itemId}/`) ||
        Object.values(cataloguePaths).some((path) => key === `/api${path}/${itemId}`)
      return isOfItem || Object.values(cataloguePaths).some((path) => key.includes(`/api${path}?`))
    })
}

/** Issues or returns; the key makes a repeat of the same call harmless. */
export function useMoveStock() {
  const refresh = useStockRefresh()
  return async (request: MoveStockRequest, idempotencyKey: string): Promise<MovementResponse> => {
    const movement = await callApi<MovementResponse>('POST', '/api/movements', {
      body: request,
      idempotencyKey,
    })
    await refresh(request.itemId)
    return movement
  }
}

export function useReverseMovement() {
  const refresh = useStockRefresh()
  return async (movement: Pick<MovementResponse, 'id' | 'itemId'>, idempotencyKey: string): Promise<void> => {
    await callApi('POST', `/api/movements/${movement.id}/reversal`, { body: {}, idempotencyKey })
    await refresh(movement.itemId)
  }
}

/** What a change of the item's own row is told to, apart from its stock. */
export function useArchiveItem(kind: CatalogueKind) {
  const { mutate } = useSWRConfig()
  return async (row: { id: string; version: number }, isArchived: boolean): Promise<void> => {
    const path = `/api${cataloguePaths[kind]}/${row.id}`
    if (isArchived) await callApi('DELETE', path)
    else await callApi('PATCH', path, { body: { version: row.version, archivedAt: null } })
    await mutate((key) => typeof key === 'string' && key.includes(`/api${cataloguePaths[kind]}`))
  }
}
