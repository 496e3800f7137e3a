import type { NearMiss, SearchChange, Shortfall, SortedOut, SortedOutReason } from '@/core/search/types'
import type { Substrate } from '@/core/tooling'
import { decimalText } from '@/core/units/decimal-text'
import type { LengthUnit } from '@/core/units/length-unit'
import type { SearchRanking } from '@/schemas/reach-search'
import { formatAngle } from './format-angle'
import { formatLength } from './format-length'
import { formatMoney } from './format-money'
import { lowerBoundNames, partNames, sentenceLength, upperBoundNames } from './reach-sentences'

/** What an assembly is called by: the shop's codes of its parts. */
export interface AssemblyNames {
  holder: string
  collet: string | null
  extension: string | null
}

/** `X-003 in H-012 with C-044`: what holds the cutter. */
export function holdingWords({ holder, collet, extension }: AssemblyNames): string {
  const held = extension === null ? holder : `${extension} in ${holder}`
  return collet === null ? held : `${held} with ${collet}`
}

/** Why a near miss does not reach, the most that is short first. */
export function nearMissSentence(
  miss: Pick<NearMiss, 'shortfalls' | 'stickOut'>,
  names: AssemblyNames,
  unit: LengthUnit,
): string {
  const [first, ...others] = miss.shortfalls.map((shortfall) =>
    shortfallSentence(shortfall, miss, names, unit),
  )
  return [first, ...others.map((sentence) => `Also: ${lowerFirst(sentence)}`)].join(' ')
}

function shortfallSentence(
  { by, shortfallMm }: Shortfall,
  { stickOut }: Pick<NearMiss, 'stickOut'>,
  names: AssemblyNames,
  unit: LengthUnit,
): string {
  const said = (mm: number) => sentenceLength(mm, unit)
  const short = said(shortfallMm)
  switch (by) {
    case 'extension':
    case 'nut':
    case 'holder':
    case 'spindle':
      return behindNoseSentence(by, shortfallMm, stickOut, names, said)
    case 'grip':
    case 'sideLock':
      return `Too little shank is left to hold in ${holdingWords(names)}: at least ${said(stickOut.neededMm)} of it must stand out (${lowerBoundNames[stickOut.neededBy]}), at most ${said(stickOut.maximumMm)} may (${upperBoundNames[stickOut.maximumBy]}); ${short} are missing.`
    case 'flute':
      return `The length of cut strikes an obstacle ${short} before the depth.`
    case 'runOut':
    case 'neck':
    case 'transition':
    case 'shank':
      return `The ${partNames[by]} of the cutter itself stops it ${short} before the depth, whatever the stick-out.`
    case 'floor':
      return `The far side of the tilted tool stands ${short} in the floor.`
    case 'opening':
      return `It is ${short} too wide for the opening.`
    case 'cornerRadius':
      return `Its radius is ${short} too large for the inside corner.`
    case 'floorRadius':
      return `Its corner radius is ${short} larger than the floor’s.`
    case 'lengthOfCut':
      return `The length of cut ends ${short} below where the tip would meet the wall.`
    case 'usableLength':
      return `Its usable length ends ${short} before the depth.`
    case 'scallop':
      return `The cusp between passes would be ${short} too high.`
    case 'stickOutToDiameter':
      return `It would stand out ${short} more than the longest stick-out to diameter allows.`
    case 'gaugeLength':
      return `Its gauge length is ${short} outside what the machine takes.`
  }
}

/** What stands behind the nose touches: the shank would have to come out farther than it may. */
function behindNoseSentence(
  part: 'extension' | 'nut' | 'holder' | 'spindle',
  shortfallMm: number,
  stickOut: NearMiss['stickOut'],
  names: AssemblyNames,
  said: (mm: number) => string,
): string {
  const missingMm = stickOut.neededMm - stickOut.maximumMm
  if (missingMm <= 0) return `The ${partNames[part]} touches ${said(shortfallMm)} before the depth.`
  const held = holdingWords(names)
  const needed = `${said(stickOut.neededMm)} of stick-out would keep the ${partNames[part]} clear`
  return stickOut.maximumBy === 'sideLock'
    ? `The side-lock’s flat in ${held} sets the stick-out ${said(missingMm)} too short: ${needed}, it sets ${said(stickOut.maximumMm)}.`
    : `Grip short by ${said(missingMm)} in ${held}: ${needed}, the longest that is still held is ${said(stickOut.maximumMm)}.`
}

/** A change that would make it reach. `names` are those of the assembly it leads to, where it leads to another. */
export function changeSentence(change: SearchChange, names: AssemblyNames | null, unit: LengthUnit): string {
  const size = (mm: number) => formatLength(mm, unit)
  switch (change.kind) {
    case 'holder':
    case 'extension':
      return `Reaches in ${names ? holdingWords(names) : 'another holder'} at ${size(change.option.stickOutMm)} stick-out; the filters leave that out.`
    case 'stickOut':
      return `Reaches with ${size(change.stickOutMm)} of stick-out, which the machine asks for.`
    case 'nut':
      return `A nut no wider than ${sentenceLength(change.nutDiameterMm, unit)} on this chuck would do; this one is ${sentenceLength(change.ofNutDiameterMm, unit)}.`
    case 'draft':
      return `${formatAngle(change.moreDeg)} more draft on the wall would do: ${formatAngle(change.draftDeg)}, at ${size(change.stickOutMm)} stick-out.`
    case 'tilt':
      return `${formatAngle(change.moreDeg)} more tilt would do: ${formatAngle(change.tiltDeg)}, at ${size(change.stickOutMm)} stick-out.`
    case 'stickOutToDiameter':
      return `Reaches if ${decimalText(Math.ceil(change.stickOutToDiameter * 100) / 100, 0, 2)} diameters of stick-out are allowed, ${size(change.stickOutMm)}.`
  }
}

/** What an option's place in the list is judged by. */
export interface RankedOption {
  complianceUmPerN: number
  stickOutMm: number
  gaugeLengthMm: number
  cuttingDiameterMm: number
  substrate: Substrate | null
  hasExtension: boolean
  /** Parts of it that are not there now, in words. */
  missingParts: readonly string[]
  /** Minor units; null where a part has no cost, undefined where costs are not shown. */
  cost: number | null | undefined
  /** The assembly it stands ready as. */
  builtAs: { number: number; place: string } | null
}

export interface RankingContext {
  rankBy: SearchRanking
  /** The first of the list. */
  first: RankedOption
  /** How many reach. */
  reachable: number
  currency: string
  unit: LengthUnit
}

/** Why an option stands where it stands. */
export function rankSentence(option: RankedOption, context: RankingContext): string {
  switch (context.rankBy) {
    case 'stiffness':
      return placeWords(option, context)
    case 'stock':
      return `${stockWords(option)} ${placeWords(option, context)}`
    case 'built':
      return `${builtWords(option)} ${placeWords(option, context)}`
    case 'cost':
      return costWords(option, context)
  }
}

/** Its place by stiffness: of the first, among what it is first of. */
function placeWords(option: RankedOption, { rankBy, first, reachable, unit }: RankingContext): string {
  if (option !== first) return stiffnessWords(option, first, unit)
  if (reachable === 1 && option.builtAs === null) return 'The only one that reaches.'
  if (rankBy === 'stock')
    return option.missingParts.length === 0
      ? 'The stiffest of what can be built now.'
      : 'Nothing that reaches is all in stock; least is missing here.'
  if (rankBy === 'built' && option.builtAs !== null) return 'The stiffest of what does.'
  return `The stiffest of the ${counted(reachable)} that reach.`
}

function stockWords({ missingParts }: RankedOption): string {
  return missingParts.length === 0
    ? 'Every part is in stock.'
    : `Not in stock now: ${missingParts.join(', ')}.`
}

function builtWords({ builtAs }: RankedOption): string {
  return builtAs === null ? 'Not built yet.' : `Stands ready as assembly ${builtAs.number}, ${builtAs.place}.`
}

function costWords(option: RankedOption, context: RankingContext): string {
  const { first, reachable, currency, unit } = context
  if (option.cost == null) return `What a part of it costs is not known. ${placeWords(option, context)}`
  if (option === first)
    return reachable === 1
      ? 'The only one that reaches.'
      : `The least cost of the ${counted(reachable)} that reach.`
  const moreMinor = option.cost - (first.cost ?? 0)
  const more =
    moreMinor === 0
      ? 'Costs the same as the first.'
      : `${formatMoney(moreMinor, currency)} more than the first.`
  return `${more} ${stiffnessWords(option, first, unit)}`
}

const sameStiffness = 0.005
const mostDifferences = 2

function stiffnessWords(option: RankedOption, first: RankedOption, unit: LengthUnit): string {
  const times = option.complianceUmPerN / first.complianceUmPerN
  if (Math.abs(times - 1) < sameStiffness) return 'As stiff as the first.'
  if (times < 1) return `Bends ${decimalText(times, 2, 2)} times as much as the first: it is stiffer.`
  const why = differences(option, first, unit)
  return `Bends ${decimalText(times, 2, 2)} times as much as the first${why.length > 0 ? `: ${why.join(', ')}` : ''}.`
}

/** What makes an option give more than another, the weightiest first. */
function differences(option: RankedOption, first: RankedOption, unit: LengthUnit): string[] {
  const size = (mm: number) => formatLength(mm, unit)
  const said = (mm: number) => sentenceLength(mm, unit)
  const moreStickOutMm = option.stickOutMm - first.stickOutMm
  const moreHolderMm = option.gaugeLengthMm - first.gaugeLengthMm - moreStickOutMm
  return [
    option.cuttingDiameterMm < first.cuttingDiameterMm
      ? `a cutter of ${size(option.cuttingDiameterMm)}, not ${size(first.cuttingDiameterMm)}`
      : null,
    option.substrate === 'hss' && first.substrate !== 'hss' ? 'high-speed steel' : null,
    moreStickOutMm > 0 ? `${said(moreStickOutMm)} more stick-out` : null,
    option.hasExtension && !first.hasExtension
      ? 'an extension'
      : moreHolderMm > 0
        ? `${said(moreHolderMm)} longer behind it`
        : null,
  ]
    .filter((words) => words !== null)
    .slice(0, mostDifferences)
}

const cutterReasons: Partial<Record<SortedOutReason, string>> = {
  cutterForm: 'of a form that makes no such feature',
  holeDiameter: 'not of the hole’s diameter',
  taperSteeperThanWall: 'with more taper than the wall',
  lengthOfCut: 'with too short a length of cut for the tip to meet the wall',
  opening: 'too wide for the opening',
  cornerRadius: 'too thick for the inside corner',
  floorRadius: 'with too large a corner radius for the floor',
  scallop: 'leaving too high a cusp',
  cutterTouches: 'stopped before the depth by their own neck or shank',
  usableLength: 'too short in their usable length',
  cutterInFloor: 'standing in the floor, tilted like this',
  shankNotHeld: 'with a shank that nothing offered holds',
}

/** What kept cutters from being tried in anything, the commonest reason first; null where nothing did. */
export function noCutterSentence(sortedOut: SortedOut): string | null {
  const reasons = (Object.keys(cutterReasons) as SortedOutReason[])
    .filter((reason) => sortedOut[reason] > 0)
    .toSorted((one, other) => sortedOut[other] - sortedOut[one])
  if (reasons.length === 0) return null
  const said = reasons.map((reason) => `${counted(sortedOut[reason])} ${cutterReasons[reason]}`)
  return `Of the cutters looked at: ${said.join('; ')}.`
}

function counted(count: number): string {
  return count.toLocaleString('en')
}

function lowerFirst(sentence: string): string {
  return sentence.charAt(0).toLowerCase() + sentence.slice(1)
}
