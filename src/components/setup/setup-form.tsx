'use client'

import type { FormEvent } from 'react'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

/** The shop's first minute: its name and unit, its crib, and the person who keeps it all. */
export function SetupForm({ token }: { token: string }) {
  const { fault, isBusy, attempt } = useAttempt()
  const faults = fieldFaults(fault)

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const values = Object.fromEntries(new FormData(event.currentTarget))
    void attempt(async () => {
      await callApi('POST', '/api/setup', { body: { ...values, token } })
      await callApi('POST', '/api/session', { body: { email: values.email, password: values.password } })
      window.location.assign('/first-day')
    })
  }

  return (
    <form onSubmit={handleSubmit} className="flex flex-col gap-4" noValidate>
      <div>
        <h1 className="text-2xl">Set up the shop</h1>
        <p className="text-ink-soft mt-1">
          You become its first admin. All but the currency can be changed later; bins, catalogue, stock and
          people come next.
        </p>
      </div>
      {fault ? (
        <Notice kind="collision" isAnnounced>
          {faultSentence(fault)}
        </Notice>
      ) : null}
      <TextField label="Name of the shop" name="shopName" error={faults.shopName} isRequired />
      <div className="grid grid-cols-2 gap-4">
        <SelectField
          label="Unit of length"
          name="lengthUnit"
          options={[
            { value: 'mm', label: 'Millimetres' },
            { value: 'in', label: 'Inches' },
          ]}
        />
        <TextField
          label="Currency"
          name="currency"
          hint="Three letters, such as EUR or USD."
          error={faults.currency}
          isRequired
        />
      </div>
      <div className="grid grid-cols-2 gap-4">
        <TextField label="Crib code" name="cribCode" defaultValue="MAIN" error={faults.cribCode} isRequired />
        <TextField
          label="Crib name"
          name="cribName"
          defaultValue="Main crib"
          error={faults.cribName}
          isRequired
        />
      </div>
      <TextField
        label="Time zone of the crib"
        name="timeZone"
        hint="Such as Europe/Vienna: it says when a day ends."
        defaultValue={Intl.DateTimeFormat().resolvedOptions().timeZone}
        suppressHydrationWarning
        error={faults.timeZone}
        isRequired
      />
      <TextField label="Your name" name="name" autoComplete="name" error={faults.name} isRequired />
      <TextField
        label="Your e-mail address"
        name="email"
        type="email"
        autoComplete="username"
        error={faults.email}
        isRequired
      />
      <TextField
        label="Password"
        name="password"
        type="password"
        autoComplete="new-password"
        hint="At least 8 characters; 15 or more are better."
        error={faults.password}
        isRequired
      />
      <Button type="submit" variant="primary" disabled={isBusy}>
        {isBusy ? 'Setting up …' : 'Set up and sign in'}
      </Button>
    </form>
  )
}
