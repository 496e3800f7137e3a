'use client'

import { useRef, useState } from 'react'
import { useViewName } from '@/hooks/use-view-name'
import { AddButton } from './add-button'
import { CatalogueList, type CatalogueListHandle } from './catalogue-list'
import type { CatalogueRow } from './catalogue-row'
import type { CatalogueShapeProps } from './catalogue-shape'
import { exportPath, isNarrowed, narrowingText, viewParams } from './catalogue-view'
import { FilterDrawer } from './filter-drawer'
import { FilterFields } from './filter-fields'
import type { ListAct } from './list-act'
import { ListMenu } from './list-menu'
import { ListOverlays } from './list-overlays'
import { ListPrinter, type ListPrinterHandle } from './list-printer'
import { SearchBox } from './search-box'
import { SortSelect } from './sort-select'

export function NarrowCatalogue<Row extends CatalogueRow>(props: CatalogueShapeProps<Row>) {
  const { definition, columns, shownIds, view, onViewChange } = props
  const [act, setAct] = useState<ListAct | null>(null)
  const [total, setTotal] = useState<number | null>(null)
  const list = useRef<CatalogueListHandle<Row>>(null)
  const printer = useRef<ListPrinterHandle>(null)
  const viewName = useViewName(definition.kind, viewParams(view).toString())
  const menuButton = useRef<HTMLButtonElement>(null)
  return (
    <>
      <div className="flex flex-col gap-2 px-4 pt-3 pb-2">
        <div className="flex items-center gap-2">
          <h1 className="mr-auto text-2xl">{definition.title}</h1>
          <AddButton one={definition.one} onAdd={props.onAdd} />
          <ListMenu
            kind={definition.kind}
            many={definition.many}
            isNarrowed={isNarrowed(view)}
            exportHref={exportPath(definition.kind, view, shownIds)}
            onAct={setAct}
            onPrint={() => printer.current?.print()}
            isMarkAlone
            triggerRef={menuButton}
          />
        </div>
        {viewName ? <p className="truncate font-semibold">{viewName}</p> : null}
        <div className="flex items-center gap-2">
          <SearchBox
            value={view.q}
            label={`Search ${definition.many}`}
            onSearch={(q) => onViewChange({ q })}
          />
          <FilterDrawer
            count={Object.keys(view.filters).length + (view.sort ? 1 : 0)}
            found={total}
            onClear={() => onViewChange({ filters: {}, sort: '' })}
          >
            <SortSelect columns={columns} value={view.sort} onChange={(sort) => onViewChange({ sort })} />
            <FilterFields
              shape="column"
              kind={definition.kind}
              narrowing={narrowingText(view)}
              filters={definition.filters}
              values={view.filters}
              onChange={(filters) => onViewChange({ filters })}
            />
          </FilterDrawer>
        </div>
      </div>
      <CatalogueList {...props} handleRef={list} onTotal={setTotal} />
      <ListOverlays
        {...{ definition, columns, shownIds, view, onViewChange, act }}
        onAct={setAct}
        anchor={menuButton}
        onReload={() => list.current?.reload()}
      />
      <ListPrinter<Row>
        {...{ definition, columns, shownIds, view }}
        handleRef={printer}
        loaded={() => list.current?.loaded() ?? { rows: [], first: 0, total: 0 }}
      />
    </>
  )
}
