'use client'

import type { LengthUnit } from '@/core/units/length-unit'
import { ScaleBar } from '../drawing/scale-bar'
import { useElementWidth } from '../drawing/use-element-width'
import { ToolDimensions } from '../reach/section-dimensions'
import { sectionLayout, sharedFrames } from '../reach/section-layout'
import { SectionPart, SectionPatterns } from '../reach/section-part'
import type { SectionScene } from '../reach/section-scene'
import { sectionSentence } from '../reach/section-sentence'
import { SectionTool } from '../reach/section-tool'

export interface CompareDrawingProps {
  drawn: readonly { name: string; scene: SectionScene }[]
  unit: LengthUnit
}

const firstWidth = 900
/** Narrower columns have no room for dimensions; the table under them has the figures. */
const dimensionedFromPx = 250
const captionPx = 26

/** Several assemblies at the same feature: one scale, one floor, so that what is longer looks longer. */
export function CompareDrawing({ drawn, unit }: CompareDrawingProps) {
  const [ref, width] = useElementWidth<HTMLDivElement>(firstWidth)
  const columnWidth = Math.floor(width / Math.max(1, drawn.length))
  const sheet = { width: columnWidth, height: columnWidth < dimensionedFromPx ? 340 : 520 }
  const scenes = drawn.map(({ scene }) => scene)
  const frames = sharedFrames(scenes, 'whole', sheet)
  const label = drawn.map(({ name, scene }) => `${name}: ${sectionSentence(scene, null, unit)}`).join(' ')
  return (
    <div ref={ref}>
      <svg
        role="img"
        aria-label={label}
        viewBox={`0 0 ${columnWidth * drawn.length} ${sheet.height + captionPx}`}
        className="block h-auto w-full"
      >
        {drawn.map(({ name, scene }, index) => {
          const layout = sectionLayout(scene, 'whole', sheet, frames[index] ?? null, `compared-${index}`)
          return (
            <g key={layout.name} transform={`translate(${index * columnWidth} 0)`}>
              <SectionPatterns layout={layout} />
              <g clipPath={`url(#${layout.name}-section-sheet)`}>
                <SectionPart scene={scene} layout={layout} />
                <SectionTool scene={scene} layout={layout} highlighted={null} />
                {columnWidth >= dimensionedFromPx ? (
                  <ToolDimensions scene={scene} layout={layout} unit={unit} />
                ) : null}
              </g>
              <text
                x={columnWidth / 2}
                y={sheet.height + 14}
                textAnchor="middle"
                fontSize={13}
                fontWeight={600}
                fill="var(--ink)"
              >
                {name}
              </text>
            </g>
          )
        })}
        {frames[0] ? <ScaleBar x={12} y={20} pxPerMm={frames[0].pxPerMm} unit={unit} /> : null}
      </svg>
    </div>
  )
}
