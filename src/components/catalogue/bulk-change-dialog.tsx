'use client'

import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Notice } from '@/components/ui/notice'
import { toast } from '@/components/ui/toast'
import { useAttempt } from '@/components/ui/use-attempt'
import { faultSentence } from '@/lib/field-faults'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { bulkRefusals } from './edit-refusal'
import type { ItemField } from './item-form-definition'
import { ManyField, useManyField } from './many-field'
import { RefusedRows } from './refused-rows'
import type { GridEditing } from './use-grid-editing'

export interface BulkChangeDialogProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  editing: GridEditing<Row>
  onClose: () => void
}

/** One field of all rows selected: all are changed or none. */
export default function BulkChangeDialog<Row extends CatalogueRow>(props: BulkChangeDialogProps<Row>) {
  const { definition, editing, onClose } = props
  const count = editing.selected.length
  return (
    <Dialog
      isOpen
      onOpenChange={(open) => !open && onClose()}
      title={`Change ${count} ${count === 1 ? definition.one : definition.many}`}
      description="You first see what would happen. All of them are changed, or none; Undo takes it back."
    >
      <BulkChangeForm {...props} />
    </Dialog>
  )
}

function BulkChangeForm<Row extends CatalogueRow>({
  definition,
  editing,
  onClose,
}: BulkChangeDialogProps<Row>) {
  const many = useManyField(editing.fields)
  const [seen, setSeen] = useState<{ field: ItemField; value: unknown; changed: number } | null>(null)
  const { fault, isBusy, attempt } = useAttempt()
  const { field } = many
  const refusals = bulkRefusals(fault, editing.selected, editing.fields)
  if (!field) return null

  function handleRehearse() {
    const typed = many.read()
    if (!typed || !field) return
    setSeen(null)
    void attempt(async () => {
      setSeen({ field, ...typed, changed: await editing.rehearseSelected(field, typed.value) })
    })
  }

  function handleChange({ field, value, changed }: NonNullable<typeof seen>) {
    void attempt(async () => {
      await editing.changeSelected(field, value)
      toast.success(`${field.label} of ${counted(changed)} changed.`)
      onClose()
    })
  }

  const total = editing.selected.length
  const counted = (count: number) => `${count} ${count === 1 ? definition.one : definition.many}`
  const isReady = seen !== null && seen.changed > 0

  return (
    <form
      noValidate
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault()
        handleRehearse()
      }}
    >
      <ManyField many={many} onChange={() => setSeen(null)} />
      {fault ? (
        <Notice kind="collision" isAnnounced>
          <p>{faultSentence(fault)}</p>
          <RefusedRows refusals={refusals} />
        </Notice>
      ) : null}
      {seen && !fault ? (
        <Notice kind="plain" isAnnounced>
          {counted(total)} selected: {isReady ? seen.changed : 'none'} would change
          {seen.changed < total ? `, ${total - seen.changed} are so already` : ''}.
        </Notice>
      ) : null}
      <div className="flex flex-wrap gap-3">
        {isReady && !fault ? (
          <Button variant="primary" disabled={isBusy} onClick={() => handleChange(seen)}>
            {isBusy ? 'Changing …' : `Change ${counted(seen.changed)}`}
          </Button>
        ) : null}
        <Button type="submit" variant={isReady ? 'secondary' : 'primary'} disabled={isBusy || total === 0}>
          {isBusy && !seen ? 'Looking …' : seen ? 'Look again' : 'See what would change'}
        </Button>
        <Button onClick={onClose}>Cancel</Button>
      </div>
    </form>
  )
}
