import type { Bore } from '@/core/tooling'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import { formatMoney } from '@/lib/format-money'
import type { StockSummary } from '@/schemas/item'
import type { CatalogueColumn } from './catalogue-column'

interface ItemRow {
  code: string
  maker: string | null
  partNumber: string | null
  description: string
  unitCost?: number | null
  stock: StockSummary
}

type Names<Row, Value> = {
  [Name in keyof Row]-?: Row[Name] extends Value ? Name : never
}[keyof Row] &
  string

interface ColumnOptions {
  width?: number
  word?: string
  isUsual?: boolean
}

type NumberValue = number | null | undefined

/** A dimension: the symbol as heading, the person's unit under it. */
export function lengthColumn<Row>(
  id: Names<Row, NumberValue>,
  heading: string,
  name: string,
  { width = 84, isUsual = true, word }: ColumnOptions = {},
): CatalogueColumn<Row> {
  return {
    ...{ id, heading, name, word, kind: 'length', width, isUsual, isSortable: true },
    text: (row, { unit }) => {
      const mm = row[id] as NumberValue
      return mm == null ? '' : formatLength(mm, unit, { withUnit: false })
    },
  }
}

export function angleColumn<Row>(
  id: Names<Row, NumberValue>,
  heading: string,
  name: string,
  { width = 84, isUsual = false, word }: ColumnOptions = {},
): CatalogueColumn<Row> {
  return {
    ...{ id, heading, name, word, kind: 'angle', width, isUsual, isSortable: true },
    text: (row) => {
      const deg = row[id] as NumberValue
      return deg == null ? '' : formatAngle(deg).replace('°', '')
    },
  }
}

export function countColumn<Row>(
  id: Names<Row, NumberValue>,
  heading: string,
  name: string,
  { width = 76, isUsual = true, word }: ColumnOptions = {},
): CatalogueColumn<Row> {
  return {
    ...{ id, heading, name, word, kind: 'count', width, isUsual, isSortable: true },
    text: (row) => {
      const count = row[id] as NumberValue
      return count == null ? '' : String(count)
    },
  }
}

export function textColumn<Row>(
  id: string,
  heading: string,
  text: (row: Row) => string,
  options: ColumnOptions & { name?: string; isSortable?: boolean } = {},
): CatalogueColumn<Row> {
  const { width = 140, isUsual = true, name = heading, isSortable = true } = options
  return { id, heading, name, kind: 'text', width, isUsual, isSortable, text }
}

/** Of a holder or an extension: the bore where it is fixed, nothing for a collet chuck. */
export function boreDiameterColumn<Row extends { bore: Bore }>(): CatalogueColumn<Row> {
  return {
    ...{ id: 'boreDiameterMm', heading: 'Bore ⌀', name: 'Diameter of a fixed bore', kind: 'length' },
    ...{ width: 90, isUsual: true, isSortable: true },
    text: ({ bore }, { unit }) =>
      bore.kind === 'fixed' ? formatLength(bore.diameterMm, unit, { withUnit: false }) : '',
  }
}

/** First in every list: what the shop calls it. */
export function codeColumn<Row extends ItemRow>(): CatalogueColumn<Row> {
  return {
    ...{
      id: 'code',
      heading: 'Code',
      name: 'Code',
      kind: 'code',
      width: 150,
      isUsual: true,
      isSortable: true,
    },
    text: (row) => row.code,
  }
}

/** Last in every list: what there is, where it lies, who made it, what it costs. */
export function itemColumns<Row extends ItemRow>(canSeeCosts: boolean): CatalogueColumn<Row>[] {
  return [
    {
      ...{ id: 'onHand', heading: 'On hand', name: 'On hand: in bins and not worn', kind: 'onHand' },
      ...{ width: 104, isUsual: true, isSortable: true },
      text: (row) => String(row.stock.onHand),
    },
    {
      ...{ id: 'available', heading: 'Available', name: 'Available: on hand less reserved', kind: 'count' },
      ...{ width: 90, isUsual: true, isSortable: true },
      text: (row) => String(row.stock.available),
    },
    {
      ...{ id: 'locations', heading: 'Location', name: 'Bins it lies in, fullest first', kind: 'places' },
      ...{ width: 140, isUsual: true, isSortable: false },
      text: (row) => placeCodes(row.stock),
    },
    textColumn('maker', 'Maker', (row) => row.maker ?? '', { width: 130 }),
    textColumn('partNumber', 'Part number', (row) => row.partNumber ?? '', { width: 138 }),
    textColumn('description', 'Description', (row) => row.description, { width: 280 }),
    ...(canSeeCosts ? [unitCostColumn<Row>()] : []),
  ]
}

function unitCostColumn<Row extends ItemRow>(): CatalogueColumn<Row> {
  return {
    ...{ id: 'unitCost', heading: 'Unit cost', name: 'Unit cost (price)', kind: 'money', width: 110 },
    ...{ isUsual: false, isSortable: true },
    text: (row, { currency }) => (row.unitCost == null ? '' : formatMoney(row.unitCost, currency)),
  }
}

/** `B-04-2 · B-05-1`; the crib only where pieces lie in more than one. */
export function placeCodes(stock: StockSummary): string {
  const isSpread = new Set(stock.locations.map((place) => place.cribId)).size > 1
  return stock.locations
    .map((place) => (isSpread ? `${place.cribCode} ${place.code}` : place.code))
    .join(' · ')
}
