'use client'

import { type FormEvent, useState } from 'react'
import { parseCount } from '@/core/units/parse-count'
import { useCribs } from '@/hooks/use-cribs'
import { createReorderPoint } from '@/hooks/use-reorder-points'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

/** Watches an item in a crib from now on. The rest is edited in the list. */
export function AddReorderPointDialog({ onClose, onSaved }: { onClose: () => void; onSaved: () => void }) {
  const { data: cribs } = useCribs()
  const { fault, isBusy, attempt } = useAttempt()
  const [codeFault, setCodeFault] = useState<string>()
  const faults = fieldFaults(fault)

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const values = new FormData(event.currentTarget)
    const code = String(values.get('code') ?? '').trim()
    setCodeFault(undefined)
    void attempt(async () => {
      const isFound = await createReorderPoint(code, String(values.get('cribId') ?? ''), {
        reorderPoint: countOf(values.get('reorderPoint')),
        orderUpTo: countOf(values.get('orderUpTo')),
      })
      if (isFound) onSaved()
      else setCodeFault(code === '' ? 'Give the code of the item.' : 'No item in use has this code.')
    })
  }

  return (
    <Dialog isOpen onOpenChange={onClose} title="Add a reorder point">
      <form onSubmit={handleSubmit} className="flex flex-col gap-4" noValidate>
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault)}
          </Notice>
        ) : null}
        <TextField label="Item’s code" name="code" error={codeFault} isRequired autoComplete="off" />
        <SelectField
          key={cribs ? 'cribs' : 'none'}
          label="Crib"
          name="cribId"
          options={(cribs?.rows ?? []).map((crib) => ({
            value: crib.id,
            label: `${crib.code} · ${crib.name}`,
          }))}
        />
        <TextField
          label="Reorder point, pieces"
          name="reorderPoint"
          inputMode="numeric"
          hint="At or below this many, available and coming, the item is low."
          error={faults.reorderPoint}
          isRequired
          autoComplete="off"
        />
        <TextField
          label="Order up to, pieces"
          name="orderUpTo"
          inputMode="numeric"
          error={faults.orderUpTo}
          isRequired
          autoComplete="off"
        />
        <Button type="submit" variant="primary" className="self-start" disabled={isBusy}>
          Add the reorder point
        </Button>
      </form>
    </Dialog>
  )
}

/** What is no number goes as it was typed, so that the server says so beside the field. */
function countOf(value: FormDataEntryValue | null): number | string {
  const text = String(value ?? '')
  const read = parseCount(text)
  return read.ok ? read.count : text
}
