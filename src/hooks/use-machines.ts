'use client'

import useSWR from 'swr'
import { callApi, getJson } from '@/lib/api-client'
import type { MachineResponse } from '@/schemas/machine'
import type { SetUpAssemblyRequest, SetUpAssemblyResponse, SetUpResponse } from '@/schemas/set-up'

/** The machines in use. */
export function useMachines(initialRows?: MachineResponse[]) {
  const { data, error, isLoading, mutate } = useSWR<{ rows: MachineResponse[] }, Error>(
    '/api/machines',
    getJson,
    initialRows ? { fallbackData: { rows: initialRows } } : {},
  )
  return { rows: data?.rows ?? [], error, isLoading, refresh: () => mutate() }
}

export function useMachine(first: MachineResponse) {
  const { data, mutate } = useSWR<MachineResponse, Error>(`/api/machines/${first.id}`, getJson, {
    fallbackData: first,
  })
  return { machine: data ?? first, refresh: () => mutate() }
}

/** The set-ups of one machine, or of all in use; null asks nothing. */
export function useSetUps(machineId: string | 'all' | null, initialRows?: SetUpResponse[]) {
  const query = machineId === 'all' ? '' : `?machineId=${machineId}`
  const { data, error, isLoading, mutate } = useSWR<{ rows: SetUpResponse[] }, Error>(
    machineId === null ? null : `/api/set-ups${query}`,
    getJson,
    initialRows ? { fallbackData: { rows: initialRows } } : {},
  )
  return { rows: data?.rows ?? [], error, isLoading, refresh: () => mutate() }
}

/** Whether an assembly fits a set-up and what would; null asks nothing. */
export function useSetUpAssembly(setUp: SetUpResponse | null, request: SetUpAssemblyRequest | null) {
  const { data, error, isLoading } = useSWR<SetUpAssemblyResponse, Error>(
    setUp && request ? [`/api/set-ups/${setUp.id}/assembly`, request, setUp.version] : null,
    ([url, body]: [string, SetUpAssemblyRequest]) => callApi<SetUpAssemblyResponse>('POST', url, { body }),
    { keepPreviousData: false, revalidateOnFocus: false },
  )
  return { answer: data ?? null, error, isLoading }
}
