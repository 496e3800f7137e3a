import type { Knex } from 'knex'
import type { LengthUnit } from '@/core/units/length-unit'
import type { ImportKind } from '@/schemas/import-fields'
import type { ColumnTarget } from '@/schemas/import-mapping'
import { enumToDb } from '../enum-case'

/** What an index entry may hold with room to spare; a longer heading is not remembered. */
const longestHeading = 500

/** What the shop has said of headings before, by heading in lower case. */
export async function readKeptMappings(db: Knex, kind: ImportKind): Promise<Map<string, ColumnTarget>> {
  const rows = await db('import_mappings').where('kind', enumToDb(kind)).select('heading', 'field', 'unit')
  return new Map(rows.map((row) => [row.heading, { field: row.field, unit: row.unit as LengthUnit | null }]))
}

/** Keeps what a person said of headings, for the next file. */
export async function keepMappings(
  trx: Knex,
  kind: ImportKind,
  actorId: string,
  mappings: ReadonlyMap<string, ColumnTarget>,
): Promise<void> {
  const rows = [...mappings]
    .filter(([heading]) => heading.length > 0 && heading.length <= longestHeading)
    .map(([heading, target]) => ({
      kind: enumToDb(kind),
      heading,
      field: target.field,
      unit: target.unit,
      updated_by: actorId,
    }))
  if (rows.length === 0) return
  await trx('import_mappings')
    .insert(rows)
    .onConflict(['kind', 'heading'])
    .merge({
      field: trx.raw('excluded.field'),
      unit: trx.raw('excluded.unit'),
      updated_by: trx.raw('excluded.updated_by'),
      updated_at: trx.fn.now(),
    })
}
