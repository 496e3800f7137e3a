'use client'

import { RotateCcw } from 'lucide-react'
import type { ReactNode } from 'react'
import { LengthField } from '../ui/length-field'
import { SelectField, type SelectOption } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { catalogueValue } from './catalogue-values'
import { type FieldGroup, reachField } from './reach-fields'
import type { InputsProps } from './reach-inputs'
import { fieldText, readField } from './read-field'

export interface ReachFieldInputProps extends InputsProps {
  group: FieldGroup
  name: string
  texts: Readonly<Record<string, string>>
  label?: string
  hint?: string
  /** What stands where nothing is typed, as the shop's own setting does. */
  placeholder?: string
  options?: readonly SelectOption[]
  isRequired?: boolean
  className?: string
}

/** One field of a check: typed text before the catalogue's figure, marked where the two differ. */
export function ReachFieldInput(props: ReachFieldInputProps) {
  const { group, name, texts, rows, reading, errors, onChange, options, placeholder, isRequired, className } =
    props
  const field = reachField(group, name)
  const ofCatalogue = catalogueValue(rows, group, name)
  const catalogueText = fieldText(field.kind, ofCatalogue, reading)
  const typed = texts[name]
  const read = typed === undefined ? null : readField(field.kind, typed, reading)
  const isChanged =
    group !== 'feature' &&
    group !== 'check' &&
    rows[group] != null &&
    read !== null &&
    !(read.ok && read.value === ofCatalogue)
  const common = {
    label: props.label ?? field.label,
    value: typed ?? catalogueText,
    error: errors[field.path] ?? null,
    hint: isChanged ? (
      <ChangedHint text={catalogueText} onRestore={() => onChange({ type: 'forget', group, name })} />
    ) : (
      (props.hint ?? field.hint)
    ),
    ...(isRequired ? { isRequired } : {}),
    ...(className ? { className } : {}),
  }
  const handleText = (text: string) => onChange({ type: 'text', group, name, text })
  if (options) {
    return <SelectField {...common} options={options} onChange={(event) => handleText(event.target.value)} />
  }
  if (field.kind === 'length' || field.kind === 'lengthOrZero') {
    return (
      <LengthField
        {...common}
        {...reading}
        {...(field.symbol ? { symbol: field.symbol } : {})}
        {...(placeholder ? { placeholder } : {})}
        allowZero={field.kind === 'lengthOrZero'}
        onTextChange={handleText}
      />
    )
  }
  return (
    <TextField
      {...common}
      symbol={field.kind === 'angle' ? (field.symbol ? `${field.symbol} · °` : '°') : field.symbol}
      autoComplete="off"
      spellCheck={false}
      placeholder={placeholder}
      error={common.error ?? (read && !read.ok ? read.message : null)}
      onChange={(event) => handleText(event.target.value)}
    />
  )
}

function ChangedHint({ text, onRestore }: { text: string; onRestore: () => void }): ReactNode {
  return (
    <span className="text-caution flex flex-wrap items-center gap-x-2">
      <span>Changed from the catalogue’s {text === '' ? 'blank' : text}.</span>
      <button
        type="button"
        className="text-accent inline-flex min-h-6 items-center gap-1 font-semibold underline underline-offset-2 pointer-coarse:min-h-11"
        onClick={onRestore}
      >
        <RotateCcw aria-hidden="true" className="size-3.5" />
        Undo
      </button>
    </span>
  )
}
