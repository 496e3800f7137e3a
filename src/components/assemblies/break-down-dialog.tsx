'use client'

import { type FormEvent, useState } from 'react'
import { conditions } from '@/core/stock/kinds'
import { usePlaces } from '@/hooks/use-places'
import { assemblyPartNames } from '@/lib/assembly-sentences'
import type { AssemblyPart } from '@/schemas/assembly'
import { conditionNames } from '../catalogue/stock-words'
import { useCan, useShop } from '../layout/shop-context'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { placeWords } from './assembly-words'
import { DialogFoot, gloveFormClass } from './dialog-foot'
import { type AssemblyDialogProps, useDialogAct } from './use-dialog-act'

interface PartChoice {
  /** A condition it comes back in, `scrap` or `gone`. */
  outcome: string
  toLocationId: string
}

/** What was new has been used by now; everything else comes back as it went. */
function firstChoice(part: AssemblyPart, isGone: boolean): PartChoice {
  const condition = part.condition === 'new' && part.kind === 'cutter' ? 'used' : (part.condition ?? 'used')
  return { outcome: isGone ? 'gone' : condition, toLocationId: part.home?.locationId ?? '' }
}

/** Every part back to a bin in the condition it is in, or to scrap, all together. */
export function BreakDownDialog(props: AssemblyDialogProps) {
  const { assembly, onClose } = props
  const { actor } = useShop()
  const keepsCrib = useCan('keepCrib')
  const { send, errors, failure, isBusy } = useDialogAct('break-down', props)
  const bins = usePlaces('bin')
  const goneParts = new Set(
    assembly.findings.flatMap(({ detail }) => (detail.code === 'partGone' ? [detail.part] : [])),
  )
  const [choices, setChoices] = useState<Record<string, PartChoice>>({})
  const choiceOf = (part: AssemblyPart) => choices[part.kind] ?? firstChoice(part, goneParts.has(part.kind))
  const change = (part: AssemblyPart, changed: Partial<PartChoice>) =>
    setChoices({ ...choices, [part.kind]: { ...choiceOf(part), ...changed } })
  const isOwn = assembly.place?.locationId === actor.locationId
  const mayScrap = keepsCrib || isOwn

  async function handleSubmit(event: FormEvent) {
    event.preventDefault()
    await send(
      {
        parts: assembly.parts.map((part) => {
          const { outcome, toLocationId } = choiceOf(part)
          return outcome === 'scrap' || outcome === 'gone'
            ? { kind: part.kind, outcome }
            : { kind: part.kind, outcome: 'return', condition: outcome, toLocationId }
        }),
      },
      `Assembly ${assembly.number} is broken down.`,
    )
  }

  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      title={`Break assembly ${assembly.number} down`}
      description="Every part goes back, all together."
    >
      <form noValidate onSubmit={handleSubmit} className={gloveFormClass}>
        {mayScrap ? null : (
          <Notice kind="plain">
            It is not in your hands: take it out first where a part is broken and goes to scrap.
          </Notice>
        )}
        {assembly.parts.map((part, index) => {
          const choice = choiceOf(part)
          const goesToBin = choice.outcome !== 'scrap' && choice.outcome !== 'gone'
          return (
            <fieldset key={part.kind} className="border-hairline grid gap-3 border-t pt-3 sm:grid-cols-2">
              <legend className="float-left font-semibold sm:col-span-2">
                {assemblyPartNames[part.kind]} {part.code}
              </legend>
              <SelectField
                label="What becomes of it"
                className="clear-both"
                value={choice.outcome}
                onChange={(event) => change(part, { outcome: event.target.value })}
                options={[
                  ...conditions.map((name) => ({
                    value: name,
                    label: `Back, ${conditionNames[name].toLowerCase()}`,
                  })),
                  ...(mayScrap ? [{ value: 'scrap', label: 'Broken: scrap' }] : []),
                  ...(goneParts.has(part.kind)
                    ? [{ value: 'gone', label: 'It went before, as the books say' }]
                    : []),
                ]}
                error={errors[`parts.${index}.outcome`]}
              />
              {goesToBin ? (
                <SelectField
                  label="To"
                  value={choice.toLocationId}
                  onChange={(event) => change(part, { toLocationId: event.target.value })}
                  options={binOptions(part, bins.places)}
                  error={errors[`parts.${index}.toLocationId`]}
                />
              ) : null}
            </fieldset>
          )
        })}
        <DialogFoot
          label="Break it down"
          busyLabel="Breaking down …"
          isBusy={isBusy}
          failure={failure}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}

/** Where it came from first, then the bins it lies in, then the rest of the first block of bins. */
function binOptions(
  part: AssemblyPart,
  places: readonly { id: string; code: string; cribCode: string | null }[],
) {
  const options = new Map<string, string>()
  if (part.home) options.set(part.home.locationId, `${placeWords(part.home)}, where it came from`)
  for (const { place } of part.bins)
    if (!options.has(place.locationId)) options.set(place.locationId, placeWords(place))
  for (const { id, code, cribCode } of places) if (!options.has(id)) options.set(id, `${cribCode} ${code}`)
  return [...options].map(([value, label]) => ({ value, label }))
}
