'use client'

import type { FormEvent } from 'react'
import { toast } from '@/components/ui/toast'
import type { Role } from '@/core/policies/permissions'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { roleNames, roleNotes } from '@/lib/role-names'
import { PageHeading } from '../layout/page-heading'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

/** One's own account: who one is here, the password, and where else one is signed in. */
export function AccountPage({ name, email, role }: { name: string; email: string; role: Role }) {
  return (
    <div className="max-w-xl pb-10">
      <PageHeading title={name} note={`${email} · ${roleNames[role]}: ${roleNotes[role]}.`} />
      <div className="flex flex-col gap-8 px-4 lg:px-6">
        <PasswordForm />
        <OtherSessions />
      </div>
    </div>
  )
}

function PasswordForm() {
  const { fault, isBusy, attempt } = useAttempt()
  const faults = fieldFaults(fault)

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const form = event.currentTarget
    const values = new FormData(form)
    void attempt(async () => {
      await callApi('PUT', '/api/me/password', {
        body: { currentPassword: values.get('currentPassword'), newPassword: values.get('newPassword') },
      })
      form.reset()
      toast.success('Your password is changed, and you are signed out everywhere else.')
    })
  }

  return (
    <form onSubmit={handleSubmit} className="flex flex-col gap-4" noValidate>
      <h2 className="border-ink border-b pb-1 text-lg">Password</h2>
      {fault ? (
        <Notice kind="collision" isAnnounced>
          {faultSentence(fault)}
        </Notice>
      ) : null}
      <TextField
        label="Present password"
        name="currentPassword"
        type="password"
        autoComplete="current-password"
        error={faults.currentPassword}
        isRequired
      />
      <TextField
        label="New password"
        name="newPassword"
        type="password"
        autoComplete="new-password"
        hint="At least 8 characters; 15 or more are better."
        error={faults.newPassword}
        isRequired
      />
      <div>
        <Button type="submit" variant="primary" disabled={isBusy}>
          Change password
        </Button>
      </div>
    </form>
  )
}

function OtherSessions() {
  async function handleEnd() {
    try {
      await callApi('DELETE', '/api/me/sessions')
      toast.success('You are signed out everywhere but here.')
    } catch (error) {
      toast.error(faultSentence(error))
    }
  }
  return (
    <section className="flex flex-col items-start gap-3">
      <h2 className="border-ink w-full border-b pb-1 text-lg">Elsewhere</h2>
      <p>Left a phone at a machine? End every other place you are signed in.</p>
      <Button onClick={handleEnd}>Sign out everywhere else</Button>
    </section>
  )
}
