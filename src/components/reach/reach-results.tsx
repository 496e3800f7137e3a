'use client'

import { useState } from 'react'
import type { ToolPart } from '@/core/outline/types'
import type { LengthUnit } from '@/core/units/length-unit'
import { CutSection } from '../cutting/cut-section'
import type { CheckResult } from './compile-check'
import { FirstTouchTable } from './first-touch-table'
import { PrintedInputs, type PrintedInputsProps } from './printed-inputs'
import { ReachCautions } from './reach-cautions'
import { ReachFigures } from './reach-figures'
import { ReachMessages } from './reach-messages'

export interface ReachResultsProps extends PrintedInputsProps {
  result: CheckResult
  unit: LengthUnit
  highlighted: ToolPart | null
  onHighlight: (part: ToolPart | null) => void
  /** The person wants to see this part on the drawing. */
  onShow: () => void
}

/** Every figure of the answer, what is to be known about it, and the cautions, which stand there without one too. */
export function ReachResults(props: ReachResultsProps) {
  const { result, unit, highlighted, onHighlight, onShow, draft, rows, reading } = props
  const [pinned, setPinned] = useState<ToolPart | null>(null)
  const answered = result.state === 'answered' ? result : null
  function handlePin(part: ToolPart) {
    const next = pinned === part ? null : part
    setPinned(next)
    onHighlight(next)
    if (next) onShow()
  }
  return (
    <div className="border-ink bg-sheet flex min-w-0 flex-col gap-5 self-start border p-4 print:**:min-h-0 print:**:py-px print:**:text-[8pt] print:**:leading-tight print:gap-1.5 print:border-t-0 print:p-2">
      {answered ? (
        <>
          <div className="grid gap-x-8 gap-y-5 xl:grid-cols-[minmax(0,1.4fr)_minmax(0,1fr)] print:grid-cols-[1.4fr_1fr] print:gap-x-4 print:gap-y-0">
            <ReachFigures answer={answered.answer} request={answered.request} unit={unit} />
            <FirstTouchTable
              answer={answered.answer}
              unit={unit}
              highlighted={highlighted}
              pinned={pinned}
              onPoint={(part) => onHighlight(part ?? pinned)}
              onPin={handlePin}
            />
          </div>
          <ReachMessages messages={answered.answer.messages} unit={unit} />
          <CutSection
            assembly={{
              // What was picked from the crib knows its flutes and speeds; what was typed by hand does not.
              cutter: {
                ...answered.request.cutter,
                fluteCount: rows.cutter?.fluteCount ?? null,
                maximumRpm: rows.cutter?.maximumRpm ?? null,
              },
              holderMaximumRpm: rows.holder?.maximumRpm ?? null,
              complianceUmPerN: answered.answer.stiffness.complianceUmPerN,
              stickOutToDiameter: answered.answer.stiffness.stickOutToDiameter,
            }}
          />
        </>
      ) : null}
      <PrintedInputs draft={draft} rows={rows} reading={reading} />
      <ReachCautions />
    </div>
  )
}
