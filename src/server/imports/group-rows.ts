import type { ImportKind } from '@/schemas/import-fields'
import type { ImportRow } from './row-reader'

/** Rows that wait for the last row of their item; more than a shop's whole list of holders. */
const mostWaiting = 20_000

/** What names a row's item, capitals aside; null for a row that names none. */
export function groupKey(row: ImportRow): string | null {
  const text = (field: string) => String(row.values.get(field) ?? '').toLowerCase()
  if (row.values.has('code')) return `c ${text('code')}`
  return row.values.has('maker') && row.values.has('partNumber')
    ? `n ${text('maker')}\t${text('partNumber')}`
    : null
}

/** Whether several rows of a file may tell of one item: its segments. */
export function takesSeveralRows(kind: ImportKind): boolean {
  return kind === 'holders' || kind === 'extensions'
}

/**
 * Puts the rows of one item together, wherever they stand in the file. `lastLines` says where each item's last row is,
 * so that an item is handed on as soon as it is whole and only unfinished ones are kept.
 */
export class RowGroups {
  private readonly waiting = new Map<string, ImportRow[]>()
  private waitingRows = 0

  constructor(private readonly lastLines: ReadonlyMap<string, number>) {}

  /** The groups that are whole with this row. */
  add(row: ImportRow): ImportRow[][] {
    const key = groupKey(row)
    if (key === null) return [[row]]
    const group = this.waiting.get(key) ?? []
    group.push(row)
    if ((this.lastLines.get(key) ?? 0) <= row.line) {
      if (this.waiting.delete(key)) this.waitingRows -= group.length - 1
      return [group]
    }
    this.waiting.set(key, group)
    this.waitingRows += 1
    return this.waitingRows > mostWaiting ? this.rest() : []
  }

  /** What is left: items whose last row could not be read as theirs, or that lie too far apart to be kept. */
  rest(): ImportRow[][] {
    const groups = [...this.waiting.values()]
    this.waiting.clear()
    this.waitingRows = 0
    return groups
  }
}
