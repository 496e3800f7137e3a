import {
  boreColumns,
  boreDiameterFilter,
  boreKindFilter,
  clampingLengths,
  colletSeriesFilter,
} from '@/components/catalogue/bore-columns'
import { boreWords } from '@/components/catalogue/bore-words'
import type { CatalogueDefinition } from '@/components/catalogue/catalogue-definition'
import { itemFilters } from '@/components/catalogue/catalogue-filter'
import {
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
    ...boreColumns(),
    lengthColumn('gaugeLengthMm', 'A', 'Gauge length (A)', { word: 'gauge' }),
    ...clampingLengths.map(([field, heading, name, look]) =>
      lengthColumn<HolderResponse>(field, heading, name, look),
    ),
    countColumn('nutTorqueNm', 'N·m', 'Nut torque in N·m', { isUsual: false, width: 80 }),
    lengthColumn('sideLockInsertionMm', 'Side-lock', 'Side-lock insertion', { width: 96, isUsual: false }),
    countColumn('maximumRpm', 'RPMX', 'Highest spindle speed (RPMX)', {
      word: 'highest',
      isUsual: false,
      width: 90,
    }),
    ...itemColumns<HolderResponse>(canSeeCosts),
  ],
  filters: [
    boreKindFilter,
    { kind: 'text', name: 'taper', label: 'Taper' },
    colletSeriesFilter,
    { kind: 'lengthRange', name: 'gaugeLengthMm', label: 'Gauge length' },
    boreDiameterFilter,
    ...itemFilters,
  ],
  facts: (row, unit) =>
    [row.taper, boreWords(row.bore, unit), `A ${formatLength(row.gaugeLengthMm, unit)}`]
      .filter(Boolean)
      .join(' · '),
  form: holderForm,
}
