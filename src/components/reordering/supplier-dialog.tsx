'use client'

import type { FormEvent } from 'react'
import { parseCount } from '@/core/units/parse-count'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

/** Names someone the shop buys from. */
export function SupplierDialog({ onClose, onSaved }: { onClose: () => void; onSaved: () => void }) {
  const { fault, isBusy, attempt } = useAttempt()
  const faults = fieldFaults(fault)

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const values = new FormData(event.currentTarget)
    const days = String(values.get('leadTimeDays') ?? '')
    void attempt(async () => {
      const body = { name: values.get('name'), email: values.get('email'), leadTimeDays: daysOf(days) }
      await callApi('POST', '/api/suppliers', { body })
      onSaved()
    })
  }

  return (
    <Dialog isOpen onOpenChange={onClose} title="Add a supplier">
      <form onSubmit={handleSubmit} className="flex flex-col gap-4" noValidate>
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault)}
          </Notice>
        ) : null}
        <TextField label="Name" name="name" error={faults.name} isRequired autoComplete="off" />
        <TextField label="E-mail address" name="email" type="email" error={faults.email} autoComplete="off" />
        <TextField
          label="Lead time, days"
          name="leadTimeDays"
          inputMode="numeric"
          error={faults.leadTimeDays}
          autoComplete="off"
        />
        <Button type="submit" variant="primary" className="self-start" disabled={isBusy}>
          Add the supplier
        </Button>
      </form>
    </Dialog>
  )
}

/** What is no number goes as it was typed, so that the server says so beside the field. */
function daysOf(text: string): number | string | null {
  if (text.trim() === '') return null
  const read = parseCount(text)
  return read.ok ? read.count : text
}
