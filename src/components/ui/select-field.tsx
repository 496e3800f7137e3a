import type { ComponentProps } from 'react'
import { controlClass, Field, type FieldProps } from './field'

export interface SelectOption {
  value: string
  label: string
}

export type SelectFieldProps = FieldProps &
  Omit<ComponentProps<'select'>, 'id' | 'className'> & { options: readonly SelectOption[] }

/** The platform's own list: the best one there is on a phone, and known to every screen reader. */
export function SelectField({
  label,
  symbol,
  hint,
  error,
  isRequired,
  className,
  options,
  ...select
}: SelectFieldProps) {
  return (
    <Field {...{ label, symbol, hint, error, isRequired, className }}>
      {(wiring) => (
        <select className={controlClass} required={isRequired} {...select} {...wiring}>
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  )
}
