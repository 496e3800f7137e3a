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
import { codeColumn, countColumn, itemColumns, lengthColumn } from '@/components/catalogue/columns'
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
    ...boreColumns(),
    lengthColumn('projectionMm', 'E', 'Projection (E)', { word: 'projection' }),
    lengthColumn('shankDiameterMm', 'DMM', 'Shank diameter, which the holder takes', { word: 'shank' }),
    ...clampingLengths.map(([field, heading, name, look]) =>
      lengthColumn<ExtensionResponse>(field, heading, name, look),
    ),
    countColumn('nutTorqueNm', 'N·m', 'Nut torque in N·m', { isUsual: false, width: 80 }),
    ...itemColumns<ExtensionResponse>(canSeeCosts),
  ],
  filters: [
    boreKindFilter,
    colletSeriesFilter,
    { kind: 'lengthRange', name: 'projectionMm', label: 'Projection' },
    boreDiameterFilter,
    ...itemFilters,
  ],
  facts: (row, unit) => `${boreWords(row.bore, unit)} · projection ${formatLength(row.projectionMm, unit)}`,
  form: extensionForm,
}
