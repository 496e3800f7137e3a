'use client'

import dynamic from 'next/dynamic'
import { useRouter } from 'next/navigation'
import { type ReactNode, useMemo, useState } from 'react'
import { useCan } from '@/components/layout/shop-context'
import { StateSentence } from '@/components/ui/state-sentence'
import { useMediaQuery } from '@/components/ui/use-media-query'
import { itemPagePath } from '@/lib/catalogue-paths'
import type { CatalogueDefinition } from './catalogue-definition'
import { filterParamNames } from './catalogue-filter'
import type { CatalogueRow } from './catalogue-row'
import type { CatalogueShapeProps } from './catalogue-shape'
import type { ItemFormDialogProps } from './item-form-dialog'
import { NarrowCatalogue } from './narrow-catalogue'
import { useCatalogueView } from './use-catalogue-view'
import { WideCatalogue, wideScreen } from './wide-catalogue'

const ItemFormDialog = dynamic(() => import('./item-form-dialog').then((module) => module.ItemFormDialog), {
  ssr: false,
}) as <Row extends CatalogueRow>(props: ItemFormDialogProps<Row>) => ReactNode

/** A list of one kind of item: a grid where there is room, rows for a thumb where there is not. */
export function CataloguePage<Row extends CatalogueRow>({
  definition,
}: {
  definition: CatalogueDefinition<Row>
}) {
  const router = useRouter()
  const isWide = useMediaQuery(wideScreen)
  const canSeeCosts = useCan('seeCosts')
  const filterNames = useMemo(() => filterParamNames(definition.filters), [definition.filters])
  const columns = useMemo(() => definition.columns(canSeeCosts), [definition, canSeeCosts])
  const [view, onViewChange] = useCatalogueView(filterNames)
  const [isAdding, setIsAdding] = useState(false)
  const shared: CatalogueShapeProps<Row> = {
    definition,
    columns,
    shownIds: useMemo(() => shownColumnIds(columns, view.columns), [columns, view.columns]),
    view,
    onViewChange,
    onClear: () => onViewChange({ q: '', filters: {} }),
    onReset: () => onViewChange({ q: '', filters: {}, sort: '', columns: null }),
    onAdd: () => setIsAdding(true),
  }
  return (
    <div className="flex flex-1 flex-col print:hidden md:h-[calc(100dvh-3.5rem)] md:flex-none min-[84rem]:h-[calc(100dvh-3rem)]">
      {isWide === null ? <StateSentence sentence={`Loading the ${definition.many} …`} /> : null}
      {isWide === true ? <WideCatalogue {...shared} /> : null}
      {isWide === false ? <NarrowCatalogue {...shared} /> : null}
      {isAdding ? (
        <ItemFormDialog
          definition={definition}
          row={null}
          isOpen
          onClose={() => setIsAdding(false)}
          onSaved={(row) => {
            setIsAdding(false)
            router.push(itemPagePath(row.kind, row.id))
          }}
        />
      ) : null}
    </div>
  )
}

/** Those the address names and that are there; the usual ones where it names none. */
function shownColumnIds(
  columns: readonly { id: string; isUsual: boolean }[],
  asked: readonly string[] | null,
): string[] {
  const known = asked?.filter((id) => columns.some((column) => column.id === id)) ?? []
  return known.length > 0 ? known : columns.filter((column) => column.isUsual).map((column) => column.id)
}
