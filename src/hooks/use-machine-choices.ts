'use client'

import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { MachineResponse } from '@/schemas/machine'

/** The machines in use, by code. */
export function useMachineChoices() {
  const { data, error, isLoading } = useSWR<{ rows: MachineResponse[] }, Error>('/api/machines', getJson)
  return { machines: data?.rows ?? [], error, isLoading }
}
