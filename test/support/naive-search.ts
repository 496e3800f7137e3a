import { CoreInputError } from '@/core/core-input-error'
import { holdingOf } from '@/core/reach/holding-messages'
import { reachAnswer } from '@/core/reach/reach-answer'
import { defaultReachSettings, type ReachAnswer, type ReachRequest } from '@/core/reach/types'
import type { AssemblyParts, CribTooling, SearchQuestion } from '@/core/search/types'
import type { Bore, ColletGeometry } from '@/core/tooling'
import { cutterRegions } from './solids'

/*
 * The search as anybody would write it first: every assembly of the crib, one by one, asked of the reach check.
 */

export interface NaiveAssembly extends AssemblyParts {
  request: ReachRequest
  answer: ReachAnswer
  penalty: number
  /** How short it is of everything together; 0 where it reaches. Infinity where it is another tool altogether. */
  shortfallMm: number
}

export interface NaiveSearch {
  assemblies: NaiveAssembly[]
  /** With those whose form the feature refuses. */
  considered: number
}

const tolerance = 1e-9

/** Reach refuses these by the cutter's form and the feature alone. */
const formCodes = [
  'chamfer-not-checked',
  'hole-tool-on-wall',
  'tilt-without-spherical-tip',
  'tilt-out-of-range',
]

export function naiveSearch(tooling: CribTooling, question: SearchQuestion): NaiveSearch {
  const found: NaiveSearch = { assemblies: [], considered: 0 }
  for (const parts of buildable(tooling, question)) {
    const request = requestFor(tooling, question, parts)
    const answer = answerOrCode(request)
    if (typeof answer === 'string') {
      if (formCodes.includes(answer) && canBeAskedOtherwise(request)) found.considered++
      continue
    }
    found.considered++
    const shortfallMm = naiveShortfallMm(request, answer, question)
    found.assemblies.push({ ...parts, request, answer, penalty: penaltyOf(question, parts), shortfallMm })
  }
  return found
}

export function requestFor(
  tooling: CribTooling,
  { feature, purpose, clearances, spindleNoseDiameterMm }: SearchQuestion,
  { cutterIndex, holderIndex, colletIndex, extensionIndex }: AssemblyParts,
): ReachRequest {
  const holder = tooling.holders[holderIndex]!
  const extension = extensionIndex === null ? null : tooling.extensions[extensionIndex]!
  return {
    feature:
      purpose === 'roughing' && feature.kind === 'wall'
        ? { ...feature, insideCornerRadiusMm: null, floorRadiusMm: null }
        : feature,
    cutter: tooling.cutters[cutterIndex]!.geometry,
    holder: spindleNoseDiameterMm ? { ...holder.geometry, spindleNoseDiameterMm } : holder.geometry,
    collet: colletIndex === null ? null : tooling.collets[colletIndex]!.geometry,
    extension: extension?.geometry ?? null,
    bore: (extension ?? holder).bore,
    clearances: clearances ?? null,
    settings: defaultReachSettings,
  }
}

function* buildable(tooling: CribTooling, question: SearchQuestion): Generator<AssemblyParts> {
  const { masks, penalties } = question
  const offered = <Kind>(records: Kind[], mask: Uint8Array | null | undefined) =>
    [...records.keys()].filter((index) => mask?.[index] !== 0)
  const collets = [null, ...offered(tooling.collets, masks?.collets)]
  const geometry = (index: number | null) => (index === null ? null : tooling.collets[index]!.geometry)
  for (const cutterIndex of offered(tooling.cutters, masks?.cutters)) {
    const { shankDiameterMm } = tooling.cutters[cutterIndex]!.geometry
    for (const holderIndex of offered(tooling.holders, masks?.holders)) {
      const holder = tooling.holders[holderIndex]!
      if (!holder.bore) continue
      for (const colletIndex of collets)
        if (isHeld(holder.bore, geometry(colletIndex), shankDiameterMm))
          yield { cutterIndex, holderIndex, colletIndex, extensionIndex: null, extensionColletIndex: null }
      for (const extensionIndex of offered(tooling.extensions, masks?.extensions)) {
        const extension = tooling.extensions[extensionIndex]!
        if (!extension.bore) continue
        const ofExtension = extension.shankDiameterMm
        const ways =
          ofExtension === null
            ? [null]
            : collets.filter((one) => isHeld(holder.bore!, geometry(one), ofExtension))
        if (ways.length === 0) continue
        const extensionColletIndex = ways.reduce((best, one) => {
          const cost = (index: number | null) => (index === null ? 0 : (penalties?.collets?.[index] ?? 0))
          const id = (index: number | null) => (index === null ? '' : tooling.collets[index]!.id)
          return cost(one) < cost(best) || (cost(one) === cost(best) && id(one) < id(best)) ? one : best
        })
        for (const colletIndex of collets)
          if (isHeld(extension.bore, geometry(colletIndex), shankDiameterMm))
            yield { cutterIndex, holderIndex, colletIndex, extensionIndex, extensionColletIndex }
      }
    }
  }
}

/** By the reach check's own words: nothing refused, and no collet missing. */
function isHeld(bore: Bore, collet: ColletGeometry | null, shankDiameterMm: number): boolean {
  const cutter = { form: 'square' as const, cuttingDiameterMm: 1, shankDiameterMm, overallLengthMm: 1 }
  const { refusals, notes } = holdingOf({
    feature: { kind: 'wall', depthMm: 1 },
    holder: { gaugeLengthMm: 1, segments: [] },
    settings: defaultReachSettings,
    bore,
    collet,
    cutter,
  })
  return refusals.length === 0 && notes.every(({ code }) => code !== 'collet-not-given')
}

function answerOrCode(request: ReachRequest): ReachAnswer | string {
  try {
    return reachAnswer(request)
  } catch (error) {
    if (error instanceof CoreInputError) return error.code
    throw error
  }
}

/** Whether the form alone was refused: the same assembly with a plain cutter on a plain wall is answered. */
function canBeAskedOtherwise({ cutter, ...request }: ReachRequest): boolean {
  const plain = { ...cutter, form: 'square' as const, taperHalfAngleDeg: null, cornerRadiusMm: null }
  return (
    typeof answerOrCode({ ...request, cutter: plain, feature: { kind: 'wall', depthMm: 1 } }) !== 'string'
  )
}

function penaltyOf({ penalties }: SearchQuestion, parts: AssemblyParts): number {
  const of = (values: Float64Array | null | undefined, index: number | null) =>
    index === null ? 0 : (values?.[index] ?? 0)
  return (
    of(penalties?.cutters, parts.cutterIndex) +
    of(penalties?.holders, parts.holderIndex) +
    of(penalties?.collets, parts.colletIndex) +
    of(penalties?.collets, parts.extensionColletIndex) +
    of(penalties?.extensions, parts.extensionIndex)
  )
}

/** The stick-out it is set to: the least it needs where its shank allows it, else the longest allowed. */
export function setStickOutMm({ request, answer }: Pick<NaiveAssembly, 'request' | 'answer'>): number {
  const { minimumMm, maximumMm } = answer.stickOut
  if (minimumMm > maximumMm + tolerance) return maximumMm
  const steps = Math.ceil(minimumMm / request.settings.stickOutStepMm - tolerance)
  return Math.min(Math.max(minimumMm, steps * request.settings.stickOutStepMm), maximumMm)
}

/** Everything it is short of, the most of it; from the answer's own figures. */
function naiveShortfallMm(request: ReachRequest, answer: ReachAnswer, question: SearchQuestion): number {
  const { feature, cutter } = request
  const askedMm = feature.depthMm + (feature.kind === 'wall' ? (feature.throughMm ?? 0) : 0)
  const stickOutMm = setStickOutMm({ request, answer })
  const gaugeLengthMm = answer.gaugeLengthMm - answer.stickOut.usedMm + stickOutMm
  const short: number[] = [answer.stickOut.minimumMm - answer.stickOut.maximumMm]
  for (const { code, values } of answer.messages) {
    if (code === 'taper-steeper-than-wall' || code === 'hole-diameter-mismatch')
      return Number.POSITIVE_INFINITY
    if (code === 'opening-too-narrow' || code === 'hole-too-narrow') short.push(values.shortfallMm)
    if (code === 'corner-too-tight' || code === 'floor-radius-too-small') short.push(values.shortfallMm)
    if (code === 'length-of-cut-below-contact')
      short.push(Math.max(tolerance, values.contactHeightMm - values.lengthOfCutMm))
    if (code === 'flutes-strike-obstacle') short.push(askedMm - values.depthMm)
  }
  for (const { part, depthMm } of answer.firstTouch)
    if (['runOut', 'neck', 'transition', 'shank'].includes(part) && depthMm !== null)
      short.push(askedMm - depthMm)
  if (question.longestStickOutToDiameter != null)
    short.push(stickOutMm - question.longestStickOutToDiameter * cutter.cuttingDiameterMm)
  if (question.gaugeLengthMm) {
    short.push(
      question.gaugeLengthMm.shortestMm - gaugeLengthMm,
      gaugeLengthMm - question.gaugeLengthMm.longestMm,
    )
  }
  short.push(...usableShortfalls(request), ...floorShortfalls(request))
  const most = Math.max(...short)
  return most > tolerance ? most : 0
}

/** A hole tool's flutes, with room for chips in a drill's, or its reach length; its point and the break-through go off. */
function usableShortfalls({ feature, cutter }: ReachRequest): number[] {
  if (feature.kind !== 'hole' || !['drill', 'reamer', 'tap'].includes(cutter.form)) return []
  const { cuttingDiameterMm, pointAngleDeg, lengthOfCutMm, reachLengthMm } = cutter
  const usableMm =
    reachLengthMm ?? (lengthOfCutMm ?? 0) - (cutter.form === 'drill' ? 1.5 * cuttingDiameterMm : 0)
  const isPointed = pointAngleDeg != null && pointAngleDeg < 180
  const pointMm = isPointed ? cuttingDiameterMm / 2 / Math.tan((pointAngleDeg * Math.PI) / 360) : 0
  return [feature.depthMm - Math.max(0, usableMm - pointMm - (feature.breakThroughMm ?? 0))]
}

/** How deep any point of the tilted cutter above its length of cut stands in the floor. */
function floorShortfalls({ feature, cutter, clearances, settings }: ReachRequest): number[] {
  if (feature.kind !== 'wall' || !feature.tiltDeg) return []
  const tiltRad = (feature.tiltDeg * Math.PI) / 180
  const ballMm = cutter.cuttingDiameterMm / 2
  const outMm = clearances?.shankMm ?? settings.shankClearanceMm
  const body = cutterRegions(cutter, cutter.overallLengthMm).filter(({ part }) => part !== 'flute')
  return body.flatMap(({ fromMm, toMm, radiusAt }) =>
    [fromMm, toMm].map(
      (zMm) => -(ballMm + (zMm - ballMm) * Math.cos(tiltRad) - (radiusAt(zMm) + outMm) * Math.sin(tiltRad)),
    ),
  )
}
