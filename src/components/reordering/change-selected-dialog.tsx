'use client'

import { type FormEvent, useState } from 'react'
import { toast } from '@/components/ui/toast'
import type { ReorderPointChange } from '@/hooks/use-reorder-points'
import { ApiError } from '@/lib/api-client'
import { faultSentence } from '@/lib/field-faults'
import type { ReorderPointRow } from '@/schemas/reordering'
import type { SupplierResponse } from '@/schemas/supplier'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'
import {
  editedFields,
  type ReorderPointField,
  readTypedChange,
  supplierChoices,
} from './reorder-point-fields'

export interface ChangeSelectedDialogProps {
  rows: readonly ReorderPointRow[]
  suppliers: readonly SupplierResponse[]
  /** Throws what stands against it. */
  onChange: (field: ReorderPointField, change: ReorderPointChange) => Promise<void>
  onClose: () => void
}

/** One field, the same for every row selected: all of them are changed or none. */
export function ChangeSelectedDialog({ rows, suppliers, onChange, onClose }: ChangeSelectedDialogProps) {
  const [fieldName, setFieldName] = useState<string>('reorderPoint')
  const [unread, setUnread] = useState<string>()
  const { fault, isBusy, attempt } = useAttempt()
  const field = editedFields.find((one) => one.field === fieldName)
  const many = rows.length === 1 ? '1 reorder point' : `${rows.length} reorder points`

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    if (!field) return
    const read = readTypedChange(field, String(new FormData(event.currentTarget).get('value') ?? ''))
    setUnread(read.ok ? undefined : read.message)
    if (!read.ok) return
    void attempt(async () => {
      await onChange(field.field, read.change)
      toast.success(`${field.label} of ${many} changed.`)
      onClose()
    })
  }

  return (
    <Dialog isOpen onOpenChange={onClose} title={`Change ${many}`} description="All of them, or none.">
      <form onSubmit={handleSubmit} className="flex flex-col gap-4" noValidate>
        <SelectField
          label="Field"
          value={fieldName}
          onChange={(event) => {
            setFieldName(event.target.value)
            setUnread(undefined)
          }}
          options={editedFields.map(({ field: value, label }) => ({ value, label }))}
        />
        {field?.kind === 'supplier' ? (
          <SelectField key="supplier" label="New value" name="value" options={supplierChoices(suppliers)} />
        ) : (
          <TextField
            key={fieldName}
            label="New value"
            name="value"
            hint={field?.kind === 'count' ? undefined : 'Empty clears it.'}
            error={unread}
            autoComplete="off"
          />
        )}
        {fault ? <ManyFaults fault={fault} rows={rows} /> : null}
        <div className="flex flex-wrap gap-3">
          <Button type="submit" variant="primary" disabled={isBusy}>
            {isBusy ? 'Changing …' : 'Change them all'}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </div>
      </form>
    </Dialog>
  )
}

const shownFaults = 8

function ManyFaults({ fault, rows }: { fault: unknown; rows: readonly ReorderPointRow[] }) {
  const lines = fault instanceof ApiError ? fault.fieldProblems.map(lineOf(rows)) : []
  return (
    <Notice kind="collision" isAnnounced>
      <p>{faultSentence(fault)}</p>
      <ul className="mt-1">
        {lines.slice(0, shownFaults).map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
      {lines.length > shownFaults ? <p>and {lines.length - shownFaults} more.</p> : null}
    </Notice>
  )
}

/** `rows.3.reorderPoint` by the row it is of. */
function lineOf(rows: readonly ReorderPointRow[]) {
  return ({ path, message }: { path: string; message: string }): string => {
    const row = rows[Number(path.split('.')[1])]
    return row ? `${row.itemCode} in ${row.cribCode}: ${message}` : message
  }
}
