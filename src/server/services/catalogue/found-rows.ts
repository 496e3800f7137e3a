import { createHash } from 'node:crypto'
import type { z } from 'zod'
import type { CatalogueKind } from '@/core/stock/kinds'
import { AppError } from '@/lib/app-error'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { FoundRehearsal, foundRefusalSchema } from '@/schemas/found-change'
import { foundLimit, listedRefusals } from '@/schemas/found-change-limits'
import type { Database } from '../../db/connection'
import { readCatalogueRows } from '../../db/read-models/catalogue-rows'
import { changedFields, impossibleFields } from './item-change'
import { kindWords } from './kind-words'

type Row = CatalogueTypes[CatalogueKind]['row']
type Version = { id: string; version: number }

const rowsAPiece = 500

/** What a change of many would do, row by row. */
export interface Foreseen {
  /** Those that would change, as they are. */
  changing: Row[]
  unchanged: number
  refusedCount: number
  refused: z.output<typeof foundRefusalSchema>[]
}

/** Names a set of rows as they are: another row, or another version of one, and it is another mark. */
export function foundMark(found: readonly Version[]): string {
  const text = found.map(({ id, version }) => `${id}:${version}`).join()
  return createHash('sha256').update(text).digest('base64url')
}

export function refuseTooMany(kind: CatalogueKind, found: readonly unknown[]): void {
  if (found.length <= foundLimit) return
  const [count, most] = [found.length, foundLimit].map((figure) => figure.toLocaleString('en'))
  throw new AppError(
    'too-many-found',
    `${count} ${kindWords[kind].many} are found; at most ${most} are changed at once. Narrow the list first.`,
  )
}

/** Asks the rules of each row as it would be. The whole of it is read a piece at a time. */
export async function foreseeChange(
  db: Database,
  kind: CatalogueKind,
  ids: readonly string[],
  change: Record<string, unknown>,
): Promise<Foreseen> {
  const foreseen: Foreseen = { changing: [], unchanged: 0, refusedCount: 0, refused: [] }
  for (let done = 0; done < ids.length; done += rowsAPiece) {
    for (const row of await readCatalogueRows(db, kind, ids.slice(done, done + rowsAPiece)))
      foreseeRow(foreseen, kind, row, change)
  }
  return foreseen
}

function foreseeRow(
  foreseen: Foreseen,
  kind: CatalogueKind,
  row: Row,
  change: Record<string, unknown>,
): void {
  const changed = changedFields({ ...row }, change)
  if (Object.keys(changed).length === 0) {
    foreseen.unchanged += 1
    return
  }
  const [problem] = impossibleFields(kind, { ...row, ...changed })
  if (!problem) {
    foreseen.changing.push(row)
    return
  }
  foreseen.refusedCount += 1
  if (foreseen.refused.length < listedRefusals)
    foreseen.refused.push({ id: row.id, code: row.code, ...problem })
}

export function rehearsalOf(found: readonly Version[], foreseen: Foreseen): FoundRehearsal {
  const { changing, ...told } = foreseen
  return { total: found.length, changed: changing.length, ...told, mark: foundMark(found) }
}
