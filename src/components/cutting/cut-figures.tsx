'use client'

import { CircleCheck, CircleX, TriangleAlert } from 'lucide-react'
import type { ReactNode } from 'react'
import type { CutAnswer, CuttingSettings } from '@/core/cutting/cut-answer'
import { decimalText } from '@/core/units/decimal-text'
import type { LengthUnit } from '@/core/units/length-unit'
import {
  amount,
  assumptionSentences,
  bandSentence,
  cautionAssumptions,
  driveSentence,
  formatFeed,
  thinningWords,
} from '@/lib/cut-sentences'
import { formatLength } from '@/lib/format-length'
import { formatRpm, formatSpeed } from '@/lib/format-speed'

export interface CutFiguresProps {
  answer: CutAnswer
  stickOutToDiameter: number
  settings: CuttingSettings
  unit: LengthUnit
}

/** Every figure of an estimated cut, its cautions first and what was taken for granted last. */
export function CutFigures(props: CutFiguresProps) {
  const { answer, unit } = props
  const remarks = answer.assumptions.filter((code) => !cautionAssumptions.includes(code))
  return (
    <div className="flex flex-col gap-3">
      <CutMarks {...props} />
      <dl className="border-hairline grid gap-x-8 border-t text-[0.9375rem] sm:grid-cols-2">
        {answer.kind === 'milling' ? (
          <>
            <Figure name="Side load, estimated" value={`${amount(answer.sideLoadN)} N`} />
            <Figure name="Deflection at the tip" value={`${amount(answer.deflectionUm)} µm`} />
          </>
        ) : (
          <Figure name="Thrust, estimated" value={`${amount(answer.thrustN)} N`} />
        )}
        <Figure name="Spindle speed" value={formatRpm(answer.spindleRpm)}>
          {formatSpeed(answer.cuttingSpeedMPerMin, unit)} on {formatLength(answer.diameterMm, unit)}
        </Figure>
        <Figure name="Feed" value={formatFeed(answer.feedMmPerMin, unit)}>
          {answer.kind === 'milling'
            ? `${formatLength(answer.feedPerToothMm, unit, { extraDecimals: 1 })} a tooth${thinningWords(answer.chipThinningFactor)}`
            : null}
        </Figure>
        <Figure name="Power at the cutter" value={`${amount(answer.powerKw)} kW`}>
          {answer.motorPowerKw === null ? null : `${amount(answer.motorPowerKw)} kW of the motor`}
        </Figure>
        <Figure name="Torque" value={`${amount(answer.torqueNm)} Nm`} />
        <Figure
          name="Specific cutting force"
          value={`${decimalText(answer.specificForceNPerMm2, 0, 0)} N/mm²`}
        >
          at a mean chip of {formatLength(answer.chipMm, unit, { extraDecimals: 1 })}
        </Figure>
      </dl>
      <p className="text-ink-soft text-sm">{remarks.map((code) => assumptionSentences[code]).join(' ')}</p>
    </div>
  )
}

/** The cautions of a cut and whether the spindle drives it, each a line with its mark: short enough for a list. */
export function CutMarks({ answer, stickOutToDiameter, settings }: CutFiguresProps) {
  const band = bandSentence(answer.stickOutBand, stickOutToDiameter, settings)
  const drive = driveSentence(answer)
  const cautions = answer.assumptions.filter((code) => cautionAssumptions.includes(code))
  if (band === null && drive === null && cautions.length === 0) return null
  return (
    <ul className="flex flex-col gap-1">
      {drive === null ? null : <Mark kind={answer.drive?.drives ? 'holds' : 'collision'}>{drive}</Mark>}
      {band === null ? null : (
        <Mark kind={answer.stickOutBand === 'over' ? 'collision' : 'caution'}>{band}</Mark>
      )}
      {cautions.map((code) => (
        <Mark key={code} kind="caution">
          {assumptionSentences[code]}
        </Mark>
      ))}
    </ul>
  )
}

const marks = {
  holds: { colour: 'text-holds', Sign: CircleCheck },
  caution: { colour: 'text-caution', Sign: TriangleAlert },
  collision: { colour: 'text-collision', Sign: CircleX },
} as const

function Mark({ kind, children }: { kind: keyof typeof marks; children: ReactNode }) {
  const { colour, Sign } = marks[kind]
  return (
    <li className="flex gap-2">
      <Sign aria-hidden="true" className={`mt-0.5 size-5 shrink-0 ${colour}`} />
      <span>{children}</span>
    </li>
  )
}

function Figure({ name, value, children }: { name: string; value: string; children?: ReactNode }) {
  return (
    <div className="border-hairline flex flex-wrap items-baseline justify-between gap-x-4 border-b py-1">
      <dt className="text-ink-soft">{name}</dt>
      <dd className="text-right">
        <span className="font-semibold">{value}</span>
        {children ? <span className="text-ink-soft block text-sm">{children}</span> : null}
      </dd>
    </div>
  )
}
