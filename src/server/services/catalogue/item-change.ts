import { isDeepStrictEqual } from 'node:util'
import type { CatalogueKind } from '@/core/stock/kinds'
import { type CatalogueTypes, geometryProblemsOf } from '@/schemas/catalogue'
import type { FieldProblem } from '@/schemas/problem'
import type { Database } from '../../db/connection'
import { updateGeometry } from '../../db/stores/geometry-store'
import { restoreItem, updateItem as writeItem } from '../../db/stores/item-store'

type Fields = Record<string, unknown>

/** Of what was sent, what differs from the row: sending a value again is no change. */
export function changedFields(before: Fields, request: Fields): Fields {
  const { version: _, id: __, archivedAt, ...fields } = request
  const changed = Object.entries(fields).filter(
    ([field, value]) => value !== undefined && !isDeepStrictEqual(value, before[field]),
  )
  const isRestored = archivedAt === null && before.archivedAt !== null
  return { ...Object.fromEntries(changed), ...(isRestored ? { archivedAt } : {}) }
}

/** What the rules of geometry have against a row as it would be. */
export function impossibleFields<Kind extends CatalogueKind>(kind: Kind, row: Fields): FieldProblem[] {
  const problems = geometryProblemsOf[kind](row as CatalogueTypes[Kind]['create'])
  return problems.map(({ path, message }) => ({ path: path.join('.'), message }))
}

export async function writeChange(
  trx: Database,
  kind: CatalogueKind,
  id: string,
  change: Fields,
): Promise<void> {
  if (change.archivedAt === null) await restoreItem(trx, id)
  await writeItem(trx, id, change)
  await updateGeometry(trx, kind, id, change)
}
