'use client'

import dynamic from 'next/dynamic'
import { type ReactNode, useRef, useState } from 'react'
import type { PartsListHandle } from '@/components/grid/parts-list-grid'
import { useCan } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { StateSentence } from '@/components/ui/state-sentence'
import { useViewName } from '@/hooks/use-view-name'
import { AddButton } from './add-button'
import type { CatalogueGridProps } from './catalogue-grid'
import type { CatalogueRow } from './catalogue-row'
import type { CatalogueShapeProps } from './catalogue-shape'
import { exportPath, isNarrowed, narrowingText, viewParams } from './catalogue-view'
import type { EditBarProps } from './edit-bar'
import { FilterFields } from './filter-fields'
import { useFirstBlock } from './first-block'
import type { ListAct } from './list-act'
import { ListMenu } from './list-menu'
import { ListOverlays } from './list-overlays'
import { ListPrinter, type ListPrinterHandle } from './list-printer'
import { MakerList } from './maker-list'
import { SearchBox } from './search-box'
import { useGridEditing } from './use-grid-editing'

/** Wide enough for a grid. */
export const wideScreen = '(min-width: 48rem)'

const loadGrid = () => import('./catalogue-grid')
// Asked for while the page is still waking; should it not come, the page asks again and says so.
if (typeof window !== 'undefined' && window.matchMedia(wideScreen).matches) loadGrid().catch(() => undefined)

/** The grid's code comes only where a grid is shown: not on a phone, not on any other page. */
const CatalogueGrid = dynamic(loadGrid, {
  ssr: false,
  loading: () => <StateSentence sentence="Loading the list …" />,
}) as <Row extends CatalogueRow>(props: CatalogueGridProps<Row>) => ReactNode

const EditBar = dynamic(() => import('./edit-bar'), {
  ssr: false,
  loading: () => <div className="h-23" />,
}) as <Row extends CatalogueRow>(props: EditBarProps<Row>) => ReactNode

export function WideCatalogue<Row extends CatalogueRow>(props: CatalogueShapeProps<Row>) {
  const { definition, columns, shownIds, view, onViewChange, onClear, onAdd } = props
  const [total, setTotal] = useState<number | null>(null)
  const [act, setAct] = useState<ListAct | null>(null)
  const mayKeep = useCan('keepCrib')
  const [isEditing, setIsEditing] = useState(false)
  const grid = useRef<PartsListHandle>(null)
  const printer = useRef<ListPrinterHandle>(null)
  const menuButton = useRef<HTMLButtonElement>(null)
  const editing = useGridEditing(definition, grid, isEditing)
  const firstBlock = useFirstBlock(definition.kind, view)
  const narrowed = isNarrowed(view)
  const viewName = useViewName(definition.kind, viewParams(view).toString())
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 px-4 pt-3 pb-2 lg:px-6">
        <h1 className="text-2xl">{definition.title}</h1>
        {viewName ? <p className="max-w-64 truncate font-semibold">{viewName}</p> : null}
        <p className="text-ink-soft mr-auto" role="status">
          {total === null
            ? ''
            : `${total.toLocaleString('en')} ${narrowed ? 'found' : total === 1 ? definition.one : definition.many}`}
        </p>
        <SearchBox
          value={view.q}
          label={`Search ${definition.many}`}
          onSearch={(q) => onViewChange({ q })}
          onLeaveDown={() => grid.current?.focusFirstRow()}
        />
        {mayKeep && !isEditing ? (
          <Button size="compact" onClick={() => setIsEditing(true)}>
            Edit<span className="sr-only"> in the list</span>
          </Button>
        ) : null}
        <ListMenu
          kind={definition.kind}
          many={definition.many}
          isNarrowed={narrowed}
          exportHref={exportPath(definition.kind, view, shownIds)}
          onAct={setAct}
          onPrint={() => printer.current?.print()}
          hasColumns
          triggerRef={menuButton}
        />
        <AddButton one={definition.one} isQuiet={isEditing} onAdd={onAdd} />
      </div>
      <div className="flex flex-wrap items-start gap-x-4 gap-y-2 px-4 pb-3 lg:px-6">
        <FilterFields
          shape="row"
          kind={definition.kind}
          narrowing={narrowingText(view)}
          filters={definition.filters}
          values={view.filters}
          onChange={(filters) => onViewChange({ filters })}
        />
        {narrowed ? (
          <Button variant="quiet" size="compact" className="self-end" onClick={onClear}>
            Clear all
          </Button>
        ) : null}
      </div>
      {isEditing ? (
        <EditBar
          {...{ definition, editing, grid, total }}
          isNarrowed={narrowed}
          onChangeSelected={() => setAct('changeSelected')}
          onChangeFound={() => setAct('changeFound')}
          onDone={() => {
            setIsEditing(false)
            menuButton.current?.focus()
          }}
        />
      ) : null}
      {isEditing ? <MakerList kind={definition.kind} /> : null}
      <CatalogueGrid
        {...props}
        onTotal={setTotal}
        handleRef={grid}
        firstBlock={firstBlock}
        editing={isEditing ? editing : undefined}
      />
      <ListOverlays
        {...{ definition, columns, shownIds, view, onViewChange, act, editing }}
        onAct={setAct}
        anchor={menuButton}
        onReload={() => grid.current?.refresh()}
      />
      <ListPrinter<Row>
        {...{ definition, columns, shownIds, view }}
        handleRef={printer}
        loaded={() => {
          const { first, rows } = grid.current?.loadedRows() ?? { first: 0, rows: [] }
          return { first, rows: rows as Row[], total: total ?? rows.length }
        }}
      />
    </>
  )
}
