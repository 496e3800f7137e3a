import useSWR, { mutate } from 'swr'
import { getJson } from '@/lib/api-client'
import type { MovementResponse } from '@/schemas/movement'
import type { AlertResponse } from '@/schemas/reordering'

/** As many as one answer holds; beyond that a list of what is low is a list of everything. */
const mostShown = 500
const lookAgainMs = 60_000

export interface OpenAlerts {
  rows: AlertResponse[]
  total: number
}

/** What is low now, in one crib or in all, newest first. */
export function useOpenAlerts(cribId: string) {
  const crib = cribId ? `&cribId=${cribId}` : ''
  const { data, error, mutate } = useSWR<OpenAlerts>(
    `/api/alerts?state=open&limit=${mostShown}${crib}`,
    getJson,
    { refreshInterval: lookAgainMs, keepPreviousData: true },
  )
  return { data, error, refresh: mutate }
}

/** How many are open; undefined until it is known, and for those who need not know. */
export function useOpenAlertCount(isAsked: boolean): number | undefined {
  const { data } = useSWR<OpenAlerts>(isAsked ? '/api/alerts?state=open&limit=1' : null, getJson, {
    refreshInterval: lookAgainMs,
  })
  return data?.total
}

/** Everything that shows what is low, or when, reads again: after whatever may bring an item low or above. */
export async function refreshReordering(): Promise<void> {
  await mutate((key) => typeof key === 'string' && /^\/api\/(alerts|reorder-points)\b/.test(key))
}

/** What a movement brought low: its alerts were opened in the same transaction, at the instant it was recorded. */
export async function readBroughtLow(
  movement: Pick<MovementResponse, 'itemId' | 'recordedAt'>,
): Promise<AlertResponse[]> {
  const { rows } = await getJson<OpenAlerts>(`/api/alerts?state=open&itemId=${movement.itemId}`)
  return rows.filter(({ openedAt }) => openedAt === movement.recordedAt)
}
