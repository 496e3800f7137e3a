import type { ReachSettings } from '@/core/reach/types'
import type { CatalogueRows } from './catalogue-values'
import type { FieldValue, Reading } from './read-field'

/** Figures by the names of their fields. */
export type Values = Readonly<Record<string, FieldValue>>

/** What a draft is read with. */
export interface CheckContext {
  rows: CatalogueRows
  reading: Reading
  settings: ReachSettings
}
