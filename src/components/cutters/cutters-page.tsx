'use client'

import { CataloguePage } from '@/components/catalogue/catalogue-page'
import { cutterCatalogue } from './cutter-catalogue'

export function CuttersPage() {
  return <CataloguePage definition={cutterCatalogue} />
}
