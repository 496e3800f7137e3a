'use client'

import { ItemPage } from '@/components/catalogue/item-page'
import type { ExtensionResponse } from '@/schemas/extension'
import { extensionCatalogue } from './extension-catalogue'

export function ExtensionPage({ extension }: { extension: ExtensionResponse }) {
  return <ItemPage definition={extensionCatalogue} first={extension} />
}
