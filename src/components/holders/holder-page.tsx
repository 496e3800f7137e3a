'use client'

import { ItemPage } from '@/components/catalogue/item-page'
import type { HolderResponse } from '@/schemas/holder'
import { holderCatalogue } from './holder-catalogue'

export function HolderPage({ holder }: { holder: HolderResponse }) {
  return <ItemPage definition={holderCatalogue} first={holder} />
}
