'use client'

import { CataloguePage } from '@/components/catalogue/catalogue-page'
import { extensionCatalogue } from './extension-catalogue'

export function ExtensionsPage() {
  return <CataloguePage definition={extensionCatalogue} />
}
