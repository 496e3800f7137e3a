import type { ImportResponse } from '@/schemas/import'
import { db } from '../../db/connection'
import { readImportView } from '../../db/read-models/import-views'
import { noSuchImport } from './import-refusals'

export async function getImport(id: string): Promise<ImportResponse> {
  const found = await readImportView(db(), id)
  if (!found) throw noSuchImport()
  return found
}
