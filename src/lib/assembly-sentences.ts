import type {
  AssemblyPartKind,
  AssemblyState,
  FindingDetail,
  OffsetName,
  SizeChange,
} from '@/core/assemblies/types'
import type { Feature } from '@/core/reach/types'
import type { Bore, OutlineSegment } from '@/core/tooling'
import type { LengthUnit } from '@/core/units/length-unit'
import { cutterFormNames, substrateNames } from './cutter-words'
import { formatAngle } from './format-angle'
import { formatLength } from './format-length'
import { sentenceLength, verdictSentence } from './reach-sentences'

export const assemblyStateNames: Readonly<Record<AssemblyState, string>> = {
  planned: 'Planned',
  built: 'Built',
  brokenDown: 'Broken down',
}

export const assemblyPartNames: Readonly<Record<AssemblyPartKind, string>> = {
  cutter: 'Cutter',
  collet: 'Collet',
  extension: 'Extension',
  extensionCollet: 'Collet of the extension',
  holder: 'Holder',
}

const offsetWords: Readonly<Record<OffsetName, string>> = {
  gaugeLength: 'gauge length to expect',
  diameter: 'cutting diameter',
  cornerRadius: 'corner radius',
}

const sizeWords: Readonly<Record<string, string>> = {
  form: 'form',
  cuttingDiameterMm: 'cutting diameter',
  cornerRadiusMm: 'corner radius',
  taperHalfAngleDeg: 'taper a side',
  pointAngleDeg: 'point angle',
  tipDiameterMm: 'tip diameter',
  lengthOfCutMm: 'length of cut',
  fluteLengthMm: 'fluted length',
  neckDiameterMm: 'neck diameter',
  neckTaperHalfAngleDeg: 'neck taper a side',
  reachLengthMm: 'reach length',
  neckTransitionAngleDeg: 'transition angle a side',
  shankDiameterMm: 'shank diameter',
  overallLengthMm: 'overall length',
  substrate: 'tool material',
  gaugeLengthMm: 'gauge length',
  bore: 'bore',
  boreDepthMm: 'bore depth',
  minimumGripMm: 'least grip',
  gripStartMm: 'start of grip',
  sideLockInsertionMm: 'side-lock insertion',
  segments: 'outline',
  series: 'series',
  minimumMm: 'smallest shank',
  maximumMm: 'largest shank',
  lengthMm: 'length',
  projectionMm: 'projection',
}

/**
 * One changed size, before and after.
 *
 * @example
 * sizeChangeWords({ field: 'gaugeLengthMm', before: 100, after: 98 }, 'mm') // => 'gauge length 100 mm → 98 mm'
 */
export function sizeChangeWords({ field, before, after }: SizeChange, unit: LengthUnit): string {
  const said = (value: unknown) => sizeWord(field, value, unit)
  return `${sizeWords[field] ?? field} ${said(before)} → ${said(after)}`
}

function sizeWord(field: string, value: unknown, unit: LengthUnit): string {
  if (value === null || value === undefined) return 'not given'
  if (typeof value === 'number') return field.endsWith('Deg') ? formatAngle(value) : formatLength(value, unit)
  if (Array.isArray(value)) return outlineWords(value as OutlineSegment[], unit)
  if (typeof value === 'object') return boreWords(value as Bore, unit)
  const names: Readonly<Record<string, string>> = field === 'form' ? cutterFormNames : substrateNames
  return names[String(value)]?.toLowerCase() ?? String(value)
}

function boreWords(bore: Bore, unit: LengthUnit): string {
  return bore.kind === 'collet' ? `${bore.series} collets` : formatLength(bore.diameterMm, unit)
}

/** `18 × Ø28, 50 × Ø32 to 36`, from the nose face up. */
function outlineWords(segments: readonly OutlineSegment[], unit: LengthUnit): string {
  const bare = (mm: number) => formatLength(mm, unit, { withUnit: false })
  return segments
    .map(({ lengthMm, noseDiameterMm, spindleDiameterMm }) => {
      const wide = spindleDiameterMm === noseDiameterMm ? '' : ` to ${bare(spindleDiameterMm)}`
      return `${bare(lengthMm)} × Ø${bare(noseDiameterMm)}${wide}`
    })
    .join(', ')
}

/**
 * A feature by what it is called: what it is and how deep.
 *
 * @example
 * featureWords({ kind: 'wall', depthMm: 25, draftDeg: 3 }, 'mm') // => 'Wall 25 mm deep, draft 3°'
 */
export function featureWords(feature: Feature, unit: LengthUnit): string {
  const size = (mm: number) => formatLength(mm, unit)
  if (feature.kind === 'hole') return `Hole Ø${size(feature.diameterMm)}, ${size(feature.depthMm)} deep`
  return [
    `Wall ${size(feature.depthMm)} deep`,
    feature.draftDeg ? `draft ${formatAngle(feature.draftDeg)}` : null,
    feature.tiltDeg ? `tilt ${formatAngle(feature.tiltDeg)}` : null,
    feature.openingWidthMm ? `opening ${size(feature.openingWidthMm)}` : null,
    feature.insideCornerRadiusMm ? `inside corner R ${size(feature.insideCornerRadiusMm)}` : null,
    feature.floorRadiusMm === 0 ? 'square floor' : null,
    feature.floorRadiusMm ? `floor R ${size(feature.floorRadiusMm)}` : null,
    feature.throughMm ? `through ${size(feature.throughMm)}` : null,
    feature.obstacles?.length
      ? `${feature.obstacles.length} ${feature.obstacles.length === 1 ? 'obstacle' : 'obstacles'}`
      : null,
  ]
    .filter(Boolean)
    .join(', ')
}

/** What was found about an assembly, in one or two sentences, its lengths in the reader's unit. */
export function findingSentence(detail: FindingDetail, unit: LengthUnit): string {
  switch (detail.code) {
    case 'sizesChanged':
      return `${assemblyPartNames[detail.part]}: ${detail.changes.map((change) => sizeChangeWords(change, unit)).join('; ')}.`
    case 'offsetChanged':
      return `The ${offsetWords[detail.offset]} was ${formatLength(detail.beforeMm, unit)} and is ${formatLength(detail.afterMm, unit)} now.`
    case 'checkFails':
      return `${featureWords(detail.feature, unit)}: ${verdictSentence(detail.answer, detail.feature, unit)}`
    case 'checkFailsAsMeasured':
      return `${featureWords(detail.feature, unit)}, as measured: ${verdictSentence(detail.answer, detail.feature, unit)}`
    case 'checkImpossible':
      return detail.message
    case 'partGone':
      return goneSentence(detail)
    case 'partArchived':
      return `${assemblyPartNames[detail.part]}: its item is archived.`
  }
}

function goneSentence({ part, held, claimed }: Extract<FindingDetail, { code: 'partGone' }>): string {
  const name = assemblyPartNames[part]
  if (claimed === 1) return `${name}: by the books it is no longer with the assembly.`
  return `${name}: by the books ${held} of ${claimed} are left where ${claimed} assemblies have theirs. See which is without.`
}

/**
 * How far a measured figure is from the calculated one, with its sign.
 *
 * @example
 * differenceWords(139.62, 139.5, 'mm') // => '+0.12 mm'
 * differenceWords(139.5, 139.5, 'mm') // => '0 mm'
 */
export function differenceWords(measuredMm: number, calculatedMm: number, unit: LengthUnit): string {
  const differenceMm = measuredMm - calculatedMm
  const said = sentenceLength(Math.abs(differenceMm), unit)
  if (Math.abs(differenceMm) < 1e-9) return said
  return `${differenceMm > 0 ? '+' : '−'}${said}`
}
