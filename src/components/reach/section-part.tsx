import { memo } from 'react'
import type { ToolPart } from '@/core/outline/types'
import { lineWidths } from '../drawing/drafting-style'
import { HatchPattern } from '../drawing/hatch-pattern'
import { type MaterialPath, materialPaths, obstaclePaths } from './material-paths'
import type { SectionLayout } from './section-layout'
import type { SectionScene } from './section-scene'
import { toolTransform } from './section-tool'
import { envelopePaths } from './tool-paths'

export interface SectionPartProps {
  scene: SectionScene
  layout: SectionLayout
}

/** What is cut through is hatched; two solids that touch the two ways. */
export function SectionPatterns({ layout }: Pick<SectionPartProps, 'layout'>) {
  const { name, sheet } = layout
  return (
    <defs>
      <HatchPattern id={`${name}-hatch-part`} />
      <HatchPattern id={`${name}-hatch-obstacle`} isMirrored />
      <clipPath id={`${name}-section-sheet`}>
        <rect x={0} y={0} width={sheet.width} height={sheet.height} />
      </clipPath>
      <clipPath id={`${name}-section-cut`}>
        <rect x={-4000} y={-(layout.cutZMm - layout.turn.zMm) * layout.pxPerMm} width={8000} height={8000} />
      </clipPath>
    </defs>
  )
}

/** The part in section, and what stands on it. */
export const SectionPart = memo(function SectionPart({ scene, layout }: SectionPartProps) {
  return (
    <g strokeLinejoin="round">
      {obstaclePaths(scene, layout).map((obstacle) => (
        <Solid key={obstacle.area} solid={obstacle} hatch={`${layout.name}-hatch-obstacle`} />
      ))}
      {materialPaths(scene, layout).map((material) => (
        <Solid key={material.area} solid={material} hatch={`${layout.name}-hatch-part`} />
      ))}
    </g>
  )
})

function Solid({ solid, hatch }: { solid: MaterialPath; hatch: string }) {
  return (
    <g fill="none" stroke="var(--ink)">
      <path d={solid.area} fill="var(--sheet)" stroke="none" />
      <path d={solid.area} fill={`url(#${hatch})`} stroke="none" />
      <path d={solid.edges} strokeWidth={lineWidths.outline} />
      {solid.breaks.map((d) => (
        <path key={d} d={d} strokeWidth={lineWidths.thin} />
      ))}
    </g>
  )
}

/**
 * Where the tool, with the room it must keep, is inside the part. What only rubs is too thin to be seen, so the parts the
 * answer says touch are drawn with a rim; no other part is, or a narrow gap would look like a touch.
 */
export const SectionCollision = memo(function SectionCollision({
  scene,
  layout,
  touching,
}: SectionPartProps & { touching: readonly ToolPart[] }) {
  const solids = [...materialPaths(scene, layout), ...obstaclePaths(scene, layout)]
  return (
    <g>
      <clipPath id={`${layout.name}-collision`}>
        {solids.map(({ area }) => (
          <path key={area} d={area} />
        ))}
      </clipPath>
      <g clipPath={`url(#${layout.name}-collision)`}>
        <g
          transform={toolTransform(layout)}
          clipPath={`url(#${layout.name}-section-cut)`}
          fill="var(--collision)"
          fillOpacity={0.5}
          stroke="var(--collision)"
        >
          {envelopePaths(scene, layout).map(({ part, d }) => (
            <path key={part} d={d} strokeWidth={touching.includes(part) ? 4 : 0} />
          ))}
        </g>
      </g>
    </g>
  )
})
