'use client'

import { useState } from 'react'
import { overlapToleranceMm, type ToolPart } from '@/core/outline/types'
import type { ReachAnswer } from '@/core/reach/types'
import type { LengthUnit } from '@/core/units/length-unit'
import { partNames, sentenceLength } from '@/lib/reach-sentences'
import { ScaleBar } from '../drawing/scale-bar'
import { useElementWidth } from '../drawing/use-element-width'
import { PartDimensions, ToolDimensions } from './section-dimensions'
import { type SectionChanges, SectionHandles } from './section-handles'
import {
  isNarrow,
  type SectionFrame,
  type SectionLayout,
  type SectionView,
  sectionLayout,
} from './section-layout'
import { SectionCollision, SectionPart, SectionPatterns } from './section-part'
import { type SectionScene, topFaceMm } from './section-scene'
import { sectionSentence } from './section-sentence'
import { SectionTool } from './section-tool'
import { TouchMark } from './touch-mark'
import { limitPoint, touchPoint } from './touch-point'
import { touchingParts } from './touching-parts'
import { useIsMounted } from './use-is-mounted'

export interface SectionDrawingProps extends SectionChanges {
  scene: SectionScene
  answer: ReachAnswer | null
  verdict: string | null
  unit: LengthUnit
  stickOutStepMm: number
  view: SectionView
  highlighted: ToolPart | null
}

const firstWidth = 900
const roomBelowPx = 44
const roomAbovePx = 60
const usualDropPx = 30

function sheetHeight(width: number): number {
  return isNarrow({ width })
    ? Math.round(Math.min(480, Math.max(400, width * 1.12)))
    : Math.round(Math.min(640, Math.max(460, width * 0.7)))
}

/**
 * The section: cutter, chuck and part in true proportion, dimensioned, with the first touch and what can be dragged. It is
 * drawn in the browser alone, for the width there really is.
 */
export function SectionDrawing(props: SectionDrawingProps) {
  const { scene, answer, verdict, unit, view, highlighted } = props
  const [ref, width] = useElementWidth<HTMLDivElement>(firstWidth)
  const [held, setHeld] = useState<SectionFrame | null>(null)
  const isMounted = useIsMounted()
  if (!isMounted) return <div ref={ref} className="h-[25rem] sm:h-[40rem] print:h-[100mm]" />
  const layout = sectionLayout(scene, view, { width, height: sheetHeight(width) }, held)
  const { sheet } = layout
  return (
    <div ref={ref} className="relative overflow-hidden">
      <svg
        role="img"
        aria-label={sectionSentence(scene, verdict, unit)}
        viewBox={`0 0 ${sheet.width} ${sheet.height}`}
        className="block h-auto w-full print:mx-auto print:max-h-[100mm]"
      >
        <SectionPatterns layout={layout} />
        <g clipPath={`url(#${layout.name}-section-sheet)`}>
          <SectionPart scene={scene} layout={layout} />
          <SectionTool scene={scene} layout={layout} highlighted={highlighted} />
          {answer && answer.verdict !== 'reaches' ? (
            <SectionCollision scene={scene} layout={layout} touching={touchingParts(scene, answer)} />
          ) : null}
          <PartDimensions scene={scene} layout={layout} unit={unit} reachMm={answer?.reachMm ?? null} />
          <ToolDimensions scene={scene} layout={layout} unit={unit} />
          {answer ? <Touches {...props} answer={answer} layout={layout} /> : null}
          <ScaleBar x={16} y={24} pxPerMm={layout.pxPerMm} unit={unit} />
        </g>
      </svg>
      <SectionHandles {...props} layout={layout} onHold={(isHeld) => setHeld(isHeld ? layout : null)} />
    </div>
  )
}

/** The cross of what touches first, and that of the part asked about. */
function Touches({
  scene,
  answer,
  unit,
  layout,
  highlighted,
}: SectionDrawingProps & { answer: ReachAnswer; layout: SectionLayout }) {
  const limit = limitPoint(scene, answer.limitedBy, answer.reachMm)
  const asked = answer.firstTouch.find(({ part }) => part === highlighted)
  const askedPoint =
    asked && asked.depthMm !== null && asked.part !== answer.limitedBy
      ? touchPoint(scene, asked.part, asked.depthMm)
      : null
  // Above a cross near the top face stands the holder: the words go under it, into the air or the hatching.
  const dropPx = (hMm: number) => {
    const abovePx = (hMm - topFaceMm(scene.at)) * layout.pxPerMm
    if (abovePx <= -roomAbovePx) return null
    return abovePx > 0 && abovePx <= roomBelowPx ? abovePx + usualDropPx : usualDropPx
  }
  return (
    <g>
      {askedPoint && asked && asked.depthMm !== null ? (
        <TouchMark
          at={askedPoint}
          layout={layout}
          text={`${partNames[asked.part]} ${sentenceLength(asked.depthMm, unit)}`}
          tone="asked"
          dropPx={dropPx(askedPoint.hMm)}
        />
      ) : null}
      {limit && answer.limitedBy !== null && answer.reachMm !== null ? (
        <TouchMark
          at={limit}
          layout={layout}
          text={limitText(answer, answer.limitedBy, answer.reachMm, unit)}
          tone={isCollision(answer) ? 'collision' : 'next'}
          dropPx={answer.limitedBy === 'floor' ? usualDropPx : dropPx(limit.hMm)}
        />
      ) : null}
    </g>
  )
}

function limitText(
  answer: ReachAnswer,
  limitedBy: NonNullable<ReachAnswer['limitedBy']>,
  reachMm: number,
  unit: LengthUnit,
): string {
  if (limitedBy === 'floor') return 'collision: the far side is in the floor'
  const name = partNames[limitedBy]
  const at = sentenceLength(reachMm, unit)
  return isCollision(answer) ? `collision: ${name}, ${at}` : `${name} touches next, ${at}`
}

/** Something is in the way at this depth; an impossible check may have other reasons. */
function isCollision({ shortfallMm, limitedBy }: ReachAnswer): boolean {
  return limitedBy === 'floor' || shortfallMm > overlapToleranceMm
}
