'use client'

import { overlapToleranceMm } from '@/core/outline/types'
import type { ReachAnswer } from '@/core/reach/types'
import type { LengthUnit } from '@/core/units/length-unit'
import { sectionLayout } from '../reach/section-layout'
import { SectionCollision, SectionPart, SectionPatterns } from '../reach/section-part'
import type { SectionScene } from '../reach/section-scene'
import { sectionSentence } from '../reach/section-sentence'
import { SectionTool } from '../reach/section-tool'
import { TouchCross } from '../reach/touch-mark'
import { limitPoint } from '../reach/touch-point'
import { touchingParts } from '../reach/touching-parts'

export interface OptionDrawingProps {
  /** Its own among the drawings of the page. */
  name: string
  scene: SectionScene
  answer: Pick<ReachAnswer, 'shortfallMm' | 'firstTouch' | 'limitedBy' | 'reachMm'>
  unit: LengthUnit
}

const sheet = { width: 120, height: 200 }

/** The section beside a line of the list: tip, wall and nose in true proportion, the touch marked, no figures. */
export function OptionDrawing({ name, scene, answer, unit }: OptionDrawingProps) {
  const layout = sectionLayout(scene, 'tip', sheet, null, name)
  // A corner that is too tight is nothing to be seen here: only what touches too early is marked.
  const isShort = answer.limitedBy === 'floor' || answer.shortfallMm > overlapToleranceMm
  const limit = isShort ? limitPoint(scene, answer.limitedBy, answer.reachMm) : null
  return (
    <svg
      role="img"
      aria-label={sectionSentence(scene, null, unit)}
      viewBox={`0 0 ${sheet.width} ${sheet.height}`}
      className="block h-auto w-full"
    >
      <SectionPatterns layout={layout} />
      <g clipPath={`url(#${name}-section-sheet)`}>
        <SectionPart scene={scene} layout={layout} />
        <SectionTool scene={scene} layout={layout} highlighted={null} />
        {isShort ? (
          <SectionCollision scene={scene} layout={layout} touching={touchingParts(scene, answer)} />
        ) : null}
        {limit ? <TouchCross at={limit} layout={layout} tone="collision" /> : null}
      </g>
    </svg>
  )
}
