'use client'

import { useId } from 'react'
import type { BallSpeedRequest } from '@/core/ball-end/ball-speed-answer'
import { isBallEnd } from '@/core/ball-end/corner-diameter'
import { formatLength } from '@/lib/format-length'
import { DimensionLine } from '../drawing/dimension-line'
import { lineWidths } from '../drawing/drafting-style'
import { DrawingSheet } from '../drawing/drawing-sheet'
import { HatchPattern } from '../drawing/hatch-pattern'
import { useShop } from '../layout/shop-context'

export interface ScallopDrawingProps {
  request: BallSpeedRequest
  stepoverMm: number
  scallopHeightMm: number
  sentence: string
}

/** How much taller than wide a scallop may be drawn: most are far too low to be seen in proportion. */
const stretches = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000]
const readableHeight = 30
const passes = [-1, 0, 1] as const

/** The surface three passes leave, the scallops stretched upwards by a round number where they are low. */
export function ScallopDrawing({ request, stepoverMm, scallopHeightMm, sentence }: ScallopDrawingProps) {
  const { unit } = useShop()
  const hatchId = useId()
  return (
    <DrawingSheet
      sentence={`Drawing. ${sentence}`}
      unit={unit}
      draw={(width) => {
        const view = layOut(stepoverMm, scallopHeightMm, width)
        return {
          height: view.baseY + 84,
          scaleName: view.stretch === 1 ? 'in proportion' : `heights ${view.stretch} times`,
          body: (
            <>
              <defs>
                <HatchPattern id={hatchId} />
              </defs>
              <path
                d={`${surface(request, stepoverMm, view)}V${view.baseY + 40}H${view.left}Z`}
                fill={`url(#${hatchId})`}
              />
              <path
                d={surface(request, stepoverMm, view)}
                fill="none"
                stroke="var(--ink)"
                strokeWidth={lineWidths.outline}
              />
              <DimensionLine
                from={{ x: view.middle - view.step, y: view.baseY }}
                to={{ x: view.middle, y: view.baseY }}
                axis="horizontal"
                at={view.baseY + 66}
                symbol="ae"
                text={formatLength(stepoverMm, unit, { withUnit: false })}
              />
              <DimensionLine
                from={{ x: view.middle, y: view.baseY }}
                to={{ x: view.middle + view.step / 2, y: view.baseY - view.rise }}
                axis="vertical"
                at={view.right + 18}
                symbol="h"
                text={formatLength(scallopHeightMm, unit, { withUnit: false, extraDecimals: 1 })}
              />
            </>
          ),
        }
      }}
    />
  )
}

interface View {
  left: number
  right: number
  middle: number
  baseY: number
  /** Stepover and scallop height on the sheet, in px. */
  step: number
  rise: number
  pxPerMm: number
  stretch: number
}

function layOut(stepoverMm: number, scallopHeightMm: number, width: number): View {
  const [left, right] = [16, width - 60]
  const step = (right - left) / passes.length
  const pxPerMm = step / stepoverMm
  const flatRise = scallopHeightMm * pxPerMm
  const stretch = stretches.find((factor) => flatRise * factor >= readableHeight) ?? stretches.at(-1) ?? 1
  const rise = flatRise * stretch
  return { left, right, middle: (left + right) / 2, baseY: 70 + rise, step, rise, pxPerMm, stretch }
}

/** One hollow a pass: an arc, which stretched is an ellipse's, with a flat in its middle under a corner radius. */
function surface(request: BallSpeedRequest, stepoverMm: number, view: View): string {
  const radiusMm = request.cuttingDiameterMm / 2
  const cornerMm = request.cornerRadiusMm
  const roundMm = cornerMm == null || isBallEnd(request.cuttingDiameterMm, cornerMm) ? radiusMm : cornerMm
  const flat = Math.min(radiusMm - roundMm, stepoverMm / 2) * view.pxPerMm
  const [rx, ry] = [roundMm * view.pxPerMm, roundMm * view.pxPerMm * view.stretch]
  const crest = view.baseY - view.rise
  const hollows = passes.map((pass) => {
    const x = view.middle + pass * view.step
    return (
      `A${rx} ${ry} 0 0 0 ${x - flat} ${view.baseY}H${x + flat}` +
      `A${rx} ${ry} 0 0 0 ${x + view.step / 2} ${crest}`
    )
  })
  return `M${view.left} ${crest}${hollows.join('')}`
}
