import type { RefObject } from 'react'
import type { CatalogueKind } from '@/core/stock/kinds'

/** What opens over a list. */
export type ListAct = 'columns' | 'views' | 'paste' | 'changeSelected' | 'changeFound'

export interface ListMenuProps {
  kind: CatalogueKind
  many: string
  isNarrowed: boolean
  exportHref: string
  onAct: (act: ListAct) => void
  onPrint: () => void
  /** Where there is a grid: it has columns to choose. */
  hasColumns?: boolean
  /** On a phone the mark alone. */
  isMarkAlone?: boolean
  triggerRef: RefObject<HTMLButtonElement | null>
}
