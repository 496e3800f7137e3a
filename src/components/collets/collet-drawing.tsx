'use client'

import { useId } from 'react'
import { ChainLine } from '@/components/drawing/chain-line'
import { DimensionLine } from '@/components/drawing/dimension-line'
import { dimensionRoom, hiddenDashes, lineWidths } from '@/components/drawing/drafting-style'
import { drawingScale } from '@/components/drawing/drawing-scale'
import { DrawingSheet, type SheetContent } from '@/components/drawing/drawing-sheet'
import { HatchPattern } from '@/components/drawing/hatch-pattern'
import { ScaleBar } from '@/components/drawing/scale-bar'
import { useShop } from '@/components/layout/shop-context'
import type { ColletGeometry } from '@/core/tooling'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'

export interface ColletDrawingProps {
  code: string
  collet: ColletGeometry
}

/** The collet cut along its axis: its bore at the largest shank, dashed at the smallest. Its outside is only a sign. */
export function ColletDrawing({ code, collet }: ColletDrawingProps) {
  const { unit } = useShop()
  const hatchId = useId()
  return (
    <DrawingSheet
      code={code}
      unit={unit}
      sentence={colletSentence(collet, unit)}
      note={collet.lengthMm ? 'Outside drawn as a sign' : 'Length and outside drawn as a sign'}
      draw={(width) => drawCollet(collet, unit, width, hatchId)}
    />
  )
}

function colletSentence(collet: ColletGeometry, unit: LengthUnit): string {
  const length = (mm: number) => formatLength(mm, unit)
  const long = collet.lengthMm ? `, ${length(collet.lengthMm)} long` : ''
  const grip = collet.minimumGripMm ? `, minimum clamping length ${length(collet.minimumGripMm)}` : ''
  return `Drawing: collet of series ${collet.series} for shanks from ${length(collet.minimumMm)} to ${length(collet.maximumMm)}${long}${grip}.`
}

/** Shares of the length and multiples of the bore that make the sign read as a collet. */
const sign = { lengthToBore: 2.2, bodyToBore: 1.75, noseToBore: 1.5, noseShare: 0.16, backToBore: 1.35 }
const tallestDrawing = 170

function drawCollet(collet: ColletGeometry, unit: LengthUnit, width: number, hatchId: string): SheetContent {
  const lengthMm = collet.lengthMm ?? collet.maximumMm * sign.lengthToBore
  const [left, right] = [64, 64]
  const { pxPerMm, name } = drawingScale(
    { widthMm: lengthMm, heightMm: collet.maximumMm * sign.bodyToBore },
    { width: Math.min(width, 760) - left - right, height: tallestDrawing },
  )
  const lengthPx = lengthMm * pxPerMm
  const noseX = (width + lengthPx) / 2
  const backX = noseX - lengthPx
  const bodyPx = (collet.maximumMm * sign.bodyToBore * pxPerMm) / 2
  const [smallPx, largePx] = [collet.minimumMm, collet.maximumMm].map((mm) => (mm * pxPerMm) / 2)
  const figure = (mm: number) => `⌀${formatLength(mm, unit, { withUnit: false })}`
  const axisY = Math.max(
    bodyPx + 34,
    dimensionRoom(2 * (smallPx ?? 0), `min ${figure(collet.minimumMm)}`) + 8,
    dimensionRoom(2 * (largePx ?? 0), `max ${figure(collet.maximumMm)}`) + 8,
  )
  const hasLength = collet.lengthMm != null
  const hasGrip = collet.minimumGripMm != null
  const firstY = axisY + bodyPx + 24
  const height = firstY + (hasLength ? 26 : 0) + (hasGrip ? 26 : 0) + 26
  const outside = colletSide(noseX, backX, axisY, collet.maximumMm * pxPerMm)
  return {
    height,
    scaleName: name,
    body: (
      <>
        <defs>
          <HatchPattern id={hatchId} spacing={7} />
        </defs>
        <path
          d={outside}
          fill={`url(#${hatchId})`}
          stroke="var(--ink)"
          strokeWidth={lineWidths.thin}
          strokeLinejoin="round"
        />
        <Bore {...{ noseX, backX, axisY }} radius={largePx ?? 0} />
        <Bore {...{ noseX, backX, axisY }} radius={smallPx ?? 0} isDashed />
        <ChainLine from={{ x: backX - 18, y: axisY }} to={{ x: noseX + 18, y: axisY }} />
        <DimensionLine
          axis="vertical"
          from={{ x: noseX, y: axisY - (largePx ?? 0) }}
          to={{ x: noseX, y: axisY + (largePx ?? 0) }}
          at={noseX + 40}
          text={figure(collet.maximumMm)}
          symbol="max"
        />
        <DimensionLine
          axis="vertical"
          from={{ x: backX, y: axisY - (smallPx ?? 0) }}
          to={{ x: backX, y: axisY + (smallPx ?? 0) }}
          at={backX - 34}
          text={figure(collet.minimumMm)}
          symbol="min"
        />
        {collet.minimumGripMm != null ? (
          <DimensionLine
            axis="horizontal"
            from={{ x: noseX, y: axisY + bodyPx * 0.86 }}
            to={{ x: noseX - collet.minimumGripMm * pxPerMm, y: axisY + bodyPx }}
            at={firstY}
            text={formatLength(collet.minimumGripMm, unit, { withUnit: false })}
            symbol="LSCN"
            overflow="start"
          />
        ) : null}
        {hasLength ? (
          <DimensionLine
            axis="horizontal"
            from={{ x: noseX, y: axisY + bodyPx * 0.86 }}
            to={{ x: backX, y: axisY + bodyPx * 0.78 }}
            at={firstY + (hasGrip ? 26 : 0)}
            text={formatLength(lengthMm, unit, { withUnit: false })}
          />
        ) : null}
        <ScaleBar x={14} y={height - 12} pxPerMm={pxPerMm} unit={unit} />
      </>
    ),
  }
}

/** Nose cone, groove, long cone: the outline of a spring collet, as wide as its bore asks. */
function colletSide(noseX: number, backX: number, axisY: number, borePx: number): string {
  const at = (share: number) => noseX - (noseX - backX) * share
  const nose = (borePx * sign.noseToBore) / 2
  const body = (borePx * sign.bodyToBore) / 2
  const back = (borePx * sign.backToBore) / 2
  const top: [number, number][] = [
    [at(0), nose],
    [at(sign.noseShare), body],
    [at(sign.noseShare), body * 0.86],
    [at(sign.noseShare * 1.5), body * 0.86],
    [at(sign.noseShare * 1.5), body],
    [at(1), back],
  ]
  const points = [
    ...top.map(([x, radius]) => `${x} ${axisY - radius}`),
    ...top.toReversed().map(([x, radius]) => `${x} ${axisY + radius}`),
  ]
  return `M${points.join('L')}Z`
}

function Bore({
  noseX,
  backX,
  axisY,
  radius,
  isDashed,
}: {
  noseX: number
  backX: number
  axisY: number
  radius: number
  isDashed?: boolean
}) {
  return (
    <rect
      x={backX}
      y={axisY - radius}
      width={noseX - backX}
      height={radius * 2}
      fill={isDashed ? 'none' : 'var(--sheet)'}
      stroke="var(--ink)"
      strokeWidth={isDashed ? lineWidths.thin : lineWidths.outline}
      strokeDasharray={isDashed ? hiddenDashes : undefined}
    />
  )
}
