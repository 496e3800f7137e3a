import type { CatalogueDefinition } from '@/components/catalogue/catalogue-definition'
import { itemFilters } from '@/components/catalogue/catalogue-filter'
import { codeColumn, itemColumns, lengthColumn, textColumn } from '@/components/catalogue/columns'
import { formatLength } from '@/lib/format-length'
import type { ColletResponse } from '@/schemas/collet'
import { colletForm } from './collet-form'

export const colletCatalogue: CatalogueDefinition<ColletResponse> = {
  kind: 'collet',
  title: 'Collets',
  one: 'collet',
  many: 'collets',
  columns: (canSeeCosts) => [
    codeColumn(),
    textColumn('series', 'Series', (row) => row.series, { width: 100 }),
    lengthColumn('minimumMm', 'From', 'Smallest shank it takes'),
    lengthColumn('maximumMm', 'To', 'Largest shank it takes'),
    lengthColumn('lengthMm', 'Length', 'Length of the collet', { width: 90 }),
    lengthColumn('minimumGripMm', 'LSCN', 'Minimum clamping length (LSCN)', { word: 'min. clamp' }),
    ...itemColumns<ColletResponse>(canSeeCosts),
  ],
  filters: [
    { kind: 'text', name: 'series', label: 'Series' },
    { kind: 'lengthRange', name: 'minimumMm', label: 'Smallest shank' },
    { kind: 'lengthRange', name: 'maximumMm', label: 'Largest shank' },
    ...itemFilters,
  ],
  facts: (row, unit) =>
    `${row.series} · ⌀${formatLength(row.minimumMm, unit, { withUnit: false })} to ${formatLength(row.maximumMm, unit)}`,
  form: colletForm,
}
