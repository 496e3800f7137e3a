import type { OutlineArc, OutlinePart, OutlineStroke, ToolPart } from './types'

/** A straight piece of a body, before the steps between pieces are drawn. */
export interface BodyPiece {
  part: ToolPart
  fromZMm: number
  fromRadiusMm: number
  toZMm: number
  toRadiusMm: number
}

/**
 * A straight stroke from one point of the outline to another.
 *
 * Units      Millimetres.
 *
 * @example
 * line(0, 0, 0, 3).toRadiusMm // => 3
 */
export function line(
  fromZMm: number,
  fromRadiusMm: number,
  toZMm: number,
  toRadiusMm: number,
): OutlineStroke {
  return { kind: 'line', fromZMm, fromRadiusMm, toZMm, toRadiusMm }
}

/**
 * The pieces as outline parts, the square steps between them drawn.
 *
 * Assumes the pieces follow one another upwards. A step belongs to the thicker side: a face looking down to the part
 * above it, a face looking up to the part below it. The first piece begins with a face from `baseRadiusMm`.
 *
 * Units      Millimetres.
 * Result     One entry for every run of pieces of the same part; pieces without length and step are left out.
 *
 * @example
 * chainParts([{ part: 'nut', fromZMm: 0, fromRadiusMm: 14, toZMm: 18, toRadiusMm: 14 }], 0)[0].segments.length // => 2
 */
export function chainParts(pieces: BodyPiece[], baseRadiusMm: number): OutlinePart[] {
  const parts: OutlinePart[] = []
  let radiusMm = baseRadiusMm
  for (const piece of pieces) {
    const below = parts.at(-1)
    if (piece.fromRadiusMm < radiusMm && below)
      below.segments.push(line(piece.fromZMm, radiusMm, piece.fromZMm, piece.fromRadiusMm))
    const strokes: OutlineStroke[] = []
    if (piece.fromRadiusMm > radiusMm)
      strokes.push(line(piece.fromZMm, radiusMm, piece.fromZMm, piece.fromRadiusMm))
    if (piece.toZMm > piece.fromZMm)
      strokes.push(line(piece.fromZMm, piece.fromRadiusMm, piece.toZMm, piece.toRadiusMm))
    appendPart(parts, piece.part, strokes)
    radiusMm = piece.toRadiusMm
  }
  return parts
}

/**
 * Adds strokes to the last part where it is the same part, else begins a new one. Changes `parts`.
 *
 * @example
 * appendPart([], 'shank', []) // => undefined
 */
export function appendPart(parts: OutlinePart[], part: ToolPart, strokes: OutlineStroke[]): void {
  if (strokes.length === 0) return
  const last = parts.at(-1)
  if (last?.part === part) last.segments.push(...strokes)
  else parts.push({ part, segments: strokes })
}

/**
 * Radius of a stroke at a height within it.
 *
 * Assumes the stroke rises: a flat face has no single radius.
 *
 * Units      Millimetres.
 *
 * @example
 * strokeRadius(line(0, 2, 10, 4), 5) // => 3
 */
export function strokeRadius(stroke: OutlineStroke, zMm: number): number {
  if (stroke.kind === 'arc') {
    const below = Math.max(0, stroke.centreZMm - zMm)
    return stroke.centreRadiusMm + Math.sqrt(Math.max(0, stroke.arcRadiusMm ** 2 - below ** 2))
  }
  const part = (zMm - stroke.fromZMm) / (stroke.toZMm - stroke.fromZMm)
  return stroke.fromRadiusMm + part * (stroke.toRadiusMm - stroke.fromRadiusMm)
}

/**
 * What of the strokes lies from one height to another, cut at both.
 *
 * Assumes a flat face exactly at `fromZMm` belongs below it, except at height 0.
 *
 * Units      Millimetres.
 *
 * @example
 * strokesBetween([line(0, 3, 20, 3)], 5, 12)[0].toZMm // => 12
 */
export function strokesBetween(strokes: OutlineStroke[], fromZMm: number, toZMm: number): OutlineStroke[] {
  const cut: OutlineStroke[] = []
  for (const stroke of strokes) {
    const isFace = stroke.fromZMm === stroke.toZMm
    if (isFace) {
      if (stroke.fromZMm <= toZMm && (stroke.fromZMm > fromZMm || fromZMm === 0)) cut.push(stroke)
      continue
    }
    const startMm = Math.max(fromZMm, stroke.fromZMm)
    const endMm = Math.min(toZMm, stroke.toZMm)
    if (startMm < endMm) cut.push(clip(stroke, startMm, endMm))
  }
  return cut
}

function clip(stroke: OutlineStroke, startMm: number, endMm: number): OutlineStroke {
  if (startMm === stroke.fromZMm && endMm === stroke.toZMm) return stroke
  return {
    ...stroke,
    fromZMm: startMm,
    fromRadiusMm: startMm === stroke.fromZMm ? stroke.fromRadiusMm : strokeRadius(stroke, startMm),
    toZMm: endMm,
    toRadiusMm: endMm === stroke.toZMm ? stroke.toRadiusMm : strokeRadius(stroke, endMm),
  }
}

/**
 * The quarter of a circle, or less, that rounds a corner, from straight below its centre up to a height.
 *
 * Units      Millimetres.
 *
 * @example
 * cornerArc(3, 0, 3, 3).toRadiusMm // => 3
 */
export function cornerArc(
  centreZMm: number,
  centreRadiusMm: number,
  arcRadiusMm: number,
  toZMm: number,
): OutlineArc {
  const below = centreZMm - toZMm
  return {
    kind: 'arc',
    fromZMm: centreZMm - arcRadiusMm,
    fromRadiusMm: centreRadiusMm,
    toZMm,
    toRadiusMm: centreRadiusMm + Math.sqrt(Math.max(0, arcRadiusMm ** 2 - below ** 2)),
    centreZMm,
    centreRadiusMm,
    arcRadiusMm,
  }
}
