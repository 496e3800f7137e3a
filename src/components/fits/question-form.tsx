'use client'

import { type FormEvent, useState } from 'react'
import { decimalText } from '@/core/units/decimal-text'
import { parseLength } from '@/core/units/parse-length'
import { lengthInputText } from '@/lib/format-length'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { LengthField } from '../ui/length-field'
import { TextField } from '../ui/text-field'
import type { FitsQuestion } from './fits-question'

export interface QuestionFormProps {
  question: FitsQuestion
  /** What the address asks, in millimetres. */
  asked: URLSearchParams
  onAsk: (query: URLSearchParams) => void
}

/** The figures of one question, typed in the person's own unit. */
export function QuestionForm({ question, asked, onAsk }: QuestionFormProps) {
  const { unit, decimalComma } = useShop()
  const [faults, setFaults] = useState<Record<string, string>>({})
  const [isInStock, setIsInStock] = useState(asked.get('inStock') === 'yes')
  const [texts, setTexts] = useState<Record<string, string>>(() =>
    Object.fromEntries(
      question.fields.map(({ name, kind }) => {
        const value = asked.get(name)
        if (value === null || kind === 'text') return [name, value ?? '']
        return [name, lengthInputText(Number(value), unit, { decimalComma })]
      }),
    ),
  )

  function handleSubmit(event: FormEvent) {
    event.preventDefault()
    const query = new URLSearchParams({ from: question.id })
    const found: Record<string, string> = {}
    for (const { name, kind, label, isOptional } of question.fields) {
      const text = (texts[name] ?? '').trim()
      if (text === '') {
        if (!isOptional) found[name] = `Enter ${label.toLowerCase()}.`
      } else if (kind === 'text') {
        query.set(name, text)
      } else {
        const read = parseLength(text, { unit, decimalComma, allowZero: kind === 'lengthOrZero' })
        if (read.ok) query.set(name, decimalText(read.mm, 0, 9))
        else found[name] = read.message
      }
    }
    if (isInStock && question.id === 'pocket') query.set('inStock', 'yes')
    setFaults(found)
    if (Object.keys(found).length === 0) onAsk(query)
  }

  return (
    <form
      onSubmit={handleSubmit}
      noValidate
      className="flex flex-wrap items-start gap-x-4 gap-y-3"
      aria-label={question.label}
    >
      {question.fields.map(({ name, label, kind, hint, isOptional }) => {
        const common = {
          name,
          label,
          hint,
          value: texts[name] ?? '',
          error: faults[name] ?? null,
          isRequired: !isOptional,
          className: 'w-full sm:w-56',
        }
        const setText = (text: string) => setTexts((held) => ({ ...held, [name]: text }))
        return kind === 'text' ? (
          <TextField
            key={name}
            {...common}
            autoComplete="off"
            onChange={(event) => setText(event.target.value)}
          />
        ) : (
          <LengthField
            key={name}
            {...common}
            unit={unit}
            decimalComma={decimalComma}
            allowZero={kind === 'lengthOrZero'}
            onTextChange={setText}
          />
        )
      })}
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 sm:pt-[1.8rem]">
        {question.id === 'pocket' ? (
          <label className="flex min-h-10 items-center gap-2 pointer-coarse:min-h-11">
            <input
              type="checkbox"
              className="accent-accent size-4"
              checked={isInStock}
              onChange={(event) => setIsInStock(event.target.checked)}
            />
            In stock only
          </label>
        ) : null}
        <Button type="submit" variant="primary">
          Find what fits
        </Button>
      </div>
    </form>
  )
}
