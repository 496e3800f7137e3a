import type { CatalogueKind } from '@/core/stock/kinds'

/** Where each kind of item has its page and its route. */
export const cataloguePaths: Readonly<Record<CatalogueKind, string>> = {
  cutter: '/cutters',
  holder: '/holders',
  collet: '/collets',
  extension: '/extensions',
  fixture: '/fixtures',
}

export function itemPagePath(kind: CatalogueKind, id: string): string {
  return `${cataloguePaths[kind]}/${id}`
}

export function catalogueApiPath(kind: CatalogueKind): string {
  return `/api${cataloguePaths[kind]}`
}

export function itemApiPath(kind: CatalogueKind, id: string): string {
  return `${catalogueApiPath(kind)}/${id}`
}
