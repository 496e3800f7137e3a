'use client'

import useSWR, { useSWRConfig } from 'swr'
import useSWRInfinite from 'swr/infinite'
import { callApi, getJson } from '@/lib/api-client'
import type { AssemblyResponse, AssemblyRow, ImportMeasurementsResponse } from '@/schemas/assembly'

interface AssemblyBlock {
  rows: AssemblyRow[]
  nextCursor: string | null
  total?: number
}

const blockRows = 100
/** While the worker has yet to look at something, its answer is asked for again. */
const lookAgainMs = 2000

/** Assemblies by the filters given, a block more whenever asked. */
export function useAssemblies(query: Readonly<Record<string, string>>) {
  const base = `/api/assemblies?${new URLSearchParams({ ...query, limit: String(blockRows) })}`
  const { data, error, size, setSize, mutate } = useSWRInfinite<AssemblyBlock, Error>(
    (_index: number, before: AssemblyBlock | null) => {
      if (before === null) return base
      return before.nextCursor === null ? null : `${base}&cursor=${encodeURIComponent(before.nextCursor)}`
    },
    getJson,
    { keepPreviousData: true },
  )
  return {
    rows: data?.flatMap((block) => block.rows),
    total: data?.[0]?.total,
    error,
    hasMore: data?.at(-1)?.nextCursor != null,
    loadMore: () => setSize(size + 1),
    refresh: () => mutate(),
  }
}

/** The assembly as it is now; the page comes with it, so there is no first wait. */
export function useAssembly(first: AssemblyResponse) {
  const { data, mutate } = useSWR<AssemblyResponse, Error>(`/api/assemblies/${first.id}`, getJson, {
    fallbackData: first,
    refreshInterval: (latest) => (latest?.isBeingRechecked ? lookAgainMs : 0),
  })
  return { assembly: data ?? first, put: (next: AssemblyResponse) => mutate(next, { revalidate: false }) }
}

/** What moves parts carries a key, so that a repeat of the same call is harmless. */
export type AssemblyAct = 'build' | 'measure' | 'pocket' | 'break-down' | 'take-over'

export function useActOnAssembly() {
  const { mutate } = useSWRConfig()
  return async (
    assembly: Pick<AssemblyResponse, 'id' | 'version'>,
    act: AssemblyAct,
    body: object,
    idempotencyKey: string,
  ): Promise<AssemblyResponse> => {
    const changed = await callApi<AssemblyResponse>('POST', `/api/assemblies/${assembly.id}/${act}`, {
      body: { version: assembly.version, ...body },
      idempotencyKey,
    })
    // Parts moved: every stock shown is read again.
    await mutate((key) => typeof key === 'string' && key.startsWith('/api/items/'))
    return changed
  }
}

export function useChangeAssembly() {
  return (assembly: Pick<AssemblyResponse, 'id' | 'version'>, change: object): Promise<AssemblyResponse> =>
    callApi('PATCH', `/api/assemblies/${assembly.id}`, { body: { version: assembly.version, ...change } })
}

/** Keeps another feature with an assembly that is there already. */
export function useAddAssemblyCheck() {
  return (
    assembly: Pick<AssemblyRow, 'id' | 'version'>,
    check: { feature: object; clearances: object | null },
  ): Promise<AssemblyResponse> =>
    callApi('POST', `/api/assemblies/${assembly.id}/checks`, {
      body: { version: assembly.version, ...check },
    })
}

export function useArchiveAssembly() {
  return (assembly: Pick<AssemblyResponse, 'id' | 'version'>): Promise<AssemblyResponse> =>
    callApi('DELETE', `/api/assemblies/${assembly.id}?version=${assembly.version}`)
}

export function useImportMeasurements() {
  return (request: object): Promise<ImportMeasurementsResponse> =>
    callApi('POST', '/api/assemblies/measurements', { body: request })
}
