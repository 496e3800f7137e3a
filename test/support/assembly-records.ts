import { randomUUID } from 'node:crypto'
import type { Knex } from 'knex'
import { type Books, post } from './books'
import { createCollet, createCutter, createHolder } from './catalogue'

export interface AssemblyRecords {
  id: string
  cutterId: string
  holderId: string
  colletId: string
}

/** A planned assembly of a cutter, a collet and a holder, each with so many pieces in the bin; no check of it. */
export async function createAssemblyRecord(db: Knex, books: Books, quantity = 1): Promise<AssemblyRecords> {
  const cutterId = await createCutter(db)
  const holderId = await createHolder(db)
  const colletId = await createCollet(db)
  for (const itemId of [cutterId, holderId, colletId])
    await post(db, books, { kind: 'receipt', itemId, quantity, from: books.supplierId, to: books.binId })
  return {
    id: await insertAssembly(db, books, { cutterId, holderId, colletId }),
    cutterId,
    holderId,
    colletId,
  }
}

/** Another assembly of the same items. */
export function insertAssembly(db: Knex, books: Books, items: Omit<AssemblyRecords, 'id'>): Promise<string> {
  return db.transaction(async (trx) => {
    const [row] = await trx('assemblies')
      .insert({ stick_out_mm: 30, gauge_length_mm: 90, created_by: books.userId })
      .returning('id')
    await trx('assembly_parts').insert(
      Object.entries({ cutter: items.cutterId, holder: items.holderId, collet: items.colletId }).map(
        ([kind, itemId]) => ({ assembly_id: row.id, kind, item_id: itemId, geometry: '{}' }),
      ),
    )
    return row.id
  })
}

/** Issues its parts to a place and says so, as building it does. */
export function putTogether(
  db: Knex,
  books: Books,
  assembly: AssemblyRecords,
  at = books.personId,
): Promise<void> {
  return db.transaction(async (trx) => {
    for (const itemId of [assembly.cutterId, assembly.holderId, assembly.colletId])
      await post(trx, books, { kind: 'issue', itemId, from: books.binId, to: at })
    await trx('assembly_parts')
      .where('assembly_id', assembly.id)
      .update({ home_location_id: books.binId, location_id: at, condition: 'new' })
    await trx('assemblies').where('id', assembly.id).update({ state: 'built', built_at: trx.fn.now() })
  })
}

export async function createMachineRecord(
  db: Knex,
  pocketCount: number | null = 20,
): Promise<{ id: string; locationId: string }> {
  const code = `M-${randomUUID().slice(0, 8)}`
  const [row] = await db('machines')
    .insert({
      code,
      name: code,
      taper: 'BT30',
      gauge_line_to_table_mm: 600,
      z_travel_mm: 450,
      maximum_rpm: 12_000,
      pocket_count: pocketCount,
    })
    .returning(['id', 'location_id'])
  return { id: row.id, locationId: row.location_id }
}

/** How often somebody asked to look at an assembly again, and takes the requests away. */
export async function takeRechecks(db: Knex, assemblyId: string): Promise<number> {
  return db('assembly_rechecks').where('assembly_id', assemblyId).delete()
}
