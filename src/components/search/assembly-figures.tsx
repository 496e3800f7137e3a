import type { ReactNode } from 'react'
import { decimalText } from '@/core/units/decimal-text'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'
import { formatMoney } from '@/lib/format-money'
import { formatRpm, formatSpeedRange } from '@/lib/format-speed'
import type { SearchedAssembly } from './listed-assembly'

export interface AssemblyFiguresProps {
  assembly: SearchedAssembly
  /** Of what does not reach nothing is to be set, of what stands ready nothing any more. */
  stickOutLabel: 'Stick-out to set' | 'Stick-out as built' | 'Stick-out as drawn'
  /** What is cut, where it was chosen. */
  material: string | null
  unit: LengthUnit
}

/** The stick-out to set, large enough to be read at arm's length, and the figures beside it. */
export function AssemblyFigures({ assembly, stickOutLabel, material, unit }: AssemblyFiguresProps) {
  const { stickOut, reach, stiffness, speed, cost } = assembly
  return (
    <dl className="flex flex-wrap items-baseline gap-x-6 gap-y-1">
      {stickOutLabel !== 'Stick-out as drawn' ? (
        <div>
          <dt className="text-ink-soft text-sm">{stickOutLabel}</dt>
          <dd className="text-2xl leading-tight font-semibold">{formatLength(stickOut.usedMm, unit)}</dd>
        </div>
      ) : (
        <Figure label={stickOutLabel}>{formatLength(stickOut.usedMm, unit)}</Figure>
      )}
      <Figure label="Gauge length">{formatLength(reach.gaugeLengthMm, unit)}</Figure>
      <Figure label="Bends">
        {decimalText(stiffness.complianceUmPerN, 3, 3)} µm/N
        {stiffness.timesStiffest !== null ? (
          <span className="text-ink-soft">
            {' '}
            · {decimalText(stiffness.timesStiffest, 2, 2)} × the stiffest
          </span>
        ) : null}
      </Figure>
      <Figure label="Stick-out to diameter">{decimalText(stiffness.stickOutToDiameter, 1, 1)}</Figure>
      {speed ? (
        <Figure label="Speed to start from">
          {formatRpm(speed.lowRpm)} to {formatRpm(speed.highRpm)}
          <span className="text-ink-soft">
            {' '}
            · {formatSpeedRange(speed, unit)}
            {speed.limited === 'no' ? '' : ', held to what cutter, holder or spindle allow'}
          </span>
        </Figure>
      ) : material !== null ? (
        <Figure label="Speed to start from">none of the shop’s for this tool in {material}</Figure>
      ) : null}
      {cost ? (
        <Figure label="Cost of its parts">
          {cost.amount === null ? 'not known' : formatMoney(cost.amount, cost.currency)}
        </Figure>
      ) : null}
    </dl>
  )
}

function Figure({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div>
      <dt className="text-ink-soft text-sm">{label}</dt>
      <dd>{children}</dd>
    </div>
  )
}
