'use client'

import { useState } from 'react'
import type { CatalogueKind } from '@/core/stock/kinds'
import { type CatalogueBlock, catalogueBlockUrl } from '@/hooks/use-catalogue-rows'
import { getJson } from '@/lib/api-client'
import { catalogueApiPath } from '@/lib/catalogue-paths'
import { type CatalogueView, queryParams } from './catalogue-view'

/** Where a block of a list is read: what narrows it, and the order, which the grid may have changed since. */
export function listBlockUrl(kind: CatalogueKind, narrowing: string, sort: string, offset: number): string {
  const query = sort ? `${narrowing}${narrowing ? '&' : ''}sort=${encodeURIComponent(sort)}` : narrowing
  return catalogueBlockUrl(catalogueApiPath(kind), query, offset)
}

/** A block that was asked for ahead: it is taken once, and only by who asks for just that. */
export interface FirstBlock {
  take: <Row>(url: string) => Promise<CatalogueBlock<Row>> | undefined
}

/** Asks for a list's first block as soon as the list is there, while the code of its grid may still be on its way. */
export function useFirstBlock(kind: CatalogueKind, view: CatalogueView): FirstBlock {
  const [first] = useState(() => {
    const narrowing = queryParams({ ...view, sort: '' }).toString()
    return askAhead(listBlockUrl(kind, narrowing, view.sort, 0))
  })
  return first
}

/** One block, asked for now. */
export function askAhead(url: string): FirstBlock {
  let asked: Promise<unknown> | undefined = getJson(url)
  // Who takes it hears of its failure.
  asked.catch(() => undefined)
  return {
    take: <Row>(wanted: string) => {
      const block = wanted === url ? asked : undefined
      asked = undefined
      return block as Promise<CatalogueBlock<Row>> | undefined
    },
  }
}
