'use client'

import { ItemPage } from '@/components/catalogue/item-page'
import type { ColletResponse } from '@/schemas/collet'
import { colletCatalogue } from './collet-catalogue'

export function ColletPage({ collet }: { collet: ColletResponse }) {
  return <ItemPage definition={colletCatalogue} first={collet} />
}
