import { boreWords } from '@/components/catalogue/bore-words'
import type { CatalogueDefinition } from '@/components/catalogue/catalogue-definition'
import { itemFilters } from '@/components/catalogue/catalogue-filter'
import {
  boreDiameterColumn,
  codeColumn,
  countColumn,
  itemColumns,
  lengthColumn,
  textColumn,
} from '@/components/catalogue/columns'
import { formatLength } from '@/lib/format-length'
import type { HolderResponse } from '@/schemas/holder'
import { holderForm } from './holder-form'

export const holderCatalogue: CatalogueDefinition<HolderResponse> = {
  kind: 'holder',
  title: 'Holders',
  one: 'holder',
  many: 'holders',
  columns: (canSeeCosts) => [
    codeColumn(),
    textColumn('taper', 'Taper', (row) => row.taper ?? '', { name: 'Spindle taper', width: 96 }),
    textColumn('boreKind', 'Holds by', (row) => (row.bore.kind === 'collet' ? 'Collet' : 'Fixed bore'), {
      width: 112,
    }),
    textColumn('series', 'Series', (row) => (row.bore.kind === 'collet' ? row.bore.series : ''), {
      name: 'Collet series',
      width: 90,
    }),
    boreDiameterColumn(),
    lengthColumn('gaugeLengthMm', 'A', 'Gauge length (A)'),
    lengthColumn('boreDepthMm', 'Bore depth', 'Bore depth', { width: 104 }),
    lengthColumn('minimumGripMm', 'LSCN', 'Minimum clamping length (LSCN)'),
    lengthColumn('gripStartMm', 'Grip start', 'Where gripping begins behind the nose face', {
      width: 100,
      isUsual: false,
    }),
    countColumn('nutTorqueNm', 'N·m', 'Nut torque in N·m', { isUsual: false, width: 80 }),
    lengthColumn('sideLockInsertionMm', 'Side-lock', 'Side-lock insertion', { width: 96, isUsual: false }),
    countColumn('maximumRpm', 'RPMX', 'Highest spindle speed (RPMX)', { isUsual: false, width: 90 }),
    ...itemColumns<HolderResponse>(canSeeCosts),
  ],
  filters: [
    {
      kind: 'choice',
      name: 'boreKind',
      label: 'Holds by',
      anyLabel: 'Any',
      options: [
        { value: 'collet', label: 'Collet' },
        { value: 'fixed', label: 'Fixed bore' },
      ],
    },
    { kind: 'text', name: 'taper', label: 'Taper' },
    { kind: 'text', name: 'series', label: 'Collet series' },
    { kind: 'lengthRange', name: 'gaugeLengthMm', label: 'Gauge length' },
    ...itemFilters,
  ],
  facts: (row, unit) =>
    [row.taper, boreWords(row.bore, unit), `A ${formatLength(row.gaugeLengthMm, unit)}`]
      .filter(Boolean)
      .join(' · '),
  form: holderForm,
}
