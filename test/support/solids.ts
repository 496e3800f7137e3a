import type { Feature, ReachRequest } from '@/core/reach/types'
import type { CutterGeometry, ExtensionGeometry, HolderGeometry } from '@/core/tooling'

/*
 * The tool as solids of revolution, written down from the tables of parts and nothing else: what the two oracles stand
 * on. Nothing here comes from src/core but types.
 */

export type Keeps = 'nothing' | 'shankClearance' | 'holderClearance'

export interface SolidRegion {
  part: string
  keeps: Keeps
  fromMm: number
  toMm: number
  radiusAt: (zMm: number) => number
  /** Its far side is not looked at: a spindle of unknown width. */
  isEndless: boolean
}

/** Stands in for a face without end. */
const endlessMm = 5000

const degree = Math.PI / 180
const isHoleTool = (cutter: CutterGeometry) => ['drill', 'reamer', 'tap'].includes(cutter.form)

export function lengthOfCutMm(cutter: CutterGeometry): number {
  return cutter.lengthOfCutMm ?? cutter.fluteLengthMm ?? 0
}

function fluteLengthMm(cutter: CutterGeometry): number {
  if (cutter.lengthOfCutMm != null && cutter.fluteLengthMm != null) return cutter.fluteLengthMm
  const hasNeck = cutter.neckDiameterMm != null && (cutter.reachLengthMm ?? 0) > lengthOfCutMm(cutter)
  const runOutMm = hasNeck ? 0 : 0.5 * cutter.cuttingDiameterMm
  return Math.min(lengthOfCutMm(cutter) + runOutMm, cutter.overallLengthMm)
}

export function cornerRadiusMm(cutter: CutterGeometry): number {
  if (cutter.form === 'ball') return cutter.cuttingDiameterMm / 2
  return cutter.form === 'cornerRadius' || cutter.form === 'tapered' ? (cutter.cornerRadiusMm ?? 0) : 0
}

/** The cutting form, carried on without end. */
export function formRadiusMm(cutter: CutterGeometry, zMm: number): number {
  const r = cutter.cuttingDiameterMm / 2
  if (isHoleTool(cutter)) {
    const halfDeg = (cutter.pointAngleDeg ?? 180) / 2
    return halfDeg >= 90 ? r : Math.min(r, zMm * Math.tan(halfDeg * degree))
  }
  const corner = cornerRadiusMm(cutter)
  const taper = cutter.form === 'tapered' ? (cutter.taperHalfAngleDeg ?? 0) * degree : 0
  const arcTopMm = corner * (1 - Math.sin(taper))
  if (zMm < arcTopMm) return r - corner + Math.sqrt(corner * corner - (corner - zMm) * (corner - zMm))
  return r - corner + corner * Math.cos(taper) + (zMm - arcTopMm) * Math.tan(taper)
}

function neckEndRadiusMm(cutter: CutterGeometry): number {
  const lengthMm = (cutter.reachLengthMm ?? 0) - fluteLengthMm(cutter)
  return (cutter.neckDiameterMm ?? 0) / 2 + lengthMm * Math.tan((cutter.neckTaperHalfAngleDeg ?? 0) * degree)
}

function hasNeck(cutter: CutterGeometry): boolean {
  return cutter.neckDiameterMm != null && (cutter.reachLengthMm ?? 0) > fluteLengthMm(cutter)
}

/** Where full shank begins. */
function shankFromMm(cutter: CutterGeometry): number {
  if (!hasNeck(cutter)) return fluteLengthMm(cutter)
  const riseMm = Math.max(0, cutter.shankDiameterMm / 2 - neckEndRadiusMm(cutter))
  const angleDeg = cutter.neckTransitionAngleDeg ?? 45
  return (cutter.reachLengthMm ?? 0) + (angleDeg === 90 ? 0 : riseMm / Math.tan(angleDeg * degree))
}

/** The cutter's parts up to a height. */
export function cutterRegions(cutter: CutterGeometry, upToMm: number): SolidRegion[] {
  const cutMm = lengthOfCutMm(cutter)
  const flutedMm = fluteLengthMm(cutter)
  const form = (z: number) => formRadiusMm(cutter, z)
  const shankMm = cutter.shankDiameterMm / 2
  const regions = [
    region('flute', 'nothing', 0, cutMm, form),
    region('runOut', 'shankClearance', cutMm, flutedMm, form),
  ]
  if (hasNeck(cutter)) {
    const neckMm = (cutter.neckDiameterMm ?? 0) / 2
    const slope = Math.tan((cutter.neckTaperHalfAngleDeg ?? 0) * degree)
    const endMm = cutter.reachLengthMm ?? 0
    const rise = Math.tan((cutter.neckTransitionAngleDeg ?? 45) * degree)
    const neckEndMm = neckEndRadiusMm(cutter)
    regions.push(
      region('neck', 'shankClearance', flutedMm, endMm, (z) => neckMm + (z - flutedMm) * slope),
      region(
        'transition',
        'shankClearance',
        endMm,
        shankFromMm(cutter),
        (z) => neckEndMm + (z - endMm) * rise,
      ),
    )
  }
  const fullMm = shankFromMm(cutter)
  regions.push(region('shank', 'shankClearance', fullMm, cutter.overallLengthMm, () => shankMm))
  return regions
    .map((one) => ({ ...one, toMm: Math.min(one.toMm, upToMm) }))
    .filter((one) => one.toMm > one.fromMm)
}

/** What is behind the nose, the nose that holds the cutter at height 0. */
export function holderRegions(
  holder: HolderGeometry,
  extension: ExtensionGeometry | null | undefined,
): SolidRegion[] {
  const regions: SolidRegion[] = []
  let fromMm = 0
  let lastMm = 0
  const add = (part: string, lengthMm: number, noseMm: number, spindleMm: number) => {
    const startMm = fromMm
    const slope = (spindleMm - noseMm) / 2 / lengthMm
    regions.push(
      region(part, 'holderClearance', startMm, startMm + lengthMm, (z) => noseMm / 2 + (z - startMm) * slope),
    )
    fromMm += lengthMm
    lastMm = spindleMm
  }
  const carryUp = (part: string, toMm: number) => {
    if (toMm > fromMm) add(part, toMm - fromMm, lastMm, lastMm)
  }
  if (extension) {
    for (const { lengthMm, noseDiameterMm, spindleDiameterMm } of extension.segments)
      add('extension', lengthMm, noseDiameterMm, spindleDiameterMm)
    carryUp('extension', extension.projectionMm)
  }
  for (const { part, lengthMm, noseDiameterMm, spindleDiameterMm } of holder.segments)
    add(part, lengthMm, noseDiameterMm, spindleDiameterMm)
  const gaugeMm = (extension?.projectionMm ?? 0) + holder.gaugeLengthMm
  carryUp('holder', gaugeMm)
  const noseMm = holder.spindleNoseDiameterMm
  const spindle = region(
    'spindle',
    'holderClearance',
    gaugeMm,
    gaugeMm + 100,
    () => (noseMm ?? 2 * endlessMm) / 2,
  )
  return [...regions, { ...spindle, isEndless: noseMm == null }]
}

function region(
  part: string,
  keeps: Keeps,
  fromMm: number,
  toMm: number,
  radiusAt: (zMm: number) => number,
): SolidRegion {
  return { part, keeps, fromMm, toMm, radiusAt, isEndless: false }
}

/** The part, in its own frame: the wall's foot at (0, 0), u into the wall, h up from the floor. */
export interface PartSolid {
  depthMm: number
  slope: number
  tiltRad: number
  openingMm: number | null
  obstacles: { setbackMm: number; riseMm: number }[]
}

/** A wall, or the wall a hole is for a tool that circles in it. */
export function wallSolid(feature: Feature): PartSolid {
  if (feature.kind === 'hole')
    return {
      depthMm: feature.depthMm + (feature.breakThroughMm ?? 0),
      slope: 0,
      tiltRad: 0,
      openingMm: feature.diameterMm,
      obstacles: [],
    }
  return {
    depthMm: feature.depthMm + (feature.throughMm ?? 0),
    slope: Math.tan((feature.draftDeg ?? 0) * degree),
    tiltRad: (feature.tiltDeg ?? 0) * degree,
    openingMm: feature.openingWidthMm ?? null,
    obstacles: feature.obstacles ?? [],
  }
}

/** What the clamping allows, whatever the part. */
export function clampingRange({ cutter, holder, extension, collet }: ReachRequest): {
  fromMm: number
  toMm: number
} {
  const owner = extension ?? holder
  const fullShankMm = shankFromMm(cutter) + 1
  const insertionMm = extension ? null : (holder.sideLockInsertionMm ?? null)
  const gripMm = gripLengthMm(owner.minimumGripMm ?? null, collet)
  const flatMm = insertionMm === null ? [] : [cutter.overallLengthMm - insertionMm]
  const heldMm = gripMm === null ? [] : [cutter.overallLengthMm - gripMm - (owner.gripStartMm ?? 0)]
  return {
    fromMm: Math.max(cutter.overallLengthMm - (owner.boreDepthMm ?? 0), fullShankMm, ...flatMm),
    toMm: Math.min(...heldMm, ...flatMm),
  }
}

/** The longer where both name one; a collet that names none is two thirds of its length. */
function gripLengthMm(ofOwnerMm: number | null, collet: ReachRequest['collet']): number | null {
  const named = [ofOwnerMm, collet?.minimumGripMm ?? null].filter((mm) => mm !== null)
  if (named.length > 0) return Math.max(...named)
  return collet?.lengthMm == null ? null : (2 / 3) * collet.lengthMm
}

export function drillsHole({ feature, cutter }: ReachRequest): boolean {
  return feature.kind === 'hole' && isHoleTool(cutter)
}
