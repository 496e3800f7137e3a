import { describe, expect, it } from 'vitest'
import { can, permissionTable, roles } from './permissions'

/** Written from the shop's own table, by hand: machinist, estimator, crib manager, admin. */
const expected = {
  see: [true, true, true, true],
  move: [true, false, true, true],
  plan: [true, true, true, true],
  keepCrib: [false, false, true, true],
  seeCosts: [false, true, true, true],
  administer: [false, false, false, true],
}

describe('who may do what', () => {
  it('is decided for every permission there is', () => {
    expect(Object.keys(permissionTable).sort()).toEqual(Object.keys(expected).sort())
  })

  it.each(Object.entries(expected))('gives "%s" to the roles it is meant for', (permission, row) => {
    expect(roles.map((role) => can(role, permission as keyof typeof expected))).toEqual(row)
  })
})
