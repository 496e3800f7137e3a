import type { ComponentProps } from 'react'
import { classNames } from './class-names'
import { controlClass, Field, type FieldProps } from './field'

export type TextFieldProps = FieldProps & Omit<ComponentProps<'input'>, 'id' | 'className'>

export function TextField({ label, symbol, hint, error, isRequired, className, ...input }: TextFieldProps) {
  return (
    <Field {...{ label, symbol, hint, error, isRequired, className }}>
      {(wiring) => (
        <input type="text" className={controlClass} required={isRequired} {...input} {...wiring} />
      )}
    </Field>
  )
}

export type TextAreaFieldProps = FieldProps & Omit<ComponentProps<'textarea'>, 'id' | 'className'>

export function TextAreaField({ label, hint, error, isRequired, className, ...area }: TextAreaFieldProps) {
  return (
    <Field {...{ label, hint, error, isRequired, className }}>
      {(wiring) => (
        <textarea
          className={classNames(controlClass, 'min-h-20')}
          required={isRequired}
          {...area}
          {...wiring}
        />
      )}
    </Field>
  )
}
