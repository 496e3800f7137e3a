'use client'

import { type ReactNode, useState } from 'react'
import { useCan } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { toast } from '@/components/ui/toast'
import { useArchiveItem } from '@/hooks/use-archive-item'
import { useItem, useItemStock } from '@/hooks/use-item'
import { ArchiveDialog } from './archive-dialog'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { GeometryTable } from './geometry-table'
import { ItemFitsSection } from './item-fits-section'
import { ItemFormDialog } from './item-form-dialog'
import { type ItemAct, ItemHeading } from './item-heading'
import { ItemMovementsSection } from './item-movements-section'
import { ItemStockSection } from './item-stock-section'
import { MergesNotice } from './merges-notice'
import { MoveDialog } from './move-dialog'

export interface ItemPageProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  /** As the server had it when it made the page. */
  first: Row
  /** What only this kind of item has to say, below its geometry and stock. */
  extra?: (row: Row) => ReactNode
}

/** One item: its drawing, what it measures, where it is, what happened to it, and what fits it. */
export function ItemPage<Row extends CatalogueRow>({ definition, first, extra }: ItemPageProps<Row>) {
  const row = useItem(definition.kind, first)
  const stocked = useItemStock(row.id)
  const [act, setAct] = useState<ItemAct | null>(null)
  const close = () => setAct(null)
  return (
    <div className="flex w-full max-w-[100rem] flex-col gap-6 px-4 pt-4 pb-10 lg:px-6">
      <ItemHeading definition={definition} row={row} onAct={setAct} />
      {row.archivedAt ? <ArchivedNotice row={row} /> : null}
      <MergesNotice itemId={row.id} />
      {definition.form.draw(row)}
      <div className="grid items-start gap-x-10 gap-y-6 lg:grid-cols-2">
        <GeometryTable definition={definition} row={row} />
        <ItemStockSection row={row} />
      </div>
      {extra?.(row)}
      {row.kind === 'fixture' ? null : <ItemFitsSection itemId={row.id} kind={row.kind} />}
      <ItemMovementsSection itemId={row.id} />
      {act === 'edit' ? (
        <ItemFormDialog definition={definition} row={row} isOpen onClose={close} onSaved={close} />
      ) : null}
      {act === 'archive' ? <ArchiveDialog row={row} onClose={close} /> : null}
      {act === 'issue' || act === 'return' ? (
        <MoveDialog kind={act} item={row} stock={stocked} onClose={close} />
      ) : null}
    </div>
  )
}

function ArchivedNotice({ row }: { row: CatalogueRow }) {
  const archiveItem = useArchiveItem(row.kind)
  const mayKeep = useCan('keepCrib')
  async function handleRestore() {
    try {
      await archiveItem(row, false)
      toast.success(`${row.code} is back in the lists.`)
    } catch (error) {
      toast.error(error instanceof Error ? error.message : 'It could not be brought back.')
    }
  }
  return (
    <Notice kind="plain">
      <div className="flex flex-wrap items-center gap-3">
        <p>This item is archived: no list and no search shows it unless asked to.</p>
        {mayKeep ? (
          <Button size="compact" onClick={handleRestore}>
            Bring it back
          </Button>
        ) : null}
      </div>
    </Notice>
  )
}
