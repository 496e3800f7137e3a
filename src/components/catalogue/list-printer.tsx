'use client'

import { type RefObject, useCallback, useEffect, useImperativeHandle, useRef, useState } from 'react'
import { createPortal, flushSync } from 'react-dom'
import { toast } from '@/components/ui/toast'
import { type CatalogueBlock, catalogueBlockUrl } from '@/hooks/use-catalogue-rows'
import { getJson } from '@/lib/api-client'
import { catalogueApiPath } from '@/lib/catalogue-paths'
import { faultSentence } from '@/lib/field-faults'
import type { CatalogueColumn } from './catalogue-column'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { type CatalogueView, queryParams } from './catalogue-view'
import { type Printed, PrintedList } from './printed-list'

export interface ListPrinterProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  columns: readonly CatalogueColumn<Row>[]
  shownIds: readonly string[]
  view: CatalogueView
  handleRef: RefObject<ListPrinterHandle | null>
  /** What is on the page already; `first` counts from 0. */
  loaded: () => { rows: Row[]; first: number; total: number }
}

export interface ListPrinterHandle {
  print: () => void
}

/** Some hundred sheets of paper; who wants more wants the export. */
const mostRows = 5000
const rowsABlock = 500

/**
 * Prints the rows of the view as a plain table, its heading on every sheet: all of them by the menu and by Ctrl+P. Where
 * the browser prints by its own menu, which waits for nothing, it is the rows loaded so far, and the sheet says so.
 */
export function ListPrinter<Row extends CatalogueRow>(props: ListPrinterProps<Row>) {
  const { definition, view, loaded } = props
  const [printed, setPrinted] = useState<Printed<Row> | null>(null)
  const isReading = useRef(false)

  const print = useCallback(async () => {
    if (isReading.current) return
    isReading.current = true
    const waiting = setTimeout(() => toast.loading('Reading the list for printing …', { id: waitingId }), 600)
    try {
      setPrinted(await readRows<Row>(definition, view))
    } catch (error) {
      toast.error(`The list could not be read for printing. ${faultSentence(error)}`)
    } finally {
      clearTimeout(waiting)
      toast.dismiss(waitingId)
      isReading.current = false
    }
  }, [definition, view])

  useImperativeHandle(props.handleRef, () => ({ print: () => void print() }), [print])
  usePrintKey(print)
  useEffect(() => {
    if (printed && !printed.isPart) window.print()
  }, [printed])
  useOwnPrinting(
    () => {
      if (printed) return
      const { rows, first, total } = loaded()
      flushSync(() => setPrinted({ rows, first, total, at: new Date().toISOString(), isPart: true }))
    },
    () => setPrinted(null),
  )

  return printed ? createPortal(<PrintedList {...props} printed={printed} />, document.body) : null
}

const waitingId = 'printing'

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
  return { rows, first: 0, total, at: new Date().toISOString(), isPart: false }
}

/** Ctrl+P, where nothing stands over the list. */
function usePrintKey(onPrint: () => void): void {
  useEffect(() => {
    const handle = (event: KeyboardEvent) => {
      const isPrint = event.key.toLowerCase() === 'p' && (event.ctrlKey || event.metaKey)
      if (!isPrint || event.shiftKey || event.altKey || document.querySelector('[role="dialog"]')) return
      event.preventDefault()
      onPrint()
    }
    window.addEventListener('keydown', handle)
    return () => window.removeEventListener('keydown', handle)
  }, [onPrint])
}

function useOwnPrinting(onBefore: () => void, onAfter: () => void): void {
  const latest = useRef({ onBefore, onAfter })
  useEffect(() => {
    latest.current = { onBefore, onAfter }
  })
  useEffect(() => {
    const before = () => latest.current.onBefore()
    const after = () => latest.current.onAfter()
    window.addEventListener('beforeprint', before)
    window.addEventListener('afterprint', after)
    return () => {
      window.removeEventListener('beforeprint', before)
      window.removeEventListener('afterprint', after)
    }
  }, [])
}
