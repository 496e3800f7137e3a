'use client'

import { X } from 'lucide-react'
import { parseLength } from '@/core/units/parse-length'
import { formatLength, lengthInputText } from '@/lib/format-length'
import type { FixtureResponse } from '@/schemas/fixture'
import { Button, ButtonLink } from '../ui/button'
import { LengthField } from '../ui/length-field'
import { SelectField } from '../ui/select-field'
import type { DraftManner } from './draft'

export interface StackDraft {
  key: number
  itemId: string
  /** As the set-up had it, where it is no longer offered. */
  code: string | null
  baseText: string
}

export function stackDrafts(
  fixtures: readonly { itemId: string; code: string; baseMm: number }[],
  { unit, decimalComma }: DraftManner,
): StackDraft[] {
  return fixtures.map(({ itemId, code, baseMm }, key) => ({
    key,
    itemId,
    code,
    baseText: lengthInputText(baseMm, unit, { decimalComma }),
  }))
}

export interface StackReading {
  body: { itemId: string; baseMm: number }[]
  faults: Record<string, string>
}

/** Each fixture with the height of what it stands on; left empty, that is the table. */
export function readStack(stack: readonly StackDraft[], { unit, decimalComma }: DraftManner): StackReading {
  const reading: StackReading = { body: [], faults: {} }
  for (const [index, { itemId, baseText }] of stack.entries()) {
    if (itemId === '') reading.faults[`fixtures.${index}.itemId`] = 'Choose a fixture, or remove this row.'
    const read =
      baseText.trim() === ''
        ? { ok: true as const, mm: 0 }
        : parseLength(baseText, { unit, decimalComma, allowZero: true, drillSizes: false })
    if (read.ok) reading.body.push({ itemId, baseMm: read.mm })
    else reading.faults[`fixtures.${index}.baseMm`] = read.message
  }
  return reading
}

export interface FixtureStackProps {
  stack: readonly StackDraft[]
  offered: readonly FixtureResponse[]
  state: { error: Error | undefined; isLoading: boolean }
  manner: DraftManner
  errors: Readonly<Record<string, string>>
  onChange: (stack: StackDraft[]) => void
}

/** The fixtures of the crib that stand on the table, each with what it stands on. */
export function FixtureStack({ stack, offered, state, manner, errors, onChange }: FixtureStackProps) {
  const change = (key: number, values: Partial<StackDraft>) =>
    onChange(stack.map((draft) => (draft.key === key ? { ...draft, ...values } : draft)))
  return (
    <fieldset className="flex flex-col gap-4">
      <legend className="border-ink mb-3 w-full border-b pb-1 text-lg font-semibold">Fixtures</legend>
      {state.error ? <p className="text-collision">{state.error.message}</p> : null}
      {!state.isLoading && !state.error && offered.length === 0 ? (
        <p className="flex flex-wrap items-center gap-3">
          The crib has no fixtures yet.
          <ButtonLink href="/fixtures" size="compact">
            Enter the first
          </ButtonLink>
        </p>
      ) : null}
      {stack.map(({ key, itemId, code, baseText }, index) => (
        <div key={key} className="flex items-end gap-2">
          <SelectField
            className="min-w-0 flex-[2]"
            label="Fixture"
            value={itemId}
            error={errors[`fixtures.${index}.itemId`] ?? errors.fixtures ?? null}
            onChange={(event) => change(key, { itemId: event.target.value })}
            options={[
              { value: '', label: 'Choose one' },
              ...(code !== null && !offered.some(({ id }) => id === itemId)
                ? [{ value: itemId, label: code }]
                : []),
              ...offered.map((fixture) => ({
                value: fixture.id,
                label: `${fixture.code} · ${formatLength(fixture.heightMm, manner.unit)} high`,
              })),
            ]}
          />
          <LengthField
            className="min-w-0 flex-1"
            label="Stands at"
            value={baseText}
            {...manner}
            allowZero
            drillSizes={false}
            error={errors[`fixtures.${index}.baseMm`] ?? null}
            onTextChange={(text) => change(key, { baseText: text })}
          />
          <button
            type="button"
            className="hover:bg-accent-wash grid size-10 shrink-0 place-items-center rounded-[3px] pointer-coarse:size-11"
            aria-label={`Remove fixture ${index + 1}`}
            onClick={() => onChange(stack.filter((draft) => draft.key !== key))}
          >
            <X aria-hidden="true" className="size-4.5" />
          </button>
        </div>
      ))}
      <div>
        <Button
          size="compact"
          onClick={() => onChange([...stack, { ...nextOf(stack, offered, manner), itemId: '', code: null }])}
        >
          Add a fixture
        </Button>
      </div>
    </fieldset>
  )
}

/** A further fixture is taken to stand on the one before it. */
function nextOf(
  stack: readonly StackDraft[],
  offered: readonly FixtureResponse[],
  manner: DraftManner,
): Pick<StackDraft, 'key' | 'baseText'> {
  const key = Math.max(-1, ...stack.map((draft) => draft.key)) + 1
  const last = stack.at(-1)
  const below = offered.find(({ id }) => id === last?.itemId)
  const base = last ? readStack([last], manner).body[0] : undefined
  const topMm = below && base ? base.baseMm + below.heightMm : 0
  return { key, baseText: lengthInputText(topMm, manner.unit, { decimalComma: manner.decimalComma }) }
}
