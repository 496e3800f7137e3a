'use client'

import type { CatalogueKind } from '@/core/stock/kinds'
import { useMakers } from '@/hooks/use-makers'

export const makerListId = 'makers'

/** The makers already known, offered wherever a field names this list. */
export function MakerList({ kind }: { kind: CatalogueKind }) {
  return (
    <datalist id={makerListId}>
      {useMakers(kind).map((maker) => (
        <option key={maker} value={maker} />
      ))}
    </datalist>
  )
}
