import { isDeepStrictEqual } from 'node:util'
import { AppError } from '@/lib/app-error'
import type { archivedChoices } from '@/schemas/paging'
import type { CreateSupplierRequest, SupplierResponse, UpdateSupplierRequest } from '@/schemas/supplier'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { isUniqueViolation } from '../../db/database-errors'
import { createAuditEntry } from '../../db/stores/audit-store'
import {
  findSupplier,
  lockSupplier,
  listSuppliers as readSuppliers,
  createSupplier as writeSupplier,
  updateSupplier as writeSupplierChange,
} from '../../db/stores/supplier-store'
import { inTransaction } from '../../db/transaction'

/** Suppliers are few: all of them, by name. */
export async function listSuppliers({
  archived,
}: {
  archived: (typeof archivedChoices)[number]
}): Promise<{ rows: SupplierResponse[] }> {
  return { rows: await readSuppliers(db(), archived) }
}

export async function createSupplier(
  actor: Actor,
  request: CreateSupplierRequest,
): Promise<SupplierResponse> {
  return refusingTakenName(() =>
    inTransaction(db(), async (trx) => {
      const after = await writeSupplier(trx, request)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: 'supplier-created',
        entity: 'supplier',
        entityId: after.id,
        after,
      })
      return after
    }),
  )
}

/** Changes, archives or restores a supplier. One that reorder points name is not archived: they would name nobody. */
export async function updateSupplier(
  actor: Actor,
  id: string,
  request: UpdateSupplierRequest,
): Promise<SupplierResponse> {
  return refusingTakenName(() =>
    inTransaction(db(), async (trx) => {
      const before = await lockSupplier(trx, id)
      if (!before) throw new AppError('not-found', 'There is no such supplier.')
      if (before.version !== request.version) {
        throw new AppError('stale-version', `Someone changed ${before.name} meanwhile.`, {
          extra: { current: before },
        })
      }
      if (request.isArchived && !before.isArchived) refuseWhileNamed(before)
      await writeSupplierChange(trx, id, request)
      const after = await findSupplier(trx, id)
      if (!after) throw new Error(`supplier ${id} vanished while it was changed`)
      if (!isDeepStrictEqual(before, after)) {
        await createAuditEntry(trx, {
          ...{ actorId: actor.id, action: 'supplier-changed', entity: 'supplier', entityId: id },
          ...{ before, after },
        })
      }
      return after
    }),
  )
}

function refuseWhileNamed({ name, reorderPoints }: SupplierResponse): void {
  if (reorderPoints === 0) return
  const many = reorderPoints === 1 ? 'One reorder point names' : `${reorderPoints} reorder points name`
  const message = `${many} ${name}. Give ${reorderPoints === 1 ? 'it' : 'them'} another supplier first.`
  throw new AppError('still-in-use', message, { errors: [{ path: 'isArchived', message }] })
}

async function refusingTakenName<Answer>(work: () => Promise<Answer>): Promise<Answer> {
  try {
    return await work()
  } catch (error) {
    if (!isUniqueViolation(error, 'suppliers_name_idx')) throw error
    const message = 'A supplier has this name already, perhaps an archived one.'
    throw new AppError('name-taken', message, { errors: [{ path: 'name', message }] })
  }
}
