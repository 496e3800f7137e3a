import type { BallSpeedAnswer, BallSpeedRequest } from '@/core/ball-end/ball-speed-answer'
import { decimalText } from '@/core/units/decimal-text'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import { formatRpm, formatSpeed } from '@/lib/format-speed'

interface Figure {
  name: string
  symbol?: string
  value: string
  note?: string
}

/** Every figure of the answer, as a plain list. */
export function SpeedFigures({
  request,
  answer,
  unit,
}: {
  request: BallSpeedRequest
  answer: BallSpeedAnswer
  unit: LengthUnit
}) {
  return (
    <dl className="grid content-start gap-x-8 sm:grid-cols-2 lg:col-start-2">
      {figuresOf(request, answer, unit).map(({ name, symbol, value, note }) => (
        <div key={name} className="border-hairline flex flex-wrap items-baseline gap-x-2 border-b py-1.5">
          <dt>
            {name}
            {symbol ? <span className="text-ink-soft"> {symbol}</span> : null}
          </dt>
          <dd className="ml-auto text-right">
            <span className="font-semibold">{value}</span>
            {note ? <span className="text-ink-soft block text-sm">{note}</span> : null}
          </dd>
        </div>
      ))}
    </dl>
  )
}

function figuresOf(request: BallSpeedRequest, answer: BallSpeedAnswer, unit: LengthUnit): Figure[] {
  const { effectiveDiameterMm, speedMPerMin, tiltToClearTipDeg, scallopHeightMm, chipThinningFactor } = answer
  const figures: (Figure | null)[] = [
    {
      name: 'Largest effective diameter',
      symbol: 'Deff',
      value: formatLength(effectiveDiameterMm.largest, unit),
    },
    {
      name: 'Smallest effective diameter',
      value: answer.tipInCut ? '0' : formatLength(effectiveDiameterMm.smallest, unit),
      ...(answer.tipInCut ? { note: 'the dead tip is in the cut' } : {}),
    },
    speedMPerMin && {
      name: 'Largest cutting speed',
      symbol: 'vc',
      value: formatSpeed(speedMPerMin.largest, unit),
    },
    speedMPerMin && { name: 'Smallest cutting speed', value: formatSpeed(speedMPerMin.smallest, unit) },
    answer.spindleRpm === null
      ? null
      : {
          name: 'Spindle speed',
          symbol: 'n',
          value: formatRpm(answer.spindleRpm),
          ...(answer.spindleLimited ? { note: 'held to the limit' } : {}),
        },
    { name: 'Axis to surface normal', symbol: 'β', value: formatAngle(answer.tiltDeg) },
    tiltToClearTipDeg === null
      ? null
      : {
          name: 'Tilt that clears the tip',
          symbol: 'ψ',
          value: tiltToClearTipDeg >= 90 ? 'none' : `more than ${formatAngle(tiltToClearTipDeg)}`,
        },
    request.stepoverMm == null
      ? null
      : {
          name: 'Stepover',
          symbol: 'ae',
          value: formatLength(request.stepoverMm, unit, { extraDecimals: 1 }),
        },
    scallopHeightMm === null
      ? null
      : {
          name: 'Scallop height',
          symbol: 'h',
          value: formatLength(scallopHeightMm, unit, { extraDecimals: 1 }),
          note: 'on a flat surface',
        },
    chipThinningFactor === null
      ? null
      : {
          name: 'Radial chip thinning',
          symbol: 'fz/hex',
          value: `${decimalText(chipThinningFactor, 2, 2)} times`,
          note: 'feed a tooth for the same largest chip, on Deff',
        },
  ]
  return figures.filter((figure) => figure !== null)
}
