'use client'

import { type FormEvent, useState } from 'react'
import { CoreInputError } from '@/core/core-input-error'
import { setUpWindow } from '@/core/machine/set-up-window'
import { useFixtures } from '@/hooks/use-fixtures'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { windowSentences } from '@/lib/machine-sentences'
import type { MachineResponse } from '@/schemas/machine'
import type { SetUpResponse } from '@/schemas/set-up'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { useAttempt } from '../ui/use-attempt'
import { type DraftField, type DraftTexts, draftTexts, readDraft } from './draft'
import { DraftFieldInput } from './draft-field-input'
import { FixtureStack, readStack, stackDrafts } from './fixture-stack'
import { noteField, rotaryFields, setUpFields } from './set-up-fields'

export interface SetUpDialogProps {
  machine: MachineResponse
  /** Null for a new one. */
  setUp: SetUpResponse | null
  onClose: () => void
  /** Null: it was removed. */
  onSaved: (setUp: SetUpResponse | null) => void
}

/** A set-up entered or changed; what it lets into the spindle is said while it is typed. */
export function SetUpDialog({ machine, setUp, onClose, onSaved }: SetUpDialogProps) {
  const { unit, decimalComma } = useShop()
  const manner = { unit, decimalComma }
  const fields = [...setUpFields, noteField]
  const [texts, setTexts] = useState(() => draftTexts(fields, setUp ?? { retractClearanceMm: 25 }, manner))
  const [rotaryTexts, setRotaryTexts] = useState<DraftTexts | null>(() =>
    setUp?.rotaryStock ? draftTexts(rotaryFields, setUp.rotaryStock, manner) : null,
  )
  const [stack, setStack] = useState(() => stackDrafts(setUp?.fixtures ?? [], manner))
  const fixtures = useFixtures()
  const [isChecked, setIsChecked] = useState(false)
  const { fault, isBusy, attempt } = useAttempt()

  const reading = readDraft(fields, texts, manner)
  const rotary = rotaryTexts ? readDraft(rotaryFields, rotaryTexts, manner) : null
  const standing = readStack(stack, manner)
  const unread = {
    ...reading.faults,
    ...Object.fromEntries(
      Object.entries(rotary?.faults ?? {}).map(([name, message]) => [`rotaryStock.${name}`, message]),
    ),
    ...standing.faults,
  }
  const errors = { ...fieldFaults(fault), ...(isChecked ? unread : {}) }
  const body = {
    ...reading.body,
    rotaryStock: rotary?.body ?? null,
    fixtures: standing.body,
  }

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    setIsChecked(true)
    if (Object.keys(unread).length > 0) return
    void attempt(async () => {
      onSaved(
        setUp
          ? await callApi<SetUpResponse>('PATCH', `/api/set-ups/${setUp.id}`, {
              body: { ...body, version: setUp.version },
            })
          : await callApi<SetUpResponse>('POST', '/api/set-ups', {
              body: { ...body, machineId: machine.id },
            }),
      )
    })
  }

  const input = (field: DraftField) => (
    <DraftFieldInput
      key={field.name}
      field={field}
      text={texts[field.name] ?? ''}
      manner={manner}
      error={errors[field.name]}
      onTextChange={(text) => setTexts((held) => ({ ...held, [field.name]: text }))}
    />
  )

  return (
    <Dialog
      isOpen
      onOpenChange={onClose}
      title={setUp ? `Change ${setUp.name}` : `A set-up on ${machine.code}`}
      shape="side"
    >
      <form onSubmit={handleSubmit} noValidate className="flex flex-col gap-7">
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault)}
          </Notice>
        ) : null}
        <div className="grid items-start gap-4 sm:grid-cols-2">{setUpFields.map(input)}</div>
        <FixtureStack
          stack={stack}
          offered={fixtures.rows}
          state={fixtures}
          manner={manner}
          errors={errors}
          onChange={setStack}
        />
        <RotaryFields texts={rotaryTexts} errors={errors} manner={manner} onChange={setRotaryTexts} />
        {input(noteField)}
        {Object.keys(unread).length === 0 ? (
          <Preview
            sentences={attemptedSentences(() =>
              windowSentences(
                setUpWindow(machine, {
                  ...(reading.body as { highestMm: number; lowestTipMm: number; retractClearanceMm: number }),
                  rotaryStock: rotary
                    ? (rotary.body as { widthMm: number; heightMm: number; axisHeightMm: number })
                    : null,
                  fixtures: standing.body.map(({ itemId, baseMm }) => ({
                    baseMm,
                    heightMm: heightOf(itemId, fixtures.rows, setUp),
                  })),
                }),
                unit,
              ),
            )}
          />
        ) : null}
        <div className="bg-sheet border-hairline sticky bottom-0 -mx-5 flex flex-wrap gap-3 border-t px-5 py-3">
          <Button type="submit" variant="primary" disabled={isBusy}>
            {isBusy ? 'Saving …' : 'Save'}
          </Button>
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
          {setUp ? (
            <Button
              variant="danger"
              disabled={isBusy}
              className="ml-auto"
              onClick={() =>
                void attempt(async () => {
                  await callApi('DELETE', `/api/set-ups/${setUp.id}`)
                  onSaved(null)
                })
              }
            >
              Remove
            </Button>
          ) : null}
        </div>
      </form>
    </Dialog>
  )
}

function heightOf(
  itemId: string,
  offered: readonly { id: string; heightMm: number }[],
  setUp: SetUpResponse | null,
): number {
  const found = offered.find(({ id }) => id === itemId)?.heightMm
  return found ?? setUp?.fixtures.find((fixture) => fixture.itemId === itemId)?.heightMm ?? 0
}

/** What the core refuses is a sentence too. */
function attemptedSentences(work: () => string[]): string[] {
  try {
    return work()
  } catch (error) {
    if (error instanceof CoreInputError) return [error.message]
    throw error
  }
}

function Preview({ sentences }: { sentences: readonly string[] }) {
  return (
    <p className="bg-well px-3 py-2" aria-live="polite">
      {sentences.join(' ')}
    </p>
  )
}

function RotaryFields({
  texts,
  errors,
  manner,
  onChange,
}: {
  texts: DraftTexts | null
  errors: Readonly<Record<string, string>>
  manner: { unit: 'mm' | 'in'; decimalComma: boolean }
  onChange: (texts: DraftTexts | null) => void
}) {
  return (
    <fieldset className="flex flex-col gap-4">
      <legend className="border-ink mb-3 w-full border-b pb-1 text-lg font-semibold">Rotary stock</legend>
      <label className="flex min-h-11 items-center gap-2.5 text-[0.9375rem]">
        <input
          type="checkbox"
          className="accent-accent size-5"
          checked={texts !== null}
          onChange={(event) => onChange(event.target.checked ? {} : null)}
        />
        The part turns in a rotary axis
      </label>
      {texts ? (
        <div className="grid items-start gap-4 sm:grid-cols-2">
          {rotaryFields.map((field) => (
            <DraftFieldInput
              key={field.name}
              field={field}
              text={texts[field.name] ?? ''}
              manner={manner}
              error={errors[`rotaryStock.${field.name}`]}
              onTextChange={(text) => onChange({ ...texts, [field.name]: text })}
            />
          ))}
        </div>
      ) : null}
    </fieldset>
  )
}
