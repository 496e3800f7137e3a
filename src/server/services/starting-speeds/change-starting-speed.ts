import { AppError } from '@/lib/app-error'
import type {
  CreateStartingSpeedRequest,
  StartingSpeed,
  UpdateStartingSpeedRequest,
} from '@/schemas/starting-speed'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { isUniqueViolation } from '../../db/database-errors'
import { createAuditEntry } from '../../db/stores/audit-store'
import {
  removeStartingSpeed as deleteStartingSpeed,
  findLockedStartingSpeed,
  createStartingSpeed as insertStartingSpeed,
  updateStartingSpeed as writeStartingSpeed,
} from '../../db/stores/starting-speed-store'
import { inTransaction } from '../../db/transaction'

/** Adds a material to the shop's table. */
export async function createStartingSpeed(
  actor: Actor,
  request: CreateStartingSpeedRequest,
): Promise<StartingSpeed> {
  return refusingTwins(request.material, () =>
    inTransaction(db(), async (trx) => {
      const after = await insertStartingSpeed(trx, request)
      await audit(trx, actor, 'starting-speed-added', after.id, { after })
      return after
    }),
  )
}

/** Puts a row of the table as it was sent, where it still has the version it was read with. */
export async function updateStartingSpeed(
  actor: Actor,
  id: string,
  { version, ...fields }: UpdateStartingSpeedRequest,
): Promise<StartingSpeed> {
  return refusingTwins(fields.material, () =>
    inTransaction(db(), async (trx) => {
      const before = await getLocked(trx, id)
      if (before.version !== version) {
        throw new AppError('stale-version', 'Someone changed this speed meanwhile.', {
          extra: { current: before },
        })
      }
      const after = await writeStartingSpeed(trx, id, fields)
      if (after.version !== before.version) {
        await audit(trx, actor, 'starting-speed-changed', id, { before, after })
      }
      return after
    }),
  )
}

/** Takes a row out of the table; the audit keeps what it said. */
export async function removeStartingSpeed(actor: Actor, id: string): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const before = await getLocked(trx, id)
    await deleteStartingSpeed(trx, id)
    await audit(trx, actor, 'starting-speed-removed', id, { before })
  })
}

async function getLocked(trx: Database, id: string): Promise<StartingSpeed> {
  const found = await findLockedStartingSpeed(trx, id)
  if (!found) throw new AppError('not-found', 'There is no such starting speed.')
  return found
}

async function audit(
  trx: Database,
  actor: Actor,
  action: string,
  entityId: string,
  states: { before?: StartingSpeed; after?: StartingSpeed },
): Promise<void> {
  await createAuditEntry(trx, { actorId: actor.id, action, entity: 'starting-speed', entityId, ...states })
}

async function refusingTwins<Answer>(material: string, work: () => Promise<Answer>): Promise<Answer> {
  try {
    return await work()
  } catch (error) {
    if (!isUniqueViolation(error, 'starting_speeds_material_idx')) throw error
    const message = `${material} has a speed for this substrate already.`
    throw new AppError('code-taken', message, { errors: [{ path: 'material', message }] })
  }
}
