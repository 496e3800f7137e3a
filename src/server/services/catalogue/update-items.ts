import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { FieldProblem } from '@/schemas/problem'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { readCatalogueRows } from '../../db/read-models/catalogue-rows'
import { createAuditEntry } from '../../db/stores/audit-store'
import { lockItems } from '../../db/stores/item-store'
import { inTransaction } from '../../db/transaction'
import { explainingRefusals } from './explain-refusal'
import { changedFields, impossibleFields, writeChange } from './item-change'
import { kindWords } from './kind-words'
import { auditedItem, visibleItem } from './visible-item'

type Change<Kind extends CatalogueKind> = CatalogueTypes[Kind]['update'] & { id: string }
type Row<Kind extends CatalogueKind> = CatalogueTypes[Kind]['row']

/**
 * Changes many items, each as `updateItem` would: all of them or none. What stands against it is told row by row, at
 * `changes.<its place>`, so that all can be mended at once. A rehearsal answers the rows as they are.
 */
export async function updateItems<Kind extends CatalogueKind>(
  actor: Actor,
  kind: Kind,
  { changes, isRehearsal }: { changes: readonly Change<Kind>[]; isRehearsal?: boolean | undefined },
): Promise<{ rows: Row<Kind>[] }> {
  const ids = changes.map(({ id }) => id)
  const codes = changes.flatMap(({ code }) => code ?? [])
  return explainingRefusals(codes.join(' or ') || undefined, () =>
    inTransaction(db(), async (trx) => {
      await lockItems(trx, kind, ids)
      const before = new Map((await readCatalogueRows(trx, kind, ids)).map((row) => [row.id, row]))
      refuseFaulty(kind, changes, before)
      if (isRehearsal) return { rows: ids.flatMap((id) => visibleRow<Kind>(actor, before.get(id))) }
      for (const change of changes) {
        const row = before.get(change.id)
        if (row) await writeChange(trx, kind, change.id, changedFields({ ...row }, change))
      }
      const after = await readCatalogueRows(trx, kind, ids)
      for (const row of after) await writeDown<Kind>(trx, actor, kind, before.get(row.id), row)
      return { rows: after.map((row) => visibleItem<Kind>(actor, row)) }
    }),
  )
}

function visibleRow<Kind extends CatalogueKind>(actor: Actor, row: Row<Kind> | undefined): Row<Kind>[] {
  return row ? [visibleItem<Kind>(actor, row)] : []
}

function refuseFaulty<Kind extends CatalogueKind>(
  kind: Kind,
  changes: readonly Change<Kind>[],
  before: ReadonlyMap<string, Row<Kind>>,
): void {
  const errors: FieldProblem[] = []
  const staleIds: string[] = []
  for (const [index, change] of changes.entries()) {
    const row = before.get(change.id)
    const at = (path: string) => `changes.${index}.${path}`
    if (!row) errors.push({ path: at('id'), message: `There is no such ${kindWords[kind].one}.` })
    else if (row.version !== change.version) {
      staleIds.push(row.id)
      errors.push({ path: at('version'), message: `Someone changed ${row.code} meanwhile.` })
    } else {
      for (const { path, message } of impossibleFields(kind, {
        ...row,
        ...changedFields({ ...row }, change),
      }))
        errors.push({ path: at(path), message })
    }
  }
  if (errors.length === 0) return
  const isStaleAlone = staleIds.length === errors.length
  const faulty = new Set(errors.map(({ path }) => path.split('.')[1])).size
  throw new AppError(
    isStaleAlone ? 'stale-version' : 'impossible',
    `${faulty} of ${changes.length} ${kindWords[kind].many} cannot be changed so; nothing was changed.`,
    { errors },
  )
}

async function writeDown<Kind extends CatalogueKind>(
  trx: Database,
  actor: Actor,
  kind: Kind,
  before: Row<Kind> | undefined,
  after: Row<Kind>,
): Promise<void> {
  if (!before || before.version === after.version) return
  await createAuditEntry(trx, {
    actorId: actor.id,
    action: `${kind}-changed`,
    entity: 'item',
    entityId: after.id,
    before: auditedItem<Kind>(before),
    after: auditedItem<Kind>(after),
  })
}
