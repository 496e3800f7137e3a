'use client'

import { CataloguePage } from '@/components/catalogue/catalogue-page'
import { holderCatalogue } from './holder-catalogue'

export function HoldersPage() {
  return <CataloguePage definition={holderCatalogue} />
}
