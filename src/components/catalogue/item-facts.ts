import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import type { ItemField, ItemFormDefinition } from './item-form-definition'
import { formFields, type Manner } from './typed-values'
import { valueAt } from './value-at'

export interface ItemFact {
  path: string
  label: string
  symbol: string | null
  text: string
  isFigure: boolean
}

/** What is known of an item beyond its names and its cost, in the order it is asked for. */
export function itemFacts(
  definition: Pick<ItemFormDefinition<never>, 'groups' | 'segments' | 'blank'>,
  row: object,
  manner: Manner,
): ItemFact[] {
  const elsewhere = new Set(['code', 'description', 'maker', 'partNumber', 'unitCost'])
  return formFields(definition).flatMap((field) => {
    const value: unknown = valueAt(row, field.path)
    if (elsewhere.has(field.path) || value === null || value === undefined || value === '') return []
    return [
      {
        path: field.path,
        label: field.label,
        symbol: field.symbol ?? null,
        text: factText(field, value, manner),
        isFigure: typeof value === 'number',
      },
    ]
  })
}

function factText(field: ItemField, value: unknown, { unit }: Manner): string {
  if (typeof value !== 'number')
    return field.options?.find((option) => option.value === value)?.label ?? String(value)
  if (field.kind === 'length') return formatLength(value, unit, { fractions: true })
  if (field.kind === 'angle') return formatAngle(value)
  return value.toLocaleString('en')
}
