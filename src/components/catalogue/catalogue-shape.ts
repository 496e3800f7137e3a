import type { CatalogueColumn } from './catalogue-column'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import type { CatalogueView } from './catalogue-view'

/** What a list's page is given, whatever its shape. */
export interface CatalogueShapeProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  columns: readonly CatalogueColumn<Row>[]
  /** Of the columns shown, in their order. */
  shownIds: readonly string[]
  view: CatalogueView
  onViewChange: (change: Partial<CatalogueView>) => void
  onClear: () => void
  onReset: () => void
  onAdd: () => void
}
