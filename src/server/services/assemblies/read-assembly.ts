import { AppError } from '@/lib/app-error'
import type { AssemblyResponse } from '@/schemas/assembly'
import { type Database, db } from '../../db/connection'
import {
  findNutTorqueNm,
  readAssemblyChecks,
  readAssemblyFindings,
  readAssemblyParts,
  readPartSources,
} from '../../db/read-models/assembly-details'
import { readAssemblyRows, readMeasurements } from '../../db/read-models/assembly-rows'
import { toolsOf } from './assembly-tools'

/** An assembly with all there is to know of it, archived or not. */
export function getAssembly(id: string): Promise<AssemblyResponse> {
  return readAssembly(db(), id)
}

/** The same within a transaction, for services that change it. Queries run one after another: it has one connection. */
export async function readAssembly(database: Database, id: string): Promise<AssemblyResponse> {
  const [row] = await readAssemblyRows(database, [id])
  if (!row) throw noSuchAssembly()
  const parts = await readAssemblyParts(database, id)
  const sources = await readPartSources(
    database,
    parts.map(({ itemId }) => itemId),
  )
  return {
    ...row,
    nutTorqueNm: await findNutTorqueNm(database, id),
    tools: toolsOf(parts),
    parts: parts.map((part) => ({
      ...part,
      ...(sources.get(part.itemId) ?? { bins: [], pieces: [] }),
    })),
    checks: await readAssemblyChecks(database, id),
    findings: await readAssemblyFindings(database, id),
    measurements: (await readMeasurements(database, [id])).get(id) ?? [],
  }
}

export function noSuchAssembly(): AppError {
  return new AppError('not-found', 'There is no such assembly.')
}
