import { AppError } from '@/lib/app-error'
import type { AssemblyResponse, PocketAssemblyRequest } from '@/schemas/assembly'
import type { Actor } from '../../auth/actor'
import type { Database } from '../../db/connection'
import { type AssemblyPartRecord, readAssemblyParts } from '../../db/read-models/assembly-details'
import {
  type AssemblyRecord,
  moveAssembly as markMoved,
  updateAssembly as writeAssembly,
} from '../../db/stores/assembly-store'
import { createAuditEntry } from '../../db/stores/audit-store'
import { createMovements, type NewMovement } from '../../db/stores/movement-store'
import { onceInTransaction, type RepeatableCall } from '../idempotency'
import { assemblySpot } from './assembly-spot'
import { explainingAssemblyRefusals } from './explain-assembly-refusal'
import { getLockedBuiltAssembly } from './locked-assembly'
import { readAssembly } from './read-assembly'

/**
 * Puts a built assembly into a machine and a pocket of it, into another, or back into one's hands. The books know no way
 * from hands to a machine but over a bin, so every part is returned to the bin it came from and issued again, both in
 * one transaction: the bin has as much after it as before.
 */
export async function pocketAssembly(
  actor: Actor,
  id: string,
  request: PocketAssemblyRequest,
  claim: RepeatableCall,
): Promise<AssemblyResponse> {
  const { version, machineId, pocket, ...offsets } = request
  return explainingAssemblyRefusals(() =>
    onceInTransaction(actor, claim, async (trx) => {
      const assembly = await getLockedBuiltAssembly(trx, id, version)
      const before = await readAssembly(trx, id)
      const spot = await assemblySpot(trx, actor, id, { machineId, pocket })
      const parts = await readAssemblyParts(trx, id)
      await markMoved(trx, id, spot)
      await writeAssembly(trx, id, offsets)
      await carryParts(trx, actor, assembly, parts, spot.locationId)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: 'assembly-moved',
        entity: 'assembly',
        entityId: id,
        before: { machineId: before.machine?.id ?? null, pocket: before.pocket },
        after: { machineId: spot.machineId, pocket: spot.pocket, ...offsets },
      })
      return readAssembly(trx, id)
    }),
  )
}

async function carryParts(
  trx: Database,
  actor: Actor,
  { number }: AssemblyRecord,
  parts: readonly AssemblyPartRecord[],
  toLocationId: string,
): Promise<void> {
  const note = `Assembly ${number} moved`
  const returned: NewMovement[] = []
  const issued: NewMovement[] = []
  for (const { itemId, pieceId, homeLocationId, locationId, condition, presence, code } of parts) {
    if (homeLocationId === null || locationId === null || condition === null) continue
    if (locationId === toLocationId) continue
    if (presence !== null && presence.held < presence.claimed) throw incomplete(number, code)
    const common = { itemId, pieceId, quantity: 1, fromCondition: condition, toCondition: condition }
    const by = { note, actorId: actor.id, reversesId: null }
    returned.push({
      ...common,
      ...by,
      kind: 'return',
      fromLocationId: locationId,
      toLocationId: homeLocationId,
    })
    issued.push({
      ...common,
      ...by,
      kind: 'issue',
      fromLocationId: homeLocationId,
      toLocationId,
    })
  }
  await createMovements(trx, [...returned, ...issued])
}

function incomplete(number: number, code: string): AppError {
  return new AppError(
    'assembly-does-not-hold',
    `${code} is no longer with assembly ${number} by the books: break it down and build it again.`,
  )
}
