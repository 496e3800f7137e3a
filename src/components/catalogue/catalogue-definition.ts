import type { CatalogueKind } from '@/core/stock/kinds'
import type { LengthUnit } from '@/core/units/length-unit'
import type { CatalogueColumn } from './catalogue-column'
import type { CatalogueFilter } from './catalogue-filter'
import type { CatalogueRow } from './catalogue-row'
import type { ItemFormDefinition } from './item-form-definition'

/** All that tells one kind of item from another on the pages of the catalogue. */
export interface CatalogueDefinition<Row extends CatalogueRow> {
  kind: CatalogueKind
  title: string
  one: string
  many: string
  columns: (canSeeCosts: boolean) => CatalogueColumn<Row>[]
  filters: readonly CatalogueFilter[]
  /** The essential facts in one short line, for a list read with a thumb. */
  facts: (row: Row, unit: LengthUnit) => string
  form: ItemFormDefinition<Row>
}
