'use client'

import { useState } from 'react'
import { toast } from 'sonner'
import { useShop } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Notice } from '@/components/ui/notice'
import { SelectField } from '@/components/ui/select-field'
import { TextField } from '@/components/ui/text-field'
import { useAttempt } from '@/components/ui/use-attempt'
import { faultSentence } from '@/lib/field-faults'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { bulkFaults } from './edit-refusal'
import type { ItemField } from './item-form-definition'
import { type Manner, readTypedField } from './typed-values'
import type { GridEditing } from './use-grid-editing'

export interface BulkChangeDialogProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  editing: GridEditing<Row>
  isOpen: boolean
  onClose: () => void
}

/** One field of all rows selected: all are changed or none. */
export function BulkChangeDialog<Row extends CatalogueRow>(props: BulkChangeDialogProps<Row>) {
  const { definition, editing, isOpen, onClose } = props
  const count = editing.selected.length
  return (
    <Dialog
      isOpen={isOpen}
      onOpenChange={(open) => !open && onClose()}
      title={`Change ${count} ${count === 1 ? definition.one : definition.many}`}
      description="All of them are changed, or none."
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
  const shop = useShop()
  const manner: Manner = shop
  // A code is one item's own.
  const fields = editing.fields.filter(({ path }) => path !== 'code')
  const [path, setPath] = useState('maker')
  const [text, setText] = useState('')
  const [unread, setUnread] = useState<string | null>(null)
  const { fault, isBusy, attempt } = useAttempt()
  const field = fields.find((one) => one.path === path) ?? fields[0]
  const faults = bulkFaults(fault, editing.selected, editing.fields)
  if (!field) return null

  function handleSubmit(chosen: ItemField) {
    const read = readTypedField(chosen, text, manner)
    setUnread(read.ok ? null : read.message)
    if (!read.ok) return
    const count = editing.selected.length
    void attempt(async () => {
      await editing.changeSelected(chosen, read.value)
      toast.success(`${chosen.label} of ${count} ${count === 1 ? definition.one : definition.many} changed.`)
      onClose()
    })
  }

  return (
    <form
      noValidate
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault()
        handleSubmit(field)
      }}
    >
      <SelectField
        label="Field"
        value={field.path}
        onChange={(event) => {
          setPath(event.target.value)
          setText('')
          setUnread(null)
        }}
        options={fields.map((one) => ({
          value: one.path,
          label: one.symbol ? `${one.label} (${one.symbol})` : one.label,
        }))}
      />
      <BulkValue field={field} text={text} onChange={setText} error={unread} unit={shop.unit} />
      {fault ? (
        <Notice kind="collision" isAnnounced>
          <p>{faultSentence(fault)}</p>
          {faults.length > 0 ? (
            <ul className="mt-1 max-h-40 overflow-y-auto">
              {faults.map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
          ) : null}
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

function BulkValue({
  field,
  text,
  onChange,
  error,
  unit,
}: {
  field: ItemField
  text: string
  onChange: (text: string) => void
  error: string | null
  unit: string
}) {
  const label = field.kind === 'length' ? `To, ${unit}` : 'To'
  const hint = field.isRequired ? undefined : 'Empty clears it.'
  const shared = { label, hint, error: error ?? undefined, value: text }
  if (field.options) {
    const options = field.options.some(({ value }) => value === '')
      ? field.options
      : [{ value: '', label: 'Choose' }, ...field.options]
    return <SelectField {...shared} options={options} onChange={(event) => onChange(event.target.value)} />
  }
  return (
    <TextField
      {...shared}
      autoComplete="off"
      list={field.listId}
      onChange={(event) => onChange(event.target.value)}
    />
  )
}
