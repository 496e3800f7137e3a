import { canPostMovement } from '@/core/policies/movement-policy'
import {
  isNoMove,
  isPostedByHand,
  movementProblem,
  type PostedMovementKind,
} from '@/core/stock/movement-problems'
import { AppError } from '@/lib/app-error'
import type { CreateMovementRequest } from '@/schemas/movement'
import type { FieldProblem } from '@/schemas/problem'
import type { Actor } from '../../auth/actor'
import type { Database } from '../../db/connection'
import { findItem, type ItemInBrief } from '../../db/stores/item-store'
import { findLocation, getScrapLocationId, type LocationRecord } from '../../db/stores/location-store'
import { findItemOfPiece, type NewMovement } from '../../db/stores/movement-store'

/** The movement a request asks for, or what is wrong with it, each fault beside its field. */
export async function checkedMovement(
  trx: Database,
  actor: Actor,
  request: CreateMovementRequest,
): Promise<NewMovement> {
  const kind = kindAllowedTo(actor, request)
  const item = await findItem(trx, request.itemId)
  const from = await findLocation(trx, request.fromLocationId)
  const to = await findTarget(trx, kind, request.toLocationId ?? null)
  const faults = [
    ...itemFaults(item),
    ...(await pieceFaults(trx, item, request)),
    ...placeFaults(kind, from, to),
    ...jobFaults(request.jobId ?? null),
  ]
  if (faults.length > 0 || !from || !to) throw notPossible(faults)
  const movement: NewMovement = {
    kind,
    itemId: request.itemId,
    pieceId: request.pieceId ?? null,
    quantity: request.quantity,
    fromLocationId: from.id,
    fromCondition: request.fromCondition,
    toLocationId: to.id,
    toCondition: request.toCondition ?? request.fromCondition,
    note: request.note ?? '',
    actorId: actor.id,
    reversesId: null,
  }
  refuseNoMove(movement)
  return movement
}

function kindAllowedTo(actor: Actor, request: CreateMovementRequest): PostedMovementKind {
  const { kind } = request
  if (!isPostedByHand(kind)) {
    const message =
      kind === 'reversal'
        ? 'A reversal is posted on the movement it reverses.'
        : 'Receipts and adjustments come from their documents: an order, a count, an import of opening stock.'
    throw notPossible([{ path: 'kind', message }])
  }
  if (canPostMovement(actor, kind, request.fromLocationId)) return kind
  throw new AppError(
    'not-allowed',
    kind === 'scrap' ? 'You can scrap only what is in your own hands.' : `Your role posts no ${kind}.`,
    { note: `user ${actor.id} (${actor.role}) may not post ${kind} from ${request.fromLocationId}` },
  )
}

/** What is broken goes to the one scrap of the books, which nobody needs to name. */
async function findTarget(
  trx: Database,
  kind: PostedMovementKind,
  locationId: string | null,
): Promise<LocationRecord | null> {
  const id = kind === 'scrap' && locationId === null ? await getScrapLocationId(trx) : locationId
  return id === null ? null : findLocation(trx, id)
}

function itemFaults(item: ItemInBrief | null): FieldProblem[] {
  if (!item) return [{ path: 'itemId', message: 'There is no such item.' }]
  return item.isArchived
    ? [{ path: 'itemId', message: `${item.code} is archived: bring it back first.` }]
    : []
}

async function pieceFaults(
  trx: Database,
  item: ItemInBrief | null,
  request: CreateMovementRequest,
): Promise<FieldProblem[]> {
  if (!item) return []
  const pieceId = request.pieceId ?? null
  if (item.isTrackedByPiece && pieceId === null) {
    return [{ path: 'pieceId', message: `${item.code} is tracked piece by piece: say which piece.` }]
  }
  if (pieceId === null) return []
  if (!item.isTrackedByPiece) {
    return [{ path: 'pieceId', message: `${item.code} is not tracked piece by piece: leave this out.` }]
  }
  if ((await findItemOfPiece(trx, pieceId)) !== item.id) {
    return [{ path: 'pieceId', message: `There is no such piece of ${item.code}.` }]
  }
  return request.quantity === 1 ? [] : [{ path: 'quantity', message: 'A tagged piece moves alone: 1.' }]
}

function placeFaults(
  kind: PostedMovementKind,
  from: LocationRecord | null,
  to: LocationRecord | null,
): FieldProblem[] {
  const missing = [
    ...(from ? [] : [{ path: 'fromLocationId', message: 'There is no such location.' }]),
    ...(to ? [] : [{ path: 'toLocationId', message: 'There is no such location.' }]),
  ]
  if (!from || !to) return missing
  const problem = movementProblem(kind, from, to)
  if (problem) return [problem]
  return to.isArchived ? [{ path: 'toLocationId', message: `${to.code} is archived.` }] : []
}

function jobFaults(jobId: string | null): FieldProblem[] {
  return jobId === null ? [] : [{ path: 'jobId', message: 'There is no such job.' }]
}

function refuseNoMove(movement: NewMovement): void {
  const from = { locationId: movement.fromLocationId, condition: movement.fromCondition }
  const to = { locationId: movement.toLocationId, condition: movement.toCondition }
  if (!isNoMove(from, to)) return
  throw notPossible([{ path: 'toLocationId', message: 'The pieces are there already, in that condition.' }])
}

function notPossible(errors: FieldProblem[]): AppError {
  return new AppError('movement-not-possible', errors[0]?.message ?? 'This movement is not possible.', {
    errors,
  })
}
