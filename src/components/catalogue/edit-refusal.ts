import { ApiError } from '@/lib/api-client'
import { faultSentence } from '@/lib/field-faults'
import type { CatalogueRow } from './catalogue-row'
import type { ItemField } from './item-form-definition'
import type { Refusal } from './refused-rows'

/** What was typed into a cell and not taken. */
export interface EditRefusal<Row> {
  row: Row
  columnId: string
  /** As it was typed. */
  text: string
  message: string
  /** Someone else changed the row in between. */
  isStale: boolean
}

/** Why the server did not take one field's change, in words that stand beside its cell. */
export function refusalMessage(error: unknown, field: ItemField, fields: readonly ItemField[]): string {
  if (!(error instanceof ApiError)) return faultSentence(error)
  if (error.code === 'stale-version') {
    const by = error.problem?.changedBy
    return `${typeof by === 'string' ? by : 'Someone else'} changed this row meanwhile; it is shown as it is now.`
  }
  const own = error.fieldProblems.find(({ path }) => path === field.path)
  if (own) return own.message
  const [other] = error.fieldProblems
  if (!other) return error.message
  const label = fields.find(({ path }) => path === other.path)?.label ?? other.path
  return `${label}: ${other.message}`
}

/** The row as it is now, which a refusal of a stale edit brings along. */
export function currentRow<Row extends CatalogueRow>(error: unknown): Row | null {
  if (!(error instanceof ApiError) || error.code !== 'stale-version') return null
  return (error.problem?.current as Row | undefined) ?? null
}

/** What stands against a change of many rows, row by row. */
export function bulkRefusals(
  error: unknown,
  rows: readonly { code: string }[],
  fields: readonly ItemField[],
): Refusal[] {
  if (!(error instanceof ApiError)) return []
  return error.fieldProblems.flatMap(({ path, message }) => {
    const [, index = '', ...rest] = path.split('.')
    const code = rows[Number(index)]?.code
    if (!path.startsWith('changes.') || !code) return []
    return [{ code, reason: labelled(rest.join('.'), message, fields) }]
  })
}

/** A reason with the field it is about, where that is one of the form. */
export function labelled(path: string, message: string, fields: readonly ItemField[]): string {
  const label = fields.find((field) => field.path === path)?.label
  return label ? `${label}: ${message}` : message
}
