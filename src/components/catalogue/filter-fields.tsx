'use client'

import { type FocusEvent, useEffect, useId, useRef, useState } from 'react'
import { useShop } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { controlClass } from '@/components/ui/field'
import type { SelectOption } from '@/components/ui/select-field'
import type { CatalogueKind } from '@/core/stock/kinds'
import { parseLength } from '@/core/units/parse-length'
import { useCatalogueCounts } from '@/hooks/use-catalogue-counts'
import { lengthInputText } from '@/lib/format-length'
import type { CatalogueCounts } from '@/schemas/catalogue-counts'
import type { CatalogueFilter } from './catalogue-filter'
import { useDelayed } from './use-delayed'

type Choices = CatalogueCounts[string]

export interface FilterFieldsProps {
  kind: CatalogueKind
  /** The search and the filters as the API takes them: what is counted within. */
  narrowing: string
  filters: readonly CatalogueFilter[]
  values: Readonly<Record<string, string>>
  onChange: (values: Record<string, string>) => void
  /** In one line over the list, or one under the other in a drawer. */
  shape: 'row' | 'column'
}

/** The ways to narrow a list; each change takes hold as soon as it can be read. */
export function FilterFields({ kind, narrowing, filters, values, onChange, shape }: FilterFieldsProps) {
  const [isMoreShown, setIsMoreShown] = useState(false)
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
  const isInUse = ({ name }: CatalogueFilter) =>
    [name, `${name}.min`, `${name}.max`].some((param) => values[param] !== undefined)
  const shown = filters.filter(
    (filter) => shape === 'column' || isMoreShown || !filter.isMore || isInUse(filter),
  )
  const hasMore = shape === 'row' && filters.some((filter) => filter.isMore && !isInUse(filter))
  return (
    <>
      {shown.map((filter) => (
        <FilterBox
          key={filter.name}
          {...{ kind, narrowing, filter, values }}
          isCountedAtOnce={shape === 'column' && filter.kind !== 'lengthRange'}
          onSet={handleSet}
          className={boxClass}
        />
      ))}
      {hasMore ? (
        <Button
          variant="quiet"
          size="compact"
          className="self-end"
          aria-expanded={isMoreShown}
          onClick={() => setIsMoreShown(!isMoreShown)}
        >
          {isMoreShown ? 'Fewer filters' : 'More filters'}
        </Button>
      ) : null}
    </>
  )
}

interface FilterBoxProps {
  kind: CatalogueKind
  narrowing: string
  filter: CatalogueFilter
  values: Readonly<Record<string, string>>
  /** Else once a hand or the keyboard comes near. */
  isCountedAtOnce: boolean
  onSet: (name: string, value: string) => void
  className: string
}

function FilterBox(props: FilterBoxProps) {
  const { kind, narrowing, filter, values, onSet, className } = props
  const id = useId()
  const [isNear, setIsNear] = useState(props.isCountedAtOnce)
  const value = values[filter.name] ?? ''
  // A place or a crib from the address has no name but the one that comes with its count.
  const isNamedByCounts = filter.kind === 'counted' && value !== ''
  const isCountable =
    filter.kind === 'lengthRange' ? !filter.isWorkedOut : filter.kind !== 'choice' || !filter.isUncounted
  const isWanted = isCountable && (isNear || isNamedByCounts)
  const counts = useCatalogueCounts(kind, narrowing, filter.name, isWanted)
  const nearing = { onPointerEnter: () => setIsNear(true), onFocus: () => setIsNear(true) }
  if (filter.kind === 'lengthRange')
    return <LengthRange {...{ values, onSet, className, nearing }} filter={filter} offered={counts} />
  return (
    <div className={`flex flex-col text-sm ${className}`} {...nearing}>
      <label htmlFor={id} className="text-ink-soft">
        {filter.label}
      </label>
      {filter.kind === 'text' ? (
        <TextFilter id={id} name={filter.name} value={value} onSet={onSet} offered={counts} />
      ) : (
        <select
          id={id}
          className={`${filterClass} pr-7`}
          value={value}
          onChange={(event) => onSet(filter.name, event.target.value)}
        >
          <option value="">{filter.anyLabel}</option>
          {choicesOf(filter, counts, value).map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </div>
  )
}

/** The choices with how many rows each would leave, where that is known. */
function choicesOf(
  filter: Extract<CatalogueFilter, { kind: 'choice' | 'counted' }>,
  counts: Choices | undefined,
  chosen: string,
): SelectOption[] {
  if (filter.kind === 'choice') {
    return filter.options.map(({ value, label }) => {
      const count = counts?.find((choice) => choice.value === value)?.count ?? 0
      return { value, label: counts ? `${label} (${count.toLocaleString('en')})` : label }
    })
  }
  const options = (counts ?? []).map(({ value, label, count }) => ({
    value,
    label: `${label ?? value} (${count.toLocaleString('en')})`,
  }))
  const isListed = chosen === '' || options.some((option) => option.value === chosen)
  return isListed ? options : [{ value: chosen, label: filter.unknownLabel }, ...options]
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
  offered,
}: {
  id: string
  name: string
  value: string
  onSet: FilterBoxProps['onSet']
  offered: Choices | undefined
}) {
  const typed = useTyped(value, (text) => {
    typed.setSent(text.trim())
    onSet(name, text.trim())
  })
  return (
    <>
      <input
        id={id}
        list={offered ? `${id}-offered` : undefined}
        type="text"
        className={`${filterClass} sm:w-36`}
        maxLength={200}
        {...typed.props}
      />
      {offered ? (
        <datalist id={`${id}-offered`}>
          {offered.map((choice) => (
            <option
              key={choice.value}
              value={choice.value}
              label={`${choice.value} (${choice.count.toLocaleString('en')})`}
            />
          ))}
        </datalist>
      ) : null}
    </>
  )
}

function LengthRange({
  filter,
  values,
  onSet,
  className,
  nearing,
  offered,
}: Pick<FilterBoxProps, 'values' | 'onSet' | 'className'> & {
  filter: Extract<CatalogueFilter, { kind: 'lengthRange' }>
  nearing: { onPointerEnter: () => void; onFocus: (event: FocusEvent) => void }
  offered: Choices | undefined
}) {
  const { unit, decimalComma } = useShop()
  const listId = useId()
  return (
    <fieldset className={`flex flex-col text-sm ${className}`} {...nearing}>
      <legend className="text-ink-soft float-left">
        {filter.label}, {unit}
      </legend>
      <span className="flex items-start gap-1.5">
        <LengthBound
          name={`${filter.name}.min`}
          label={`${filter.label} from`}
          words="from"
          {...{ values, onSet, listId }}
        />
        <LengthBound
          name={`${filter.name}.max`}
          label={`${filter.label} to`}
          words="to"
          {...{ values, onSet, listId }}
        />
      </span>
      <datalist id={listId}>
        {(offered ?? []).map((choice) => {
          const text = lengthInputText(Number(choice.value), unit, { decimalComma })
          return (
            <option
              key={choice.value}
              value={text}
              label={`${text} (${choice.count.toLocaleString('en')})`}
            />
          )
        })}
      </datalist>
    </fieldset>
  )
}

function LengthBound({
  name,
  label,
  words,
  values,
  onSet,
  listId,
}: Pick<FilterBoxProps, 'values' | 'onSet'> & {
  name: string
  label: string
  words: string
  listId: string
}) {
  const { unit, decimalComma } = useShop()
  const faultId = useId()
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
    <span className="relative flex-1 sm:w-24 sm:flex-none">
      <input
        type="text"
        list={listId}
        aria-label={label}
        placeholder={words}
        aria-invalid={fault ? true : undefined}
        aria-describedby={fault ? faultId : undefined}
        className={filterClass}
        {...typed.props}
      />
      {fault ? (
        // Laid over a list, which would else move down under the pointer.
        <span
          id={faultId}
          className="text-collision bg-sheet sm:border-collision block text-sm font-semibold sm:absolute sm:top-full sm:z-20 sm:mt-1 sm:w-max sm:max-w-64 sm:border sm:px-2 sm:py-1"
        >
          {fault}
        </span>
      ) : null}
    </span>
  )
}
