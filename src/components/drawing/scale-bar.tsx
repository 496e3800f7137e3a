import type { LengthUnit } from '@/core/units/length-unit'
import { mmPerInch } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'
import { draftingFontSize, lineWidths } from './drafting-style'
import { DraftingText } from './drafting-text'

const stepsMm = [0.5, 1, 2, 5, 10, 20, 50, 100, 200]
const stepsIn = [0.02, 0.05, 0.1, 0.25, 0.5, 1, 2, 5, 10]

/** A ruler of one round length: it stays true however the sheet is enlarged, on screen or on paper. */
export function ScaleBar({
  x,
  y,
  pxPerMm,
  unit,
}: {
  x: number
  y: number
  pxPerMm: number
  unit: LengthUnit
}) {
  const steps = unit === 'mm' ? stepsMm : stepsIn.map((step) => step * mmPerInch)
  const lengthMm = steps.findLast((step) => step * pxPerMm <= 110) ?? steps[0] ?? 1
  const width = lengthMm * pxPerMm
  return (
    <g>
      <path
        d={`M${x} ${y - 5}V${y}H${x + width}V${y - 5}M${x + width / 2} ${y - 3}V${y}`}
        fill="none"
        stroke="var(--ink)"
        strokeWidth={lineWidths.thin}
      />
      <DraftingText
        x={x + width + 7}
        y={y + draftingFontSize / 3 - 2}
        anchor="start"
        text={formatLength(lengthMm, unit)}
      />
    </g>
  )
}
