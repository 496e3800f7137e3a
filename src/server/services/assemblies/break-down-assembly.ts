import { canPostMovement } from '@/core/policies/movement-policy'
import { movementProblem } from '@/core/stock/movement-problems'
import { AppError } from '@/lib/app-error'
import type { AssemblyResponse, BreakDownAssemblyRequest } from '@/schemas/assembly'
import type { FieldProblem } from '@/schemas/problem'
import type { Actor } from '../../auth/actor'
import type { Database } from '../../db/connection'
import { type AssemblyPartRecord, readAssemblyParts } from '../../db/read-models/assembly-details'
import { markAssemblyBrokenDown } from '../../db/stores/assembly-store'
import { createAuditEntry } from '../../db/stores/audit-store'
import { findLocation, getScrapLocationId } from '../../db/stores/location-store'
import { createMovements, type NewMovement } from '../../db/stores/movement-store'
import { onceInTransaction, type RepeatableCall } from '../idempotency'
import { explainingAssemblyRefusals } from './explain-assembly-refusal'
import { getLockedBuiltAssembly } from './locked-assembly'
import { readAssembly } from './read-assembly'
import { recheckAssembly } from './recheck-assembly'

type GivenPart = BreakDownAssemblyRequest['parts'][number]

/** Takes an assembly apart: every part goes back to a bin in the condition said, or to scrap, in one transaction. */
export async function breakDownAssembly(
  actor: Actor,
  id: string,
  request: BreakDownAssemblyRequest,
  claim: RepeatableCall,
): Promise<AssemblyResponse> {
  return explainingAssemblyRefusals(() =>
    onceInTransaction(actor, claim, async (trx) => {
      const assembly = await getLockedBuiltAssembly(trx, id, request.version)
      const parts = await readAssemblyParts(trx, id)
      const movements: NewMovement[] = []
      const faults: FieldProblem[] = []
      for (const part of parts) {
        const index = request.parts.findIndex(({ kind }) => kind === part.kind)
        const given = request.parts[index]
        if (!given) {
          faults.push({ path: 'parts', message: `Say what becomes of ${part.code}.` })
          continue
        }
        const made = await movementOf(trx, actor, part, given, `parts.${index}`)
        if (Array.isArray(made)) faults.push(...made)
        else if (made) movements.push({ ...made, note: `Assembly ${assembly.number} broken down` })
      }
      if (faults.length > 0)
        throw new AppError('impossible', faults[0]?.message ?? 'This cannot be broken down.', {
          errors: faults,
        })
      await markAssemblyBrokenDown(trx, id)
      await createMovements(trx, movements)
      await recheckAssembly(trx, assembly)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: 'assembly-broken-down',
        entity: 'assembly',
        entityId: id,
        after: { number: assembly.number, parts: request.parts },
      })
      return readAssembly(trx, id)
    }),
  )
}

/** The movement of one part; null where it went before; faults where it can't be as said. */
async function movementOf(
  trx: Database,
  actor: Actor,
  part: AssemblyPartRecord,
  given: GivenPart,
  path: string,
): Promise<NewMovement | FieldProblem[] | null> {
  const { locationId, condition, presence } = part
  if (locationId === null || condition === null) return null
  if (given.outcome === 'gone') {
    const isGone = presence !== null && presence.held < presence.claimed
    const message = `${part.code} is there by the books: return it or scrap it.`
    return isGone ? null : [{ path: `${path}.outcome`, message }]
  }
  if (!canPostMovement(actor, given.outcome, locationId)) {
    throw new AppError(
      'not-allowed',
      'You can scrap only what is in your own hands: take the assembly out first.',
    )
  }
  const toLocationId =
    given.outcome === 'scrap' ? await getScrapLocationId(trx) : (given.toLocationId ?? part.homeLocationId)
  const target = toLocationId === null ? null : await findLocation(trx, toLocationId)
  if (!target) return [{ path: `${path}.toLocationId`, message: 'There is no such location.' }]
  const problem = movementProblem(given.outcome, { kind: 'person', cribId: null }, target)
  if (problem) return [{ path: `${path}.toLocationId`, message: problem.message }]
  return {
    kind: given.outcome,
    itemId: part.itemId,
    pieceId: part.pieceId,
    quantity: 1,
    fromLocationId: locationId,
    fromCondition: condition,
    toLocationId: target.id,
    toCondition: given.condition ?? condition,
    note: '',
    actorId: actor.id,
    reversesId: null,
  }
}
