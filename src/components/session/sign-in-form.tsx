'use client'

import { type FormEvent, useState } from 'react'
import { callApi } from '@/lib/api-client'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { TextField } from '../ui/text-field'

export function SignInForm({ nextPath }: { nextPath: string }) {
  const [failure, setFailure] = useState<string | null>(null)
  const [isBusy, setIsBusy] = useState(false)

  async function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const values = new FormData(event.currentTarget)
    setIsBusy(true)
    setFailure(null)
    try {
      await callApi('POST', '/api/session', {
        body: { email: values.get('email'), password: values.get('password') },
      })
      // A full load: the new session's own pages, with nothing kept of the old.
      window.location.assign(nextPath)
    } catch (error) {
      setFailure(error instanceof Error ? error.message : 'Signing in failed.')
      setIsBusy(false)
    }
  }

  return (
    <form onSubmit={handleSubmit} className="flex flex-col gap-4">
      <h1 className="text-2xl">Sign in</h1>
      {failure ? (
        <Notice kind="collision" isAnnounced>
          {failure}
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
