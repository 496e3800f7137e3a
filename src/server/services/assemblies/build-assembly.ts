import { movementProblem } from '@/core/stock/movement-problems'
import { AppError } from '@/lib/app-error'
import type { AssemblyResponse, BuildAssemblyRequest } from '@/schemas/assembly'
import type { FieldProblem } from '@/schemas/problem'
import type { Actor } from '../../auth/actor'
import type { Database } from '../../db/connection'
import { type AssemblyPartRecord, readAssemblyParts } from '../../db/read-models/assembly-details'
import { type AssemblyRecord, markAssemblyBuilt, type PartPlace } from '../../db/stores/assembly-store'
import { createAuditEntry } from '../../db/stores/audit-store'
import { findLocation } from '../../db/stores/location-store'
import { createMovements, findItemOfPiece } from '../../db/stores/movement-store'
import { onceInTransaction, type RepeatableCall } from '../idempotency'
import { type AssemblySpot, assemblySpot } from './assembly-spot'
import { refuseFailing, takeOver } from './change-assembly'
import { explainingAssemblyRefusals } from './explain-assembly-refusal'
import { getLockedAssembly } from './locked-assembly'
import { readAssembly } from './read-assembly'
import { recheckAssembly } from './recheck-assembly'

type GivenPart = BuildAssemblyRequest['parts'][number]

/**
 * Puts an assembly together: every part is issued, all in one transaction, and the sizes of the very parts taken are
 * what it goes by from now on. What doesn't reach with them is not built.
 */
export async function buildAssembly(
  actor: Actor,
  id: string,
  request: BuildAssemblyRequest,
  claim: RepeatableCall,
): Promise<AssemblyResponse> {
  return explainingAssemblyRefusals(() =>
    onceInTransaction(actor, claim, async (trx) => {
      const assembly = await getLockedAssembly(trx, id, request.version)
      refuseUnbuildable(assembly)
      const parts = await readAssemblyParts(trx, id)
      await refuseWrongParts(trx, parts, request.parts)
      const spot = await assemblySpot(trx, actor, id, request)
      const places = placesOf(parts, request.parts, spot)
      await issueParts(trx, actor, assembly, parts, places)
      await markAssemblyBuilt(trx, id, places, spot)
      await takeOver(trx, assembly)
      refuseFailing(await recheckAssembly(trx, assembly), 'parts')
      const built = await readAssembly(trx, id)
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: 'assembly-built',
        entity: 'assembly',
        entityId: id,
        after: { number: built.number, where: spot.words, gaugeLengthMm: built.gaugeLengthMm, parts: places },
      })
      return built
    }),
  )
}

function refuseUnbuildable({ state, isArchived, number }: AssemblyRecord): void {
  if (isArchived) throw new AppError('wrong-state', `Assembly ${number} is archived: keep it anew.`)
  if (state === 'built') throw new AppError('wrong-state', `Assembly ${number} is built already.`)
}

async function refuseWrongParts(
  trx: Database,
  parts: readonly AssemblyPartRecord[],
  given: readonly GivenPart[],
): Promise<void> {
  const faults: FieldProblem[] = []
  for (const part of parts) {
    const index = given.findIndex(({ kind }) => kind === part.kind)
    const source = given[index]
    if (!source) faults.push({ path: 'parts', message: `Say where ${part.code} is taken from.` })
    else faults.push(...(await sourceFaults(trx, part, source, `parts.${index}`)))
  }
  const unknown = given.find(({ kind }) => !parts.some((part) => part.kind === kind))
  if (unknown) faults.push({ path: 'parts', message: `This assembly has no ${unknown.kind}.` })
  if (new Set(given.map(({ kind }) => kind)).size < given.length)
    faults.push({ path: 'parts', message: 'One part is named twice.' })
  if (faults.length > 0)
    throw new AppError('impossible', faults[0]?.message ?? 'This cannot be built.', { errors: faults })
}

async function sourceFaults(
  trx: Database,
  part: AssemblyPartRecord,
  source: GivenPart,
  path: string,
): Promise<FieldProblem[]> {
  if (part.isArchived) return [{ path, message: `${part.code} is archived: bring it back first.` }]
  const location = await findLocation(trx, source.fromLocationId)
  if (!location) return [{ path: `${path}.fromLocationId`, message: 'There is no such location.' }]
  const problem = movementProblem('issue', location, { kind: 'person', cribId: null })
  if (problem) return [{ path: `${path}.fromLocationId`, message: problem.message }]
  const pieceId = pieceOf(part, source)
  if (!part.isTrackedByPiece)
    return source.pieceId
      ? [{ path: `${path}.pieceId`, message: `${part.code} is not tracked piece by piece: leave this out.` }]
      : []
  if (pieceId === null)
    return [{ path: `${path}.pieceId`, message: `${part.code} is tracked piece by piece: say which piece.` }]
  return (await findItemOfPiece(trx, pieceId)) === part.itemId
    ? []
    : [{ path: `${path}.pieceId`, message: `There is no such piece of ${part.code}.` }]
}

/** The piece named now, or the one it was planned with. */
function pieceOf(part: AssemblyPartRecord, source: GivenPart): string | null {
  return part.isTrackedByPiece ? (source.pieceId ?? part.pieceId) : null
}

function placesOf(
  parts: readonly AssemblyPartRecord[],
  given: readonly GivenPart[],
  { locationId }: AssemblySpot,
): PartPlace[] {
  return parts.flatMap((part) => {
    const source = given.find(({ kind }) => kind === part.kind)
    if (!source) return []
    const { kind } = part
    const { fromLocationId: homeLocationId, condition } = source
    return [{ kind, pieceId: pieceOf(part, source), homeLocationId, locationId, condition }]
  })
}

async function issueParts(
  trx: Database,
  actor: Actor,
  { number }: AssemblyRecord,
  parts: readonly AssemblyPartRecord[],
  places: readonly PartPlace[],
): Promise<void> {
  await createMovements(
    trx,
    places.flatMap((place) => {
      const part = parts.find(({ kind }) => kind === place.kind)
      if (!part) return []
      return [
        {
          kind: 'issue' as const,
          itemId: part.itemId,
          pieceId: place.pieceId,
          quantity: 1,
          fromLocationId: place.homeLocationId,
          fromCondition: place.condition,
          toLocationId: place.locationId,
          toCondition: place.condition,
          note: `Assembly ${number} built`,
          actorId: actor.id,
          reversesId: null,
        },
      ]
    }),
  )
}
