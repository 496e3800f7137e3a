import { describe, expect, it } from 'vitest'
import type { PostedMovementKind } from '../stock/movement-problems'
import { canPostMovement, canReverseMovement } from './movement-policy'
import type { Role } from './permissions'

const own = '7'
const person = (role: Role) => ({ id: '1', role, locationId: own })
const kinds: PostedMovementKind[] = ['issue', 'return', 'relocation', 'transfer', 'regrind', 'scrap']
const allowed = (role: Role, from: string) =>
  kinds.filter((kind) => canPostMovement(person(role), kind, from))

describe('canPostMovement', () => {
  it('lets a machinist issue, return and scrap from their own hands, no more', () => {
    expect(allowed('machinist', '8')).toEqual(['issue', 'return'])
    expect(allowed('machinist', own)).toEqual(['issue', 'return', 'scrap'])
  })

  it('lets an estimator move nothing, and who keeps the crib everything', () => {
    expect(allowed('estimator', own)).toEqual([])
    expect(allowed('cribManager', '8')).toEqual(kinds)
    expect(allowed('admin', '8')).toEqual(kinds)
  })
})

describe('canReverseMovement', () => {
  it('lets a machinist undo their own of today, and who keeps the crib any', () => {
    const cases = [
      { actorId: '1', isOfToday: true },
      { actorId: '1', isOfToday: false },
      { actorId: '2', isOfToday: true },
    ]
    const of = (role: Role) => cases.map((movement) => canReverseMovement(person(role), movement))
    expect(of('machinist')).toEqual([true, false, false])
    expect(of('estimator')).toEqual([false, false, false])
    expect(of('cribManager')).toEqual([true, true, true])
    expect(of('admin')).toEqual([true, true, true])
  })
})
