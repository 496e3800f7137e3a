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
import type { ExtensionResponse } from '@/schemas/extension'
import { extensionForm } from './extension-form'

export const extensionCatalogue: CatalogueDefinition<ExtensionResponse> = {
  kind: 'extension',
  title: 'Extensions',
  one: 'extension',
  many: 'extensions',
  columns: (canSeeCosts) => [
    codeColumn(),
    textColumn('boreKind', 'Holds by', (row) => (row.bore.kind === 'collet' ? 'Collet' : 'Fixed bore'), {
      width: 112,
    }),
    textColumn('series', 'Series', (row) => (row.bore.kind === 'collet' ? row.bore.series : ''), {
      name: 'Collet series',
      width: 90,
    }),
    boreDiameterColumn(),
    lengthColumn('projectionMm', 'E', 'Projection (E)'),
    lengthColumn('shankDiameterMm', 'DMM', 'Shank diameter, which the holder takes'),
    lengthColumn('boreDepthMm', 'Bore depth', 'Bore depth', { width: 104 }),
    lengthColumn('minimumGripMm', 'LSCN', 'Minimum clamping length (LSCN)'),
    lengthColumn('gripStartMm', 'Grip start', 'Where gripping begins behind the nose face', {
      width: 100,
      isUsual: false,
    }),
    countColumn('nutTorqueNm', 'N·m', 'Nut torque in N·m', { isUsual: false, width: 80 }),
    ...itemColumns<ExtensionResponse>(canSeeCosts),
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
    { kind: 'text', name: 'series', label: 'Collet series' },
    { kind: 'lengthRange', name: 'projectionMm', label: 'Projection' },
    ...itemFilters,
  ],
  facts: (row, unit) => `${boreWords(row.bore, unit)} · E ${formatLength(row.projectionMm, unit)}`,
  form: extensionForm,
}
