import useSWR from 'swr'
import { getJson } from '@/lib/api-client'
import type { SupplierResponse } from '@/schemas/supplier'

/** Whom the shop buys from, by name. */
export function useSuppliers() {
  const { data, error, mutate } = useSWR<{ rows: SupplierResponse[] }>('/api/suppliers', getJson)
  return { data, error, refresh: mutate }
}
