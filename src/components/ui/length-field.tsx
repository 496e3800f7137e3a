'use client'

import type { LengthUnit } from '@/core/units/length-unit'
import { parseLength } from '@/core/units/parse-length'
import { formatLength } from '@/lib/format-length'
import { TextField, type TextFieldProps } from './text-field'

export interface LengthFieldProps extends Omit<TextFieldProps, 'value' | 'onChange' | 'inputMode'> {
  /** What was typed, as it was typed; whoever keeps it parses it once, at the edge. */
  value: string
  onTextChange: (text: string) => void
  unit: LengthUnit
  decimalComma: boolean
  /** Whether 0 is an answer, as it is of a tip or an offset. */
  allowZero?: boolean
  /** Whether a drill size such as `#7` is a length here; yes unless false. */
  drillSizes?: boolean
}

/** A dimension as people write it: `1/8`, `3.175 mm`, `#7`. What it was read as stands below where that isn't plain to see. */
export function LengthField({
  value,
  onTextChange,
  unit,
  decimalComma,
  allowZero,
  drillSizes,
  symbol,
  hint,
  error,
  ...rest
}: LengthFieldProps) {
  const parsed =
    value.trim() === '' ? null : parseLength(value, { unit, decimalComma, allowZero, drillSizes })
  const readAs = parsed?.ok && parsed.as !== 'plain' ? `Read as ${formatLength(parsed.mm, unit)}` : undefined
  const fault = parsed && !parsed.ok ? parsed.message : undefined
  return (
    <TextField
      {...rest}
      symbol={symbol ? `${symbol} · ${unit}` : unit}
      inputMode="text"
      autoComplete="off"
      spellCheck={false}
      value={value}
      onChange={(event) => onTextChange(event.target.value)}
      hint={readAs ?? hint}
      error={error ?? fault}
    />
  )
}
