'use client'

import { type FormEvent, useMemo, useRef, useState } from 'react'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Notice } from '@/components/ui/notice'
import { useAttempt } from '@/components/ui/use-attempt'
import { type FoundRequest, useChangeFound } from '@/hooks/use-found-changes'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { newIdempotencyKey } from '@/lib/new-idempotency-key'
import type { FoundChange, FoundRehearsal } from '@/schemas/found-change'
import { foundChangeDays } from '@/schemas/found-change-limits'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { type CatalogueView, isNarrowed, queryParams } from './catalogue-view'
import { labelled } from './edit-refusal'
import { FoundChangesMade } from './found-changes-made'
import { MakerList } from './maker-list'
import { ManyField, useManyField } from './many-field'
import { RefusedRows } from './refused-rows'
import { formFields } from './typed-values'

export interface FoundChangeDialogProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  view: CatalogueView
  onClose: () => void
  onChanged: (change: FoundChange, name: string) => void
  onUndone: (id: string) => void
}

/** One field of everything the filter finds, also what was never scrolled to: rehearsed first, then all of it or none. */
export default function FoundChangeDialog<Row extends CatalogueRow>(props: FoundChangeDialogProps<Row>) {
  const { definition, view, onClose } = props
  const [done, setDone] = useState<{ change: FoundChange; name: string } | null>(null)
  const { many } = definition
  const which = isNarrowed(view) ? `all ${many} found` : `all ${many}`
  return (
    <Dialog
      isOpen
      onOpenChange={(open) => !open && onClose()}
      title={`Change ${which}`}
      description="You first see what would happen. All of them are changed, or none."
    >
      <MakerList kind={definition.kind} />
      {done ? (
        <ChangeDone {...props} {...done} />
      ) : (
        <ChangeForm
          {...props}
          onChanged={(change, name) => {
            setDone({ change, name })
            props.onChanged(change, name)
          }}
        />
      )}
    </Dialog>
  )
}

function ChangeForm<Row extends CatalogueRow>(props: FoundChangeDialogProps<Row>) {
  const { definition, view, onClose, onChanged } = props
  const fields = useMemo(() => formFields(definition.form), [definition])
  const many = useManyField(fields)
  const { rehearse, change } = useChangeFound(definition.kind)
  const [seen, setSeen] = useState<{ request: FoundRequest; rehearsal: FoundRehearsal } | null>(null)
  const key = useRef('')
  const { fault, isBusy, attempt } = useAttempt()
  const { field } = many
  if (!field) return null

  function handleRehearse(event: FormEvent) {
    event.preventDefault()
    const typed = many.read()
    if (!typed || !field) return
    const filters = Object.fromEntries(queryParams({ ...view, sort: '' }))
    const request = { filters, change: { [field.path]: typed.value } }
    setSeen(null)
    void attempt(async () => {
      setSeen({ request, rehearsal: await rehearse(request) })
      key.current = newIdempotencyKey()
    })
  }

  function handleChange({ request, rehearsal }: NonNullable<typeof seen>) {
    void attempt(async () => {
      const made = await change(request, rehearsal, key.current)
      onChanged(made, `${field?.label} of ${counted(made.count, definition)}`)
    })
  }

  const atField = fieldFaults(fault)[`change.${field.path}`]
  const isReady = seen !== null && seen.rehearsal.refusedCount === 0 && seen.rehearsal.changed > 0
  return (
    <form noValidate className="flex flex-col gap-4" onSubmit={handleRehearse}>
      <ManyField many={many} error={atField} onChange={() => setSeen(null)} />
      {fault && !atField ? (
        <Notice kind="collision" isAnnounced>
          {faultSentence(fault)}
        </Notice>
      ) : null}
      {seen ? <Rehearsed {...{ definition, fields }} rehearsal={seen.rehearsal} /> : null}
      <div className="flex flex-wrap gap-3">
        {isReady && seen ? (
          <Button variant="primary" disabled={isBusy} onClick={() => handleChange(seen)}>
            {isBusy ? 'Changing …' : `Change ${counted(seen.rehearsal.changed, definition)}`}
          </Button>
        ) : null}
        <Button type="submit" variant={isReady ? 'secondary' : 'primary'} disabled={isBusy}>
          {isBusy && !seen ? 'Looking …' : seen ? 'Look again' : 'See what would change'}
        </Button>
        <Button variant="quiet" onClick={onClose}>
          Cancel
        </Button>
      </div>
      <FoundChangesMade {...props} fields={fields} />
    </form>
  )
}

function counted(count: number, { one, many }: { one: string; many: string }): string {
  return `${count.toLocaleString('en')} ${count === 1 ? one : many}`
}

function Rehearsed({
  definition,
  fields,
  rehearsal,
}: {
  definition: { one: string; many: string }
  fields: ReturnType<typeof formFields>
  rehearsal: FoundRehearsal
}) {
  const { total, changed, unchanged, refusedCount, refused } = rehearsal
  const found = `${counted(total, definition)} found`
  if (refusedCount > 0) {
    const refusals = refused.map(({ code, path, message }) => ({
      code,
      reason: labelled(path, message, fields),
    }))
    return (
      <Notice kind="collision" isAnnounced>
        <p>
          {found}; {refusedCount.toLocaleString('en')} of them cannot be so, and then none is changed. Take
          another value, or narrow the list to those that can.
        </p>
        <RefusedRows refusals={refusals} count={refusedCount} />
      </Notice>
    )
  }
  if (total === 0) return <Notice kind="plain">Nothing is found, so nothing would change.</Notice>
  return (
    <Notice kind="plain" isAnnounced>
      <p>
        {found}: {changed === 0 ? 'none' : changed.toLocaleString('en')} would change
        {unchanged > 0 ? `, ${unchanged.toLocaleString('en')} are so already` : ''}.
      </p>
      {changed > 0 ? (
        <p className="text-ink-soft">
          You can take it back for {foundChangeDays} days, as long as nobody changes one of these{' '}
          {definition.many} again.
        </p>
      ) : null}
    </Notice>
  )
}

function ChangeDone<Row extends CatalogueRow>({
  definition,
  change,
  name,
  onClose,
  onUndone,
}: FoundChangeDialogProps<Row> & { change: FoundChange; name: string }) {
  const { undo } = useChangeFound(definition.kind)
  const [isUndone, setIsUndone] = useState(false)
  const { fault, isBusy, attempt } = useAttempt()
  return (
    <div className="flex flex-col gap-4">
      <Notice kind={isUndone ? 'plain' : 'holds'} isAnnounced>
        {isUndone ? `${name}: as it was before.` : `${counted(change.count, definition)} changed.`}
      </Notice>
      {fault ? (
        <Notice kind="collision" isAnnounced>
          {faultSentence(fault)}
        </Notice>
      ) : null}
      <div className="flex flex-wrap gap-3">
        <Button variant="primary" onClick={onClose}>
          Back to the list
        </Button>
        {isUndone ? null : (
          <Button
            disabled={isBusy}
            onClick={() =>
              void attempt(async () => {
                await undo(change.id)
                setIsUndone(true)
                onUndone(change.id)
              })
            }
          >
            {isBusy ? 'Taking it back …' : 'Take it back'}
          </Button>
        )}
      </div>
    </div>
  )
}
