import type { CutterForm } from '@/core/tooling'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import { sentenceLength } from '@/lib/reach-sentences'
import type { SectionScene } from './section-scene'

const formWords: Readonly<Record<CutterForm, string>> = {
  square: 'square end mill',
  cornerRadius: 'corner radius end mill',
  ball: 'ball end mill',
  tapered: 'tapered end mill',
  drill: 'drill',
  reamer: 'reamer',
  tap: 'tap',
  faceMill: 'face mill',
  slotting: 'slotting cutter',
  threadMill: 'thread mill',
  chamfer: 'chamfer tool',
}

/** What the drawing shows, for those who hear it. */
export function sectionSentence(scene: SectionScene, verdict: string | null, unit: LengthUnit): string {
  const said = (mm: number) => sentenceLength(mm, unit)
  const { cutter, heights } = scene
  const held = heights.noseMm === null ? '' : `, ${said(heights.noseMm)} out of its chuck`
  const tool = `Section of a ${formWords[cutter.form]} of ${formatLength(2 * cutter.radiusMm, unit)}${held}`
  return `${tool}, ${featureWords(scene, said)}.${verdict ? ` ${verdict}` : ''}`
}

function featureWords({ feature, at }: SectionScene, said: (mm: number) => string): string {
  if (feature.kind === 'hole')
    return `in a hole of ${said(feature.diameterMm)}, ${said(feature.depthMm)} deep`
  const draftDeg = at.kind === 'wall' ? at.draftDeg : 0
  const tiltDeg = at.kind === 'wall' ? at.tiltDeg : 0
  return [
    `against a wall ${said(feature.depthMm)} deep`,
    draftDeg > 0 ? ` with ${formatAngle(draftDeg)} of draft` : '',
    tiltDeg > 0 ? `, tilted ${formatAngle(tiltDeg)} away from it` : '',
    feature.openingWidthMm == null ? '' : `, in an opening of ${said(feature.openingWidthMm)}`,
    feature.insideCornerRadiusMm ? `, inside corners of ${said(feature.insideCornerRadiusMm)} radius` : '',
    feature.obstacles?.length ? `, with ${feature.obstacles.length} standing beside it` : '',
  ].join('')
}
