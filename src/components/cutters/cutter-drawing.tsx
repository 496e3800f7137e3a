'use client'

import { AngleDimension } from '@/components/drawing/angle-dimension'
import { attemptedOutline } from '@/components/drawing/attempted-outline'
import { ChainLine } from '@/components/drawing/chain-line'
import { DimensionLine } from '@/components/drawing/dimension-line'
import { dimensionRoom, dimensionSpacing } from '@/components/drawing/drafting-style'
import { drawingScale } from '@/components/drawing/drawing-scale'
import { DrawingSheet, type SheetContent } from '@/components/drawing/drawing-sheet'
import { FluteLines } from '@/components/drawing/flute-lines'
import { LeaderLine } from '@/components/drawing/leader-line'
import { NoDrawing } from '@/components/drawing/no-drawing'
import type { ToSheet } from '@/components/drawing/outline-path'
import { sheetFrame } from '@/components/drawing/outline-path'
import { ScaleBar } from '@/components/drawing/scale-bar'
import { TurnedBody } from '@/components/drawing/turned-body'
import { useShop } from '@/components/layout/shop-context'
import { cutterOutline } from '@/core/outline/cutter-outline'
import type { OutlinePart } from '@/core/outline/types'
import { type CutterForm, type CutterGeometry, holeToolForms } from '@/core/tooling'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import { cutterSentence } from './cutter-sentence'

/** A usual helix, only for the look: the catalogue does not keep it. Straight where edges run along the axis. */
const usualHelixDeg = 30
const straightFluted: readonly CutterForm[] = [
  'tap',
  'reamer',
  'threadMill',
  'faceMill',
  'slotting',
  'chamfer',
]
const tallestDrawing = 230

export interface CutterDrawingProps {
  code: string
  cutter: CutterGeometry
}

/** The cutter lying, tip to the right, with the dimensions its catalogue gives. */
export function CutterDrawing({ code, cutter }: CutterDrawingProps) {
  const { unit } = useShop()
  const { parts, reason } = attemptedOutline(() => cutterOutline(cutter))
  if (parts === null) return <NoDrawing reason={reason} />
  return (
    <DrawingSheet
      code={code}
      unit={unit}
      sentence={cutterSentence(cutter, unit)}
      note="Flutes drawn as a sign"
      draw={(width) => drawCutter(cutter, parts, unit, width)}
    />
  )
}

interface CutterLayout {
  cutter: CutterGeometry
  parts: OutlinePart[]
  unit: LengthUnit
  tipX: number
  axisY: number
  pxPerMm: number
  bottomY: number
  toSheet: ToSheet
}

function drawCutter(
  cutter: CutterGeometry,
  parts: OutlinePart[],
  unit: LengthUnit,
  width: number,
): SheetContent {
  const widestMm = Math.max(
    ...parts.flatMap((part) =>
      part.segments.map((stroke) => 2 * Math.max(stroke.toRadiusMm, stroke.fromRadiusMm)),
    ),
  )
  const left = 52
  const right = isPointed(cutter) ? 118 : 60
  const { pxPerMm, name } = drawingScale(
    { widthMm: cutter.overallLengthMm, heightMm: widestMm },
    { width: width - left - right, height: tallestDrawing },
  )
  const lengthPx = cutter.overallLengthMm * pxPerMm
  const tipX = left + (width - left - right + lengthPx) / 2
  const radiusPx = (widestMm / 2) * pxPerMm
  const figure = (mm: number) => formatLength(mm, unit, { withUnit: false })
  const axisY = Math.max(
    radiusPx + 50,
    dimensionRoom(cutter.shankDiameterMm * pxPerMm, `DMM ⌀${figure(cutter.shankDiameterMm)}`) + 8,
    dimensionRoom(cutter.cuttingDiameterMm * pxPerMm, `DC ⌀${figure(cutter.cuttingDiameterMm)}`) + 8,
  )
  const toSheet = sheetFrame({ datumX: tipX, axisY, pxPerMm })
  const layout: CutterLayout = {
    cutter,
    parts,
    unit,
    tipX,
    axisY,
    pxPerMm,
    bottomY: axisY + radiusPx,
    toSheet,
  }
  const lengths = lengthDimensions(cutter)
  return {
    height: layout.bottomY + 18 + lengths.length * dimensionSpacing + 34,
    scaleName: name,
    body: (
      <>
        <TurnedBody parts={parts} toSheet={toSheet} />
        <FluteLines
          parts={parts}
          toSheet={toSheet}
          fluteCount={cutter.fluteCount ?? 2}
          diameterMm={cutter.cuttingDiameterMm}
          helixDeg={straightFluted.includes(cutter.form) ? 0 : usualHelixDeg}
        />
        <ChainLine from={{ x: tipX - lengthPx - 16, y: axisY }} to={{ x: tipX + 16, y: axisY }} />
        <CutterLengths layout={layout} lengths={lengths} />
        <CutterDiameters layout={layout} />
        <CutterTip layout={layout} />
        <ScaleBar
          x={14}
          y={layout.bottomY + 18 + lengths.length * dimensionSpacing + 20}
          pxPerMm={pxPerMm}
          unit={unit}
        />
      </>
    ),
  }
}

function isPointed(cutter: CutterGeometry): boolean {
  return cutter.pointAngleDeg != null && (isHoleTool(cutter.form) || cutter.form === 'chamfer')
}

function isHoleTool(form: CutterForm): boolean {
  return (holeToolForms as readonly CutterForm[]).includes(form)
}

interface LengthDimension {
  symbol: string
  lengthMm: number
}

/** Shortest first, so that no extension line crosses a dimension line. */
function lengthDimensions(cutter: CutterGeometry): LengthDimension[] {
  const all = [
    { symbol: 'APMX', lengthMm: cutter.lengthOfCutMm },
    { symbol: 'LCF', lengthMm: cutter.fluteLengthMm },
    { symbol: 'LU', lengthMm: cutter.reachLengthMm },
    { symbol: 'OAL', lengthMm: cutter.overallLengthMm },
  ]
  return all
    .flatMap(({ symbol, lengthMm }) => (lengthMm == null ? [] : [{ symbol, lengthMm }]))
    .sort((one, other) => one.lengthMm - other.lengthMm)
}

function CutterLengths({ layout, lengths }: { layout: CutterLayout; lengths: LengthDimension[] }) {
  const { toSheet, bottomY, unit, cutter, parts } = layout
  const tip = toSheet(0, -tipRadius(parts))
  return lengths.map(({ symbol, lengthMm }, index) => (
    <DimensionLine
      key={symbol}
      axis="horizontal"
      from={tip}
      to={toSheet(lengthMm, -radiusNear(cutter, parts, lengthMm))}
      at={bottomY + 22 + index * dimensionSpacing}
      text={formatLength(lengthMm, unit, { withUnit: false })}
      symbol={symbol}
      overflow="start"
    />
  ))
}

function tipRadius(parts: OutlinePart[]): number {
  return parts[0]?.segments[0]?.fromZMm === parts[0]?.segments[0]?.toZMm
    ? (parts[0]?.segments[0]?.toRadiusMm ?? 0)
    : 0
}

function radiusNear(cutter: CutterGeometry, parts: OutlinePart[], zMm: number): number {
  const stroke = parts
    .flatMap((part) => part.segments)
    .find((candidate) => candidate.toZMm > candidate.fromZMm && zMm <= candidate.toZMm + 1e-6)
  return stroke?.toRadiusMm ?? cutter.shankDiameterMm / 2
}

function CutterDiameters({ layout }: { layout: CutterLayout }) {
  const { cutter, toSheet, tipX, pxPerMm, unit, axisY } = layout
  const figure = (mm: number) => `⌀${formatLength(mm, unit, { withUnit: false })}`
  const cuttingZMm = Math.min(fullDiameterZ(cutter), cutter.overallLengthMm)
  const dcX = tipX + (isPointed(cutter) ? 92 : 34)
  const backX = tipX - cutter.overallLengthMm * pxPerMm
  const neckMm = cutter.neckDiameterMm
  const neckZMm = ((cutter.fluteLengthMm ?? cutter.lengthOfCutMm ?? 0) + (cutter.reachLengthMm ?? 0)) / 2
  return (
    <>
      <DimensionLine
        axis="vertical"
        from={toSheet(cuttingZMm, cutter.cuttingDiameterMm / 2)}
        to={toSheet(cuttingZMm, -cutter.cuttingDiameterMm / 2)}
        at={dcX}
        text={figure(cutter.cuttingDiameterMm)}
        symbol="DC"
      />
      <DimensionLine
        axis="vertical"
        from={toSheet(cutter.overallLengthMm, cutter.shankDiameterMm / 2)}
        to={toSheet(cutter.overallLengthMm, -cutter.shankDiameterMm / 2)}
        at={backX - 26}
        text={figure(cutter.shankDiameterMm)}
        symbol="DMM"
      />
      {neckMm != null ? (
        <LeaderLine
          target={toSheet(neckZMm, neckMm / 2)}
          shoulder={{ x: toSheet(neckZMm, 0).x - 12, y: axisY - (layout.bottomY - axisY) - 22 }}
          text={figure(neckMm)}
          symbol="DN"
        />
      ) : null}
    </>
  )
}

/** Where the full cutting diameter is reached, so that DC is measured on an edge that has it. */
function fullDiameterZ(cutter: CutterGeometry): number {
  if (cutter.form === 'ball') return cutter.cuttingDiameterMm / 2
  if (cutter.form === 'cornerRadius') return cutter.cornerRadiusMm ?? 0
  if (!isPointed(cutter) || !cutter.pointAngleDeg) return 0
  const tipRadiusMm = cutter.form === 'chamfer' ? (cutter.tipDiameterMm ?? 0) / 2 : 0
  return (cutter.cuttingDiameterMm / 2 - tipRadiusMm) / Math.tan((cutter.pointAngleDeg * Math.PI) / 360)
}

function CutterTip({ layout }: { layout: CutterLayout }) {
  const { cutter, toSheet, axisY, unit, bottomY } = layout
  const topY = axisY - (bottomY - axisY) - 22
  if (isPointed(cutter) && cutter.pointAngleDeg && cutter.form !== 'chamfer') {
    const half = cutter.pointAngleDeg / 2
    return (
      <AngleDimension
        vertex={toSheet(0, 0)}
        radius={30}
        fromDeg={-half}
        toDeg={half}
        text={formatAngle(cutter.pointAngleDeg)}
      />
    )
  }
  const radiusMm = cutter.form === 'ball' ? cutter.cuttingDiameterMm / 2 : cutter.cornerRadiusMm
  if (!radiusMm) return null
  const onArc = radiusMm * (1 - Math.SQRT1_2)
  const target = toSheet(onArc, cutter.cuttingDiameterMm / 2 - onArc)
  return (
    <LeaderLine
      target={target}
      shoulder={{ x: Math.max(target.x - 18, 120), y: topY }}
      text={formatLength(radiusMm, unit, { withUnit: false })}
      symbol="RE"
    />
  )
}
