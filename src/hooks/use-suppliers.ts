import useSWR from 'swr'
import { callApi, getJson } from '@/lib/api-client'
import type { SupplierResponse } from '@/schemas/supplier'

/** Whom the shop buys from, by name; with the archived ones where they are asked for. */
export function useSuppliers({ withArchived = false } = {}) {
  const { data, error, mutate } = useSWR<{ rows: SupplierResponse[] }>(
    withArchived ? '/api/suppliers?archived=all' : '/api/suppliers',
    getJson,
    { keepPreviousData: true },
  )
  return { data, error, refresh: mutate }
}

/** Saves a new supplier, or changes of one that is there; throws what stands against it. */
export function saveSupplier(
  existing: Pick<SupplierResponse, 'id' | 'version'> | null,
  fields: object,
): Promise<SupplierResponse> {
  return existing
    ? callApi('PATCH', `/api/suppliers/${existing.id}`, { body: { ...fields, version: existing.version } })
    : callApi('POST', '/api/suppliers', { body: fields })
}
