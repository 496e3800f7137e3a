import { isDeepStrictEqual } from 'node:util'
import { AppError } from '@/lib/app-error'
import {
  type CreateMachineRequest,
  type MachineResponse,
  machineProblems,
  type UpdateMachineRequest,
} from '@/schemas/machine'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { databaseErrorCode, isUniqueViolation, ledgerErrorCodes } from '../../db/database-errors'
import { createAuditEntry } from '../../db/stores/audit-store'
import {
  findLockedMachine,
  createMachine as insertMachine,
  type MachineChange,
  setMachineArchived,
  updateMachine as writeMachine,
} from '../../db/stores/machine-store'
import { inTransaction } from '../../db/transaction'
import { getMachine } from './get-machine'

/** Adds a machine; the place where its stock is counted comes with it. */
export async function createMachine(actor: Actor, request: CreateMachineRequest): Promise<MachineResponse> {
  return explainingRefusals(request.code, () =>
    inTransaction(db(), async (trx) => {
      const after = await getMachine(await insertMachine(trx, request), trx)
      await audit(trx, actor, 'machine-added', after.id, { after })
      return after
    }),
  )
}

/** Changes a machine: absent leaves alone, null clears; `archivedAt: null` brings it back. */
export async function updateMachine(
  actor: Actor,
  id: string,
  { version, archivedAt, ...request }: UpdateMachineRequest,
): Promise<MachineResponse> {
  return explainingRefusals(request.code, () =>
    inTransaction(db(), async (trx) => {
      const before = await getLocked(trx, id)
      if (before.version !== version) {
        throw new AppError('stale-version', 'Someone changed this machine meanwhile.', {
          extra: { current: before },
        })
      }
      const change = changedFields(before, request)
      const errors = machineProblems({ ...before, ...change })
      if (errors.length > 0) {
        throw new AppError('impossible', 'Some fields cannot be taken as they are.', { errors })
      }
      await writeMachine(trx, id, change)
      if (archivedAt === null && before.archivedAt !== null) await setMachineArchived(trx, id, false)
      const after = await getMachine(id, trx)
      if (after.version !== before.version) await audit(trx, actor, 'machine-changed', id, { before, after })
      return after
    }),
  )
}

/** Archives a machine that has no stock on it; done again, it changes nothing. */
export async function archiveMachine(actor: Actor, id: string): Promise<void> {
  await explainingRefusals(undefined, () =>
    inTransaction(db(), async (trx) => {
      const before = await getLocked(trx, id)
      if (before.archivedAt !== null) return
      await setMachineArchived(trx, id, true)
      await audit(trx, actor, 'machine-archived', id, { before, after: await getMachine(id, trx) })
    }),
  )
}

async function getLocked(trx: Database, id: string): Promise<MachineResponse> {
  const found = await findLockedMachine(trx, id)
  if (!found) throw new AppError('not-found', 'There is no such machine.')
  return found
}

/** Of what was sent, what differs from the row: sending a value again is no change. */
function changedFields(before: MachineResponse, request: MachineChange): MachineChange {
  const held: Record<string, unknown> = { ...before }
  const given = request.spindlePoints
    ? { ...request, spindlePoints: [...request.spindlePoints].sort((one, other) => one.rpm - other.rpm) }
    : request
  return Object.fromEntries(
    Object.entries(given).filter(
      ([field, value]) => value !== undefined && !isDeepStrictEqual(value, held[field]),
    ),
  )
}

async function audit(
  trx: Database,
  actor: Actor,
  action: string,
  entityId: string,
  states: { before?: MachineResponse; after?: MachineResponse },
): Promise<void> {
  await createAuditEntry(trx, { actorId: actor.id, action, entity: 'machine', entityId, ...states })
}

async function explainingRefusals<Answer>(
  code: string | undefined,
  work: () => Promise<Answer>,
): Promise<Answer> {
  try {
    return await work()
  } catch (error) {
    if (
      isUniqueViolation(error, 'machines_code_idx') ||
      isUniqueViolation(error, 'locations_crib_id_code_idx')
    ) {
      throw new AppError('code-taken', `The code ${code ?? 'given'} is taken.`, {
        errors: [{ path: 'code', message: 'Another machine or location has this code.' }],
      })
    }
    if (databaseErrorCode(error) === ledgerErrorCodes.stillInUse) {
      throw new AppError('still-in-use', 'There is stock on this machine: return it first.')
    }
    throw error
  }
}
