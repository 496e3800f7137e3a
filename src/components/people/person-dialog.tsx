'use client'

import type { FormEvent } from 'react'
import { roles } from '@/core/policies/permissions'
import { useCribs } from '@/hooks/use-cribs'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { roleNames, roleNotes } from '@/lib/role-names'
import type { Person, PersonLink } from '@/schemas/person'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

export interface PersonDialogProps {
  /** Null adds a person. */
  person: Person | null
  onClose: () => void
  onSaved: (link: PersonLink | null) => void
  onLink: (link: PersonLink) => void
}

const roleOptions = roles.map((role) => ({ value: role, label: `${roleNames[role]}: ${roleNotes[role]}` }))

export function PersonDialog({ person, onClose, onSaved, onLink }: PersonDialogProps) {
  const { data: cribs } = useCribs()
  const { fault, isBusy, attempt } = useAttempt()
  const faults = fieldFaults(fault)

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const values = new FormData(event.currentTarget)
    const common = {
      name: values.get('name'),
      role: values.get('role'),
      homeCribId: values.get('homeCribId') || null,
    }
    void attempt(async () => {
      if (person) {
        const body = { ...common, version: person.version, isActive: values.get('isActive') === 'yes' }
        await callApi('PATCH', `/api/users/${person.id}`, { body })
        onSaved(null)
      } else {
        const body = { ...common, email: values.get('email') }
        onSaved(await callApi<PersonLink>('POST', '/api/users', { body }))
      }
    })
  }

  function handleRenew() {
    void attempt(async () => onLink(await callApi<PersonLink>('POST', `/api/users/${person?.id}/link`)))
  }

  return (
    <Dialog isOpen onOpenChange={onClose} title={person ? person.name : 'Add a person'}>
      <form onSubmit={handleSubmit} className="flex flex-col gap-4" noValidate>
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault)}
          </Notice>
        ) : null}
        <TextField
          label="Name"
          name="name"
          defaultValue={person?.name}
          error={faults.name}
          isRequired
          autoComplete="off"
        />
        {person ? (
          <p className="text-ink-soft">{person.email}</p>
        ) : (
          <TextField
            label="E-mail address"
            name="email"
            type="email"
            error={faults.email}
            isRequired
            autoComplete="off"
          />
        )}
        <SelectField
          label="Role"
          name="role"
          defaultValue={person?.role ?? 'machinist'}
          error={faults.role}
          options={roleOptions}
        />
        <SelectField
          key={cribs ? 'cribs' : 'none'}
          label="Home crib"
          name="homeCribId"
          defaultValue={person?.homeCribId ?? ''}
          error={faults.homeCribId}
          options={[
            { value: '', label: 'None' },
            ...(cribs?.rows ?? []).map((crib) => ({ value: crib.id, label: `${crib.code} · ${crib.name}` })),
          ]}
        />
        {person ? (
          <SelectField
            label="Standing"
            name="isActive"
            defaultValue={person.isActive ? 'yes' : 'no'}
            error={faults.isActive}
            hint="Someone made inactive is signed out at once; what they did stays in the books."
            options={[
              { value: 'yes', label: 'Active' },
              { value: 'no', label: 'Inactive' },
            ]}
          />
        ) : null}
        <div className="flex flex-wrap gap-2">
          <Button type="submit" variant="primary" disabled={isBusy}>
            {person ? 'Save' : 'Add and make the invitation'}
          </Button>
          {person ? (
            <Button onClick={handleRenew} disabled={isBusy}>
              {person.hasPassword ? 'Make a password link' : 'Make a new invitation'}
            </Button>
          ) : null}
        </div>
      </form>
    </Dialog>
  )
}
