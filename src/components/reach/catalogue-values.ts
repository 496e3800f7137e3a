import type { ColletResponse } from '@/schemas/collet'
import type { CutterResponse } from '@/schemas/cutter'
import type { ExtensionResponse } from '@/schemas/extension'
import type { HolderResponse } from '@/schemas/holder'
import type { FieldGroup } from './reach-fields'
import type { FieldValue } from './read-field'

/** The rows of the crib that are picked; undefined or null while there is none, or it is still being read. */
export interface CatalogueRows {
  cutter?: CutterResponse | null
  holder?: HolderResponse | null
  collet?: ColletResponse | null
  extension?: ExtensionResponse | null
}

/** What the catalogue says of a field; null where nothing is picked or it doesn't say. */
export function catalogueValue(rows: CatalogueRows, group: FieldGroup, name: string): FieldValue {
  if (group === 'feature' || group === 'check') return null
  const row = rows[group]
  if (!row) return null
  if ('bore' in row && name.startsWith('bore') && name !== 'boreDepthMm') return boreValue(row.bore, name)
  const value: unknown = Object.entries(row).find(([member]) => member === name)?.[1]
  return typeof value === 'number' || typeof value === 'string' ? value : null
}

function boreValue(bore: HolderResponse['bore'], name: string): FieldValue {
  if (name === 'boreKind') return bore.kind
  if (bore.kind === 'collet') return name === 'boreSeries' ? bore.series : null
  return name === 'boreDiameterMm' ? bore.diameterMm : null
}
