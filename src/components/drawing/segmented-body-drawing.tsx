'use client'

import { useId } from 'react'
import type { OutlinePart } from '@/core/outline/types'
import type { OutlineSegment } from '@/core/tooling'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'
import { ChainLine } from './chain-line'
import { DimensionLine } from './dimension-line'
import { dimensionSpacing, draftingTextWidth, lineWidths } from './drafting-style'
import { drawingScale } from './drawing-scale'
import { DrawingSheet, type SheetContent } from './drawing-sheet'
import { HatchPattern } from './hatch-pattern'
import { LeaderLine } from './leader-line'
import { sheetFrame, type ToSheet } from './outline-path'
import { type PlacedSegment, placedSegments } from './placed-segments'
import { ScaleBar } from './scale-bar'
import { TurnedBody } from './turned-body'

export interface SegmentedBodyDrawingProps {
  code: string
  sentence: string
  unit: LengthUnit
  parts: readonly OutlinePart[]
  segments: readonly OutlineSegment[]
  /** From the nose face to the datum at the spindle's side. */
  length: { symbol: string; mm: number }
  /** What the datum line at the spindle's side is called. */
  datum: string
  bore: { diameterMm: number | null; depthMm: number | null; words: string | null }
}

interface BodyLayout extends SegmentedBodyDrawingProps {
  noseX: number
  axisY: number
  radiusPx: number
  pxPerMm: number
  toSheet: ToSheet
  placed: PlacedSegment[]
}

const tallestDrawing = 260

/** A holder or an extension lying, nose to the right: outline, bore, segment lengths and diameters, gauge length. */
export function SegmentedBodyDrawing(props: SegmentedBodyDrawingProps) {
  const hatchId = useId()
  return (
    <DrawingSheet
      code={props.code}
      unit={props.unit}
      sentence={props.sentence}
      draw={(width) => drawBody(props, width, hatchId)}
    />
  )
}

function drawBody(props: SegmentedBodyDrawingProps, width: number, hatchId: string): SheetContent {
  const placed = placedSegments(props.segments)
  const widestMm = Math.max(
    ...placed.flatMap((segment) => [segment.noseDiameterMm, segment.spindleDiameterMm]),
  )
  const [left, right] = [56, 60]
  const { pxPerMm, name } = drawingScale(
    { widthMm: props.length.mm, heightMm: widestMm },
    { width: width - left - right, height: tallestDrawing },
  )
  const lengthPx = props.length.mm * pxPerMm
  const noseX = left + (width - left - right + lengthPx) / 2
  const radiusPx = (widestMm / 2) * pxPerMm
  const axisY = Math.max(radiusPx + 52, draftingTextWidth('⌀00.0000') + 30)
  const toSheet = sheetFrame({ datumX: noseX, axisY, pxPerMm })
  const layout: BodyLayout = { ...props, noseX, axisY, radiusPx, pxPerMm, toSheet, placed }
  const rows = placed.length > 1 ? 2 : 1
  const height = axisY + radiusPx + 22 + rows * dimensionSpacing + 34
  return {
    height,
    scaleName: name,
    body: (
      <>
        <defs>
          <HatchPattern id={hatchId} />
        </defs>
        <TurnedBody parts={props.parts} toSheet={toSheet} fill={`url(#${hatchId})`} />
        <BoreCut layout={layout} />
        <ChainLine from={{ x: noseX - lengthPx - 30, y: axisY }} to={{ x: noseX + 18, y: axisY }} />
        <BodyLengths layout={layout} />
        <BodyDiameters layout={layout} />
        <DatumLine layout={layout} />
        <ScaleBar x={14} y={height - 14} pxPerMm={pxPerMm} unit={props.unit} />
      </>
    ),
  }
}

/** The bore is open: its walls stand in thick line where the diameter is known. */
function BoreCut({ layout }: { layout: BodyLayout }) {
  const { bore, toSheet, length, placed } = layout
  const noseMm = placed[0]?.noseDiameterMm ?? 0
  const depthMm = Math.min(bore.depthMm ?? length.mm, length.mm)
  const radiusMm = Math.min(bore.diameterMm ?? noseMm * 0.36, noseMm * 0.46) / 2
  const [topNose, bottomEnd] = [toSheet(0, radiusMm), toSheet(depthMm, -radiusMm)]
  return (
    <rect
      x={bottomEnd.x}
      y={topNose.y}
      width={topNose.x - bottomEnd.x}
      height={bottomEnd.y - topNose.y}
      fill="var(--sheet)"
      stroke="var(--ink)"
      strokeWidth={bore.diameterMm === null ? lineWidths.thin : lineWidths.outline}
      strokeDasharray={bore.diameterMm === null ? '5 3' : undefined}
    />
  )
}

function DatumLine({ layout }: { layout: BodyLayout }) {
  const { toSheet, length, radiusPx, axisY, datum } = layout
  const { x } = toSheet(length.mm, 0)
  return (
    <>
      <line
        x1={x}
        x2={x}
        y1={axisY - radiusPx - 14}
        y2={axisY + radiusPx + 10}
        stroke="var(--ink)"
        strokeWidth={lineWidths.thin}
        strokeDasharray="14 3 2 3"
      />
      <text
        x={x + 4}
        y={axisY - radiusPx - 18}
        fontSize={12}
        fill="var(--ink-soft)"
        stroke="var(--sheet)"
        strokeWidth={4}
        strokeLinejoin="round"
        paintOrder="stroke"
      >
        {datum}
      </text>
    </>
  )
}

function BodyLengths({ layout }: { layout: BodyLayout }) {
  const { placed, toSheet, unit, axisY, radiusPx, length } = layout
  const firstY = axisY + radiusPx + 26
  const isChained = placed.length > 1
  return (
    <>
      {isChained
        ? placed.map((segment) => (
            <DimensionLine
              key={segment.key}
              axis="horizontal"
              from={toSheet(segment.fromMm, -segment.noseDiameterMm / 2)}
              to={toSheet(segment.toMm, -segment.spindleDiameterMm / 2)}
              at={firstY}
              text={formatLength(segment.lengthMm, unit, { withUnit: false })}
            />
          ))
        : null}
      <DimensionLine
        axis="horizontal"
        from={toSheet(0, -(placed[0]?.noseDiameterMm ?? 0) / 2)}
        to={toSheet(length.mm, -(placed.at(-1)?.spindleDiameterMm ?? 0) / 2)}
        at={firstY + (isChained ? dimensionSpacing : 0)}
        text={formatLength(length.mm, unit, { withUnit: false })}
        symbol={length.symbol}
      />
    </>
  )
}

/** On the segment's own side of its edge, where a thicker neighbour may stand above it. */
function justBehindNose(segment: PlacedSegment, toSheet: ToSheet, pxPerMm: number) {
  const insideMm = Math.min(4 / pxPerMm, segment.lengthMm / 2)
  const riseMm = (segment.spindleDiameterMm - segment.noseDiameterMm) / 2
  return toSheet(
    segment.fromMm + insideMm,
    segment.noseDiameterMm / 2 + (riseMm * insideMm) / segment.lengthMm,
  )
}

function BodyDiameters({ layout }: { layout: BodyLayout }) {
  const { placed, toSheet, unit, noseX, pxPerMm, length, axisY, radiusPx, bore } = layout
  const first = placed[0]
  const last = placed.at(-1)
  const figure = (mm: number) => `⌀${formatLength(mm, unit, { withUnit: false })}`
  if (!first || !last) return null
  const inner = placed
    .slice(1)
    .filter((segment) => segment !== last || segment.noseDiameterMm !== segment.spindleDiameterMm)
  return (
    <>
      <DimensionLine
        axis="vertical"
        from={toSheet(0, first.noseDiameterMm / 2)}
        to={toSheet(0, -first.noseDiameterMm / 2)}
        at={noseX + 40}
        text={figure(first.noseDiameterMm)}
      />
      <DimensionLine
        axis="vertical"
        from={toSheet(length.mm, last.spindleDiameterMm / 2)}
        to={toSheet(length.mm, -last.spindleDiameterMm / 2)}
        at={noseX - length.mm * pxPerMm - 30}
        text={figure(last.spindleDiameterMm)}
      />
      {inner.map((segment, index) => (
        <LeaderLine
          key={segment.key}
          target={justBehindNose(segment, toSheet, pxPerMm)}
          // Neighbours stand at two heights, so that short segments keep their figures apart.
          shoulder={{
            x: toSheet(segment.fromMm, 0).x + 10,
            y: axisY - radiusPx - (index % 2 === 0 ? 14 : 32),
          }}
          text={figure(segment.noseDiameterMm)}
        />
      ))}
      {bore.words ? (
        <text
          x={noseX - 6}
          y={axisY - 5}
          textAnchor="end"
          fontSize={12}
          fill="var(--ink)"
          stroke="var(--sheet)"
          strokeWidth={4}
          paintOrder="stroke"
        >
          {bore.words}
        </text>
      ) : null}
    </>
  )
}
