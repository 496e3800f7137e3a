'use client'

import { type FormEvent, useState } from 'react'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import type { MachineResponse } from '@/schemas/machine'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { useAttempt } from '../ui/use-attempt'
import { draftTexts, readDraft } from './draft'
import { DraftFieldInput } from './draft-field-input'
import { machineFields, machineGroups } from './machine-fields'
import { pointDrafts, readPoints, SpindlePoints } from './spindle-points'

export interface MachineDialogProps {
  /** Null for a new one. */
  machine: MachineResponse | null
  onClose: () => void
  onSaved: (machine: MachineResponse) => void
}

/** A machine entered or changed, all of it in one form. */
export function MachineDialog({ machine, onClose, onSaved }: MachineDialogProps) {
  const { unit, decimalComma } = useShop()
  const manner = { unit, decimalComma }
  const [texts, setTexts] = useState(() => draftTexts(machineFields, machine ?? { efficiency: 0.8 }, manner))
  const [points, setPoints] = useState(() => pointDrafts(machine?.spindlePoints ?? [], manner))
  const [unread, setUnread] = useState<Record<string, string>>({})
  const { fault, isBusy, attempt } = useAttempt()
  const errors = { ...fieldFaults(fault), ...unread }

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const reading = readDraft(machineFields, texts, manner)
    const curve = readPoints(points, manner)
    const faults = { ...reading.faults, ...curve.faults }
    setUnread(faults)
    if (Object.keys(faults).length > 0) return
    const { efficiency, ...fields } = reading.body
    const body = {
      ...fields,
      ...(efficiency === null ? {} : { efficiency }),
      spindlePoints: curve.body,
      ...(machine ? { version: machine.version } : {}),
    }
    void attempt(async () => {
      onSaved(
        machine
          ? await callApi<MachineResponse>('PATCH', `/api/machines/${machine.id}`, { body })
          : await callApi<MachineResponse>('POST', '/api/machines', { body }),
      )
    })
  }

  return (
    <Dialog
      isOpen
      onOpenChange={onClose}
      title={machine ? `Change ${machine.code}` : 'Add a machine'}
      shape="side"
    >
      <form onSubmit={handleSubmit} noValidate className="flex flex-col gap-7">
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault)}
          </Notice>
        ) : null}
        {machineGroups.map(({ title, fields }) => (
          <fieldset key={title} className="grid items-start gap-4 sm:grid-cols-2">
            <legend className="border-ink mb-3 w-full border-b pb-1 text-lg font-semibold">{title}</legend>
            {fields.map((field) => (
              <DraftFieldInput
                key={field.name}
                field={field}
                text={texts[field.name] ?? ''}
                manner={manner}
                error={errors[field.name]}
                onTextChange={(text) => setTexts((held) => ({ ...held, [field.name]: text }))}
              />
            ))}
          </fieldset>
        ))}
        <SpindlePoints points={points} errors={errors} onChange={setPoints} />
        <div className="bg-sheet border-hairline sticky bottom-0 -mx-5 flex gap-3 border-t px-5 py-3">
          <Button type="submit" variant="primary" disabled={isBusy}>
            {isBusy ? 'Saving …' : 'Save'}
          </Button>
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
