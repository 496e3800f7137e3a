import type { Knex } from 'knex'
import type { archivedChoices } from '@/schemas/paging'
import type { CreateSupplierRequest, SupplierResponse, UpdateSupplierRequest } from '@/schemas/supplier'
import type { SuppliersRow } from '../row-types'

type CountedRow = SuppliersRow & { reorder_points: number }

function withCount(db: Knex): Knex.QueryBuilder {
  return db('suppliers').select(
    'suppliers.*',
    db.raw(
      '(select count(*)::int from reorder_points where reorder_points.supplier_id = suppliers.id) as reorder_points',
    ),
  )
}

/** By name. */
export async function listSuppliers(
  db: Knex,
  archived: (typeof archivedChoices)[number],
): Promise<SupplierResponse[]> {
  const matching = withCount(db).orderByRaw('lower(suppliers.name)')
  if (archived === 'no') matching.whereNull('archived_at')
  if (archived === 'only') matching.whereNotNull('archived_at')
  const rows: CountedRow[] = await matching
  return rows.map(supplier)
}

export async function findSupplier(db: Knex, id: string): Promise<SupplierResponse | null> {
  const row: CountedRow | undefined = await withCount(db).where('suppliers.id', id).first()
  return row ? supplier(row) : null
}

/** Held until the transaction ends: nobody names it in a new reorder point meanwhile. */
export async function lockSupplier(trx: Knex, id: string): Promise<SupplierResponse | null> {
  await trx('suppliers').where('id', id).forUpdate().select('id')
  return findSupplier(trx, id)
}

/** Of these, those that may be named; none of them is archived before the transaction ends. */
export async function findUsableSuppliers(trx: Knex, ids: readonly string[]): Promise<Set<string>> {
  const rows: { id: string }[] = await trx('suppliers')
    .whereIn('id', ids)
    .whereNull('archived_at')
    .orderBy('id')
    .forKeyShare()
    .select('id')
  return new Set(rows.map(({ id }) => id))
}

export async function createSupplier(trx: Knex, given: CreateSupplierRequest): Promise<SupplierResponse> {
  const [row]: SuppliersRow[] = await trx('suppliers').insert(columns(given)).returning('*')
  if (!row) throw new Error('a new supplier has no row')
  return supplier({ ...row, reorder_points: 0 })
}

/** What is absent is left alone; whoever calls has locked the row and compared the version. */
export async function updateSupplier(trx: Knex, id: string, change: UpdateSupplierRequest): Promise<void> {
  const { isArchived } = change
  const archiving = isArchived === undefined ? {} : { archived_at: isArchived ? trx.fn.now() : null }
  const set = { ...columns(change), ...archiving }
  if (Object.keys(set).length > 0) await trx('suppliers').where('id', id).update(set)
}

function columns(given: Partial<CreateSupplierRequest>): Record<string, unknown> {
  const values = {
    name: given.name,
    email: given.email,
    phone: given.phone,
    contact_name: given.contactName,
    account_number: given.accountNumber,
    lead_time_days: given.leadTimeDays,
  }
  return Object.fromEntries(Object.entries(values).filter(([, value]) => value !== undefined))
}

function supplier(row: CountedRow): SupplierResponse {
  return {
    id: row.id,
    version: row.version,
    name: row.name,
    email: row.email,
    phone: row.phone,
    contactName: row.contact_name,
    accountNumber: row.account_number,
    leadTimeDays: row.lead_time_days,
    isArchived: row.archived_at !== null,
    reorderPoints: row.reorder_points,
  }
}
