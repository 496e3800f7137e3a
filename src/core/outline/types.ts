/**
 * Outlines: half sections of solids of revolution. `z` is the height above the tool tip (or above a nose face, where a
 * function says so), `radius` the distance from the axis. Millimetres throughout.
 */

export const toolParts = [
  'flute',
  'runOut',
  'neck',
  'transition',
  'shank',
  'extension',
  'nut',
  'holder',
  'spindle',
] as const
export type ToolPart = (typeof toolParts)[number]

interface StrokeEnds {
  fromZMm: number
  fromRadiusMm: number
  toZMm: number
  /** `Infinity` only for the face of a spindle whose width is not known. */
  toRadiusMm: number
}

export interface OutlineLine extends StrokeEnds {
  kind: 'line'
}

/** Part of a circle about (centreZMm, centreRadiusMm); the outline lies outward of and below its centre. */
export interface OutlineArc extends StrokeEnds {
  kind: 'arc'
  centreZMm: number
  centreRadiusMm: number
  arcRadiusMm: number
}

/** Strokes follow one another upwards; none goes down in z. */
export type OutlineStroke = OutlineLine | OutlineArc

export interface OutlinePart {
  part: ToolPart
  segments: OutlineStroke[]
}

/** A length below this is rounding of the arithmetic, not a length. */
export const overlapToleranceMm = 1e-9
