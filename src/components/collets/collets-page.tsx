'use client'

import { CataloguePage } from '@/components/catalogue/catalogue-page'
import { colletCatalogue } from './collet-catalogue'

export function ColletsPage() {
  return <CataloguePage definition={colletCatalogue} />
}
