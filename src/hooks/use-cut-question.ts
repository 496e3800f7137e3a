'use client'

import { useMemo, useState } from 'react'
import type { LengthUnit } from '@/core/units/length-unit'
import { blankCut, type CutDraft, type CutReading, readCutDraft } from '@/lib/cut-draft'
import type { MachineResponse } from '@/schemas/machine'
import { useMachines } from './use-machines'

export interface CutQuestionState extends CutReading {
  draft: CutDraft
  machines: readonly MachineResponse[]
  type: (change: Partial<CutDraft>) => void
}

/** The cut asked about; one question serves every assembly it is asked of. */
export function useCutQuestion(manner: { unit: LengthUnit; decimalComma: boolean }): CutQuestionState {
  const { unit, decimalComma } = manner
  const { rows: machines } = useMachines()
  const [draft, setDraft] = useState(blankCut)
  const reading = useMemo(
    () => readCutDraft(draft, { unit, decimalComma }, machines),
    [draft, unit, decimalComma, machines],
  )
  return { ...reading, draft, machines, type: (change) => setDraft((held) => ({ ...held, ...change })) }
}
