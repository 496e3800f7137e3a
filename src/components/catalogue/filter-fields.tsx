'use client'

import { useEffect, useId, useRef, useState } from 'react'
import { useShop } from '@/components/layout/shop-context'
import { controlClass } from '@/components/ui/field'
import { parseLength } from '@/core/units/parse-length'
import { lengthInputText } from '@/lib/format-length'
import type { CatalogueFilter } from './catalogue-filter'
import { useDelayed } from './use-delayed'

export interface FilterFieldsProps {
  filters: readonly CatalogueFilter[]
  values: Readonly<Record<string, string>>
  onChange: (values: Record<string, string>) => void
  /** In one line over the list, or one under the other in a drawer. */
  shape: 'row' | 'column'
}

/** The ways to narrow a list; each change takes hold as soon as it can be read. */
export function FilterFields({ filters, values, onChange, shape }: FilterFieldsProps) {
  const latest = useRef(values)
  useEffect(() => {
    latest.current = values
  })
  function handleSet(name: string, value: string) {
    const next = { ...latest.current }
    if (value) next[name] = value
    else delete next[name]
    latest.current = next
    onChange(next)
  }
  const boxClass = shape === 'row' ? 'w-auto min-w-0' : 'w-full'
  return filters.map((filter) => (
    <FilterBox key={filter.name} filter={filter} values={values} onSet={handleSet} className={boxClass} />
  ))
}

interface FilterBoxProps {
  filter: CatalogueFilter
  values: Readonly<Record<string, string>>
  onSet: (name: string, value: string) => void
  className: string
}

function FilterBox({ filter, values, onSet, className }: FilterBoxProps) {
  const id = useId()
  if (filter.kind === 'lengthRange') return <LengthRange {...{ values, onSet, className }} filter={filter} />
  const value = values[filter.name] ?? ''
  return (
    <div className={`flex flex-col text-sm ${className}`}>
      <label htmlFor={id} className="text-ink-soft">
        {filter.label}
      </label>
      {filter.kind === 'choice' ? (
        <select
          id={id}
          className={`${filterClass} pr-7`}
          value={value}
          onChange={(event) => onSet(filter.name, event.target.value)}
        >
          <option value="">{filter.anyLabel}</option>
          {filter.options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      ) : (
        <TextFilter id={id} name={filter.name} value={value} onSet={onSet} listId={filter.listId} />
      )}
    </div>
  )
}

const filterClass = controlClass.replace('min-h-10', 'min-h-9')

/** What is typed, until it is in the address; then what the address says. */
function useTyped(value: string, apply: (text: string) => void) {
  const [text, setText] = useState(value)
  const sent = useRef(value)
  const delayed = useDelayed((next: string) => apply(next), 350)
  useEffect(() => {
    if (value === sent.current) return
    sent.current = value
    setText(value)
  }, [value])
  return {
    text,
    setSent: (next: string) => {
      sent.current = next
    },
    props: {
      value: text,
      autoComplete: 'off',
      spellCheck: false,
      onChange: (event: { target: { value: string } }) => {
        setText(event.target.value)
        delayed.later(event.target.value)
      },
      onBlur: delayed.now,
      onKeyDown: (event: { key: string }) => {
        if (event.key === 'Enter') delayed.now()
      },
    },
  }
}

function TextFilter({
  id,
  name,
  value,
  onSet,
  listId,
}: {
  id: string
  name: string
  value: string
  onSet: FilterBoxProps['onSet']
  listId?: string
}) {
  const typed = useTyped(value, (text) => {
    typed.setSent(text.trim())
    onSet(name, text.trim())
  })
  return (
    <input
      id={id}
      list={listId}
      type="text"
      className={`${filterClass} sm:w-36`}
      maxLength={200}
      {...typed.props}
    />
  )
}

function LengthRange({
  filter,
  values,
  onSet,
  className,
}: Omit<FilterBoxProps, 'filter'> & { filter: Extract<CatalogueFilter, { kind: 'lengthRange' }> }) {
  const { unit } = useShop()
  return (
    <fieldset className={`flex flex-col text-sm ${className}`}>
      <legend className="text-ink-soft float-left">
        {filter.label}, {unit}
      </legend>
      <span className="flex items-start gap-1.5">
        <LengthBound
          name={`${filter.name}.min`}
          label={`${filter.label} from`}
          words="from"
          {...{ values, onSet }}
        />
        <LengthBound
          name={`${filter.name}.max`}
          label={`${filter.label} to`}
          words="to"
          {...{ values, onSet }}
        />
      </span>
    </fieldset>
  )
}

function LengthBound({
  name,
  label,
  words,
  values,
  onSet,
}: Pick<FilterBoxProps, 'values' | 'onSet'> & { name: string; label: string; words: string }) {
  const { unit, decimalComma } = useShop()
  const given = values[name]
  const shown =
    given && Number.isFinite(Number(given)) ? lengthInputText(Number(given), unit, { decimalComma }) : ''
  const typed = useTyped(shown, (text) => {
    const read = text.trim() === '' ? null : parseLength(text, { unit, decimalComma, allowZero: true })
    if (read && !read.ok) return
    typed.setSent(read ? lengthInputText(read.mm, unit, { decimalComma }) : '')
    onSet(name, read ? String(read.mm) : '')
  })
  const read =
    typed.text.trim() === '' ? null : parseLength(typed.text, { unit, decimalComma, allowZero: true })
  const fault = read && !read.ok ? read.message : null
  return (
    <span className="flex-1 sm:w-24 sm:flex-none">
      <input
        type="text"
        aria-label={label}
        placeholder={words}
        aria-invalid={fault ? true : undefined}
        className={filterClass}
        {...typed.props}
      />
      {fault ? <span className="text-collision block max-w-48 text-sm font-semibold">{fault}</span> : null}
    </span>
  )
}
