import { isDeepStrictEqual } from 'node:util'
import { setUpWindow } from '@/core/machine/set-up-window'
import { AppError } from '@/lib/app-error'
import type { CreateSetUpRequest, SetUpResponse, UpdateSetUpRequest } from '@/schemas/set-up'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { brokenConstraint, databaseErrorCode, isUniqueViolation } from '../../db/database-errors'
import type { SetUpRow } from '../../db/read-models/set-up-rows'
import { createAuditEntry } from '../../db/stores/audit-store'
import { findLockedMachine } from '../../db/stores/machine-store'
import {
  removeSetUp as deleteSetUp,
  createSetUp as insertSetUp,
  lockSetUp,
  type SetUpChange,
  updateSetUp as writeSetUp,
} from '../../db/stores/set-up-store'
import { inTransaction } from '../../db/transaction'
import { getSetUp } from './get-set-up'
import { setUpAnswer } from './set-up-answer'

/** Adds a set-up to a machine in use. Heights that cannot be are refused; a window that is none is kept and said. */
export async function createSetUp(
  actor: Actor,
  { machineId, ...fields }: CreateSetUpRequest,
): Promise<SetUpResponse> {
  return explainingRefusals(() =>
    inTransaction(db(), async (trx) => {
      const machine = await findLockedMachine(trx, machineId)
      if (!machine || machine.archivedAt !== null) {
        const message = machine ? 'This machine is archived.' : 'There is no such machine.'
        throw new AppError('impossible', message, { errors: [{ path: 'machineId', message }] })
      }
      const id = await insertSetUp(trx, machineId, fields)
      const after = readableSetUp(await getSetUp(id, trx))
      await audit(trx, actor, 'set-up-added', id, { after })
      return after
    }),
  )
}

/** Changes a set-up: absent leaves alone. */
export async function updateSetUp(
  actor: Actor,
  id: string,
  { version, ...request }: UpdateSetUpRequest,
): Promise<SetUpResponse> {
  return explainingRefusals(() =>
    inTransaction(db(), async (trx) => {
      await lockSetUp(trx, id)
      const before = setUpAnswer(await getSetUp(id, trx))
      if (before.version !== version) {
        throw new AppError('stale-version', 'Someone changed this set-up meanwhile.', {
          extra: { current: before },
        })
      }
      await writeSetUp(trx, id, changedFields(before, request))
      const after = readableSetUp(await getSetUp(id, trx))
      if (after.version !== before.version) await audit(trx, actor, 'set-up-changed', id, { before, after })
      return after
    }),
  )
}

/** Takes a set-up out of its machine's list; the audit keeps what it said. */
export async function removeSetUp(actor: Actor, id: string): Promise<void> {
  await inTransaction(db(), async (trx) => {
    await lockSetUp(trx, id)
    const before = setUpAnswer(await getSetUp(id, trx))
    await deleteSetUp(trx, id)
    await audit(trx, actor, 'set-up-removed', id, { before })
  })
}

/** Heights that cannot be are refused by the core at their field, which takes the change back. */
function readableSetUp(row: SetUpRow): SetUpResponse {
  setUpWindow(row.machine, row)
  return setUpAnswer(row)
}

function changedFields(before: SetUpResponse, request: SetUpChange): SetUpChange {
  const held: Record<string, unknown> = {
    ...before,
    fixtures: before.fixtures.map(({ itemId, baseMm }) => ({ itemId, baseMm })),
  }
  return Object.fromEntries(
    Object.entries(request).filter(
      ([field, value]) => value !== undefined && !isDeepStrictEqual(value, held[field]),
    ),
  )
}

async function audit(
  trx: Database,
  actor: Actor,
  action: string,
  entityId: string,
  states: { before?: SetUpResponse; after?: SetUpResponse },
): Promise<void> {
  await createAuditEntry(trx, { actorId: actor.id, action, entity: 'set-up', entityId, ...states })
}

async function explainingRefusals<Answer>(work: () => Promise<Answer>): Promise<Answer> {
  try {
    return await work()
  } catch (error) {
    if (isUniqueViolation(error, 'set_ups_name_idx')) {
      const message = 'This machine has a set-up of that name.'
      throw new AppError('name-taken', message, { errors: [{ path: 'name', message }] })
    }
    const isNoFixture =
      databaseErrorCode(error) === '23503' && brokenConstraint(error)?.startsWith('set_up_fixtures_item')
    if (!isNoFixture) throw error
    const message = 'One of these is no fixture of the crib.'
    throw new AppError('impossible', message, { errors: [{ path: 'fixtures', message }] })
  }
}
