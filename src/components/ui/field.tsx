'use client'

import { type ReactNode, useId, useRef } from 'react'
import { symbolTitle } from '@/lib/symbol-names'
import { classNames } from './class-names'
import { FieldSymbol } from './field-symbol'

export interface FieldProps {
  label: string
  /** The ISO 13399 symbol of a dimension, shown beside its name. */
  symbol?: string
  hint?: ReactNode
  /** What is wrong with what was given here. */
  error?: string | null
  isRequired?: boolean
  className?: string
}

interface ControlWiring {
  id: string
  'aria-labelledby': string | undefined
  'aria-describedby': string | undefined
  'aria-invalid': true | undefined
}

/** A label, a control, a hint and the error of that control, tied together for a screen reader. */
export function Field({
  label,
  symbol,
  hint,
  error,
  isRequired,
  className,
  children,
}: FieldProps & { children: (wiring: ControlWiring) => ReactNode }) {
  const id = useId()
  const hintId = hint ? `${id}-hint` : undefined
  const errorId = error ? `${id}-error` : undefined
  const [labelId, symbolId, nameId] = [`${id}-label`, `${id}-symbol`, `${id}-name`]
  const isNamed = symbol !== undefined && symbolTitle(symbol) !== undefined
  const describedBy = [hintId, errorId, isNamed && nameId].filter(Boolean).join(' ') || undefined
  const field = useRef<HTMLDivElement>(null)
  return (
    <div ref={field} className={classNames('flex flex-col gap-1', className)}>
      <div className="flex items-baseline justify-between gap-2 text-[0.9375rem]">
        <label id={labelId} htmlFor={id} className="flex-1 font-semibold">
          {label}
          {isRequired ? (
            <span className="text-ink-soft font-normal" aria-hidden="true">
              {' '}
              *
            </span>
          ) : null}
        </label>
        {symbol ? <FieldSymbol id={symbolId} text={symbol} {...{ nameId, field }} /> : null}
      </div>
      {children({
        id,
        'aria-labelledby': symbol ? `${labelId} ${symbolId}` : undefined,
        'aria-describedby': describedBy,
        'aria-invalid': error ? true : undefined,
      })}
      {hint ? (
        <p id={hintId} className="text-ink-soft text-sm">
          {hint}
        </p>
      ) : null}
      {error ? (
        <p id={errorId} className="text-collision text-sm font-semibold">
          {error}
        </p>
      ) : null}
    </div>
  )
}

export const controlClass =
  'w-full min-h-10 pointer-coarse:min-h-11 rounded-[3px] border border-ink-soft/60 bg-sheet px-2.5 py-1.5 text-base placeholder:text-ink-soft aria-invalid:border-collision aria-invalid:border-2 disabled:bg-well disabled:text-ink-soft'
