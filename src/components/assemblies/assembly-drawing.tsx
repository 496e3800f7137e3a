'use client'

import type { AssemblyTools } from '@/core/assemblies/types'
import type { Clearances, Feature } from '@/core/reach/types'
import { ScaleBar } from '../drawing/scale-bar'
import { useElementWidth } from '../drawing/use-element-width'
import { useShop } from '../layout/shop-context'
import { PartDimensions, ToolDimensions } from '../reach/section-dimensions'
import { sectionLayout } from '../reach/section-layout'
import { SectionPart, SectionPatterns } from '../reach/section-part'
import { sectionScene } from '../reach/section-scene'
import { sectionSentence } from '../reach/section-sentence'
import { SectionTool } from '../reach/section-tool'
import { useIsMounted } from '../reach/use-is-mounted'

export interface AssemblyDrawingProps {
  /** Its own among the drawings of the page. */
  name: string
  tools: AssemblyTools
  feature: Feature
  clearances: Partial<Clearances> | null
  stickOutMm: number
  reachMm: number | null
  className?: string
}

const firstWidth = 700

/**
 * The whole assembly in its feature, in true proportion, with the stick-out to set, the grip and the gauge length to
 * expect. Drawn in the browser alone, for the width there really is.
 */
export function AssemblyDrawing(props: AssemblyDrawingProps) {
  const { name, tools, feature, clearances, stickOutMm, reachMm, className } = props
  const { unit, reachSettings } = useShop()
  const [ref, width] = useElementWidth<HTMLDivElement>(firstWidth)
  const isMounted = useIsMounted()
  const scene = sectionScene({
    feature,
    stickOutMm,
    cutter: tools.cutter,
    holder: tools.holder,
    extension: tools.extension,
    clearances: {
      shankMm: clearances?.shankMm ?? reachSettings.shankClearanceMm,
      holderMm: clearances?.holderMm ?? reachSettings.holderClearanceMm,
    },
  })
  if (!isMounted || !scene) return <div ref={ref} className="h-[24rem] print:h-[112mm]" />
  const height = Math.round(Math.min(560, Math.max(420, width * 0.8)))
  const layout = sectionLayout(scene, 'whole', { width, height }, null, name)
  return (
    <div ref={ref} className={className}>
      <svg
        role="img"
        aria-label={sectionSentence(scene, null, unit)}
        viewBox={`0 0 ${width} ${height}`}
        className="block h-auto w-full print:mx-auto print:max-h-[112mm]"
      >
        <SectionPatterns layout={layout} />
        <g clipPath={`url(#${name}-section-sheet)`}>
          <SectionPart scene={scene} layout={layout} />
          <SectionTool scene={scene} layout={layout} highlighted={null} />
          <PartDimensions scene={scene} layout={layout} unit={unit} reachMm={reachMm} />
          <ToolDimensions scene={scene} layout={layout} unit={unit} isStickOutOutside />
          <ScaleBar x={16} y={24} pxPerMm={layout.pxPerMm} unit={unit} />
        </g>
      </svg>
    </div>
  )
}
