import { AppError } from '@/lib/app-error'
import type { LocationResponse, UpdateLocationRequest } from '@/schemas/location'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { updateCrib } from '../../db/stores/crib-store'
import { findLockedLocation, updateLocation as writeLocation } from '../../db/stores/location-store'
import { inTransaction } from '../../db/transaction'
import { explainingLocationRefusals } from './explain-location-refusal'
import { readLocation } from './read-location'
import { refuseKeptLocation } from './refuse-kept-location'

/** Renames a location, moves it within its crib or brings it back. A crib is renamed itself, and its root follows. */
export async function updateLocation(
  actor: Actor,
  id: string,
  request: UpdateLocationRequest,
): Promise<LocationResponse> {
  return explainingLocationRefusals(request.code, () =>
    inTransaction(db(), async (trx) => {
      const location = refuseKeptLocation(await findLockedLocation(trx, id))
      const before = await readLocation(trx, id)
      if (before.version !== request.version) {
        throw new AppError('stale-version', 'Someone changed this location meanwhile.', {
          extra: { current: before },
        })
      }
      const { version: _, archivedAt, ...change } = request
      if (location.kind === 'crib' && location.cribId) {
        if (change.parentId !== undefined) refuseParent()
        await updateCrib(trx, location.cribId, change)
      } else {
        if (change.parentId !== undefined && location.parentId === null) refuseParent()
        await writeLocation(trx, id, { ...change, isRestored: archivedAt === null })
      }
      const after = await readLocation(trx, id)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action:
          before.archivedAt !== null && after.archivedAt === null ? 'location-restored' : 'location-changed',
        entity: 'location',
        entityId: id,
        before,
        after,
      })
      return after
    }),
  )
}

function refuseParent(): never {
  const message = 'This stands in nothing.'
  throw new AppError('impossible', message, { errors: [{ path: 'parentId', message }] })
}
