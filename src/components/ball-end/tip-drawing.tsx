'use client'

import { useId } from 'react'
import type { BallSpeedAnswer, BallSpeedRequest } from '@/core/ball-end/ball-speed-answer'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import { AngleDimension } from '../drawing/angle-dimension'
import { ChainLine } from '../drawing/chain-line'
import { DimensionLine } from '../drawing/dimension-line'
import { draftingTextWidth, hiddenDashes, lineWidths, type Point } from '../drawing/drafting-style'
import { drawingScale } from '../drawing/drawing-scale'
import { DrawingSheet, type SheetContent } from '../drawing/drawing-sheet'
import { HatchPattern } from '../drawing/hatch-pattern'
import { LeaderLine } from '../drawing/leader-line'
import { ScaleBar } from '../drawing/scale-bar'
import { useShop } from '../layout/shop-context'
import { type TipGeometry, tipGeometry } from './tip-geometry'

export interface TipDrawingProps {
  request: BallSpeedRequest
  answer: BallSpeedAnswer
  sentence: string
}

/** The end of the tool in the cut, to scale, in the plane it leans in: the cap that cuts, the dead tip, the diameters. */
export function TipDrawing({ request, answer, sentence }: TipDrawingProps) {
  const { unit } = useShop()
  const hatchId = useId()
  const figure = (mm: number) => formatLength(mm, unit, { withUnit: false })
  const tip = tipGeometry(request, answer)
  return (
    <DrawingSheet
      sentence={`Drawing. ${sentence}`}
      unit={unit}
      note="Section in the plane of the tilt"
      draw={(width) => {
        const layout = layOut(tip, request, answer, width)
        return {
          height: layout.height,
          scaleName: layout.scaleName,
          body: (
            <>
              <defs>
                <HatchPattern id={hatchId} />
              </defs>
              <Part layout={layout} hatchId={hatchId} />
              <Tool layout={layout} tip={tip} />
              <ToolDimensions
                layout={layout}
                tip={tip}
                figure={figure}
                diameterMm={request.cuttingDiameterMm}
              />
              <Lean layout={layout} tiltDeg={answer.tiltDeg} />
              <DepthDimension layout={layout} text={figure(request.depthOfCutMm)} radiusMm={tip.radiusMm} />
              <Words layout={layout} tip={tip} isTipInCut={answer.tipInCut} />
              <ScaleBar x={14} y={layout.height - 12} pxPerMm={layout.pxPerMm} unit={unit} />
            </>
          ),
        }
      }}
    />
  )
}

interface Layout extends Pick<SheetContent, 'height' | 'scaleName'> {
  width: number
  pxPerMm: number
  /** Where the tool meets the finished surface. */
  contact: Point
  /** Centre of the rounding. */
  centre: Point
  /** Height of the uncut stock on the sheet. */
  stockY: number
  partBottomY: number
  /** How far the tool is drawn above the centre, in px. */
  bodyPx: number
  tiltDeg: number
}

const partDepth = 74
const topRoom = 34
const footRoom = 30

function layOut(tip: TipGeometry, request: BallSpeedRequest, answer: BallSpeedAnswer, width: number): Layout {
  const { radiusMm, roundMm } = tip
  const bodyMm = Math.max(1.1 * radiusMm, request.depthOfCutMm - roundMm + 0.5 * radiusMm)
  const lean = (answer.tiltDeg * Math.PI) / 180
  const size = {
    widthMm: 2 * Math.max(radiusMm * 1.25, bodyMm * Math.sin(lean) + radiusMm * Math.cos(lean)),
    heightMm: roundMm + Math.max(bodyMm * Math.cos(lean) + radiusMm * Math.sin(lean), radiusMm),
  }
  const room = { width: width - 36, height: Math.min(350, Math.max(210, width * 0.52)) }
  const { pxPerMm, name } = drawingScale(size, room)
  const toolHeight = onSheet(size.heightMm * pxPerMm)
  const contact = { x: width / 2, y: topRoom + toolHeight }
  return {
    width,
    pxPerMm,
    scaleName: name,
    height: contact.y + partDepth + footRoom,
    contact,
    centre: { x: contact.x, y: onSheet(contact.y - roundMm * pxPerMm) },
    stockY: onSheet(contact.y - request.depthOfCutMm * pxPerMm),
    partBottomY: contact.y + partDepth,
    bodyPx: onSheet(bodyMm * pxPerMm),
    tiltDeg: answer.tiltDeg,
  }
}

/** Sines differ in their last digit between server and browser; a hundredth of a px does not. */
function onSheet(px: number): number {
  return Math.round(px * 100) / 100
}

function Part({ layout, hatchId }: { layout: Layout; hatchId: string }) {
  const { width, stockY, partBottomY } = layout
  return (
    <>
      <rect x={0} y={stockY} width={width} height={partBottomY - stockY} fill={`url(#${hatchId})`} />
      <path d={`M0 ${stockY}H${width}`} stroke="var(--ink)" strokeWidth={lineWidths.outline} />
      <path d={`M0 ${partBottomY}H${width}`} stroke="var(--ink-soft)" strokeWidth={lineWidths.thin} />
    </>
  )
}

/** Leaning to the left, so that figures along the axis are read from the right. */
function leaning({ tiltDeg, centre }: Layout): string {
  return `rotate(${-tiltDeg} ${centre.x} ${centre.y})`
}

function Tool({ layout, tip }: { layout: Layout; tip: TipGeometry }) {
  const { centre, pxPerMm, bodyPx } = layout
  const radius = tip.radiusMm * pxPerMm
  const round = tip.roundMm * pxPerMm
  const flat = tip.flatMm * pxPerMm
  const top = centre.y - bodyPx
  const outline =
    `M${centre.x - radius} ${top}V${centre.y}A${round} ${round} 0 0 0 ${centre.x - flat} ${centre.y + round}` +
    `H${centre.x + flat}A${round} ${round} 0 0 0 ${centre.x + radius} ${centre.y}V${top}`
  const swing = radius / 5
  return (
    <g transform={leaning(layout)}>
      <path d={outline} fill="var(--sheet)" stroke="var(--ink)" strokeWidth={lineWidths.outline} />
      <path
        d={`M${centre.x - radius} ${top}q${radius / 2} ${-swing} ${radius} 0t${radius} 0`}
        fill="var(--sheet)"
        stroke="var(--ink)"
        strokeWidth={lineWidths.thin}
      />
      <ChainLine from={{ x: centre.x, y: top - 12 }} to={{ x: centre.x, y: centre.y + round + 16 }} />
    </g>
  )
}

/** The edge that stands in the cut, as the heaviest line of the sheet, and its chord along the stock's surface. */
function capPath(layout: Layout, tip: TipGeometry): { edge: string; chord: string } {
  const { contact, pxPerMm } = layout
  const flat = onSheet(tip.flatMm * pxPerMm)
  const round = onSheet(tip.roundMm * pxPerMm)
  const [left, right] = [engagedEnds(layout, tip, -1), engagedEnds(layout, tip, 1)]
  const arc = `A${round} ${round} 0 0 0 `
  return {
    edge:
      `M${left.end.x} ${left.end.y}L${left.arcEnd.x} ${left.arcEnd.y}` +
      `${arc}${contact.x - flat} ${contact.y}H${contact.x + flat}` +
      `${arc}${right.arcEnd.x} ${right.arcEnd.y}L${right.end.x} ${right.end.y}`,
    chord: `M${left.end.x} ${left.end.y}H${right.end.x}`,
  }
}

/** Where, left (-1) or right (1) of the contact, the rounding stops cutting and where the straight side does. */
function engagedEnds({ centre, pxPerMm, tiltDeg, bodyPx }: Layout, tip: TipGeometry, sign: -1 | 1) {
  const { arcDeg, sideMm } = sign < 0 ? tip.left : tip.right
  const [arc, lean] = [(arcDeg * Math.PI) / 180, (tiltDeg * Math.PI) / 180]
  const round = tip.roundMm * pxPerMm
  const side = Math.min(sideMm * pxPerMm, bodyPx)
  const x = centre.x + sign * (tip.flatMm * pxPerMm + round * Math.sin(arc))
  const y = centre.y + round * Math.cos(arc)
  return {
    arcEnd: { x: onSheet(x), y: onSheet(y) },
    end: { x: onSheet(x - side * Math.sin(lean)), y: onSheet(y - side * Math.cos(lean)) },
  }
}

function ToolDimensions({
  layout,
  tip,
  figure,
  diameterMm,
}: {
  layout: Layout
  tip: TipGeometry
  figure: (mm: number) => string
  diameterMm: number
}) {
  const { centre, pxPerMm, bodyPx } = layout
  const across = (radiusMm: number, y: number) => ({
    from: { x: onSheet(centre.x - radiusMm * pxPerMm), y },
    to: { x: onSheet(centre.x + radiusMm * pxPerMm), y },
    axis: 'horizontal' as const,
    at: y,
  })
  const largestY = onSheet(centre.y + tip.largest.belowMm * pxPerMm)
  const smallestY = onSheet(centre.y + (tip.smallest?.belowMm ?? 0) * pxPerMm)
  return (
    <g transform={leaning(layout)}>
      <DimensionLine
        {...across(tip.radiusMm, centre.y - bodyPx * 0.55)}
        symbol="DC"
        text={`⌀${figure(diameterMm)}`}
      />
      {tip.largest.radiusMm < tip.radiusMm * 0.999 ? (
        <DimensionLine
          {...across(tip.largest.radiusMm, largestY)}
          symbol="Deff"
          text={`⌀${figure(2 * tip.largest.radiusMm)}`}
        />
      ) : null}
      {tip.smallest && smallestY - largestY > 22 ? (
        <DimensionLine
          {...across(tip.smallest.radiusMm, smallestY)}
          text={`⌀${figure(2 * tip.smallest.radiusMm)}`}
        />
      ) : null}
    </g>
  )
}

/** The surface normal and, where the tool leans, the angle from it to the axis. */
function Lean({ layout, tiltDeg }: { layout: Layout; tiltDeg: number }) {
  const { centre, contact, bodyPx } = layout
  if (tiltDeg === 0) return null
  return (
    <>
      <path
        d={`M${contact.x} ${contact.y}V${centre.y}`}
        stroke="var(--ink-soft)"
        strokeWidth={lineWidths.thin}
      />
      <AngleDimension
        vertex={centre}
        radius={bodyPx * 0.86}
        fromDeg={-90 - tiltDeg}
        toDeg={-90}
        symbol="β"
        text={formatAngle(tiltDeg)}
      />
    </>
  )
}

function DepthDimension({ layout, text, radiusMm }: { layout: Layout; text: string; radiusMm: number }) {
  const { contact, stockY, width, pxPerMm } = layout
  return (
    <DimensionLine
      from={contact}
      to={{ x: contact.x + pxPerMm, y: stockY }}
      axis="vertical"
      at={Math.min(width - 30, contact.x + radiusMm * pxPerMm + 64)}
      symbol="ap"
      text={text}
    />
  )
}

function Words({ layout, tip, isTipInCut }: { layout: Layout; tip: TipGeometry; isTipInCut: boolean }) {
  const { centre, contact, pxPerMm, width } = layout
  const { edge, chord } = capPath(layout, tip)
  const round = tip.roundMm * pxPerMm
  const lean = (layout.tiltDeg * Math.PI) / 180
  const dead = {
    x: onSheet(centre.x + round * Math.sin(lean)),
    y: onSheet(centre.y + round * Math.cos(lean)),
  }
  const words = isTipInCut ? 'dead tip, in the cut' : 'dead tip, clear'
  const goesRight = dead.x + 30 + draftingTextWidth(words) < width - 44
  const halfway = (Math.min(tip.left.arcDeg, 90) * Math.PI) / 360
  const capStart = {
    x: onSheet(contact.x - tip.flatMm * pxPerMm - round * Math.sin(halfway)),
    y: onSheet(centre.y + round * Math.cos(halfway)),
  }
  return (
    <>
      <path d={chord} stroke="var(--ink)" strokeWidth={lineWidths.thin} strokeDasharray={hiddenDashes} />
      <path d={edge} fill="none" stroke="var(--ink)" strokeWidth={lineWidths.outline * 2} />
      <LeaderLine
        target={capStart}
        shoulder={{ x: capStart.x - 26, y: contact.y + 30 }}
        text="cap in the cut"
      />
      <LeaderLine
        target={dead}
        shoulder={{ x: dead.x + (goesRight ? 26 : -26), y: contact.y + 56 }}
        text={words}
        ending="dot"
      />
      <DeadTip at={dead} isInCut={isTipInCut} />
    </>
  )
}

/** A cross where the tip rubs, a ring where it is clear. */
function DeadTip({ at, isInCut }: { at: Point; isInCut: boolean }) {
  return isInCut ? (
    <path
      d={`M${at.x - 6} ${at.y - 6}l12 12m0 -12l-12 12`}
      stroke="var(--caution)"
      strokeWidth={2.6}
      strokeLinecap="round"
    />
  ) : (
    <circle cx={at.x} cy={at.y} r={5} fill="var(--sheet)" stroke="var(--holds)" strokeWidth={2.2} />
  )
}
