'use client'

import { type FormEvent, useState } from 'react'
import type { ReorderPointChange } from '@/hooks/use-reorder-points'
import type { ReorderPointRow } from '@/schemas/reordering'
import type { SupplierResponse } from '@/schemas/supplier'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { editedFields, readTypedChange, supplierChoices } from './reorder-point-fields'

export interface ChangeSelectedDialogProps {
  rows: readonly ReorderPointRow[]
  suppliers: readonly SupplierResponse[]
  onChange: (change: ReorderPointChange) => Promise<{ row: ReorderPointRow; message: string }[]>
  onClose: () => void
}

/** One field, the same for every row selected. */
export function ChangeSelectedDialog({ rows, suppliers, onChange, onClose }: ChangeSelectedDialogProps) {
  const [fieldName, setFieldName] = useState('reorderPoint')
  const [message, setMessage] = useState<string>()
  const [faults, setFaults] = useState<{ row: ReorderPointRow; message: string }[]>([])
  const [isBusy, setIsBusy] = useState(false)
  const field = editedFields.find((one) => one.field === fieldName)

  async function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    if (!field) return
    const read = readTypedChange(field, String(new FormData(event.currentTarget).get('value') ?? ''))
    if (!read.ok) return setMessage(read.message)
    setMessage(undefined)
    setIsBusy(true)
    const left = await onChange(read.change)
    setIsBusy(false)
    if (left.length === 0) onClose()
    else setFaults(left)
  }

  return (
    <Dialog isOpen onOpenChange={onClose} title={`Change ${rows.length} reorder points`}>
      <form onSubmit={handleSubmit} className="flex flex-col gap-4" noValidate>
        {faults.length > 0 ? (
          <Notice kind="collision" isAnnounced>
            {faults.length} of {rows.length} were not changed; the others were.{' '}
            {faults
              .slice(0, 5)
              .map(({ row, message: why }) => `${row.itemCode} in ${row.cribCode}: ${why}`)
              .join(' ')}
          </Notice>
        ) : null}
        <SelectField
          label="Field"
          value={fieldName}
          onChange={(event) => {
            setFieldName(event.target.value)
            setMessage(undefined)
          }}
          options={editedFields.map(({ field: value, label }) => ({ value, label }))}
        />
        {field?.kind === 'supplier' ? (
          <SelectField key="supplier" label="New value" name="value" options={supplierChoices(suppliers)} />
        ) : (
          <TextField key={fieldName} label="New value" name="value" error={message} autoComplete="off" />
        )}
        <Button type="submit" variant="primary" className="self-start" disabled={isBusy}>
          Change them
        </Button>
      </form>
    </Dialog>
  )
}
