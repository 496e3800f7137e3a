import type { CutterGeometry } from '@/core/tooling'
import { radians } from './checked-number'
import { type CutterDimensions, cutterDimensions } from './cutter-dimensions'
import { appendPart, type BodyPiece, chainParts, cornerArc, line, strokesBetween } from './stroke-chain'
import type { OutlinePart, OutlineStroke } from './types'

/**
 * Outline of a whole cutter, from the tip up, a part at a time.
 *
 * Assumes what `cutterDimensions` assumes. A run-out carries the cutting form on; without a neck a thicker shank is a
 * square step at the end of the flutes.
 *
 * Units      Millimetres; z from the tip, radii from the axis.
 * Result     Parts in order: flute, runOut, neck, transition, shank, those that are there. Strokes join end to end.
 * Errors     As `cutterDimensions`.
 *
 * @example
 * cutterOutline({ form: 'square', cuttingDiameterMm: 6, lengthOfCutMm: 12, fluteLengthMm: 12, shankDiameterMm: 6, overallLengthMm: 60 }).map(part => part.part) // => ['flute', 'shank']
 */
export function cutterOutline(cutter: CutterGeometry): OutlinePart[] {
  return outlineOfDimensions(cutterDimensions(cutter))
}

/**
 * As `cutterOutline`, from figures already checked.
 *
 * Units      Millimetres.
 *
 * @example
 * outlineOfDimensions(cutterDimensions({ form: 'ball', cuttingDiameterMm: 6, lengthOfCutMm: 12, shankDiameterMm: 6, overallLengthMm: 60 }))[0].segments[0].kind // => 'arc'
 */
export function outlineOfDimensions(cutter: CutterDimensions): OutlinePart[] {
  const form = formStrokes(cutter)
  const parts: OutlinePart[] = []
  appendPart(parts, 'flute', strokesBetween(form, 0, cutter.lengthOfCutMm))
  appendPart(parts, 'runOut', strokesBetween(form, cutter.lengthOfCutMm, cutter.fluteLengthMm))
  const fluted = parts.at(-1)
  const flutedRadiusMm = fluted?.segments.at(-1)?.toRadiusMm ?? cutter.radiusMm
  const above = chainParts(piecesAboveFlutes(cutter), flutedRadiusMm)
  const firstAbove = above[0]?.segments[0]
  if (fluted && firstAbove && firstAbove.fromRadiusMm < flutedRadiusMm)
    fluted.segments.push(
      line(cutter.fluteLengthMm, flutedRadiusMm, cutter.fluteLengthMm, firstAbove.fromRadiusMm),
    )
  return [...parts, ...above]
}

/** The cutting form from the tip to the end of the flutes. */
function formStrokes(cutter: CutterDimensions): OutlineStroke[] {
  const strokes: OutlineStroke[] = []
  const { radiusMm, cornerRadiusMm, fluteLengthMm } = cutter
  if (Number.isFinite(cutter.pointSlope)) {
    if (cutter.tipRadiusMm > 0) strokes.push(line(0, 0, 0, cutter.tipRadiusMm))
    strokes.push(line(0, cutter.tipRadiusMm, cutter.pointLengthMm, radiusMm))
    if (cutter.pointLengthMm < fluteLengthMm)
      strokes.push(line(cutter.pointLengthMm, radiusMm, fluteLengthMm, radiusMm))
    return strokes
  }
  const taperRad = radians(cutter.taperHalfAngleDeg)
  const flatMm = radiusMm - cornerRadiusMm
  const arcEndZMm = cornerRadiusMm * (1 - Math.sin(taperRad))
  const arcEndRadiusMm = flatMm + cornerRadiusMm * Math.cos(taperRad)
  if (flatMm > 0) strokes.push(line(0, 0, 0, flatMm))
  if (cornerRadiusMm > 0) strokes.push(cornerArc(cornerRadiusMm, flatMm, cornerRadiusMm, arcEndZMm))
  if (arcEndZMm < fluteLengthMm) {
    const endRadiusMm = arcEndRadiusMm + (fluteLengthMm - arcEndZMm) * Math.tan(taperRad)
    strokes.push(line(arcEndZMm, arcEndRadiusMm, fluteLengthMm, endRadiusMm))
  }
  return strokes
}

function piecesAboveFlutes(cutter: CutterDimensions): BodyPiece[] {
  const { neck, shankRadiusMm, overallLengthMm, fluteLengthMm } = cutter
  const pieces: BodyPiece[] = []
  let shankFromMm = fluteLengthMm
  if (neck) {
    pieces.push({
      part: 'neck',
      fromZMm: fluteLengthMm,
      fromRadiusMm: neck.startRadiusMm,
      toZMm: neck.endZMm,
      toRadiusMm: neck.endRadiusMm,
    })
    shankFromMm = neck.fullShankZMm
    const transition = transitionPiece(cutter)
    if (transition) pieces.push(transition)
  }
  if (shankFromMm < overallLengthMm)
    pieces.push({
      part: 'shank',
      fromZMm: shankFromMm,
      fromRadiusMm: shankRadiusMm,
      toZMm: overallLengthMm,
      toRadiusMm: shankRadiusMm,
    })
  return pieces
}

/** Cut off at the overall length where it would pass it; null where the shank is no thicker, or the step is square. */
function transitionPiece({ neck, shankRadiusMm, overallLengthMm }: CutterDimensions): BodyPiece | null {
  if (!neck || neck.fullShankZMm <= neck.endZMm || neck.endZMm >= overallLengthMm) return null
  const toZMm = Math.min(neck.fullShankZMm, overallLengthMm)
  const share = (toZMm - neck.endZMm) / (neck.fullShankZMm - neck.endZMm)
  return {
    part: 'transition',
    fromZMm: neck.endZMm,
    fromRadiusMm: neck.endRadiusMm,
    toZMm,
    toRadiusMm: neck.endRadiusMm + share * (shankRadiusMm - neck.endRadiusMm),
  }
}
