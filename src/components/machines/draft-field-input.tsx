'use client'

import { LengthField } from '../ui/length-field'
import { TextAreaField, TextField } from '../ui/text-field'
import type { DraftField, DraftManner } from './draft'

export interface DraftFieldInputProps {
  field: DraftField
  text: string
  manner: DraftManner
  error: string | undefined
  onTextChange: (text: string) => void
}

/** One field of a form, as its kind is written. */
export function DraftFieldInput({ field, text, manner, error, onTextChange }: DraftFieldInputProps) {
  const { label, hint, isRequired = false, kind, symbol } = field
  const common = { label, value: text, isRequired, error: error ?? null, ...(hint ? { hint } : {}) }
  const named = symbol ? { ...common, symbol } : common
  if (kind === 'length' || kind === 'distance') {
    return (
      <LengthField
        {...named}
        {...manner}
        allowZero={kind === 'distance'}
        drillSizes={false}
        onTextChange={onTextChange}
      />
    )
  }
  if (kind === 'text') {
    return (
      <TextAreaField
        {...common}
        className="sm:col-span-2"
        onChange={(event) => onTextChange(event.target.value)}
      />
    )
  }
  return (
    <TextField
      {...named}
      inputMode={kind === 'count' ? 'numeric' : kind === 'number' ? 'decimal' : 'text'}
      autoComplete="off"
      onChange={(event) => onTextChange(event.target.value)}
    />
  )
}
