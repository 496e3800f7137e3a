'use client'

import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Notice } from '@/components/ui/notice'
import { TextField } from '@/components/ui/text-field'
import { toast } from '@/components/ui/toast'
import { useAttempt } from '@/components/ui/use-attempt'
import { useSavedViews } from '@/hooks/use-saved-views'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import type { SavedViewResponse } from '@/schemas/saved-view'
import type { CatalogueColumn } from './catalogue-column'
import type { CatalogueDefinition } from './catalogue-definition'
import { filterParamNames } from './catalogue-filter'
import type { CatalogueRow } from './catalogue-row'
import { type CatalogueView, viewParams } from './catalogue-view'
import { openedView } from './opened-view'

export interface SavedViewsProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  columns: readonly CatalogueColumn<Row>[]
  view: CatalogueView
  onViewChange: (change: Partial<CatalogueView>) => void
  onClose: () => void
}

/** The views to open, one's own to rename or remove, and the present one to keep. */
export default function SavedViews<Row extends CatalogueRow>(props: SavedViewsProps<Row>) {
  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => !isOpen && props.onClose()}
      title={`Views of the ${props.definition.many}`}
    >
      <SavedViewList {...props} />
    </Dialog>
  )
}

function SavedViewList<Row extends CatalogueRow>({
  definition,
  columns,
  view,
  onViewChange,
  onClose,
}: SavedViewsProps<Row>) {
  const saved = useSavedViews(definition.kind)
  const { fault, isBusy, attempt } = useAttempt()

  function handleOpen({ name, query }: SavedViewResponse) {
    const opened = openedView(query, filterParamNames(definition.filters), columns)
    onViewChange(opened.view)
    if (opened.leftOut.length > 0) {
      toast.warning(
        `“${name}” is open without ${opened.leftOut.join(', ')}: not there any more, or not yours to see.`,
        { duration: 15_000 },
      )
    }
    onClose()
  }

  return (
    <div className="flex flex-col gap-5">
      {saved.error ? (
        <Notice kind="collision">
          The views could not be loaded. {saved.error.message}{' '}
          <Button onClick={saved.retry}>Try again</Button>
        </Notice>
      ) : saved.views?.length === 0 ? (
        <p className="text-ink-soft">
          No view is saved yet. Narrow, sort and arrange the list, then save it here.
        </p>
      ) : (
        <ul className="border-ink border-t-2">
          {(saved.views ?? []).map((one) => (
            <SavedViewLine
              key={`${one.id} ${one.version}`}
              one={one}
              onOpen={() => handleOpen(one)}
              saved={saved}
            />
          ))}
        </ul>
      )}
      <SaveViewForm
        fault={fault}
        isBusy={isBusy}
        onSave={(name, isShared) =>
          void attempt(async () => {
            await saved.create({ name, isShared, query: viewParams(view).toString() })
            toast.success(`“${name.trim()}” is saved. Open it by “More”, “Views”.`)
            onClose()
          })
        }
      />
    </div>
  )
}

function SavedViewLine({
  one,
  onOpen,
  saved,
}: {
  one: SavedViewResponse
  onOpen: () => void
  saved: ReturnType<typeof useSavedViews>
}) {
  const [name, setName] = useState<string | null>(null)
  const { fault, isBusy, attempt } = useAttempt()
  return (
    <li className="border-hairline flex flex-wrap items-center gap-x-2 gap-y-1 border-b py-1">
      {name === null ? (
        <>
          <button
            type="button"
            onClick={onOpen}
            className="text-accent min-h-11 flex-1 text-left font-semibold hover:underline"
          >
            {one.name}
          </button>
          <span className="text-ink-soft text-sm">
            {one.isMine ? (one.isShared ? 'yours, shared' : 'yours alone') : `shared by ${one.ownerName}`}
          </span>
        </>
      ) : (
        <form
          className="flex flex-1 flex-wrap items-end gap-2"
          onSubmit={(event) => {
            event.preventDefault()
            void attempt(() => saved.update(one, { name }))
          }}
        >
          <TextField
            label={`New name of ${one.name}`}
            value={name}
            onChange={(event) => setName(event.target.value)}
            error={fieldFaults(fault).name}
          />
          <Button type="submit" size="compact" disabled={isBusy}>
            Rename
          </Button>
          <Button size="compact" variant="quiet" onClick={() => setName(null)}>
            Cancel
          </Button>
        </form>
      )}
      {one.isMine && name === null ? (
        <>
          <Button size="compact" variant="quiet" onClick={() => setName(one.name)}>
            Rename<span className="sr-only"> {one.name}</span>
          </Button>
          <Button
            size="compact"
            variant="quiet"
            disabled={isBusy}
            onClick={() => void attempt(() => saved.update(one, { isShared: !one.isShared }))}
          >
            {one.isShared ? 'Keep to myself' : 'Share'}
            <span className="sr-only"> {one.name}</span>
          </Button>
          <Button
            size="compact"
            variant="quiet"
            disabled={isBusy}
            onClick={() => void attempt(() => saved.remove(one))}
          >
            Remove<span className="sr-only"> {one.name}</span>
          </Button>
        </>
      ) : null}
      {fault && !fieldFaults(fault).name ? (
        <p className="text-collision w-full text-sm font-semibold" role="alert">
          {faultSentence(fault)}
        </p>
      ) : null}
    </li>
  )
}

function SaveViewForm({
  fault,
  isBusy,
  onSave,
}: {
  fault: unknown
  isBusy: boolean
  onSave: (name: string, isShared: boolean) => void
}) {
  const [name, setName] = useState('')
  const [isShared, setIsShared] = useState(false)
  const error = fieldFaults(fault).name ?? (fault ? faultSentence(fault) : undefined)
  return (
    <form
      noValidate
      className="flex flex-col gap-3"
      onSubmit={(event) => {
        event.preventDefault()
        onSave(name, isShared)
      }}
    >
      <TextField
        label="Save the list as it is now, as"
        value={name}
        maxLength={100}
        autoComplete="off"
        onChange={(event) => setName(event.target.value)}
        error={error}
      />
      <label className="flex min-h-11 items-center gap-2.5">
        <input
          type="checkbox"
          className="accent-accent size-5"
          checked={isShared}
          onChange={(event) => setIsShared(event.target.checked)}
        />
        Everyone in the shop may open it
      </label>
      <Button type="submit" variant="primary" disabled={isBusy}>
        {isBusy ? 'Saving …' : 'Save the view'}
      </Button>
    </form>
  )
}
