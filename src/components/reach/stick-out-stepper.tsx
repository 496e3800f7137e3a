'use client'

import { Minus, Plus } from 'lucide-react'
import type { StickOutAnswer } from '@/core/reach/types'
import { sentenceLength } from '@/lib/reach-sentences'
import { Button } from '../ui/button'
import { snapped } from './drag-handle'
import { ReachFieldInput } from './reach-field-input'
import type { InputsProps } from './reach-inputs'

export interface StickOutStepperProps extends InputsProps {
  texts: Readonly<Record<string, string>>
  /** null while there is no answer. */
  stickOut: StickOutAnswer | null
  overallMm: number | null
  stepMm: number
  onStickOut: (mm: number) => void
}

/** The stick-out at the machine: two wide buttons for gloves, the figure between them, and the one that is needed. */
export function StickOutStepper(props: StickOutStepperProps) {
  const { stickOut, overallMm, stepMm, onStickOut, onChange, reading, texts } = props
  const usedMm = stickOut?.usedMm ?? null
  const isGiven = (texts.stickOutMm ?? '').trim() !== ''
  const step = (by: number) => {
    if (usedMm === null) return
    // From between two steps the next one in that direction is meant.
    const next = by > 0 ? Math.floor(usedMm / stepMm + 1e-9) + 1 : Math.ceil(usedMm / stepMm - 1e-9) - 1
    onStickOut(snapped(next * stepMm, stepMm, stepMm, overallMm ?? next * stepMm))
  }
  const required = stickOut?.requiredMm ?? null
  return (
    <div className="border-hairline flex flex-wrap items-end gap-x-3 gap-y-2 border-t px-4 py-3 print:hidden">
      <div className="flex items-end gap-2">
        <Button
          size="counter"
          className="w-16 px-0!"
          aria-label={`Stick-out shorter by ${sentenceLength(stepMm, reading.unit)}`}
          disabled={usedMm === null}
          onClick={() => step(-1)}
        >
          <Minus aria-hidden="true" className="size-7" />
        </Button>
        <ReachFieldInput
          {...props}
          group="check"
          name="stickOutMm"
          className="w-36"
          {...(usedMm === null ? {} : { placeholder: sentenceLength(usedMm, reading.unit) })}
        />
        <Button
          size="counter"
          className="w-16 px-0!"
          aria-label={`Stick-out longer by ${sentenceLength(stepMm, reading.unit)}`}
          disabled={usedMm === null}
          onClick={() => step(1)}
        >
          <Plus aria-hidden="true" className="size-7" />
        </Button>
      </div>
      {isGiven ? (
        <Button
          variant="quiet"
          className="min-h-16!"
          onClick={() => onChange({ type: 'forget', group: 'check', name: 'stickOutMm' })}
        >
          {required === null
            ? 'Clear the stick-out'
            : `Use what is needed, ${sentenceLength(required, reading.unit)}`}
        </Button>
      ) : (
        <p className="text-ink-soft max-w-[26ch] pb-2 text-sm">
          {stickOut === null
            ? 'The stick-out follows from the check, or give your own.'
            : required === null
              ? 'No stick-out does it; shown at the longest allowed.'
              : 'Shown at the stick-out it needs. Drag the nose, or give your own.'}
        </p>
      )}
    </div>
  )
}
