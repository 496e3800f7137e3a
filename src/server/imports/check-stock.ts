import type { Knex } from 'knex'
import { openingStockSchema, type RowProblem } from '@/schemas/import'
import { findImportMatches, type KeyMatches } from '../db/read-models/import-match'
import { type BinMatch, findImportPlaces } from '../db/read-models/import-places'
import type { StagedRow } from '../db/stores/import-row-store'
import { keyOf, matchedItem } from './check-records'
import { givenRecord } from './flat-record'
import { type FlatRecord, textOf } from './flat-values'
import { defaultRecord } from './import-defaults'
import type { ImportRow, RowReader } from './row-reader'

/**
 * Holds rows of opening stock against the catalogue and the crib. The quantity is what lies there, not what is added;
 * an item that already has movements has its stock on the books and is refused.
 */
export async function checkStock(
  db: Knex,
  rows: readonly ImportRow[],
  reader: RowReader,
): Promise<StagedRow[]> {
  const filled = defaultRecord(reader.settings.defaults)
  const given = rows.map((row) => {
    const own = givenRecord('stock', [row], reader)
    return { ...own, flat: { ...filled, ...own.flat } }
  })
  const matches = await findImportMatches(
    db,
    null,
    given.map(({ flat }) => keyOf(flat)),
  )
  const places = await findImportPlaces(
    db,
    given.map(({ flat }) => ({ cribCode: textOf(flat.crib), locationCode: textOf(flat.location) })),
  )
  return rows.map((row, at) => {
    const { flat, failed } = given[at] as { flat: FlatRecord; failed: Set<string> }
    const check = new StockCheck(row, reader, flat, failed)
    return check.staged(matches[at] as KeyMatches, places[at] as BinMatch)
  })
}

class StockCheck {
  private readonly problems: RowProblem[]

  constructor(
    private readonly row: ImportRow,
    private readonly reader: RowReader,
    private readonly flat: FlatRecord,
    private readonly failed: ReadonlySet<string>,
  ) {
    this.problems = [...row.problems]
  }

  staged(matches: KeyMatches, place: BinMatch): StagedRow {
    const isReadable = this.row.values.size > 0 || this.problems.length === 0
    const item = isReadable ? this.findItem(matches) : null
    const locationId = isReadable ? this.findBin(place) : null
    if (isReadable) this.checkQuantity()
    const isRejected = this.problems.length > 0
    return {
      line: this.row.line,
      outcome: isRejected ? 'rejected' : this.flat.quantity === 0 ? 'unchanged' : 'added',
      itemId: item?.id ?? null,
      itemVersion: item?.version ?? null,
      cells: [{ line: this.row.line, cells: this.row.cells }],
      fieldValues: {
        ...this.flat,
        code: item?.columns.code ?? this.flat.code ?? null,
        condition: this.flat.condition ?? 'new',
        location_id: locationId,
      },
      changes: [],
      problems: this.problems,
    }
  }

  private refuse(field: string, message: string): void {
    this.problems.push(this.reader.problemAt(this.row, [field], message))
  }

  private findItem(matches: KeyMatches) {
    const key = keyOf(this.flat)
    const found = matchedItem(key, matches)
    if ('message' in found) {
      this.refuse(found.field, found.message)
      return null
    }
    const { item } = found
    if (!item)
      this.refuse(
        'code',
        `The catalogue has no ${key.code ?? `${key.maker} ${key.partNumber}`}. Import it first.`,
      )
    else if (item.hasMovements) {
      this.refuse(
        'code',
        'This item has movements already: its stock is on the books. Only a count can correct it.',
      )
    } else if (item.isTrackedByPiece) {
      this.refuse('code', 'This item is tracked piece by piece: its pieces come in one by one.')
    }
    return item
  }

  private findBin(place: BinMatch): string | null {
    const { crib, location: bin } = this.flat
    if (place.cribCode === null) {
      this.refuse('crib', crib === undefined ? 'Give the crib.' : `There is no crib ${crib}.`)
    } else if (bin === undefined) this.refuse('location', 'Give the bin.')
    else if (!place.location) this.refuse('location', `Crib ${place.cribCode} has no bin ${bin}.`)
    else if (place.location.kind !== 'bin')
      this.refuse('location', noBinSentence(String(bin), place.location))
    else if (place.location.isArchived) this.refuse('location', `Bin ${bin} is archived.`)
    else return place.location.id
    return null
  }

  private checkQuantity(): void {
    if (this.failed.has('quantity')) return
    const parsed = openingStockSchema.safeParse(this.flat)
    for (const issue of parsed.error?.issues ?? []) this.refuse('quantity', issue.message)
  }
}

/** A drawer or a cabinet holds nothing itself: says which bins in it do. */
function noBinSentence(code: string, { kind, bins }: NonNullable<BinMatch['location']>): string {
  const one = `${code} is a ${kind}: only bins hold stock`
  if (!bins) return `${one}, and it has none yet.`
  return bins.count === 1
    ? `${one}. Its bin is ${bins.first}.`
    : `${one}. Its ${bins.count} bins are ${bins.first} … ${bins.last}.`
}
