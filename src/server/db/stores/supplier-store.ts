import type { Knex } from 'knex'
import type { CreateSupplierRequest, SupplierResponse } from '@/schemas/reordering'
import type { SuppliersRow } from '../row-types'

/** Those in use, by name. */
export async function listSuppliers(db: Knex): Promise<SupplierResponse[]> {
  const rows: SuppliersRow[] = await db('suppliers').whereNull('archived_at').orderByRaw('lower(name)')
  return rows.map(supplier)
}

export async function findSupplier(db: Knex, id: string): Promise<SupplierResponse | null> {
  const row: SuppliersRow | undefined = await db('suppliers').where('id', id).whereNull('archived_at').first()
  return row ? supplier(row) : null
}

export async function createSupplier(trx: Knex, given: CreateSupplierRequest): Promise<SupplierResponse> {
  const [row]: SuppliersRow[] = await trx('suppliers')
    .insert({ name: given.name, email: given.email, lead_time_days: given.leadTimeDays })
    .returning('*')
  if (!row) throw new Error('a new supplier has no row')
  return supplier(row)
}

function supplier(row: SuppliersRow): SupplierResponse {
  return { id: row.id, name: row.name, email: row.email, leadTimeDays: row.lead_time_days }
}
