import type { ReactNode } from 'react'
import type { FieldValues } from 'react-hook-form'
import type { SelectOption } from '@/components/ui/select-field'

export interface ItemField {
  /** The path of the request, `bore.diameterMm`, and so of its errors. */
  path: string
  label: string
  symbol?: string
  kind: 'line' | 'text' | 'length' | 'angle' | 'count' | 'money' | 'choice'
  allowZero?: boolean
  isRequired?: boolean
  options?: readonly SelectOption[]
  hint?: string
  /** A list on the page of what may be typed. */
  listId?: string
  /** Only what this form of the item has is asked for, and only that is kept. */
  isShown?: (values: FieldValues) => boolean
}

export interface ItemFieldGroup {
  title: string
  fields: readonly ItemField[]
}

export interface ItemFormDefinition<Row> {
  groups: readonly ItemFieldGroup[]
  /** Where the outline is made of segments: whether each is a nut's or the body's. */
  segments?: { hasPart: boolean; hint: string }
  /** Choices a new item begins with. */
  blank: FieldValues
  draw: (row: Row) => ReactNode
  /** What was read so far with what a drawing can do without filled in, so that it appears early while typing. */
  completeForDrawing?: (body: FieldValues) => FieldValues
}
