import useSWR from 'swr'
import { callApi, getJson } from '@/lib/api-client'
import type { ImportResponse, RecheckImportRequest, RejectChoice } from '@/schemas/import'
import { hasLengths, type ImportKind } from '@/schemas/import-fields'
import { isUnderWay } from './use-imports'

const whileBusyMs = 400

/** One import, followed while the worker is at it. */
export function useImport(initial: ImportResponse) {
  const { data, error, mutate } = useSWR<ImportResponse, Error>(`/api/imports/${initial.id}`, getJson, {
    fallbackData: initial,
    // Before the first answer SWR asks with nothing in its hands, and would never ask again.
    refreshInterval: (latest) => (isUnderWay(latest ?? initial) ? whileBusyMs : 0),
  })
  return { found: data ?? initial, error, refresh: mutate }
}

/** Uploads a file to be checked; its import's id. */
export async function createImport(
  kind: ImportKind,
  unit: string,
  file: File,
  signal?: AbortSignal,
): Promise<string> {
  const body = new FormData()
  body.set('kind', kind)
  if (hasLengths(kind)) body.set('unit', unit)
  body.set('file', file)
  const { id } = await callApi<{ id: string }>('POST', '/api/imports', {
    body,
    ...(signal ? { signal } : {}),
  })
  return id
}

export async function commitImport(id: string, rejects: RejectChoice): Promise<void> {
  await callApi('POST', `/api/imports/${id}/commit`, { body: { rejects } })
}

export async function recheckImport(id: string, change: RecheckImportRequest): Promise<void> {
  await callApi('POST', `/api/imports/${id}/check`, { body: change })
}

export async function cancelImport(id: string): Promise<void> {
  await callApi('DELETE', `/api/imports/${id}`)
}
