'use client'

import { useSWRConfig } from 'swr'
import { unstable_serialize } from 'swr/infinite'
import { catalogueKinds } from '@/core/stock/kinds'
import { callApi } from '@/lib/api-client'
import { itemApiPath } from '@/lib/catalogue-paths'
import type { MovementResponse } from '@/schemas/movement'
import type { AlertResponse } from '@/schemas/reordering'
import { readBroughtLow, refreshReordering } from './use-alerts'
import { itemMovementsUrl } from './use-item'

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
  return async (itemId: string) => {
    // A list read page by page goes by a name of its own, which no filter is shown.
    await mutate(unstable_serialize(() => itemMovementsUrl(itemId)))
    await mutate((key) => {
      if (typeof key !== 'string') return false
      if (key.startsWith(`/api/items/${itemId}/`)) return true
      return catalogueKinds.some((kind) => key === itemApiPath(kind, itemId))
    })
    await refreshReordering()
  }
}

/** Issues or returns, and answers what that brought low; the key makes a repeat of the same call harmless. */
export function useMoveStock() {
  const refresh = useStockRefresh()
  return async (request: MoveStockRequest, idempotencyKey: string): Promise<AlertResponse[]> => {
    const movement = await callApi<MovementResponse>('POST', '/api/movements', {
      body: request,
      idempotencyKey,
    })
    await refresh(request.itemId)
    // It is posted: that nobody can say what is low now does not undo it.
    return readBroughtLow(movement).catch(() => [])
  }
}

export function useReverseMovement() {
  const refresh = useStockRefresh()
  return async (movement: Pick<MovementResponse, 'id' | 'itemId'>, idempotencyKey: string): Promise<void> => {
    await callApi('POST', `/api/movements/${movement.id}/reversal`, { body: {}, idempotencyKey })
    await refresh(movement.itemId)
  }
}
