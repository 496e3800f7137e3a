import type { LengthUnit } from '@/core/units/length-unit'

/** What a column needs to know to write a value. */
export interface ColumnContext {
  unit: LengthUnit
  currency: string
}

export interface CatalogueColumn<Row> {
  /** Also the field the API sorts by. */
  id: string
  /** What stands over the column: a symbol where there is one. */
  heading: string
  /** Under a symbol, what a shop calls it in a word or two. */
  word?: string | undefined
  /** The full name, on hover, in the chooser and for a screen reader. */
  name: string
  kind: 'code' | 'text' | 'length' | 'angle' | 'count' | 'money' | 'onHand' | 'places'
  width: number
  isUsual: boolean
  isSortable: boolean
  text: (row: Row, context: ColumnContext) => string
}

export function isFigure(kind: CatalogueColumn<unknown>['kind']): boolean {
  return kind !== 'code' && kind !== 'text' && kind !== 'places'
}
