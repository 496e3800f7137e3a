'use client'

import { ItemPage } from '@/components/catalogue/item-page'
import type { CutterResponse } from '@/schemas/cutter'
import { cutterCatalogue } from './cutter-catalogue'
import { CutterSpeedsSection } from './cutter-speeds-section'

export function CutterPage({ cutter }: { cutter: CutterResponse }) {
  return (
    <ItemPage
      definition={cutterCatalogue}
      first={cutter}
      extra={(row) => <CutterSpeedsSection cutter={row} />}
    />
  )
}
