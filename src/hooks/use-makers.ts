'use client'

import useSWR from 'swr'
import type { CatalogueKind } from '@/core/stock/kinds'
import { getJson } from '@/lib/api-client'

/** Makers of one kind of item, to choose from instead of writing them anew; none where they cannot be had. */
export function useMakers(kind: CatalogueKind): string[] {
  const { data } = useSWR<{ rows: string[] }, Error>(`/api/makers?kind=${kind}`, getJson)
  return data?.rows ?? []
}
