'use client'

import { type Control, type FieldValues, useController } from 'react-hook-form'
import { useShop } from '@/components/layout/shop-context'
import { LengthField } from '@/components/ui/length-field'
import { SelectField } from '@/components/ui/select-field'
import { TextAreaField, TextField } from '@/components/ui/text-field'
import type { ItemField } from './item-form-definition'

export interface ItemFormFieldProps {
  field: ItemField
  control: Control<FieldValues, unknown, FieldValues>
}

/** The control that suits a field, tied to the form, its error beside it. */
export function ItemFormField({ field, control }: ItemFormFieldProps) {
  const { unit, decimalComma } = useShop()
  const { field: input, fieldState } = useController({ name: field.path, control })
  const common = {
    label: field.label,
    hint: field.hint,
    error: fieldState.error?.message ?? null,
    isRequired: field.isRequired,
    // The form says what is missing in its own words.
    required: false,
    'aria-required': field.isRequired || undefined,
    name: input.name,
    ref: input.ref,
    onBlur: input.onBlur,
    value: String(input.value ?? ''),
  }
  if (field.kind === 'length')
    return (
      <LengthField
        {...common}
        symbol={field.symbol}
        unit={unit}
        decimalComma={decimalComma}
        allowZero={field.allowZero}
        onTextChange={input.onChange}
      />
    )
  if (field.kind === 'choice')
    return <SelectField {...common} options={field.options ?? []} onChange={input.onChange} />
  if (field.kind === 'text')
    return (
      <TextAreaField
        {...common}
        className="sm:col-span-2"
        rows={3}
        maxLength={10_000}
        onChange={input.onChange}
      />
    )
  return (
    <TextField
      {...common}
      symbol={field.kind === 'angle' ? [field.symbol, 'deg'].filter(Boolean).join(' · ') : field.symbol}
      list={field.listId}
      autoComplete="off"
      spellCheck={false}
      inputMode={field.kind === 'count' ? 'numeric' : undefined}
      onChange={input.onChange}
    />
  )
}
