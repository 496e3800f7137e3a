import type { Dispatch } from 'react'
import type { CatalogueRows } from './catalogue-values'
import type { FieldErrors } from './compile-check'
import type { DraftChange } from './reach-draft'
import type { Reading } from './read-field'

/** What every column of fields is given, beside its own texts. */
export interface InputsProps {
  rows: CatalogueRows
  reading: Reading
  errors: FieldErrors
  onChange: Dispatch<DraftChange>
}

/** Whether a fault lies in a place or in anything inside it. */
export function hasFaultIn(errors: FieldErrors, place: string): boolean {
  return Object.keys(errors).some((path) => path === place || path.startsWith(`${place}.`))
}
