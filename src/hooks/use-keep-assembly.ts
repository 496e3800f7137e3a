'use client'

import type { z } from 'zod'
import { callApi } from '@/lib/api-client'
import type { AssemblyResponse, createAssemblyRequestSchema } from '@/schemas/assembly'

export type KeptAssembly = z.input<typeof createAssemblyRequestSchema>

/** Keeps an assembly that reaches a feature under a number of the shop's. */
export function useKeepAssembly() {
  return (assembly: KeptAssembly) => callApi<AssemblyResponse>('POST', '/api/assemblies', { body: assembly })
}
