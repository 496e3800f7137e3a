import type { ToolPart } from '@/core/outline/types'
import type { ReachMessage, ReachMessageCode, ReachMessageValues } from '@/core/reach/message-codes'
import type { Feature, ReachAnswer, ReachLimit, StickOutAnswer } from '@/core/reach/types'
import { decimalText } from '@/core/units/decimal-text'
import { type LengthUnit, lengthDecimals, mmPerInch } from '@/core/units/length-unit'
import { formatAngle } from './format-angle'
import { formatLength } from './format-length'

type LowerBound = StickOutAnswer['boundBy']
type UpperBound = StickOutAnswer['upperBoundBy']

/** Below this a hundredth of a millimetre would round the figure away. */
const fineBelowMm = 0.1

/**
 * A length inside a sentence, where a hundredth of a millimetre or a thousandth of an inch is enough to act on; finer
 * where that would round it away.
 *
 * @example
 * sentenceLength(38.1625, 'mm') // => '38.16 mm'
 * sentenceLength(38.1625, 'in') // => '1.502 in'
 * sentenceLength(0.025, 'mm') // => '0.025 mm'
 */
export function sentenceLength(lengthMm: number, unit: LengthUnit): string {
  // A difference of two lengths carries the arithmetic's own rounding: 3.175 less 3 is a hair below 0.175.
  const mm = Number(lengthMm.toFixed(lengthDecimals))
  if (Math.abs(mm) < fineBelowMm) return formatLength(mm, unit)
  return unit === 'mm' ? `${decimalText(mm, 0, 2)} mm` : `${decimalText(mm / mmPerInch, 3, 3)} in`
}

export const partNames: Readonly<Record<ToolPart | ReachLimit, string>> = {
  flute: 'length of cut',
  runOut: 'run-out',
  neck: 'neck',
  transition: 'transition',
  shank: 'shank',
  extension: 'extension',
  nut: 'nut',
  holder: 'holder',
  spindle: 'spindle face',
  usableLength: 'usable length',
  floor: 'floor',
}

/** What keeps the stick-out from being shorter. */
export const lowerBoundNames: Readonly<Record<LowerBound, string>> = {
  clearance: 'the depth, by what is behind the nose',
  floor: 'the floor, under the tilted holder',
  obstacle: 'an obstacle',
  flutes: 'the end of the flutes: only full shank is clamped',
  neck: 'the end of the neck: only full shank is clamped',
  bore: 'the bottom of the bore',
  sideLock: 'the side-lock’s flat',
}

/** What keeps the stick-out from being longer. */
export const upperBoundNames: Readonly<Record<UpperBound, string>> = {
  grip: 'the least grip',
  sideLock: 'the side-lock’s flat',
}

/**
 * `stops`: the tool can't, or doesn't, because of this. `caution`: it works, and this is to be known. `assumed`: what
 * was taken for granted.
 */
export type MessageKind = 'stops' | 'caution' | 'assumed'

export const messageKinds: Readonly<Record<ReachMessageCode, MessageKind>> = {
  'length-of-cut-assumed': 'assumed',
  'flute-length-assumed': 'assumed',
  'transition-angle-assumed': 'assumed',
  'neck-without-length': 'caution',
  'corner-radius-not-used': 'caution',
  'substrate-assumed': 'assumed',
  'spindle-width-unknown': 'assumed',
  'collet-not-given': 'caution',
  'deflection-not-asked': 'assumed',
  'spindle-taken-as-rigid': 'assumed',
  'collet-range-position': 'assumed',
  'opening-too-narrow': 'stops',
  'hole-too-narrow': 'stops',
  'corner-too-tight': 'stops',
  'floor-radius-too-small': 'stops',
  'hole-diameter-mismatch': 'stops',
  'taper-steeper-than-wall': 'stops',
  'length-of-cut-below-contact': 'stops',
  'flutes-strike-obstacle': 'stops',
  'collet-range-misses-shank': 'stops',
  'collet-of-other-series': 'stops',
  'bore-misses-shank': 'stops',
  'bounds-crossed': 'stops',
  'stick-out-breaks-bound': 'stops',
  'cutter-rubs': 'stops',
  'cutter-strikes-floor': 'stops',
  'holder-strikes-floor': 'stops',
  'usable-length-too-short': 'stops',
  'needed-stick-out-over-maximum': 'stops',
  'longer-stick-out-reaches': 'caution',
  'depth-in-steps': 'caution',
  'wall-lower-than-corner': 'caution',
  'thicker-shank-taken-as-step': 'assumed',
}

/** A length as the sentence being written says it; `size` is for what a tool or a feature is called by, in full. */
type Said = (mm: number) => string

const sentences: {
  [Code in ReachMessageCode]: (values: ReachMessageValues[Code], said: Said, size: Said) => string
} = {
  'length-of-cut-assumed': ({ lengthOfCutMm }, said) =>
    `Only the fluted length was given; its ${said(lengthOfCutMm)} are read as the length of cut.`,
  // Not called missing: where it alone was given it has just been read as the length of cut.
  'flute-length-assumed': ({ fluteLengthMm, runOutMm }, said) =>
    runOutMm > 0
      ? `The flutes are assumed to run out over ${said(runOutMm)} behind the length of cut and to end at ${said(fluteLengthMm)}.`
      : `The flutes are assumed to end with the length of cut, at ${said(fluteLengthMm)}.`,
  'transition-angle-assumed': ({ transitionAngleDeg }) =>
    `The transition from neck to shank is assumed at ${formatAngle(transitionAngleDeg)} a side.`,
  'neck-without-length': ({ neckDiameterMm }, _, size) =>
    `The neck of ${size(neckDiameterMm)} has no reach length, so it is left out and the shank begins at the flutes.`,
  'corner-radius-not-used': ({ cornerRadiusMm }, _, size) =>
    `The corner radius of ${size(cornerRadiusMm)} is not used by this form.`,
  'substrate-assumed': () => 'The tool material was not given; cemented carbide is assumed for stiffness.',
  'spindle-width-unknown': () =>
    'The width of the spindle nose is not known; its face is taken as without end.',
  'collet-not-given': () => 'No collet was given, so nothing checks that one holds this shank.',
  'deflection-not-asked': () => 'No side load was given, so no deflection is worked out.',
  'spindle-taken-as-rigid': ({ fluteStiffnessRatio }) =>
    `Stiffness takes spindle, taper and clamping as rigid, and the flutes as ${decimalText(fluteStiffnessRatio, 0, 2)} of their diameter: the tip gives more than this.`,
  'collet-range-position': ({ minimumMm, maximumMm, shankDiameterMm, positionRatio }, _, size) =>
    `The shank of ${size(shankDiameterMm)} sits ${placeInRange(minimumMm, maximumMm, positionRatio)} of the collet’s range, ${size(minimumMm)} to ${size(maximumMm)}; the small end grips worst.`,

  'opening-too-narrow': ({ openingWidthMm, neededMm, shortfallMm }, _, size) =>
    `The opening of ${size(openingWidthMm)} is too narrow by ${size(shortfallMm)}: this cutter needs ${size(neededMm)}.`,
  'hole-too-narrow': ({ holeDiameterMm, neededMm, shortfallMm }, _, size) =>
    `The hole of ${size(holeDiameterMm)} is too narrow by ${size(shortfallMm)}: this cutter needs ${size(neededMm)}.`,
  'corner-too-tight': ({ insideCornerRadiusMm, toolRadiusMm }, _, size) =>
    `The inside corner of ${size(insideCornerRadiusMm)} is tighter than the tool’s radius of ${size(toolRadiusMm)}.`,
  'floor-radius-too-small': ({ floorRadiusMm, cornerRadiusMm }, _, size) =>
    floorRadiusMm > 0
      ? `The floor’s radius of ${size(floorRadiusMm)} is smaller than the tool’s corner radius of ${size(cornerRadiusMm)}.`
      : `The floor asks for a square end; this cutter has a corner radius of ${size(cornerRadiusMm)}.`,
  'hole-diameter-mismatch': ({ holeDiameterMm, cuttingDiameterMm, toleranceMm }, _, size) =>
    `A tool of ${size(cuttingDiameterMm)} doesn’t make a hole of ${size(holeDiameterMm)}: they may differ by ${size(toleranceMm)}.`,
  'taper-steeper-than-wall': ({ taperHalfAngleDeg, wallDeg, uncutAtFootMm }, _, size) =>
    `The taper of ${formatAngle(taperHalfAngleDeg)} a side is steeper than the wall, ${formatAngle(wallDeg)} as the tool meets it${
      uncutAtFootMm ? `: it would leave ${size(uncutAtFootMm)} at the foot` : ''
    }.`,
  'length-of-cut-below-contact': ({ lengthOfCutMm, contactHeightMm }, said) =>
    `The length of cut of ${said(lengthOfCutMm)} ends below ${said(contactHeightMm)}, where the rounded tip meets the wall.`,
  'flutes-strike-obstacle': ({ depthMm }, said) =>
    `The length of cut strikes an obstacle at a depth of ${said(depthMm)}.`,
  'collet-range-misses-shank': ({ minimumMm, maximumMm, shankDiameterMm }, _, size) =>
    `The collet takes ${size(minimumMm)} to ${size(maximumMm)}; the shank is ${size(shankDiameterMm)}.`,
  'collet-of-other-series': ({ colletSeries, boreSeries }) =>
    boreSeries === null
      ? `The bore takes a plain shank, no collet; this one is of series ${colletSeries}.`
      : `The collet is of series ${colletSeries}; the chuck takes ${boreSeries}.`,
  'bore-misses-shank': ({ boreDiameterMm, shankDiameterMm, toleranceMm }, _, size) =>
    `A bore of ${size(boreDiameterMm)} doesn’t take a shank of ${size(shankDiameterMm)}: they may differ by ${size(toleranceMm)}.`,
  'bounds-crossed': ({ lowerBound, lowerMm, upperBound, upperMm, overlapMm }, said) =>
    `No stick-out is allowed. It must be at least ${said(lowerMm)} (${lowerBoundNames[lowerBound]}) and at most ${said(upperMm)} (${upperBoundNames[upperBound]}): ${said(overlapMm)} are missing.`,
  // Stick-outs to be set or typed are said in full: rounded, the figure itself might break the bound it speaks of.
  'stick-out-breaks-bound': ({ stickOutMm, bound, boundMm, overlapMm }, said, size) =>
    `A stick-out of ${size(stickOutMm)} is ${said(overlapMm)} too ${stickOutMm > boundMm ? 'long' : 'short'}: it must be at ${stickOutMm > boundMm ? 'most' : 'least'} ${size(boundMm)} (${boundName(bound)}).`,
  'cutter-rubs': ({ part, depthMm }, said) =>
    `The ${partNames[part]} of the cutter itself, with its clearance, stops at ${said(depthMm)}: no stick-out helps.`,
  'cutter-strikes-floor': ({ part }) =>
    `Tilted like this, the far side of the ${partNames[part]} stands in the floor: less tilt or another cutter.`,
  'holder-strikes-floor': ({ neededStickOutMm }, said) =>
    `The far side of the tilted holder stands in the floor; it clears at ${said(neededStickOutMm)} stick-out.`,
  'usable-length-too-short': ({ usableDepthMm, shortfallMm }, said) =>
    `The flutes serve to a depth of ${said(usableDepthMm)}, ${said(shortfallMm)} too little.`,
  'needed-stick-out-over-maximum': ({ lowerBound, neededMm, maximumMm, shortfallMm }, said) =>
    `This depth needs ${said(neededMm)} of stick-out (${lowerBoundNames[lowerBound]}), ${said(shortfallMm)} more than the ${said(maximumMm)} allowed.`,
  'longer-stick-out-reaches': ({ requiredMm }, _, size) => `A stick-out of ${size(requiredMm)} would reach.`,

  'depth-in-steps': ({ maximumAxialStepMm, steps }, said) =>
    `One axial step is at most ${said(maximumAxialStepMm)}, so this depth goes in ${steps} steps.`,
  'wall-lower-than-corner': ({ contactHeightMm, leftAtTopMm }, said) =>
    `The wall ends below ${said(contactHeightMm)}, where the rounded tip meets it: ${said(leftAtTopMm)} stay at its top edge.`,
  'thicker-shank-taken-as-step': ({ shankDiameterMm }, _, size) =>
    `Without a neck the shank of ${size(shankDiameterMm)} is taken to begin at the end of the flutes as a square step.`,
}

/**
 * One message of an answer in words, its lengths in the reader's unit.
 *
 * @example
 * messageSentence({ code: 'cutter-rubs', values: { part: 'shank', depthMm: 12.7, shortfallMm: 3 } }, 'mm') // => 'The shank of the cutter itself, with its clearance, stops at 12.7 mm: no stick-out helps.'
 */
export function messageSentence(message: ReachMessage, unit: LengthUnit): string {
  const write = sentences[message.code] as (values: ReachMessage['values'], said: Said, size: Said) => string
  return write(
    message.values,
    (mm) => sentenceLength(mm, unit),
    (mm) => formatLength(mm, unit),
  )
}

/**
 * The verdict as one thing to read, before any figure: does it, at what stick-out, and what touches next.
 *
 * An impossible check names its first reason; one that falls short, what stops it and the stick-out that would do.
 */
export function verdictSentence(answer: ReachAnswer, feature: Feature, unit: LengthUnit): string {
  const said: Said = (mm) => sentenceLength(mm, unit)
  const size: Said = (mm) => formatLength(mm, unit)
  if (answer.verdict === 'impossible') return impossibleSentence(answer, unit)
  const at = `at ${said(answer.stickOut.usedMm)} stick-out`
  if (answer.verdict === 'reaches')
    return `Reaches ${goalWords(feature, size)} ${at}. ${nextSentence(answer, said)}`
  const longer = answer.messages.find(({ code }) => code === 'longer-stick-out-reaches')
  const help = longer ? ` ${messageSentence(longer, unit)}` : ''
  return `${shortSentence(answer, feature, at, said, size)}${help}`
}

function impossibleSentence(answer: ReachAnswer, unit: LengthUnit): string {
  const reason = answer.messages.find(({ code }) => messageKinds[code] === 'stops')
  return reason ? `Impossible. ${messageSentence(reason, unit)}` : 'Impossible.'
}

/**
 * What was asked for, in full: 28.575 mm must not read as reaching 28.58. A wall's through allowance is part of its
 * depth; a hole's break-through is not counted.
 */
function goalWords(feature: Feature, size: Said): string {
  const throughMm = feature.kind === 'wall' ? (feature.throughMm ?? 0) : 0
  return throughMm > 0 ? `${size(feature.depthMm)} and ${size(throughMm)} through` : size(feature.depthMm)
}

function nextSentence({ limitedBy, reachMm }: ReachAnswer, said: Said): string {
  if (limitedBy === null || reachMm === null) return 'Nothing touches at any depth.'
  if (limitedBy === 'usableLength') return `The usable length ends next, at ${said(reachMm)}.`
  return `The ${partNames[limitedBy]} touches next, at ${said(reachMm)}.`
}

function shortSentence(answer: ReachAnswer, feature: Feature, at: string, said: Said, size: Said): string {
  const { limitedBy, reachMm, shortfallMm } = answer
  const goal = goalWords(feature, size)
  if (limitedBy === 'floor' || limitedBy === null || reachMm === null)
    return `Doesn’t reach ${goal} ${at}. The far side of the tilted tool stands in the floor.`
  const first =
    limitedBy === 'usableLength'
      ? `The usable length ends at ${said(reachMm)}.`
      : `The ${partNames[limitedBy]} touches first, at ${said(reachMm)}.`
  return `Falls ${said(shortfallMm)} short of ${goal} ${at}. ${first}`
}

function boundName(bound: LowerBound | UpperBound): string {
  return bound === 'grip' ? upperBoundNames.grip : lowerBoundNames[bound]
}

function placeInRange(minimumMm: number, maximumMm: number, positionRatio: number): string {
  if (maximumMm - minimumMm <= 0) return 'at the one size'
  if (positionRatio < 1 / 3) return 'in the small third'
  return positionRatio > 2 / 3 ? 'in the large third' : 'in the middle'
}
