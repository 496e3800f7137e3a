'use client'

import { Download, ListFilter, Pencil, Plus, Upload } from 'lucide-react'
import dynamic from 'next/dynamic'
import { useRouter } from 'next/navigation'
import { type ReactNode, useMemo, useRef, useState } from 'react'
import type { PartsListHandle } from '@/components/grid/parts-list-grid'
import { useCan } from '@/components/layout/shop-context'
import { Button, ButtonLink, buttonClass } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { StateSentence } from '@/components/ui/state-sentence'
import { useMediaQuery } from '@/components/ui/use-media-query'
import { useCatalogueCounts } from '@/hooks/use-catalogue-counts'
import { itemPagePath } from '@/lib/catalogue-paths'
import { importKindOf } from '@/schemas/import-fields'
import type { CatalogueColumn } from './catalogue-column'
import type { CatalogueDefinition } from './catalogue-definition'
import { filterParamNames } from './catalogue-filter'
import type { CatalogueGridProps } from './catalogue-grid'
import { CatalogueList } from './catalogue-list'
import type { CatalogueRow } from './catalogue-row'
import { type CatalogueView, exportPath, isNarrowed, queryParams } from './catalogue-view'
import { ColumnChooser } from './column-chooser'
import { EditBar } from './edit-bar'
import { FilterFields } from './filter-fields'
import { ItemFormDialog } from './item-form-dialog'
import { MakerList } from './maker-list'
import { PasteRows } from './paste-rows'
import { PrintList } from './print-list'
import { SavedViews } from './saved-views-dialog'
import { SearchBox } from './search-box'
import { SortSelect } from './sort-select'
import { useCatalogueView } from './use-catalogue-view'
import { useGridEditing } from './use-grid-editing'

/** The grid's code comes only where a grid is shown: not on a phone, not on any other page. */
const CatalogueGrid = dynamic(() => import('./catalogue-grid'), {
  ssr: false,
  loading: () => <StateSentence sentence="Loading the list …" />,
}) as <Row extends CatalogueRow>(props: CatalogueGridProps<Row>) => ReactNode

export function CataloguePage<Row extends CatalogueRow>({
  definition,
}: {
  definition: CatalogueDefinition<Row>
}) {
  const router = useRouter()
  const isWide = useMediaQuery('(min-width: 48rem)')
  const canSeeCosts = useCan('seeCosts')
  const filterNames = useMemo(() => filterParamNames(definition.filters), [definition.filters])
  const columns = useMemo(() => definition.columns(canSeeCosts), [definition, canSeeCosts])
  const [view, onViewChange] = useCatalogueView(filterNames)
  const [isAdding, setIsAdding] = useState(false)
  const shared = {
    definition,
    columns,
    view,
    onViewChange,
    onClear: () => onViewChange({ q: '', filters: {} }),
    onReset: () => onViewChange({ q: '', filters: {}, sort: '', columns: null }),
    onAdd: () => setIsAdding(true),
  }
  return (
    <div className="flex flex-1 flex-col print:block print:h-auto! md:h-[calc(100dvh-3.5rem)] md:flex-none lg:h-[calc(100dvh-3rem)]">
      {isWide !== null && !isAdding ? <MakerList kind={definition.kind} /> : null}
      {isWide === null ? <StateSentence sentence={`Loading the ${definition.many} …`} /> : null}
      {isWide === true ? <WideCatalogue {...shared} /> : null}
      {isWide === false ? <NarrowCatalogue {...shared} /> : null}
      <ItemFormDialog
        definition={definition}
        row={null}
        isOpen={isAdding}
        onClose={() => setIsAdding(false)}
        onSaved={(row) => {
          setIsAdding(false)
          router.push(itemPagePath(row.kind, row.id))
        }}
      />
    </div>
  )
}

interface CatalogueShapeProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  columns: readonly CatalogueColumn<Row>[]
  view: CatalogueView
  onViewChange: (change: Partial<CatalogueView>) => void
  onClear: () => void
  onReset: () => void
  onAdd: () => void
}

function WideCatalogue<Row extends CatalogueRow>(props: CatalogueShapeProps<Row>) {
  const { definition, columns, view, onViewChange, onClear } = props
  const [total, setTotal] = useState<number | null>(null)
  const counts = useFilterCounts(definition, view, total !== null)
  const grid = useRef<PartsListHandle>(null)
  const mayKeep = useCan('keepCrib')
  const shownIds = useMemo(() => shownColumnIds(columns, view.columns), [columns, view.columns])
  const [isEditing, setIsEditing] = useState(false)
  const editing = useGridEditing(definition, grid, isEditing)
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 px-4 pt-3 pb-2 lg:px-6 print:hidden">
        <h1 className="text-2xl">{definition.title}</h1>
        <p className="text-ink-soft mr-auto" role="status">
          {total === null
            ? ''
            : `${total.toLocaleString('en')} ${isNarrowed(view) ? 'found' : total === 1 ? definition.one : definition.many}`}
        </p>
        <SearchBox
          value={view.q}
          label={`Search ${definition.many}`}
          onSearch={(q) => onViewChange({ q })}
          onLeaveDown={() => grid.current?.focusFirstRow()}
        />
        <CatalogueActions
          definition={definition}
          exportHref={exportPath(definition.kind, view, shownIds)}
          onAdd={props.onAdd}
        >
          <ColumnChooser
            columns={columns}
            shown={shownIds}
            isUsual={view.columns === null}
            onChange={(ids) => onViewChange({ columns: ids })}
          />
          <SavedViews {...{ definition, columns, view, onViewChange }} />
          <PrintList {...{ definition, columns, shownIds, view }} />
          {mayKeep ? (
            <>
              {definition.kind === 'fixture' ? null : (
                <PasteRows kind={importKindOf[definition.kind]} many={definition.many} />
              )}
              <EditToggle isEditing={isEditing} onChange={setIsEditing} />
            </>
          ) : null}
        </CatalogueActions>
      </div>
      <div className="flex flex-wrap items-start gap-x-4 gap-y-2 px-4 pb-3 lg:px-6 print:hidden">
        <FilterFields
          shape="row"
          filters={definition.filters}
          values={view.filters}
          counts={counts}
          onChange={(filters) => onViewChange({ filters })}
        />
        {isNarrowed(view) ? (
          <Button variant="quiet" size="compact" className="self-end" onClick={onClear}>
            Clear all
          </Button>
        ) : null}
      </div>
      {isEditing ? <EditBar definition={definition} editing={editing} grid={grid} /> : null}
      <CatalogueGrid
        {...props}
        shownIds={shownIds}
        onTotal={setTotal}
        handleRef={grid}
        editing={isEditing ? editing : undefined}
      />
    </>
  )
}

function useFilterCounts<Row extends CatalogueRow>(
  definition: CatalogueDefinition<Row>,
  view: CatalogueView,
  isWanted: boolean,
) {
  return useCatalogueCounts(definition.kind, queryParams({ ...view, sort: '' }).toString(), isWanted)
}

/** Only while this is on does a list change under the hand; otherwise a click opens a row. */
function EditToggle({ isEditing, onChange }: { isEditing: boolean; onChange: (isEditing: boolean) => void }) {
  return (
    <Button
      size="compact"
      aria-pressed={isEditing}
      variant={isEditing ? 'primary' : 'secondary'}
      onClick={() => onChange(!isEditing)}
    >
      <Pencil aria-hidden="true" className="size-4.5" />
      {isEditing ? 'Done editing' : 'Edit in list'}
    </Button>
  )
}

function NarrowCatalogue<Row extends CatalogueRow>(props: CatalogueShapeProps<Row>) {
  const { definition, columns, view, onViewChange } = props
  const counts = useFilterCounts(definition, view, true)
  return (
    <>
      <div className="flex flex-col gap-2 px-4 pt-3 pb-2">
        <div className="flex items-center justify-between">
          <h1 className="text-2xl">{definition.title}</h1>
          <CatalogueActions
            definition={definition}
            exportHref={exportPath(definition.kind, view, shownColumnIds(columns, view.columns))}
            onAdd={props.onAdd}
          />
        </div>
        <div className="flex items-center gap-2">
          <SearchBox
            value={view.q}
            label={`Search ${definition.many}`}
            onSearch={(q) => onViewChange({ q })}
          />
          <FilterDrawer
            count={Object.keys(view.filters).length + (view.sort ? 1 : 0)}
            onClear={() => onViewChange({ filters: {}, sort: '' })}
          >
            <SavedViews {...{ definition, columns, view, onViewChange }} />
            <SortSelect columns={columns} value={view.sort} onChange={(sort) => onViewChange({ sort })} />
            <FilterFields
              shape="column"
              filters={definition.filters}
              values={view.filters}
              counts={counts}
              onChange={(filters) => onViewChange({ filters })}
            />
          </FilterDrawer>
        </div>
      </div>
      <CatalogueList {...props} />
    </>
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

function CatalogueActions<Row extends CatalogueRow>({
  definition,
  exportHref,
  onAdd,
  children,
}: {
  definition: CatalogueDefinition<Row>
  exportHref: string
  onAdd: () => void
  children?: ReactNode
}) {
  const mayKeep = useCan('keepCrib')
  return (
    <div className="flex flex-wrap items-center gap-2">
      {children}
      <a
        href={exportHref}
        download
        className={buttonClass({ size: 'compact' })}
        title="The rows found, as they are sorted, with the columns shown, as a CSV file"
      >
        <Download aria-hidden="true" className="size-4.5" />
        Export
      </a>
      {mayKeep ? (
        <>
          <ButtonLink href="/imports" size="compact" prefetch={false} className="hidden! md:inline-flex!">
            <Upload aria-hidden="true" className="size-4.5" />
            Import
          </ButtonLink>
          <Button variant="primary" size="compact" onClick={onAdd}>
            <Plus aria-hidden="true" className="size-4.5" />
            Add
            <span className="sr-only"> a {definition.one}</span>
          </Button>
        </>
      ) : null}
    </div>
  )
}

function FilterDrawer({
  count,
  onClear,
  children,
}: {
  count: number
  onClear: () => void
  children: ReactNode
}) {
  const [isOpen, setIsOpen] = useState(false)
  return (
    <>
      <Button className="min-h-11" onClick={() => setIsOpen(true)}>
        <ListFilter aria-hidden="true" className="size-5" />
        Filters{count > 0 ? ` (${count})` : ''}
      </Button>
      <Dialog isOpen={isOpen} onOpenChange={setIsOpen} title="Sort and filter" shape="side">
        <div className="flex flex-col gap-4">
          {children}
          <Button variant="primary" onClick={() => setIsOpen(false)}>
            Show the list
          </Button>
          <Button disabled={count === 0} onClick={onClear}>
            Clear all
          </Button>
        </div>
      </Dialog>
    </>
  )
}
