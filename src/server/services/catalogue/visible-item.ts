import { can } from '@/core/policies/permissions'
import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { Actor } from '../../auth/actor'

/** The row as this person may see it: without its cost for those who see none. */
export function visibleItem<Kind extends CatalogueKind>(
  actor: Actor,
  row: CatalogueTypes[Kind]['row'],
): CatalogueTypes[Kind]['row'] {
  if (can(actor.role, 'seeCosts')) return row
  const { unitCost: _, currency: __, ...visible } = row
  return visible as CatalogueTypes[Kind]['row']
}

/** What the audit keeps of a row: the item itself, not the stock that happened to be there. */
export function auditedItem<Kind extends CatalogueKind>(row: CatalogueTypes[Kind]['row']): object {
  const { stock: _, ...item } = row
  return item
}

/** Sorting or filtering by a cost tells the cost. */
export function refuseHiddenCosts(
  actor: Actor,
  query: { sort?: { field: string }[] | undefined; [filter: string]: unknown },
): void {
  const isByCost =
    query.sort?.some(({ field }) => field === 'unitCost') ||
    ['unitCost', 'unitCost.min', 'unitCost.max'].some((name) => query[name] !== undefined)
  if (!isByCost || can(actor.role, 'seeCosts')) return
  throw new AppError('not-allowed', 'Your role does not see costs.', {
    errors: [{ path: 'unitCost', message: 'Your role does not see costs.' }],
  })
}
