import { AppError } from '@/lib/app-error'
import type { FieldProblem } from '@/schemas/problem'
import type { PutReorderPointsRequest, ReorderPointResponse } from '@/schemas/reordering'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { type AuditEntry, createAuditEntries } from '../../db/stores/audit-store'
import { findKnownCribs } from '../../db/stores/crib-store'
import { findItemsInUse } from '../../db/stores/item-store'
import {
  findReorderPoints,
  lockReorderPoints,
  pairKey,
  putReorderPoints as writeReorderPoints,
} from '../../db/stores/reorder-point-store'
import { findUsableSuppliers } from '../../db/stores/supplier-store'
import { inTransaction } from '../../db/transaction'

type Rows = PutReorderPointsRequest['rows']

/**
 * Sets many reorder points at once: all of them or none. What stands against it is told row by row, at
 * `rows.<its place>`, so that all can be mended at once; of rows changed meanwhile `current` has what is there.
 */
export async function putReorderPoints(actor: Actor, rows: Rows): Promise<{ rows: ReorderPointResponse[] }> {
  return inTransaction(db(), async (trx) => {
    await lockReorderPoints(trx)
    const before = await findReorderPoints(trx, rows)
    await refuseFaulty(trx, rows, before)
    await writeReorderPoints(trx, rows, before)
    const after = await findReorderPoints(trx, rows)
    const inOrder = rows.flatMap((row) => after.get(pairKey(row)) ?? [])
    await createAuditEntries(
      trx,
      inOrder.flatMap((point) => auditEntry(actor, before.get(pairKey(point)), point)),
    )
    return { rows: inOrder }
  })
}

async function refuseFaulty(
  trx: Database,
  rows: Rows,
  before: ReadonlyMap<string, ReorderPointResponse>,
): Promise<void> {
  const items = await findItemsInUse(trx, distinct(rows.map(({ itemId }) => itemId)))
  const cribs = await findKnownCribs(trx, distinct(rows.map(({ cribId }) => cribId)))
  const suppliers = await findUsableSuppliers(
    trx,
    distinct(rows.flatMap(({ supplierId }) => supplierId ?? [])),
  )
  const stale: (ReorderPointResponse | null)[] = []
  const errors = rows.flatMap((row, index): FieldProblem[] => {
    const at = (path: string, message: string) => ({ path: `rows.${index}.${path}`, message })
    const found: FieldProblem[] = []
    if (!items.has(row.itemId)) found.push(at('itemId', 'There is no such item in use.'))
    if (!cribs.has(row.cribId)) found.push(at('cribId', 'There is no such crib.'))
    if (row.supplierId && !suppliers.has(row.supplierId))
      found.push(at('supplierId', 'There is no such supplier.'))
    const current = before.get(pairKey(row)) ?? null
    if (row.version !== undefined && row.version !== current?.version) {
      stale.push(current)
      found.push(at('version', 'Someone changed this reorder point meanwhile.'))
    }
    return found
  })
  if (errors.length === 0) return
  const faulty = new Set(errors.map(({ path }) => path.split('.')[1])).size
  throw new AppError(
    stale.length === errors.length ? 'stale-version' : 'impossible',
    `${faulty} of ${rows.length} reorder points cannot be set so; nothing was changed.`,
    { errors, extra: { current: stale.filter((point) => point !== null) } },
  )
}

function distinct(ids: readonly string[]): string[] {
  return [...new Set(ids)]
}

/** A row that stays as it was writes nothing down. */
function auditEntry(
  actor: Actor,
  before: ReorderPointResponse | undefined,
  after: ReorderPointResponse,
): AuditEntry[] {
  if (before?.version === after.version) return []
  return [
    {
      actorId: actor.id,
      action: before ? 'reorder-point-changed' : 'reorder-point-set',
      entity: 'reorder-point',
      entityId: pairKey(after),
      before,
      after,
    },
  ]
}
