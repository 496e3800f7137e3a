import type { PostedMovementKind } from '../stock/movement-problems'
import { can, type Role } from './permissions'

interface Mover {
  id: string
  role: Role
  /** The location of this person's own hands. */
  locationId: string
}

const byAnyMover: readonly PostedMovementKind[] = ['issue', 'return']

/**
 * Whether a person may post a movement of this kind from this place. Whoever moves issues and returns, and reports
 * broken what is in their own hands; the rest is for those who keep the crib.
 *
 * @example
 * canPostMovement({ id: '1', role: 'machinist', locationId: '7' }, 'scrap', '7') // => true
 * canPostMovement({ id: '1', role: 'machinist', locationId: '7' }, 'scrap', '8') // => false
 */
export function canPostMovement(mover: Mover, kind: PostedMovementKind, fromLocationId: string): boolean {
  if (can(mover.role, 'keepCrib')) return true
  if (!can(mover.role, 'move')) return false
  return byAnyMover.includes(kind) || (kind === 'scrap' && fromLocationId === mover.locationId)
}

/**
 * Whether a person may reverse a movement: any, for those who keep the crib; for others that move, their own of the
 * same day at the crib. Whether it was reversed before is another question.
 *
 * @example
 * canReverseMovement({ id: '1', role: 'machinist', locationId: '7' }, { actorId: '1', isOfToday: false }) // => false
 */
export function canReverseMovement(mover: Mover, movement: { actorId: string; isOfToday: boolean }): boolean {
  if (can(mover.role, 'keepCrib')) return true
  return can(mover.role, 'move') && movement.actorId === mover.id && movement.isOfToday
}
