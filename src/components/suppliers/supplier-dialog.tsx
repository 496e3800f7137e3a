'use client'

import { type FormEvent, useState } from 'react'
import { parseCount } from '@/core/units/parse-count'
import { saveSupplier } from '@/hooks/use-suppliers'
import { ApiError } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import type { SupplierResponse } from '@/schemas/supplier'
import { Button, ButtonLink } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

const fields = ['name', 'email', 'phone', 'contactName', 'accountNumber', 'leadTimeDays'] as const
type Field = (typeof fields)[number]

const labels: Readonly<Record<Field, string>> = {
  name: 'Name',
  email: 'E-mail address',
  phone: 'Telephone',
  contactName: 'Whom to ask for',
  accountNumber: 'Our number there',
  leadTimeDays: 'Lead time, days',
}

const inputTypes: Partial<Record<Field, string>> = { email: 'email', phone: 'tel' }

export interface SupplierDialogProps {
  /** Null adds one. */
  supplier: SupplierResponse | null
  onClose: () => void
  onSaved: () => void
}

/** Whom the shop buys from: added, changed, archived. What is refused stays as it was typed. */
export function SupplierDialog({ supplier, onClose, onSaved }: SupplierDialogProps) {
  const [base, setBase] = useState(supplier)
  const [texts, setTexts] = useState(textsOf(supplier))
  const [unread, setUnread] = useState<string>()
  const { fault, isBusy, attempt } = useAttempt()
  const current = currentOf(fault)
  const faults: Record<string, string | undefined> = {
    ...fieldFaults(fault),
    ...(unread ? { leadTimeDays: unread } : {}),
  }

  function handleSubmit(event: FormEvent) {
    event.preventDefault()
    const days = daysOf(texts.leadTimeDays)
    setUnread(days.ok ? undefined : days.message)
    if (days.ok) save({ ...texts, leadTimeDays: days.days })
  }

  function save(change: object) {
    void attempt(async () => {
      await saveSupplier(current ?? base, change)
      onSaved()
    })
  }

  return (
    <Dialog isOpen onOpenChange={onClose} title={supplier ? supplier.name : 'Add a supplier'}>
      <form onSubmit={handleSubmit} className="flex flex-col gap-4" noValidate>
        {current ? (
          <StaleNotice
            now={current}
            onTakeTheirs={() => {
              setBase(current)
              setTexts(textsOf(current))
              void attempt(async () => undefined)
            }}
          />
        ) : fault ? (
          <Notice kind="collision" isAnnounced>
            <p>{faultSentence(fault)}</p>
            {base && faults.isArchived ? (
              <ButtonLink href={`/reorder-points?supplierId=${base.id}`} size="compact" className="mt-1">
                See these reorder points
              </ButtonLink>
            ) : null}
          </Notice>
        ) : null}
        <div className="grid gap-4 sm:grid-cols-2">
          {fields.map((field) => (
            <TextField
              key={field}
              label={labels[field]}
              type={inputTypes[field] ?? 'text'}
              value={texts[field]}
              onChange={(event) => setTexts((past) => ({ ...past, [field]: event.target.value }))}
              error={faults[field]}
              isRequired={field === 'name'}
              autoComplete="off"
              {...(field === 'leadTimeDays' ? { inputMode: 'numeric' } : {})}
            />
          ))}
        </div>
        <div className="flex flex-wrap gap-3">
          <Button type="submit" variant="primary" disabled={isBusy}>
            {isBusy
              ? 'Saving …'
              : current
                ? 'Put mine over it'
                : supplier
                  ? 'Save the changes'
                  : 'Add the supplier'}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
          {base ? (
            <Button variant="quiet" disabled={isBusy} onClick={() => save({ isArchived: !base.isArchived })}>
              {base.isArchived ? 'Restore' : 'Archive'}
            </Button>
          ) : null}
        </div>
      </form>
    </Dialog>
  )
}

function textsOf(supplier: SupplierResponse | null): Record<Field, string> {
  const text = (field: Field) => String(supplier?.[field] ?? '')
  return {
    ...{ name: text('name'), email: text('email'), phone: text('phone') },
    ...{ contactName: text('contactName'), accountNumber: text('accountNumber') },
    leadTimeDays: text('leadTimeDays'),
  }
}

function daysOf(text: string): { ok: true; days: number | null } | { ok: false; message: string } {
  if (text.trim() === '') return { ok: true, days: null }
  const read = parseCount(text)
  return read.ok ? { ok: true, days: read.count } : { ok: false, message: read.message }
}

function currentOf(fault: unknown): SupplierResponse | null {
  if (!(fault instanceof ApiError) || fault.code !== 'stale-version') return null
  return (fault.problem?.current as SupplierResponse | undefined) ?? null
}

function StaleNotice({ now, onTakeTheirs }: { now: SupplierResponse; onTakeTheirs: () => void }) {
  const said = fields
    .filter((field) => now[field] !== null)
    .map((field) => `${labels[field].toLowerCase()} ${now[field]}`)
  return (
    <Notice kind="collision" isAnnounced>
      <p>
        Someone else changed this supplier meanwhile; nothing of yours was saved. It is now: {said.join(', ')}
        {now.isArchived ? ', archived' : ''}.
      </p>
      <Button size="compact" className="mt-1" onClick={onTakeTheirs}>
        Begin with theirs
      </Button>
    </Notice>
  )
}
