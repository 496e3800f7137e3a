import { AppError } from '@/lib/app-error'
import type { CreateSupplierRequest, SupplierResponse } from '@/schemas/reordering'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { isUniqueViolation } from '../../db/database-errors'
import { createAuditEntry } from '../../db/stores/audit-store'
import {
  listSuppliers as readSuppliers,
  createSupplier as writeSupplier,
} from '../../db/stores/supplier-store'
import { inTransaction } from '../../db/transaction'

/** Suppliers are few: all in use, by name. */
export async function listSuppliers(): Promise<{ rows: SupplierResponse[] }> {
  return { rows: await readSuppliers(db()) }
}

export async function createSupplier(
  actor: Actor,
  request: CreateSupplierRequest,
): Promise<SupplierResponse> {
  try {
    return await inTransaction(db(), async (trx) => {
      const after = await writeSupplier(trx, request)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: 'supplier-created',
        entity: 'supplier',
        entityId: after.id,
        after,
      })
      return after
    })
  } catch (error) {
    if (!isUniqueViolation(error, 'suppliers_name_idx')) throw error
    const message = 'A supplier has this name already.'
    throw new AppError('code-taken', message, { errors: [{ path: 'name', message }] })
  }
}
