'use client'

import { type FormEvent, useState } from 'react'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { Button, ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

export function InvitationForm({ token }: { token: string }) {
  const { fault, isBusy, attempt } = useAttempt()
  const [isDone, setIsDone] = useState(false)

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const values = new FormData(event.currentTarget)
    void attempt(async () => {
      await callApi('POST', '/api/invitations', { body: { token, password: values.get('password') } })
      setIsDone(true)
    })
  }

  if (isDone) {
    return (
      <div className="flex flex-col gap-4" role="status">
        <h1 className="text-2xl">Your password is set</h1>
        <ButtonLink href="/sign-in" variant="primary">
          Sign in with it
        </ButtonLink>
      </div>
    )
  }
  return (
    <form onSubmit={handleSubmit} className="flex flex-col gap-4" noValidate>
      <h1 className="text-2xl">Set your password</h1>
      {fault ? (
        <Notice kind="collision" isAnnounced>
          {faultSentence(fault)}
        </Notice>
      ) : null}
      <TextField
        label="Password"
        name="password"
        type="password"
        autoComplete="new-password"
        hint="At least 8 characters; 15 or more are better."
        error={fieldFaults(fault).password}
        isRequired
      />
      <Button type="submit" variant="primary" disabled={isBusy}>
        Set password
      </Button>
    </form>
  )
}
