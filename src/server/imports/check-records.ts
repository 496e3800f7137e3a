import { isDeepStrictEqual } from 'node:util'
import type { Knex } from 'knex'
import type { ToolingKind } from '@/core/stock/kinds'
import { cutterForms } from '@/core/tooling'
import { createItemSchemas } from '@/schemas/create-item'
import type { FieldChange, RowOutcome, RowProblem } from '@/schemas/import'
import { geometryFromRow, geometryTables } from '../db/geometry-tables'
import {
  findImportMatches,
  type ItemKey,
  type KeyMatches,
  type MatchedItem,
} from '../db/read-models/import-match'
import type { StagedRow } from '../db/stores/import-row-store'
import { fieldOf, type GivenRecord, givenRecord } from './flat-record'
import { type FlatRecord, textOf } from './flat-values'
import { defaultRecord } from './import-defaults'
import type { ImportRow, RowReader } from './row-reader'

/** How the kinds of a file are called one by one. */
export const itemKinds = {
  cutters: 'cutter',
  holders: 'holder',
  collets: 'collet',
  extensions: 'extension',
} as const satisfies Record<string, ToolingKind>

/**
 * Holds the items of a file against the catalogue as `db` sees it: whom each row means, and whether what it gives makes
 * an item that can be. What a row leaves blank is taken from the item that is there.
 */
export async function checkItems(
  db: Knex,
  kind: keyof typeof itemKinds,
  groups: readonly (readonly ImportRow[])[],
  reader: RowReader,
): Promise<StagedRow[]> {
  const given = groups.map((rows) => givenRecord(kind, rows, reader))
  const matches = await findImportMatches(
    db,
    itemKinds[kind],
    given.map(({ flat }) => keyOf(flat)),
  )
  return groups.map((rows, at) => {
    const item = new ItemCheck(itemKinds[kind], rows, reader, given[at] as GivenRecord)
    return item.staged(matches[at] as KeyMatches)
  })
}

export function keyOf(flat: FlatRecord): ItemKey {
  return { code: textOf(flat.code), maker: textOf(flat.maker), partNumber: textOf(flat.part_number) }
}

function archivedSentence(code: string | null, mergedIntoCode: string | null): string {
  return mergedIntoCode
    ? `${code} was merged into ${mergedIntoCode}. Use that code.`
    : `${code} is archived. Restore it first, or use another code.`
}

/** The item a row means, or why that cannot be said. */
export function matchedItem(
  key: ItemKey,
  matches: KeyMatches,
): { item: MatchedItem | null } | { field: string; message: string } {
  const number = `${key.maker} ${key.partNumber}`
  if (!key.code && !(key.maker && key.partNumber)) {
    return { field: 'code', message: 'Give the own code, or the maker and the part number.' }
  }
  if (matches.byCode) {
    return matches.byCode.isArchived
      ? { field: 'code', message: archivedSentence(key.code, matches.byCode.mergedIntoCode) }
      : { item: matches.byCode }
  }
  if (matches.byNumber.length > 1) {
    const codes = matches.byNumber.map(({ columns }) => columns.code).filter(Boolean)
    const which = codes.length > 0 ? ` (${codes.slice(0, 5).join(', ')})` : ''
    return {
      field: 'partNumber',
      message: `${matches.byNumber.length} items are ${number}${which}. Give the own code.`,
    }
  }
  return { item: matches.byNumber[0] ?? null }
}

class ItemCheck {
  private readonly problems: RowProblem[]

  constructor(
    private readonly kind: ToolingKind,
    private readonly rows: readonly ImportRow[],
    private readonly reader: RowReader,
    private readonly given: GivenRecord,
  ) {
    this.problems = [...given.problems]
  }

  staged(matches: KeyMatches): StagedRow {
    const item = this.findItem(matches)
    // An item that is there keeps its own: what holds for all rows only fills what nobody has said.
    const filled = defaultRecord(this.reader.settings.defaults)
    const whole: FlatRecord = { ...filled, ...(item?.columns as FlatRecord | undefined), ...this.given.flat }
    if (item !== undefined) this.checkWhole(whole, item)
    const changes = item ? changesBetween(item.columns as FlatRecord, whole) : []
    return {
      line: this.rows[0]?.line ?? 1,
      outcome: this.outcome(item, changes),
      itemId: item?.id ?? null,
      itemVersion: item?.version ?? null,
      cells: this.rows.map(({ line, cells }) => ({ line, cells })),
      fieldValues: whole,
      changes: this.problems.length > 0 ? [] : changes,
      problems: this.problems,
    }
  }

  private outcome(item: MatchedItem | null | undefined, changes: FieldChange[]): RowOutcome {
    if (this.problems.length > 0 || item === undefined) return 'rejected'
    if (item === null) return 'added'
    return changes.length > 0 ? 'changed' : 'unchanged'
  }

  /** The item that is there, null for a new one, undefined where that cannot be said. */
  private findItem(matches: KeyMatches): MatchedItem | null | undefined {
    if (this.problems.length > 0 && this.rows.every((row) => row.values.size === 0)) return undefined
    const found = matchedItem(keyOf(this.given.flat), matches)
    if ('message' in found) {
      this.refuse([found.field], found.message)
      return undefined
    }
    if (found.item && found.item.kind !== this.kind) {
      this.refuse(['code'], `An item of another kind (${found.item.kind}) has this code or number.`)
      return undefined
    }
    return found.item
  }

  private refuse(fields: readonly string[], message: string, row = this.rows[0]): void {
    if (row) this.problems.push(this.reader.problemAt(row, fields, message))
  }

  /** The rules of the form and the route, asked of the item as it would be. */
  private checkWhole(whole: FlatRecord, item: MatchedItem | null): void {
    if (item === null && whole.code === undefined) {
      if (!this.given.failed.has('code')) this.refuse(['code'], 'A new item needs a code of its own.')
      return
    }
    const parsed = createItemSchemas[this.kind].safeParse(requestOf(this.kind, whole))
    if (parsed.success) return
    const issues = [...parsed.error.issues, ...this.issuesInAnyForm(whole, parsed.error.issues)]
    const hasFailures = !this.isGeometryRead()
    for (const issue of issues) {
      // A rule across fields says nothing where one of them could not be read.
      if (hasFailures && issue.code === 'custom') continue
      const [first, place, member] = issue.path
      if (first === undefined || this.given.failed.has(String(first))) continue
      this.refuse(fieldsOf(String(first), member, this.reader), issue.message, this.rowOf(first, place))
    }
  }

  /** Whether what could not be read is only what no rule about sizes asks for. */
  private isGeometryRead(): boolean {
    const unread = [...this.given.failed].filter((field) => !fieldsBesideSizes.has(field))
    return unread.length === 0 && this.problems.length === this.given.failed.size
  }

  /**
   * Where only the form is missing its rules are not asked; what is wrong in whatever form it may have is said now, not
   * after the form has been given.
   */
  private issuesInAnyForm(whole: FlatRecord, issues: readonly { path: PropertyKey[] }[]): Issue[] {
    if (this.kind !== 'cutter' || issues.some(({ path }) => path[0] !== 'form')) return []
    const inForms = cutterForms.map((form) => {
      const parsed = createItemSchemas.cutter.safeParse({ ...requestOf('cutter', whole), form })
      return parsed.error?.issues ?? []
    })
    const [first = [], ...others] = inForms
    return first.filter((issue) => others.every((form) => form.some((other) => isSameIssue(issue, other))))
  }

  private rowOf(first: PropertyKey | undefined, place: PropertyKey | undefined): ImportRow | undefined {
    return (first === 'segments' && typeof place === 'number' && this.rows[place]) || this.rows[0]
  }
}

/** No rule about sizes reads these. */
const fieldsBesideSizes: ReadonlySet<string> = new Set(['unitCost', 'fluteCount', 'substrate', 'maximumRpm'])

type Issue = { code?: string | undefined; path: PropertyKey[]; message: string }

function isSameIssue(one: Issue, other: Issue): boolean {
  return one.message === other.message && one.path.join('.') === other.path.join('.')
}

function fieldsOf(first: string, member: PropertyKey | undefined, reader: RowReader): string[] {
  if (first === 'bore') return ['boreSeries', 'boreDiameterMm']
  if (first !== 'segments') return [first]
  if (typeof member !== 'string') return ['segmentLengthMm', 'bodyLengthMm', 'noseLengthMm', 'nutLengthMm']
  const name = `segment${member.charAt(0).toUpperCase()}${member.slice(1)}`
  return reader.has(name) ? [name] : ['bodyLengthMm', 'noseLengthMm', 'nutLengthMm', name]
}

/** As the form would send it. */
function requestOf(kind: ToolingKind, whole: FlatRecord): Record<string, unknown> {
  const geometry = geometryFromRow(geometryTables[kind], whole)
  if (whole.bore_kind === undefined) delete geometry.bore
  return {
    ...geometry,
    code: whole.code,
    maker: whole.maker,
    partNumber: whole.part_number,
    description: whole.description,
    unitCost: whole.unit_cost_minor,
    ...(Array.isArray(whole.segments)
      ? { segments: whole.segments.map((piece) => withFieldNames({ ...piece })) }
      : {}),
  }
}

function withFieldNames(columns: Record<string, unknown>): Record<string, unknown> {
  return Object.fromEntries(Object.entries(columns).map(([column, value]) => [fieldOf(column), value]))
}

/** Half of what lengths are rounded to. */
const tolerance = 5e-10

function changesBetween(before: FlatRecord, after: FlatRecord): FieldChange[] {
  return Object.keys(after)
    .filter((column) => !isSame(before[column] ?? null, after[column] ?? null))
    .map((column) => ({
      field: fieldOf(column),
      before: before[column] ?? null,
      after: after[column] ?? null,
    }))
}

function isSame(before: unknown, after: unknown): boolean {
  if (typeof before === 'number' && typeof after === 'number') return Math.abs(before - after) <= tolerance
  if (Array.isArray(before) && Array.isArray(after)) {
    return before.length === after.length && before.every((piece, at) => isSamePiece(piece, after[at]))
  }
  return isDeepStrictEqual(before, after)
}

function isSamePiece(before: Record<string, unknown>, after: Record<string, unknown>): boolean {
  return Object.keys(after).every((column) => isSame(before[column], after[column]))
}
