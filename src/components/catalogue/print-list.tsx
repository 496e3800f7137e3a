'use client'

import { Printer } from 'lucide-react'
import { useEffect, useState } from 'react'
import { createPortal } from 'react-dom'
import { toast } from 'sonner'
import { useShop } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { type CatalogueBlock, catalogueBlockUrl } from '@/hooks/use-catalogue-rows'
import { getJson } from '@/lib/api-client'
import { catalogueApiPath } from '@/lib/catalogue-paths'
import { faultSentence } from '@/lib/field-faults'
import { formatInstant } from '@/lib/format-instant'
import { type CatalogueColumn, isFigure } from './catalogue-column'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { type CatalogueView, queryParams } from './catalogue-view'

export interface PrintListProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  columns: readonly CatalogueColumn<Row>[]
  shownIds: readonly string[]
  view: CatalogueView
}

/** Some hundred sheets of paper; who wants more wants the export. */
const mostRows = 5000
const rowsABlock = 500

interface Printed<Row> {
  rows: Row[]
  total: number
  at: string
}

/** Prints the rows of the view, all of them and not only those on screen, as a plain table with its heading on every sheet. */
export function PrintList<Row extends CatalogueRow>(props: PrintListProps<Row>) {
  const { definition, view } = props
  const [printed, setPrinted] = useState<Printed<Row> | null>(null)
  const [isBusy, setIsBusy] = useState(false)
  useEffect(() => {
    if (!printed) return
    const handleDone = () => setPrinted(null)
    window.addEventListener('afterprint', handleDone)
    window.print()
    return () => window.removeEventListener('afterprint', handleDone)
  }, [printed])

  async function handlePrint() {
    setIsBusy(true)
    try {
      setPrinted(await readRows<Row>(definition, view))
    } catch (error) {
      toast.error(`The list could not be read for printing. ${faultSentence(error)}`)
    } finally {
      setIsBusy(false)
    }
  }

  return (
    <>
      <Button size="compact" disabled={isBusy} onClick={handlePrint}>
        <Printer aria-hidden="true" className="size-4.5" />
        {isBusy ? 'Reading …' : 'Print'}
      </Button>
      {printed ? createPortal(<PrintedTable {...props} printed={printed} />, document.body) : null}
    </>
  )
}

async function readRows<Row extends CatalogueRow>(
  definition: CatalogueDefinition<Row>,
  view: CatalogueView,
): Promise<Printed<Row>> {
  const query = queryParams(view).toString()
  const rows: Row[] = []
  let total = 0
  do {
    const url = catalogueBlockUrl(catalogueApiPath(definition.kind), query, rows.length, rowsABlock)
    const block = await getJson<CatalogueBlock<Row>>(url)
    total = block.total ?? total
    rows.push(...block.rows)
    if (block.rows.length < rowsABlock) break
  } while (rows.length < Math.min(total, mostRows))
  return { rows, total, at: new Date().toISOString() }
}

function PrintedTable<Row extends CatalogueRow>({
  definition,
  columns,
  shownIds,
  printed,
}: PrintListProps<Row> & { printed: Printed<Row> }) {
  const shop = useShop()
  const shown = shownIds.flatMap((id) => columns.find((column) => column.id === id) ?? [])
  const isCut = printed.rows.length < printed.total
  return (
    <section className="hidden p-2 print:block" aria-label={`${definition.title}, printed`}>
      <h1 className="text-xl">{definition.title}</h1>
      <p className="text-sm">
        {shop.shopName}, {formatInstant(printed.at)}.{' '}
        {isCut
          ? `The first ${printed.rows.length.toLocaleString('en')} of ${printed.total.toLocaleString('en')} rows.`
          : `${printed.total.toLocaleString('en')} rows.`}
      </p>
      <table className="mt-2 w-full border-collapse text-xs">
        <thead>
          <tr className="border-ink border-b-2">
            {shown.map((column) => (
              <th key={column.id} scope="col" className={printedCellClass(column)}>
                {column.heading}
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

function printedCellClass(column: Pick<CatalogueColumn<unknown>, 'kind'>): string {
  return `px-1 py-0.5 align-top ${isFigure(column.kind) ? 'text-right' : 'text-left'}`
}
