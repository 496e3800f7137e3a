import { memo } from 'react'
import type { ToolPart } from '@/core/outline/types'
import { ChainLine } from '../drawing/chain-line'
import { hiddenDashes, lineWidths } from '../drawing/drafting-style'
import { breakPath } from './break-path'
import type { SectionLayout } from './section-layout'
import type { SectionScene } from './section-scene'
import { envelopePaths, toolPaths } from './tool-paths'

export interface SectionToolProps {
  scene: SectionScene
  layout: SectionLayout
  highlighted: ToolPart | null
}

/** Turns the tool's own frame, axis upright, to where it stands on the sheet. */
export function toolTransform({ turn, foot, pxPerMm }: SectionLayout): string {
  const x = foot.x + turn.uMm * pxPerMm
  const y = foot.y - turn.hMm * pxPerMm
  return `translate(${x} ${y}) rotate(${-turn.tiltDeg})`
}

/** Height above the tip as a y of the tool's own frame. */
export function toolY({ turn, pxPerMm }: SectionLayout, zMm: number): number {
  return -(zMm - turn.zMm) * pxPerMm
}

const flutedParts: readonly ToolPart[] = ['flute', 'runOut']

/** Cutter, chuck and spindle, with the envelope they keep clear and the axis they turn about. */
export const SectionTool = memo(function SectionTool({ scene, layout, highlighted }: SectionToolProps) {
  const { heights } = scene
  return (
    <g transform={toolTransform(layout)}>
      {toolPaths(scene, layout).map(({ part, d }) => (
        <path
          key={`${part}${d.length}${d.slice(0, 24)}`}
          d={d}
          fill={fillOf(part, highlighted)}
          stroke={part === highlighted ? 'var(--accent)' : 'var(--ink)'}
          strokeWidth={part === highlighted ? lineWidths.outline * 1.7 : lineWidths.outline}
          strokeLinejoin="round"
        />
      ))}
      <HiddenShank scene={scene} layout={layout} />
      <Envelope scene={scene} layout={layout} />
      {heights.gaugeLineMm !== null && heights.gaugeLineMm <= layout.cutZMm ? (
        <SpindleFace scene={scene} layout={layout} isHighlighted={highlighted === 'spindle'} />
      ) : (
        <Break scene={scene} layout={layout} />
      )}
      <ChainLine
        from={{ x: 0, y: toolY(layout, 0) + 12 }}
        to={{ x: 0, y: toolY(layout, layout.cutZMm) - 16 }}
      />
    </g>
  )
})

function fillOf(part: ToolPart, highlighted: ToolPart | null): string {
  if (part === highlighted) return 'var(--accent-wash)'
  return flutedParts.includes(part) ? 'var(--well)' : 'var(--sheet)'
}

/** What of the shank stands in the bore, behind the nose. */
function HiddenShank({ scene, layout }: Omit<SectionToolProps, 'highlighted'>) {
  const { noseMm, overallMm } = scene.heights
  if (noseMm === null || overallMm <= noseMm) return null
  const topMm = Math.min(overallMm, layout.cutZMm)
  const x = scene.cutter.shankRadiusMm * layout.pxPerMm
  const [from, to] = [toolY(layout, noseMm), toolY(layout, topMm)]
  const end = topMm === overallMm ? `M${-x} ${to}H${x}` : ''
  return (
    <path
      d={`M${-x} ${from}V${to}M${x} ${from}V${to}${end}`}
      stroke="var(--ink)"
      strokeWidth={lineWidths.thin}
      strokeDasharray={hiddenDashes}
      fill="none"
    />
  )
}

/** Drawn only where it can be told from the outline. */
function Envelope({ scene, layout }: Omit<SectionToolProps, 'highlighted'>) {
  if (scene.clearances.holderMm * layout.pxPerMm < 1.2) return null
  const behindNose = envelopePaths(scene, layout).filter(({ part }) =>
    ['extension', 'nut', 'holder'].includes(part),
  )
  return (
    <g
      clipPath={`url(#${layout.name}-section-cut)`}
      stroke="var(--ink-soft)"
      strokeWidth={lineWidths.thin}
      strokeDasharray={hiddenDashes}
      fill="none"
    >
      {behindNose.map(({ part, d }) => (
        <path key={part} d={d} />
      ))}
    </g>
  )
}

function SpindleFace({
  scene,
  layout,
  isHighlighted,
}: Omit<SectionToolProps, 'highlighted'> & { isHighlighted: boolean }) {
  const face = scene.parts.find(({ part }) => part === 'spindle')?.segments[0]
  if (!face) return null
  const half = Math.min(
    face.toRadiusMm * layout.pxPerMm,
    Math.max(layout.toolRadiusMm * layout.pxPerMm + 46, layout.sheet.width * 0.22),
  )
  const y = toolY(layout, face.fromZMm)
  const isEndless = !Number.isFinite(face.toRadiusMm)
  const ticks = Array.from({ length: Math.floor((2 * half) / 9) }, (_, index) => -half + 9 * index)
  return (
    <g stroke={isHighlighted ? 'var(--accent)' : 'var(--ink)'} fill="none">
      <path d={`M${-half} ${y}H${half}`} strokeWidth={lineWidths.outline * (isHighlighted ? 1.7 : 1)} />
      <path
        strokeWidth={lineWidths.thin}
        d={
          ticks.map((x) => `M${x} ${y}l9 -9`).join('') +
          (isEndless ? '' : `M${-half} ${y}v-10M${half} ${y}v-10`)
        }
      />
    </g>
  )
}

/** The tool goes on above: its outline is broken off. */
function Break({ scene, layout }: Omit<SectionToolProps, 'highlighted'>) {
  if (scene.heights.noseMm === null) return null
  const ends = scene.parts
    .flatMap(({ segments }) => segments)
    .filter(({ fromZMm, toZMm }) => fromZMm <= layout.cutZMm && toZMm >= layout.cutZMm)
  const radiusMm = Math.max(
    0,
    ...ends.map(({ fromRadiusMm, toRadiusMm }) => Math.max(fromRadiusMm, toRadiusMm)),
  )
  const half = Math.min(radiusMm * layout.pxPerMm, 2000)
  const y = toolY(layout, layout.cutZMm)
  return (
    <g fill="none">
      <path d={`M${-half} ${y}H${half}`} stroke="var(--sheet)" strokeWidth={lineWidths.outline * 2} />
      <path
        d={breakPath({ x: -half - 4, y }, { x: half + 4, y })}
        stroke="var(--ink)"
        strokeWidth={lineWidths.thin}
      />
    </g>
  )
}
