import type { Feature } from '@/core/reach/types'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import type { SearchPurpose } from '@/schemas/reach-search'

/** What was asked for, in one line: it stands where the fields were once the answer is there. */
export function featureWords(feature: Feature, purpose: SearchPurpose | null, unit: LengthUnit): string {
  const size = (mm: number) => formatLength(mm, unit)
  const words = feature.kind === 'hole' ? holeWords(feature, size) : wallWords(feature, size)
  return [...words, purpose === 'roughing' ? 'to rough' : purpose === 'finishing' ? 'to finish' : null]
    .filter((word) => word !== null)
    .join(', ')
}

type Size = (mm: number) => string

function holeWords(feature: Extract<Feature, { kind: 'hole' }>, size: Size): (string | null)[] {
  return [
    `Hole ${size(feature.diameterMm)}, ${size(feature.depthMm)} deep`,
    feature.breakThroughMm ? `${size(feature.breakThroughMm)} through` : null,
  ]
}

function wallWords(feature: Extract<Feature, { kind: 'wall' }>, size: Size): (string | null)[] {
  const count = feature.obstacles?.length ?? 0
  return [
    `Wall ${size(feature.depthMm)} deep`,
    feature.throughMm ? `${size(feature.throughMm)} through` : null,
    feature.draftDeg ? `draft ${formatAngle(feature.draftDeg)}` : null,
    feature.tiltDeg ? `tilt ${formatAngle(feature.tiltDeg)}` : null,
    feature.openingWidthMm == null ? null : `opening ${size(feature.openingWidthMm)}`,
    feature.insideCornerRadiusMm == null ? null : `inside corner ${size(feature.insideCornerRadiusMm)}`,
    feature.floorRadiusMm == null
      ? null
      : feature.floorRadiusMm === 0
        ? 'square floor'
        : `floor radius ${size(feature.floorRadiusMm)}`,
    count > 0 ? `${count} ${count === 1 ? 'obstacle' : 'obstacles'} beside it` : null,
  ]
}
