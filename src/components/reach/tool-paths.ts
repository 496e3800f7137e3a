import { strokesBetween } from '@/core/outline/stroke-chain'
import type { OutlineStroke, ToolPart } from '@/core/outline/types'
import { widenedStart } from '@/core/reach/check-parts'
import type { SectionLayout } from './section-layout'
import { clearanceOfMm, type SectionScene } from './section-scene'

/** Radii are drawn no wider than this many px: the spindle's face may be without end. */
const widestPx = 4000

/** One part of the tool as a closed path, in the tool's own frame in px: the axis is x = 0, up is negative y. */
export interface ToolPath {
  part: ToolPart
  d: string
}

/** The tool's frame, from millimetres to px. */
function mapping({ pxPerMm, turn }: SectionLayout) {
  return {
    x: (radiusMm: number) => round(Math.min(radiusMm * pxPerMm, widestPx)),
    y: (zMm: number) => round(-(zMm - turn.zMm) * pxPerMm),
  }
}

function round(px: number): number {
  return Math.round(px * 100) / 100
}

/** Every part as far as it is drawn, from the tip up. */
export function toolPaths(scene: SectionScene, layout: SectionLayout): ToolPath[] {
  return scene.parts
    .filter(({ part }) => part !== 'spindle')
    .map(({ part, segments }) => ({ part, segments: strokesBetween(segments, 0, layout.cutZMm) }))
    .filter(({ segments }) => segments.length > 0)
    .map(({ part, segments }) => ({ part, d: closedPath(segments, layout) }))
}

function closedPath(strokes: OutlineStroke[], layout: SectionLayout): string {
  const { x, y } = mapping(layout)
  const first = strokes[0]
  if (!first) return ''
  const arcPx = (stroke: OutlineStroke) => (stroke.kind === 'arc' ? stroke.arcRadiusMm * layout.pxPerMm : 0)
  const up = strokes.map((stroke) => leg(arcPx(stroke), x(stroke.toRadiusMm), y(stroke.toZMm)))
  const down = strokes
    .toReversed()
    .map((stroke) => leg(arcPx(stroke), -x(stroke.fromRadiusMm), y(stroke.fromZMm)))
  const last = strokes.at(-1) ?? first
  return (
    `M${x(first.fromRadiusMm)} ${y(first.fromZMm)}${up.join('')}` +
    `L${-x(last.toRadiusMm)} ${y(last.toZMm)}${down.join('')}Z`
  )
}

/** A corner is rounded outward both on the way up and on the way down. */
function leg(arcPx: number, x: number, y: number): string {
  return arcPx > 0 ? `A${round(arcPx)} ${round(arcPx)} 0 0 0 ${x} ${y}` : `L${x} ${y}`
}

/** Every part but the length of cut, widened by its clearance and lowered where it is behind the nose. */
export function envelopePaths(scene: SectionScene, layout: SectionLayout): ToolPath[] {
  const { x, y } = mapping(layout)
  return scene.checked
    .filter(({ part }) => part.clearance !== 'flute')
    .map(({ part, liftMm }) => {
      const outMm = clearanceOfMm(part, scene.clearances)
      const upMm = part.clearance === 'holder' ? liftMm - outMm : liftMm
      const points = part.lines.flatMap((line) => [
        { x: x(widenedStart(line, outMm)), y: y(line.z0 + upMm) },
        { x: x(line.r1 + outMm), y: y(line.z1 + upMm) },
      ])
      const right = points.map((point) => `${point.x} ${point.y}`)
      const left = points.toReversed().map((point) => `${-point.x} ${point.y}`)
      return { part: part.part, d: `M${[...right, ...left].join('L')}Z` }
    })
}
