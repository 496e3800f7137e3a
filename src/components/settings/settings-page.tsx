'use client'

import { useRouter } from 'next/navigation'
import { type FormEvent, useState } from 'react'
import { toast } from '@/components/ui/toast'
import { parseDecimal } from '@/core/units/parse-decimal'
import { parseLength } from '@/core/units/parse-length'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { lengthInputText } from '@/lib/format-length'
import type { ShopSettingsResponse } from '@/schemas/shop-settings'
import { PageHeading } from '../layout/page-heading'
import { useShop } from '../layout/shop-context'
import { Button, ButtonLink } from '../ui/button'
import { LengthField } from '../ui/length-field'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'
import { settingGroups, settingsBody, settingValue } from './number-settings'

type Texts = Record<string, string>

const numberSettings = settingGroups.flatMap(({ settings }) => settings)

function textsOf(settings: ShopSettingsResponse, unit: 'mm' | 'in', decimalComma: boolean): Texts {
  return Object.fromEntries(
    numberSettings.map(({ path, kind }) => {
      const value = settingValue(settings, path)
      const text = kind === 'length' ? lengthInputText(value, unit, { decimalComma }) : String(value)
      return [path, kind === 'length' || !decimalComma ? text : text.replace('.', ',')]
    }),
  )
}

/** The shop's name, unit and money, and the figures every reach is worked out with. */
export function SettingsPage({ settings }: { settings: ShopSettingsResponse }) {
  const { unit, decimalComma } = useShop()
  const router = useRouter()
  const [texts, setTexts] = useState(() => textsOf(settings, unit, decimalComma))
  const { fault, isBusy, attempt } = useAttempt()
  const faults = fieldFaults(fault)

  const parsed = numberSettings.map(({ path, kind }) => {
    const text = texts[path] ?? ''
    const read =
      kind === 'length'
        ? parseLength(text, { unit, decimalComma, allowZero: true })
        : parseDecimal(text, { decimalComma })
    if (!read.ok) return { path, value: null, message: read.message }
    return { path, value: 'mm' in read ? read.mm : read.value, message: null }
  })
  const unreadable = Object.fromEntries(parsed.map(({ path, message }) => [path, message]))

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    if (parsed.some(({ value }) => value === null)) return
    const values = new FormData(event.currentTarget)
    void attempt(async () => {
      await callApi('PATCH', '/api/settings', {
        body: {
          version: settings.version,
          shopName: values.get('shopName'),
          currency: values.get('currency'),
          lengthUnit: values.get('lengthUnit'),
          decimalComma: values.get('decimalComma') === 'yes',
          ...settingsBody(parsed),
        },
      })
      toast.success('Saved. Every check from now on uses these.')
      router.refresh()
    })
  }

  return (
    <form onSubmit={handleSubmit} noValidate className="max-w-4xl pb-10">
      <PageHeading
        title="Shop settings"
        note="They hold for everyone; each person's own unit stands above them."
      >
        <ButtonLink href="/mail" size="compact" variant="quiet">
          Mail
        </ButtonLink>
        <ButtonLink href="/first-day" size="compact" variant="quiet">
          The shop’s first day
        </ButtonLink>
      </PageHeading>
      <div className="flex flex-col gap-6 px-4 lg:px-6">
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault)}
          </Notice>
        ) : null}
        <fieldset className="grid gap-4 sm:grid-cols-2">
          <legend className="border-ink mb-3 w-full border-b pb-1 text-lg font-semibold">The shop</legend>
          <TextField
            label="Name"
            name="shopName"
            defaultValue={settings.shopName}
            error={faults.shopName}
            isRequired
          />
          <TextField
            label="Currency"
            name="currency"
            defaultValue={settings.currency}
            error={faults.currency}
            hint="Three letters, as ISO 4217 writes them: EUR, USD, GBP."
            isRequired
          />
          <SelectField
            label="Unit of length"
            name="lengthUnit"
            defaultValue={settings.lengthUnit}
            hint="For everyone who has not chosen one."
            options={[
              { value: 'mm', label: 'Millimetres' },
              { value: 'in', label: 'Inches' },
            ]}
          />
          <SelectField
            label="Decimal sign"
            name="decimalComma"
            defaultValue={settings.decimalComma ? 'yes' : 'no'}
            options={[
              { value: 'no', label: 'Point: 3.175' },
              { value: 'yes', label: 'Comma: 3,175' },
            ]}
          />
        </fieldset>
        {settingGroups.map(({ title, settings: figures }) => (
          <fieldset key={title} className="grid items-start gap-4 sm:grid-cols-2">
            <legend className="border-ink mb-3 w-full border-b pb-1 text-lg font-semibold">{title}</legend>
            {figures.map(({ path, kind, label, hint }) => {
              const common = {
                label,
                hint,
                value: texts[path] ?? '',
                error: faults[path] ?? unreadable[path],
                isRequired: true,
              }
              const setText = (text: string) => setTexts((held) => ({ ...held, [path]: text }))
              return kind === 'length' ? (
                <LengthField
                  key={path}
                  {...common}
                  unit={unit}
                  decimalComma={decimalComma}
                  onTextChange={setText}
                />
              ) : (
                <TextField
                  key={path}
                  {...common}
                  inputMode="decimal"
                  onChange={(event) => setText(event.target.value)}
                />
              )
            })}
          </fieldset>
        ))}
        <Notice kind="caution">
          A smaller clearance lets more tools through and forgives less. These figures stand behind every
          verdict in the shop.
        </Notice>
        <div>
          <Button type="submit" variant="primary" disabled={isBusy}>
            {isBusy ? 'Saving …' : 'Save'}
          </Button>
        </div>
      </div>
    </form>
  )
}
