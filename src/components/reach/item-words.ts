import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { CutterResponse } from '@/schemas/cutter'
import type { StockSummary } from '@/schemas/item'
import { formNames, type ToolSlot } from './reach-fields'

/** The sizes a machinist knows an item by, in one line. */
export function itemSizes(row: CatalogueTypes[ToolSlot]['row'], unit: LengthUnit): string {
  const said = (mm: number) => formatLength(mm, unit)
  switch (row.kind) {
    case 'cutter':
      return cutterSizes(row, said)
    case 'holder':
      return [row.taper, boreWords(row.bore, said), `A ${said(row.gaugeLengthMm)}`]
        .filter(Boolean)
        .join(' · ')
    case 'extension':
      return `${boreWords(row.bore, said)} · E ${said(row.projectionMm)}`
    case 'collet':
      return `${row.series} · ${said(row.minimumMm)} to ${said(row.maximumMm)}`
  }
}

function cutterSizes(row: CutterResponse, said: (mm: number) => string): string {
  const lengthMm = row.lengthOfCutMm ?? row.fluteLengthMm
  return [
    `${formNames[row.form]} Ø${said(row.cuttingDiameterMm)}`,
    row.form === 'cornerRadius' && row.cornerRadiusMm ? `R ${said(row.cornerRadiusMm)}` : null,
    lengthMm === null ? null : `cut ${said(lengthMm)}`,
    row.neckDiameterMm !== null && row.reachLengthMm !== null ? `neck to ${said(row.reachLengthMm)}` : null,
    `shank ${said(row.shankDiameterMm)}`,
    `OAL ${said(row.overallLengthMm)}`,
  ]
    .filter(Boolean)
    .join(' · ')
}

function boreWords(bore: CatalogueTypes['holder']['row']['bore'], said: (mm: number) => string): string {
  return bore.kind === 'collet' ? `${bore.series} collets` : `bore ${said(bore.diameterMm)}`
}

/** How many there are and where the most of them lie. */
export function stockPlace(stock: StockSummary): { text: string; isOut: boolean } {
  if (stock.onHand === 0) return { text: 'Out of stock', isOut: true }
  const [fullest, ...others] = stock.locations
  const place = fullest ? ` in ${fullest.cribCode} ${fullest.code}` : ''
  const more = others.length > 0 ? ` and ${others.length} more` : ''
  return { text: `${stock.onHand} on hand${place}${more}`, isOut: false }
}
