'use client'

import dynamic from 'next/dynamic'
import { type ReactNode, type RefObject, useCallback, useState } from 'react'
import { useCan } from '@/components/layout/shop-context'
import { importKindOf } from '@/schemas/import-fields'
import type { BulkChangeDialogProps } from './bulk-change-dialog'
import type { CatalogueColumn } from './catalogue-column'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import type { CatalogueView } from './catalogue-view'
import type { FoundChangeDialogProps } from './found-change-dialog'
import type { ListAct } from './list-act'
import type { SavedViewsProps } from './saved-views-dialog'
import { useBlockPaste } from './use-block-paste'
import type { GridEditing } from './use-grid-editing'

// Each comes when it is first asked for: a list is shown far more often than any of them.
const ColumnChooser = dynamic(() => import('./column-chooser'), { ssr: false })
const PasteRows = dynamic(() => import('./paste-rows'), { ssr: false })
const SavedViews = dynamic(() => import('./saved-views-dialog'), { ssr: false }) as <
  Row extends CatalogueRow,
>(
  props: SavedViewsProps<Row>,
) => ReactNode
const FoundChangeDialog = dynamic(() => import('./found-change-dialog'), { ssr: false }) as <
  Row extends CatalogueRow,
>(
  props: FoundChangeDialogProps<Row>,
) => ReactNode
const BulkChangeDialog = dynamic(() => import('./bulk-change-dialog'), { ssr: false }) as <
  Row extends CatalogueRow,
>(
  props: BulkChangeDialogProps<Row>,
) => ReactNode

export interface ListOverlaysProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  columns: readonly CatalogueColumn<Row>[]
  shownIds: readonly string[]
  view: CatalogueView
  onViewChange: (change: Partial<CatalogueView>) => void
  act: ListAct | null
  onAct: (act: ListAct | null) => void
  /** The button the columns hang from. */
  anchor: RefObject<HTMLButtonElement | null>
  /** Where there is a grid. */
  editing?: GridEditing<Row>
  /** Rows were changed that the list may show. */
  onReload: () => void
}

/** What opens over a list, one at a time. */
export function ListOverlays<Row extends CatalogueRow>(props: ListOverlaysProps<Row>) {
  const { definition, columns, shownIds, view, onViewChange, act, onAct, editing, onReload } = props
  const mayKeep = useCan('keepCrib')
  const [pasted, setPasted] = useState('')
  const handlePaste = useCallback(
    (text: string) => {
      setPasted(text)
      onAct('paste')
    },
    [onAct],
  )
  useBlockPaste(mayKeep && act === null, handlePaste)
  function handleClose() {
    setPasted('')
    onAct(null)
  }

  if (act === 'columns')
    return (
      <ColumnChooser
        columns={columns}
        shown={shownIds}
        isUsual={view.columns === null}
        onChange={(ids) => onViewChange({ columns: ids })}
        anchor={props.anchor}
        onClose={handleClose}
      />
    )
  if (act === 'views')
    return <SavedViews {...{ definition, columns, view, onViewChange }} onClose={handleClose} />
  if (act === 'paste' && definition.kind !== 'fixture')
    return (
      <PasteRows
        kind={importKindOf[definition.kind]}
        many={definition.many}
        firstText={pasted}
        onClose={handleClose}
      />
    )
  if (act === 'changeSelected' && editing)
    return <BulkChangeDialog {...{ definition, editing }} onClose={handleClose} />
  if (act === 'changeFound')
    return (
      <FoundChangeDialog
        {...{ definition, view }}
        onClose={handleClose}
        onChanged={(change, name) => {
          editing?.noteFound({ foundId: change.id, name })
          onReload()
        }}
        onUndone={(id) => {
          editing?.forgetFound(id)
          onReload()
        }}
      />
    )
  return null
}
