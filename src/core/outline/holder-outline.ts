import { CoreInputError } from '@/core/core-input-error'
import type { ExtensionGeometry, HolderGeometry, OutlineSegment } from '@/core/tooling'
import { positive, positiveOrNull } from './checked-number'
import { type BodyPiece, chainParts, line } from './stroke-chain'
import { type OutlinePart, overlapToleranceMm, type ToolPart } from './types'

/**
 * Outline of a holder and the spindle face behind it; z from the holder's nose face towards the spindle.
 *
 * Assumes the last diameter is carried up to the gauge line where the segments are shorter. The spindle's face is as
 * wide as the spindle nose where that is known, else without end (`toRadiusMm` is Infinity).
 *
 * Units      Millimetres.
 * Result     nut, holder and spindle parts in order; every body begins with a face from the axis.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `segments-missing`, `segments-too-long`.
 *
 * @example
 * holderOutline({ gaugeLengthMm: 100, segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 28 }] }).map(part => part.part) // => ['nut', 'holder', 'spindle']
 */
export function holderOutline(holder: HolderGeometry): OutlinePart[] {
  const gaugeLengthMm = positive(holder.gaugeLengthMm, 'holder.gaugeLengthMm', 'The gauge length')
  const noseMm = positiveOrNull(
    holder.spindleNoseDiameterMm,
    'holder.spindleNoseDiameterMm',
    'The spindle nose diameter',
  )
  const pieces = segmentPieces(
    holder.segments,
    gaugeLengthMm,
    'holder',
    (index) => holder.segments[index]?.part,
  )
  const spindleRadiusMm = noseMm === null ? Number.POSITIVE_INFINITY : noseMm / 2
  const spindle: OutlinePart = {
    part: 'spindle',
    segments: [line(gaugeLengthMm, 0, gaugeLengthMm, spindleRadiusMm)],
  }
  return [...chainParts(pieces, 0), spindle]
}

/**
 * Outline of an extension; z from its own nose face towards the holder's.
 *
 * Assumes the last diameter is carried up to the holder's nose; all of it is the part `extension`.
 *
 * Units      Millimetres.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `segments-missing`, `segments-too-long`.
 *
 * @example
 * extensionOutline({ projectionMm: 60, segments: [{ lengthMm: 60, noseDiameterMm: 16, spindleDiameterMm: 20 }] })[0].part // => 'extension'
 */
export function extensionOutline(extension: ExtensionGeometry): OutlinePart[] {
  const projectionMm = positive(extension.projectionMm, 'extension.projectionMm', 'The projection')
  return chainParts(
    segmentPieces(extension.segments, projectionMm, 'extension', () => 'extension'),
    0,
  )
}

function segmentPieces(
  segments: OutlineSegment[],
  lengthMm: number,
  owner: 'holder' | 'extension',
  partOf: (index: number) => ToolPart | undefined,
): BodyPiece[] {
  const path = `${owner}.segments`
  if (segments.length === 0)
    throw new CoreInputError('segments-missing', path, `The ${owner} needs at least one segment.`)
  const pieces: BodyPiece[] = []
  let zMm = 0
  let lastRadiusMm = 0
  for (const [index, segment] of segments.entries()) {
    const at = `${path}.${index}`
    const endMm = zMm + positive(segment.lengthMm, `${at}.lengthMm`, 'The segment length')
    lastRadiusMm = positive(segment.spindleDiameterMm, `${at}.spindleDiameterMm`, 'The diameter') / 2
    pieces.push({
      part: partOf(index) ?? owner,
      fromZMm: zMm,
      fromRadiusMm: positive(segment.noseDiameterMm, `${at}.noseDiameterMm`, 'The diameter') / 2,
      toZMm: endMm,
      toRadiusMm: lastRadiusMm,
    })
    zMm = endMm
  }
  if (zMm > lengthMm + overlapToleranceMm)
    throw new CoreInputError('segments-too-long', path, `The segments are longer than the ${owner} itself.`)
  if (zMm < lengthMm)
    pieces.push({
      part: owner,
      fromZMm: zMm,
      fromRadiusMm: lastRadiusMm,
      toZMm: lengthMm,
      toRadiusMm: lastRadiusMm,
    })
  return pieces
}
