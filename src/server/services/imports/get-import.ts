import { idSchema } from '@/schemas/fields'
import type { ImportResponse } from '@/schemas/import'
import { db } from '../../db/connection'
import { readImportView } from '../../db/read-models/import-views'
import { noSuchImport } from './import-refusals'

export async function getImport(id: string): Promise<ImportResponse> {
  const found = await findImportView(id)
  if (!found) throw noSuchImport()
  return found
}

/** Null for an import that is not there, and for what is no id at all. */
export async function findImportView(id: string): Promise<ImportResponse | null> {
  return idSchema.safeParse(id).success ? readImportView(db(), id) : null
}
