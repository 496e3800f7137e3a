import type { z } from 'zod'
import type { importListQuerySchema, importRowListQuerySchema } from '@/schemas/import'
import { db } from '../../db/connection'
import { readImportPage, readImportRowPage } from '../../db/read-models/import-views'
import { getImport } from './get-import'

/** Newest first. */
export async function listImports(query: z.output<typeof importListQuerySchema>) {
  const { rows, nextCursor, total } = await readImportPage(db(), query)
  return { rows, nextCursor, ...(total === undefined ? {} : { total }) }
}

/** The rows of an import in the order of its file. */
export async function listImportRows(id: string, query: z.output<typeof importRowListQuerySchema>) {
  await getImport(id)
  const { rows, nextCursor, total } = await readImportRowPage(db(), id, query)
  return { rows, nextCursor, ...(total === undefined ? {} : { total }) }
}
