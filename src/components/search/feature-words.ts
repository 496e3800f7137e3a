import type { Feature } from '@/core/reach/types'
import type { LengthUnit } from '@/core/units/length-unit'
import { cutterFormNames, substrateNames } from '@/lib/cutter-words'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import type { SearchPurpose } from '@/schemas/reach-search'
import type { SearchDraft } from './search-question'

/** What was asked for, in one line: it stands where the fields were once the answer is there. */
export function featureWords(feature: Feature, purpose: SearchPurpose | null, unit: LengthUnit): string {
  const size = (mm: number) => formatLength(mm, unit)
  const words = feature.kind === 'hole' ? holeWords(feature, size) : wallWords(feature, size)
  return [...words, purpose === 'roughing' ? 'to rough' : purpose === 'finishing' ? 'to finish' : null]
    .filter((word) => word !== null)
    .join(', ')
}

/** What else was chosen: the material, and what of the crib is looked through; null where nothing was. */
export function filterWords({
  choices,
  texts,
  cutMaterial,
}: Pick<SearchDraft, 'choices' | 'texts' | 'cutMaterial'>): string | null {
  const words = [
    choices.material === null ? null : `in ${choices.material}`,
    choices.forms.length === 0
      ? null
      : `only ${choices.forms.map((form) => cutterFormNames[form].toLowerCase()).join(', ')}`,
    choices.substrates.length === 0
      ? null
      : `only of ${choices.substrates.map((substrate) => substrateNames[substrate]).join(', ')}`,
    texts.ratio.trim() === '' ? null : `at most ${texts.ratio.trim()} × DC out`,
    cutMaterial === null ? null : 'a cut estimated for each',
  ].filter((word) => word !== null)
  return words.length === 0 ? null : words.join('; ')
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
