/** Who may do what. The one table; every route names a permission of it and every screen hides by it. */

export const roles = ['machinist', 'estimator', 'cribManager', 'admin'] as const
export type Role = (typeof roles)[number]

export const permissionTable = {
  /** Catalogue, stock, jobs; every calculation; one's own account. */
  see: ['machinist', 'estimator', 'cribManager', 'admin'],
  /** Issue, return, report broken from one's own hands, reverse one's own of the same day. */
  move: ['machinist', 'cribManager', 'admin'],
  /** Keep an assembly, change and archive one that is only planned. */
  plan: ['machinist', 'estimator', 'cribManager', 'admin'],
  /** Items, imports, locations, relocations, transfers, regrind, counts, reorder points, orders, any reversal. */
  keepCrib: ['cribManager', 'admin'],
  /** Costs, and what is ranked or exported by them. */
  seeCosts: ['estimator', 'cribManager', 'admin'],
  /** People, roles, shop settings, audit. */
  administer: ['admin'],
} as const satisfies Record<string, readonly Role[]>

export type Permission = keyof typeof permissionTable

/**
 * Whether a role holds a permission.
 *
 * @example
 * can('machinist', 'move') // => true
 * can('estimator', 'move') // => false
 */
export function can(role: Role, permission: Permission): boolean {
  const allowed: readonly Role[] = permissionTable[permission]
  return allowed.includes(role)
}
