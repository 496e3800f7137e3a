import type { AssemblyListQuery, AssemblyRow } from '@/schemas/assembly'
import { db } from '../../db/connection'
import { readAssemblyKeys, readAssemblyRows } from '../../db/read-models/assembly-rows'

export interface AssemblyList {
  rows: AssemblyRow[]
  nextCursor: string | null
  total?: number
}

/** One block of the shop's assemblies. */
export async function listAssemblies(query: AssemblyListQuery): Promise<AssemblyList> {
  const { ids, ...page } = await readAssemblyKeys(db(), query)
  return { rows: await readAssemblyRows(db(), ids), ...page }
}
