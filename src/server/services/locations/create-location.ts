import { AppError } from '@/lib/app-error'
import type { CreateLocationRequest, LocationResponse } from '@/schemas/location'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { databaseErrorCode } from '../../db/database-errors'
import { createAuditEntry } from '../../db/stores/audit-store'
import { createCrib, getCribLocationId } from '../../db/stores/crib-store'
import {
  findLocation,
  createLocation as insertLocation,
  type LocationRecord,
} from '../../db/stores/location-store'
import { inTransaction } from '../../db/transaction'
import { explainingLocationRefusals } from './explain-location-refusal'
import { readLocation } from './read-location'

/** Adds a crib, a cabinet, drawer or bin within one, a grinder, or a place in transit. */
export async function createLocation(
  actor: Actor,
  request: CreateLocationRequest,
): Promise<LocationResponse> {
  return explainingLocationRefusals(request.code, () =>
    inTransaction(db(), async (trx) => {
      const id = await insertRequested(trx, request)
      const added = await readLocation(trx, id)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: 'location-added',
        entity: 'location',
        entityId: id,
        after: added,
      })
      return added
    }),
  )
}

async function insertRequested(trx: Database, request: CreateLocationRequest): Promise<string> {
  const { code, name, kind } = request
  if (request.kind === 'crib') return getCribLocationId(trx, await insertCrib(trx, request))
  if (!('parentId' in request)) return insertLocation(trx, { kind, code, name, cribId: null, parentId: null })
  const parent = parentOf(await findLocation(trx, request.parentId))
  return insertLocation(trx, { kind, code, name, cribId: parent.cribId, parentId: parent.id })
}

function parentOf(parent: LocationRecord | null): LocationRecord {
  if (parent?.cribId) return parent
  const message = parent ? 'Only a crib, cabinet or drawer has things in it.' : 'There is no such location.'
  throw new AppError('impossible', message, { errors: [{ path: 'parentId', message }] })
}

/** invalid_parameter_value: the database knows the world's time zones. */
async function insertCrib(
  trx: Database,
  crib: { code: string; name: string; timeZone: string },
): Promise<string> {
  try {
    return await createCrib(trx, crib)
  } catch (error) {
    if (databaseErrorCode(error) !== '22023') throw error
    const message = 'There is no such time zone. Give one such as Europe/Vienna.'
    throw new AppError('impossible', message, { errors: [{ path: 'timeZone', message }] })
  }
}
