'use client'

import type { FormEvent } from 'react'
import { callApi } from '@/lib/api-client'
import { faultSentence } from '@/lib/field-faults'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

export function SignInForm({ nextPath }: { nextPath: string }) {
  const { fault, isBusy, attempt } = useAttempt()

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const values = new FormData(event.currentTarget)
    void attempt(async () => {
      await callApi('POST', '/api/session', {
        body: { email: values.get('email'), password: values.get('password') },
      })
      // A full load: the new session's own pages, with nothing kept of the old.
      window.location.assign(nextPath)
    })
  }

  return (
    <form onSubmit={handleSubmit} className="flex flex-col gap-4">
      <h1 className="text-2xl">Sign in</h1>
      {fault ? (
        <Notice kind="collision" isAnnounced>
          {faultSentence(fault)}
        </Notice>
      ) : null}
      <TextField
        label="E-mail address"
        name="email"
        type="email"
        autoComplete="username"
        isRequired
        autoFocus
      />
      <TextField
        label="Password"
        name="password"
        type="password"
        autoComplete="current-password"
        isRequired
      />
      <Button type="submit" variant="primary" disabled={isBusy}>
        {isBusy ? 'Signing in …' : 'Sign in'}
      </Button>
    </form>
  )
}
