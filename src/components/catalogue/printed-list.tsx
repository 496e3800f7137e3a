'use client'

import { useShop } from '@/components/layout/shop-context'
import { useCatalogueCounts } from '@/hooks/use-catalogue-counts'
import { formatInstant } from '@/lib/format-instant'
import { type CatalogueColumn, isFigure } from './catalogue-column'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { type CatalogueView, narrowingText } from './catalogue-view'
import { viewWords } from './view-words'

export interface Printed<Row> {
  rows: Row[]
  /** Rows before them in the list. */
  first: number
  total: number
  at: string
  /** Only what was loaded when the browser printed by itself. */
  isPart: boolean
}

export interface PrintedListProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  columns: readonly CatalogueColumn<Row>[]
  shownIds: readonly string[]
  view: CatalogueView
  printed: Printed<Row>
}

/** More columns than this stand on the sheet laid sideways. */
const uprightColumns = 8

export function PrintedList<Row extends CatalogueRow>(props: PrintedListProps<Row>) {
  const { definition, columns, shownIds, view, printed } = props
  const shop = useShop()
  const shown = shownIds.flatMap((id) => columns.find((column) => column.id === id) ?? [])
  const narrowed = useNarrowedWords(definition, view)
  return (
    <section
      className="hidden print:block"
      data-printed={shown.length > uprightColumns ? 'sideways' : 'upright'}
      aria-label={`${definition.title}, printed`}
    >
      <h1 className="text-xl">{definition.title}</h1>
      <p className="text-sm">
        {shop.shopName}, {formatInstant(printed.at)}. {extentSentence(printed)}
      </p>
      {narrowed ? <p className="text-sm">{narrowed}</p> : null}
      <table className="mt-2 w-full border-collapse text-xs">
        <thead>
          <tr className="border-ink border-b-2">
            {shown.map((column) => (
              <th key={column.id} scope="col" className={printedCellClass(column)}>
                {column.heading}
                {column.word ? <span className="block font-normal">{column.word}</span> : null}
                {column.kind === 'length' ? <span className="block font-normal">{shop.unit}</span> : null}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {printed.rows.map((row) => (
            <tr key={row.id} className="border-hairline break-inside-avoid border-b">
              {shown.map((column) => (
                <td key={column.id} className={printedCellClass(column)}>
                  {column.text(row, shop)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  )
}

function extentSentence({ rows, first, total, isPart }: Printed<unknown>): string {
  const figure = (count: number) => count.toLocaleString('en')
  if (isPart && rows.length === 0) return 'No row was loaded when this was printed; print by “More”, “Print”.'
  if (rows.length === total) return total === 1 ? '1 row.' : `${figure(total)} rows.`
  const extent = `Rows ${figure(first + 1)} to ${figure(first + rows.length)} of ${figure(total)}`
  return isPart ? `${extent}: those loaded. For all of them print by “More”, “Print”.` : `${extent}.`
}

/** The search, the filters and whose stock it is; the names of places are those the filters have got already. */
function useNarrowedWords<Row extends CatalogueRow>(
  { kind, filters }: CatalogueDefinition<Row>,
  view: CatalogueView,
): string {
  const shop = useShop()
  const { cribId, locationId } = view.filters
  const narrowing = narrowingText(view)
  const cribs = useCatalogueCounts(kind, narrowing, 'cribId', cribId !== undefined)
  const places = useCatalogueCounts(kind, narrowing, 'locationId', locationId !== undefined)
  return viewWords(view, filters, shop, { cribId: cribs, locationId: places })
}

function printedCellClass(column: Pick<CatalogueColumn<unknown>, 'kind'>): string {
  return `px-1 py-0.5 align-top ${isFigure(column.kind) ? 'text-right' : 'text-left'}`
}
