'use client'

import { useState } from 'react'
import { useShop } from '@/components/layout/shop-context'
import { SelectField } from '@/components/ui/select-field'
import { TextField } from '@/components/ui/text-field'
import type { ItemField } from './item-form-definition'
import { readTypedField } from './typed-values'

/** One field of many items and what is typed for it. */
export function useManyField(allFields: readonly ItemField[]) {
  const manner = useShop()
  // A code is one item's own.
  const fields = allFields.filter(({ path }) => path !== 'code' && !path.includes('.'))
  const [path, setPath] = useState('maker')
  const [text, setText] = useState('')
  const [unread, setUnread] = useState<string | null>(null)
  const field = fields.find((one) => one.path === path) ?? fields[0]

  /** What was typed as the API takes it; null where it can't be read, which then stands at the field. */
  function read(): { value: unknown } | null {
    if (!field) return null
    const typed = readTypedField(field, text, manner)
    setUnread(typed.ok ? null : typed.message)
    return typed.ok ? { value: typed.value } : null
  }

  return {
    ...{ fields, field, text, unread, read },
    unit: manner.unit,
    choose: (next: string) => {
      setPath(next)
      setText('')
      setUnread(null)
    },
    type: (next: string) => {
      setText(next)
      setUnread(null)
    },
  }
}

export interface ManyFieldProps {
  many: ReturnType<typeof useManyField>
  /** What the server has against the value. */
  error?: string | undefined
  /** Something was chosen or typed. */
  onChange?: () => void
}

export function ManyField({ many, error, onChange }: ManyFieldProps) {
  const { fields, field, text, unread, unit } = many
  if (!field) return null
  const label = field.kind === 'length' ? `To, ${unit}` : 'To'
  const shared = {
    label,
    hint: field.isRequired ? undefined : 'Empty clears it.',
    error: unread ?? error,
    value: text,
  }
  function handleType(next: string) {
    many.type(next)
    onChange?.()
  }
  return (
    <>
      <SelectField
        label="Field"
        value={field.path}
        onChange={(event) => {
          many.choose(event.target.value)
          onChange?.()
        }}
        options={fields.map((one) => ({
          value: one.path,
          label: one.symbol ? `${one.label} (${one.symbol})` : one.label,
        }))}
      />
      {field.options ? (
        <SelectField
          {...shared}
          options={
            field.options.some(({ value }) => value === '')
              ? field.options
              : [{ value: '', label: 'Choose' }, ...field.options]
          }
          onChange={(event) => handleType(event.target.value)}
        />
      ) : (
        <TextField
          {...shared}
          autoComplete="off"
          list={field.listId}
          onChange={(event) => handleType(event.target.value)}
        />
      )}
    </>
  )
}
