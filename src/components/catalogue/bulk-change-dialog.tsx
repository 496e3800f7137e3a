'use client'

import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Notice } from '@/components/ui/notice'
import { toast } from '@/components/ui/toast'
import { useAttempt } from '@/components/ui/use-attempt'
import { faultSentence } from '@/lib/field-faults'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { bulkRefusals } from './edit-refusal'
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
      description="All of them are changed, or none. Undo takes it back."
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
  const { fault, isBusy, attempt } = useAttempt()
  const { field } = many
  const refusals = bulkRefusals(fault, editing.selected, editing.fields)
  if (!field) return null

  function handleSubmit() {
    const typed = many.read()
    if (!typed || !field) return
    const count = editing.selected.length
    void attempt(async () => {
      await editing.changeSelected(field, typed.value)
      toast.success(`${field.label} of ${count} ${count === 1 ? definition.one : definition.many} changed.`)
      onClose()
    })
  }

  return (
    <form
      noValidate
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault()
        handleSubmit()
      }}
    >
      <ManyField many={many} />
      {fault ? (
        <Notice kind="collision" isAnnounced>
          <p>{faultSentence(fault)}</p>
          <RefusedRows refusals={refusals} />
        </Notice>
      ) : null}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" variant="primary" disabled={isBusy || editing.selected.length === 0}>
          {isBusy ? 'Changing …' : 'Change them all'}
        </Button>
        <Button onClick={onClose}>Cancel</Button>
      </div>
    </form>
  )
}
