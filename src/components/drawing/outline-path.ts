import type { OutlinePart, OutlineStroke } from '@/core/outline/types'
import type { Point } from './drafting-style'

/** From height above the datum and distance from the axis, negative on its far side, to a place on the sheet. */
export type ToSheet = (zMm: number, radiusMm: number) => Point

/**
 * Lying, tip or nose to the right. To a hundredth of a px: the last digit of a sine may differ between server and
 * browser, and the drawing must not.
 */
export function sheetFrame(frame: { datumX: number; axisY: number; pxPerMm: number }): ToSheet {
  return (zMm, radiusMm) => ({
    x: round(frame.datumX - zMm * frame.pxPerMm),
    y: round(frame.axisY - radiusMm * frame.pxPerMm),
  })
}

interface Step {
  from: Point
  to: Point
  centre: Point | null
}

/**
 * The closed outline of a solid of revolution seen from the side: up one side, back down the other. `toSheet` may turn
 * and scale, alike in both directions.
 */
export function bodyPath(parts: readonly OutlinePart[], toSheet: ToSheet): string {
  const strokes = parts.flatMap((part) => part.segments)
  const first = strokes[0]
  const last = strokes.at(-1)
  if (!first || !last) return ''
  const near = strokes.map((stroke) => step(stroke, toSheet, 1))
  const far = strokes.toReversed().map((stroke) => reversed(step(stroke, toSheet, -1)))
  const start = toSheet(first.fromZMm, 0)
  const end = toSheet(last.toZMm, 0)
  return `M${at(start)}L${near.map(draw).join('')}L${at(end)}L${far.map(draw).join('')}Z`
}

/** One side alone, open at the ends: for envelopes. */
export function sidePath(strokes: readonly OutlineStroke[], toSheet: ToSheet, side: 1 | -1): string {
  return strokes.length === 0 ? '' : `M${strokes.map((stroke) => draw(step(stroke, toSheet, side))).join('')}`
}

/** Heights and radii at which an edge runs round the body: where its outline has a corner. */
export function outlineEdges(parts: readonly OutlinePart[]): { zMm: number; radiusMm: number }[] {
  const strokes = parts.flatMap((part) => part.segments)
  return strokes.flatMap((stroke, index) => {
    const next = strokes[index + 1]
    if (!next || isSmooth(stroke, next)) return []
    return [{ zMm: stroke.toZMm, radiusMm: stroke.toRadiusMm }]
  })
}

function step(stroke: OutlineStroke, toSheet: ToSheet, side: 1 | -1): Step {
  return {
    from: toSheet(stroke.fromZMm, side * stroke.fromRadiusMm),
    to: toSheet(stroke.toZMm, side * stroke.toRadiusMm),
    centre: stroke.kind === 'arc' ? toSheet(stroke.centreZMm, side * stroke.centreRadiusMm) : null,
  }
}

function reversed({ from, to, centre }: Step): Step {
  return { from: to, to: from, centre }
}

/** Arcs of an outline are never more than a quarter, so which way round is read off the corner they make. */
function draw({ from, to, centre }: Step): string {
  if (!centre) return `${at(from)}L${at(to)} `
  const radius = Math.hypot(from.x - centre.x, from.y - centre.y)
  const turn = (from.x - centre.x) * (to.y - centre.y) - (from.y - centre.y) * (to.x - centre.x)
  return `${at(from)}A${round(radius)} ${round(radius)} 0 0 ${turn > 0 ? 1 : 0} ${at(to)}L${at(to)} `
}

function at(point: Point): string {
  return `${round(point.x)} ${round(point.y)} `
}

function round(value: number): number {
  return Math.round(value * 100) / 100
}

function isSmooth(stroke: OutlineStroke, next: OutlineStroke): boolean {
  return Math.abs(endDirection(stroke) - startDirection(next)) < 0.02
}

function endDirection(stroke: OutlineStroke): number {
  if (stroke.kind === 'line')
    return Math.atan2(stroke.toZMm - stroke.fromZMm, stroke.toRadiusMm - stroke.fromRadiusMm)
  return Math.atan2(stroke.toRadiusMm - stroke.centreRadiusMm, stroke.centreZMm - stroke.toZMm)
}

function startDirection(stroke: OutlineStroke): number {
  if (stroke.kind === 'line')
    return Math.atan2(stroke.toZMm - stroke.fromZMm, stroke.toRadiusMm - stroke.fromRadiusMm)
  return Math.atan2(stroke.fromRadiusMm - stroke.centreRadiusMm, stroke.centreZMm - stroke.fromZMm)
}
