import type { Bore } from '@/core/tooling'
import type { CatalogueColumn } from './catalogue-column'
import type { CatalogueFilter } from './catalogue-filter'
import { boreDiameterColumn, textColumn } from './columns'

/** What a holder or an extension takes a shank with. */
export function boreColumns<Row extends { bore: Bore }>(): CatalogueColumn<Row>[] {
  return [
    textColumn('boreKind', 'Holds by', ({ bore }) => (bore.kind === 'collet' ? 'Collet' : 'Fixed bore'), {
      width: 112,
    }),
    textColumn('series', 'Series', ({ bore }) => (bore.kind === 'collet' ? bore.series : ''), {
      name: 'Collet series',
      width: 90,
    }),
    boreDiameterColumn(),
  ]
}

/** How far a shank goes in, and how much of it must be held: what `lengthColumn` makes a column of. */
export const clampingLengths = [
  ['boreDepthMm', 'Bore depth', 'Bore depth', { width: 104 }],
  ['minimumGripMm', 'LSCN', 'Minimum clamping length (LSCN)', { word: 'min. clamp' }],
  ['gripStartMm', 'Grip start', 'Where gripping begins behind the nose face', { width: 100, isUsual: false }],
] as const

export const boreKindFilter: CatalogueFilter = {
  kind: 'choice',
  name: 'boreKind',
  label: 'Holds by',
  anyLabel: 'Any',
  options: [
    { value: 'collet', label: 'Collet' },
    { value: 'fixed', label: 'Fixed bore' },
  ],
}

export const colletSeriesFilter: CatalogueFilter = { kind: 'text', name: 'series', label: 'Collet series' }

export const boreDiameterFilter: CatalogueFilter = {
  ...{ kind: 'lengthRange', name: 'boreDiameterMm', label: 'Fixed bore' },
  isMore: true,
}
