'use client'

import type { ReactNode } from 'react'
import type { ReachAnswer, ReachRequest } from '@/core/reach/types'
import { decimalText } from '@/core/units/decimal-text'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'
import { lowerBoundNames, upperBoundNames } from '@/lib/reach-sentences'

export interface ReachFiguresProps {
  answer: ReachAnswer
  request: ReachRequest
  unit: LengthUnit
}

/** Every figure of the answer in the order it is asked for: the bounds and which binds, then the rest. */
export function ReachFigures({ answer, request, unit }: ReachFiguresProps) {
  const said = (mm: number) => formatLength(mm, unit)
  const { stickOut, stiffness } = answer
  const holdsMm = request.cutter.overallLengthMm - stickOut.usedMm
  const isFromTool = request.stickOutMm == null
  return (
    <section aria-labelledby="reach-figures" className="flex flex-col gap-2 print:gap-0">
      <h2 id="reach-figures" className="text-lg">
        Figures
      </h2>
      <dl className="border-hairline grid grid-cols-[auto_1fr] border-t text-[0.9375rem]">
        <Figure
          name="Stick-out needed"
          value={stickOut.requiredMm === null ? 'none does it' : said(stickOut.requiredMm)}
        >
          rounded up to {said(request.settings.stickOutStepMm)}
        </Figure>
        <Figure name="At least" value={said(stickOut.minimumMm)}>
          {lowerBoundNames[stickOut.boundBy]}
        </Figure>
        <Figure name="At most" value={said(stickOut.maximumMm)}>
          {upperBoundNames[stickOut.upperBoundBy]}
        </Figure>
        <Figure name="Shown at" value={said(stickOut.usedMm)}>
          {isFromTool
            ? stickOut.requiredMm === null
              ? 'the longest allowed'
              : 'what is needed'
            : 'as given'}
        </Figure>
        <Figure name="Gauge length" value={said(answer.gaugeLengthMm)}>
          gauge line to tip
        </Figure>
        <Figure name="Grip" value={said(Math.max(0, holdsMm))}>
          of shank behind the nose; at least {said(stickOut.gripMm)}
        </Figure>
        <Figure name="Reach" value={answer.reachMm === null ? 'no limit' : said(answer.reachMm)}>
          at best {answer.reachAtBestMm === null ? 'no limit' : said(answer.reachAtBestMm)}, at the longest
          stick-out
        </Figure>
        <Figure name="One axial step" value={said(answer.maximumAxialStepMm)}>
          at most
        </Figure>
        <Figure name="Stiffness" value={`${decimalText(stiffness.complianceUmPerN, 3, 3)} µm/N`}>
          at the tip, sideways; stick-out {decimalText(stiffness.stickOutToDiameter, 1, 1)} × diameter
        </Figure>
        {stiffness.deflectionUm === null ? null : (
          <Figure name="Deflection" value={`${decimalText(stiffness.deflectionUm, 1, 1)} µm`}>
            under {decimalText(request.sideLoadN ?? 0, 0, 1)} N
          </Figure>
        )}
        {answer.uncutAtFootMm ? (
          <Figure name="Left at the foot" value={said(answer.uncutAtFootMm)}>
            the taper can’t reach it
          </Figure>
        ) : null}
      </dl>
    </section>
  )
}

function Figure({ name, value, children }: { name: string; value: string; children: ReactNode }) {
  return (
    <div className="border-hairline col-span-2 grid grid-cols-subgrid items-baseline gap-x-4 border-b py-1">
      <dt className="text-ink-soft">{name}</dt>
      <dd className="flex flex-wrap items-baseline justify-between gap-x-3">
        <span className="font-semibold">{value}</span>
        <span className="text-ink-soft text-sm">{children}</span>
      </dd>
    </div>
  )
}
