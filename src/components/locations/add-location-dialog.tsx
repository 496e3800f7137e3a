'use client'

import type { FormEvent } from 'react'
import type { TreeLocationKind } from '@/core/stock/kinds'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import type { LocationResponse } from '@/schemas/location'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'
import { kindsWithin } from './location-tree'

export interface AddLocationDialogProps {
  /** What it will stand in; `crib` adds a crib. */
  parent: LocationResponse | 'crib'
  onClose: () => void
  onAdded: () => void
}

const kindLabels = { cabinet: 'Cabinet', drawer: 'Drawer', bin: 'Bin' } as const

export function AddLocationDialog({ parent, onClose, onAdded }: AddLocationDialogProps) {
  const { fault, isBusy, attempt } = useAttempt()
  const faults = fieldFaults(fault)
  const isCrib = parent === 'crib'

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const values = Object.fromEntries(new FormData(event.currentTarget))
    const body = isCrib ? { ...values, kind: 'crib' } : { ...values, parentId: parent.id }
    void attempt(async () => {
      await callApi('POST', '/api/locations', { body })
      onAdded()
    })
  }

  return (
    <Dialog isOpen onOpenChange={onClose} title={isCrib ? 'Add a crib' : `Add to ${parent.code}`}>
      <form onSubmit={handleSubmit} noValidate className="flex flex-col gap-4">
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault)}
          </Notice>
        ) : null}
        {isCrib ? null : (
          <SelectField
            label="What"
            name="kind"
            error={faults.kind}
            options={kindsWithin[parent.kind as TreeLocationKind].map((kind) => ({
              value: kind,
              label: kindLabels[kind],
            }))}
          />
        )}
        <TextField
          label="Code"
          name="code"
          hint="Short, as it stands on the label."
          error={faults.code}
          isRequired
          autoComplete="off"
        />
        <TextField label="Name" name="name" error={faults.name} isRequired autoComplete="off" />
        {isCrib ? (
          <TextField
            label="Time zone"
            name="timeZone"
            defaultValue={Intl.DateTimeFormat().resolvedOptions().timeZone}
            error={faults.timeZone}
            isRequired
          />
        ) : null}
        <div>
          <Button type="submit" variant="primary" disabled={isBusy}>
            Add
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
