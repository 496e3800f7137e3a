'use client'

import { usePathname, useSearchParams } from 'next/navigation'
import { useCallback, useMemo } from 'react'
import { type CatalogueView, readView, viewParams } from './catalogue-view'

/** The view as the address bar has it; a change replaces the address, so that Back leaves the page. */
export function useCatalogueView(
  filterNames: readonly string[],
): [CatalogueView, (change: Partial<CatalogueView>) => void] {
  const params = useSearchParams()
  const pathname = usePathname()
  const text = params.toString()
  const view = useMemo(() => readView(new URLSearchParams(text), filterNames), [text, filterNames])
  const change = useCallback(
    (part: Partial<CatalogueView>) => {
      // Read anew: two changes may come between two renderings.
      const current = readView(new URLSearchParams(window.location.search), filterNames)
      // Commas and colons are legal in a query and keep the address readable.
      const next = viewParams({ ...current, ...part })
        .toString()
        .replaceAll('%2C', ',')
      window.history.replaceState(null, '', next ? `${pathname}?${next}` : pathname)
    },
    [pathname, filterNames],
  )
  return [view, change]
}
