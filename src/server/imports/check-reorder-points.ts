import type { Knex } from 'knex'
import { reorderPointCaution } from '@/lib/reorder-point-caution'
import type { FieldChange, RowProblem } from '@/schemas/import'
import { putReorderPointRequestSchema } from '@/schemas/reordering'
import { findImportMatches, type MatchedItem } from '../db/read-models/import-match'
import { findImportReorderPoints, type ReorderPointMatch } from '../db/read-models/import-reorder-points'
import type { StagedRow } from '../db/stores/import-row-store'
import { keyOf, matchedItem } from './check-records'
import { fieldOf, type GivenRecord, givenRecord } from './flat-record'
import { type FlatRecord, textOf } from './flat-values'
import { defaultRecord } from './import-defaults'
import type { ImportRow, RowReader } from './row-reader'

type FoundItem = ReturnType<typeof matchedItem>

/** Holds rows of reorder points against the items, cribs and suppliers there are, and against the points set so far. */
export async function checkReorderPoints(
  db: Knex,
  rows: readonly ImportRow[],
  reader: RowReader,
): Promise<StagedRow[]> {
  const filled = defaultRecord(reader.settings.defaults)
  const given = rows.map((row) => {
    const own = givenRecord('reorderPoints', [row], reader)
    return { ...own, flat: { ...filled, ...own.flat } }
  })
  const keys = given.map(({ flat }) => keyOf(flat))
  const items = (await findImportMatches(db, null, keys)).map((match, at) =>
    matchedItem(keys[at] ?? keyOf({}), match),
  )
  const matches = await findImportReorderPoints(
    db,
    given.map(({ flat }, at) => ({
      itemId: idOf(items[at]),
      cribCode: textOf(flat.crib),
      supplierName: textOf(flat.supplier),
    })),
  )
  return rows.map((row, at) =>
    new ReorderPointCheck(row, reader, given[at] as GivenRecord).staged(
      items[at] as FoundItem,
      matches[at] as ReorderPointMatch,
    ),
  )
}

function idOf(found: FoundItem | undefined): string | null {
  return found && 'item' in found ? (found.item?.id ?? null) : null
}

/** What a row may change, by the column of the database; the supplier by its name. */
const changeable = [
  'reorder_point',
  'order_up_to',
  'pack_size',
  'minimum_order',
  'supplier',
  'supplier_part_number',
  'lead_time_days',
] as const

class ReorderPointCheck {
  private readonly problems: RowProblem[]
  private readonly warnings: RowProblem[] = []

  constructor(
    private readonly row: ImportRow,
    private readonly reader: RowReader,
    private readonly given: GivenRecord,
  ) {
    this.problems = [...row.problems]
  }

  staged(found: FoundItem, match: ReorderPointMatch): StagedRow {
    const isReadable = this.row.values.size > 0 || this.problems.length === 0
    const item = isReadable ? this.knownItem(found) : null
    const whole = this.wholeRecord(match)
    if (isReadable) {
      this.checkCrib(match)
      this.checkSupplier(match)
      this.checkFigures(whole)
    }
    const changes = match.kept ? changesBetween(match.kept.columns, whole) : []
    const isRejected = this.problems.length > 0
    return {
      line: this.row.line,
      outcome: isRejected ? 'rejected' : !match.kept ? 'added' : changes.length > 0 ? 'changed' : 'unchanged',
      itemId: item?.id ?? null,
      itemVersion: match.kept?.version ?? null,
      cells: [{ line: this.row.line, cells: this.row.cells }],
      fieldValues: { ...whole, code: item?.columns.code ?? this.given.flat.code ?? null },
      changes: isRejected ? [] : changes,
      problems: this.problems,
      warnings: isRejected ? [] : this.warnings,
    }
  }

  private refuse(field: string, message: string): void {
    this.problems.push(this.reader.problemAt(this.row, [field], message))
  }

  private knownItem(found: FoundItem): MatchedItem | null {
    if ('message' in found) this.refuse(found.field, found.message)
    else if (!found.item) {
      const { code, maker, partNumber } = keyOf(this.given.flat)
      this.refuse('code', `The catalogue has no ${code ?? `${maker} ${partNumber}`}. Import it first.`)
    }
    return 'item' in found ? found.item : null
  }

  /** The point as it would be: what is set, with what the row gives over it. */
  private wholeRecord({ crib, supplier, kept }: ReorderPointMatch): FlatRecord {
    const named: FlatRecord = supplier ? { supplier: supplier.name, supplier_id: supplier.id } : {}
    const inCrib: FlatRecord = crib ? { crib: crib.code, crib_id: crib.id } : {}
    return { pack_size: 1, minimum_order: 1, ...kept?.columns, ...this.given.flat, ...named, ...inCrib }
  }

  private checkCrib({ crib }: ReorderPointMatch): void {
    const asked = this.given.flat.crib
    if (!crib) this.refuse('crib', asked === undefined ? 'Give the crib.' : `There is no crib ${asked}.`)
  }

  /** A name that is not known may be a slip of a known one, so no supplier is made of it. */
  private checkSupplier({ supplier }: ReorderPointMatch): void {
    const asked = this.given.flat.supplier
    if (asked === undefined) return
    if (!supplier) this.refuse('supplier', `There is no supplier ${asked}. Add them first, or mend the name.`)
    else if (supplier.isArchived)
      this.refuse('supplier', `${supplier.name} is archived. Restore them first, or name another supplier.`)
  }

  /** The rules of the form and the route, asked of the point as it would be. */
  private checkFigures(whole: FlatRecord): void {
    const figures = Object.fromEntries(
      Object.entries(whole).map(([column, value]) => [fieldOf(column), value ?? undefined]),
    )
    const parsed = putReorderPointRequestSchema.safeParse({ ...figures, supplierId: undefined })
    const hasFailures = this.given.failed.size > 0
    for (const issue of parsed.error?.issues ?? []) {
      const field = String(issue.path[0])
      // A rule across fields says nothing where one of them could not be read.
      if (this.given.failed.has(field) || (hasFailures && issue.code === 'custom')) continue
      this.refuse(field, issue.message)
    }
    const caution = parsed.success ? reorderPointCaution(parsed.data) : null
    if (caution) this.warnings.push(this.reader.problemAt(this.row, ['orderUpTo'], caution))
  }
}

function changesBetween(before: FlatRecord, after: FlatRecord): FieldChange[] {
  return changeable
    .filter((column) => (before[column] ?? null) !== (after[column] ?? null))
    .map((column) => ({
      field: fieldOf(column),
      before: before[column] ?? null,
      after: after[column] ?? null,
    }))
}
