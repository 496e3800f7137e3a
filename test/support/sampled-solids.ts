import type { ReachRequest } from '@/core/reach/types'
import {
  cutterRegions,
  formRadiusMm,
  holderRegions,
  lengthOfCutMm,
  type PartSolid,
  type SolidRegion,
  wallSolid,
} from './solids'

/*
 * The naive oracle: points of the tool, both sides, moved into the part's frame and asked one by one whether they stand
 * in the part. The placement is found by lowering the flutes' points to the floor and pushing them to the wall.
 */

/** How much the tool is made larger (or smaller, below zero) to bracket what sampling can't resolve. */
export interface Sampling {
  growMm: number
  /** Between points of an outline. */
  stepMm: number
  /** Between heights of the tip, on the way past an obstacle. */
  passMm: number
  /** A reach beyond this counts as without limit. */
  deepestMm: number
}

interface Cloud {
  z: Float64Array
  r: Float64Array
  /** Only points on the wall's side count. */
  isEndless: boolean
}

const fluteSamples = 3000
const hair = 1e-9

/** What sampling may miss of a round tip. */
const roundSamplingMm = 2e-5

/** A face without end is sampled this far out, and at its end. */
const sampledFaceMm = 1200

export class SampledTool {
  private readonly part: PartSolid
  private readonly sin: number
  private readonly cos: number
  private readonly flutes: Cloud
  private readonly body: Cloud[]
  private readonly behind: Cloud[]
  private readonly guarded: Cloud[]
  private readonly dropMm: number
  private readonly pushMm: number
  readonly canLieAlongWall: boolean

  constructor(
    request: ReachRequest,
    private readonly sampling: Sampling,
  ) {
    const { cutter, holder, extension, settings, clearances } = request
    const shankMm = (clearances?.shankMm ?? settings.shankClearanceMm) + sampling.growMm
    const holderMm = (clearances?.holderMm ?? settings.holderClearanceMm) + sampling.growMm
    this.part = wallSolid(request.feature)
    this.sin = Math.sin(this.part.tiltRad)
    this.cos = Math.cos(this.part.tiltRad)
    const cutMm = lengthOfCutMm(cutter)
    const regions = cutterRegions(cutter, cutter.overallLengthMm)
    const { stepMm } = sampling
    this.flutes = formCloud((z) => formRadiusMm(cutter, z), cutMm)
    this.body = regions
      .filter(({ keeps }) => keeps === 'shankClearance')
      .map((one) => cloud(one, shankMm, sampling.growMm, stepMm))
    this.guarded = regions.map((one) => cloud(one, holderMm, holderMm, stepMm))
    this.behind = holderRegions(holder, extension).map((one) => cloud(one, holderMm, holderMm, stepMm))
    const lowest = this.least(this.flutes, 0, (_, h) => h)
    this.dropMm = -lowest
    const gapMm = (_: number, h: number, u: number) => (h + this.dropMm) * this.part.slope - u
    this.pushMm = this.least(this.flutes, 0, gapMm)
    const carriedOn = formCloud((z) => formRadiusMm(cutter, z), cutMm + 2 * cutter.cuttingDiameterMm)
    this.canLieAlongWall =
      this.least(carriedOn, 0, gapMm) > this.pushMm - roundSamplingMm - Math.max(0, sampling.growMm)
  }

  /** Whether the flutes alone stand clear of the far wall. */
  get fitsOpening(): boolean {
    const { openingMm } = this.part
    if (openingMm === null) return true
    const leastMm = this.least(
      this.flutes,
      0,
      (_, h, u) => u + this.pushMm + openingMm + (h + this.dropMm) * this.part.slope,
    )
    return leastMm >= -roundSamplingMm - Math.max(0, -this.sampling.growMm)
  }

  /** Deepest wall of this kind that the tool at this stick-out stays out of; Infinity where no depth stops it. */
  reachMm(stickOutMm: number): number {
    return largestGood(0, this.sampling.deepestMm, (depthMm) => !this.strikesWall(depthMm, stickOutMm))
  }

  /** Least stick-out at which all behind the nose keeps clear. */
  clearStickOutMm(depthMm: number): number {
    return smallestGood(-1500, 3000, (stickOutMm) => !this.behindStrikes(depthMm, stickOutMm))
  }

  strikes(depthMm: number, stickOutMm: number): boolean {
    return this.strikesWall(depthMm, stickOutMm) || this.isInFloor(stickOutMm)
  }

  /** The length of cut in what stands on the part. */
  flutesStrike(depthMm: number): boolean {
    return this.guarded.slice(0, 1).some((points) => this.strikesObstacle(points, 0, depthMm))
  }

  private behindStrikes(depthMm: number, stickOutMm: number): boolean {
    return this.behind.some(
      (points) =>
        this.isInPart(points, stickOutMm, depthMm) ||
        this.strikesObstacle(points, stickOutMm, depthMm) ||
        this.sinks(points, stickOutMm),
    )
  }

  private strikesWall(depthMm: number, stickOutMm: number): boolean {
    return (
      this.body.some((points) => this.isInPart(points, 0, depthMm)) ||
      this.guarded.some((points) => this.strikesObstacle(points, 0, depthMm)) ||
      this.behind.some(
        (points) =>
          this.isInPart(points, stickOutMm, depthMm) || this.strikesObstacle(points, stickOutMm, depthMm),
      )
    )
  }

  private isInFloor(stickOutMm: number): boolean {
    return (
      this.body.some((points) => this.sinks(points, 0)) ||
      this.behind.some((points) => this.sinks(points, stickOutMm))
    )
  }

  private isInPart(points: Cloud, liftMm: number, depthMm: number): boolean {
    const { slope, openingMm } = this.part
    return this.some(points, liftMm, (u, h) => {
      if (h >= depthMm - hair || h < 0) return false
      return u > h * slope + hair || (openingMm !== null && u < -openingMm - h * slope - hair)
    })
  }

  private sinks(points: Cloud, liftMm: number): boolean {
    return this.some(points, liftMm, (_, h) => h < -hair)
  }

  /** Passes at every height of the tip, from the floor to the top edge. */
  private strikesObstacle(points: Cloud, liftMm: number, depthMm: number): boolean {
    const { obstacles, slope } = this.part
    if (obstacles.length === 0) return false
    const sweeps = Math.ceil(depthMm / this.sampling.passMm)
    for (let pass = 0; pass <= sweeps; pass++) {
      const tipMm = (depthMm * pass) / Math.max(1, sweeps)
      const isIn = (u: number, h: number) =>
        obstacles.some(
          ({ setbackMm, riseMm }) =>
            u + tipMm * slope > depthMm * slope + setbackMm + hair && h + tipMm < depthMm + riseMm - hair,
        )
      if (this.some(points, liftMm, isIn)) return true
    }
    return false
  }

  private some(points: Cloud, liftMm: number, test: (u: number, h: number) => boolean): boolean {
    for (let index = 0; index < points.z.length; index++) {
      const z = points.z[index]! + liftMm
      const r = points.r[index]!
      if (test(this.u(z, r), this.h(z, r))) return true
      if (!points.isEndless && test(this.u(z, -r), this.h(z, -r))) return true
    }
    return false
  }

  private u(z: number, r: number): number {
    return -z * this.sin + r * this.cos + this.pushMm
  }

  private h(z: number, r: number): number {
    return z * this.cos + r * this.sin + this.dropMm
  }

  private least(points: Cloud, liftMm: number, measure: (z: number, h: number, u: number) => number): number {
    let least = Number.POSITIVE_INFINITY
    for (let index = 0; index < points.z.length; index++) {
      const z = points.z[index]! + liftMm
      for (const r of [points.r[index]!, -points.r[index]!])
        least = Math.min(least, measure(z, z * this.cos + r * this.sin, -z * this.sin + r * this.cos))
    }
    return least
  }
}

/** Points of the form's outline, closest near the tip where it is round. */
function formCloud(radiusAt: (z: number) => number, upToMm: number): Cloud {
  const z = new Float64Array(fluteSamples + 2)
  const r = new Float64Array(fluteSamples + 2)
  for (let index = 0; index <= fluteSamples; index++) {
    z[index] = upToMm * (1 - Math.cos((Math.PI / 2) * (index / fluteSamples)))
    r[index] = radiusAt(z[index]!)
  }
  r[fluteSamples + 1] = 0
  return { z, r, isEndless: false }
}

/** Points of one region widened and lowered: its side and its lower face, ends included. */
function cloud(region: SolidRegion, outMm: number, downMm: number, stepMm: number): Cloud {
  const { fromMm, toMm, radiusAt, isEndless } = region
  const sideMm = Math.hypot(toMm - fromMm, radiusAt(toMm) - radiusAt(fromMm))
  const sides = Math.max(2, Math.ceil(sideMm / stepMm))
  const faceMm = radiusAt(fromMm) + outMm
  const innerMm = Math.min(faceMm, sampledFaceMm)
  const faces = Math.max(2, Math.ceil(innerMm / stepMm))
  const z = new Float64Array(sides + faces + 2)
  const r = new Float64Array(sides + faces + 2)
  for (let index = 0; index <= sides; index++) {
    const at = fromMm + ((toMm - fromMm) * index) / sides
    z[index] = at - downMm
    r[index] = radiusAt(at) + outMm
  }
  for (let index = 0; index <= faces; index++) {
    z[sides + 1 + index] = fromMm - downMm
    r[sides + 1 + index] = (innerMm * index) / faces
  }
  return { z, r, isEndless }
}

/** Largest x with good(x), good being true up to some x: by halving, to a ten-thousandth. */
export function largestGood(lowest: number, highest: number, good: (x: number) => boolean): number {
  if (good(highest)) return Number.POSITIVE_INFINITY
  let low = lowest
  let high = highest
  while (high - low > 1e-4) {
    const middle = (low + high) / 2
    if (good(middle)) low = middle
    else high = middle
  }
  return low
}

/** Smallest x with good(x), good being true from some x on. */
export function smallestGood(lowest: number, highest: number, good: (x: number) => boolean): number {
  const found = largestGood(-highest, -lowest, (negative) => good(-negative))
  return found === Number.POSITIVE_INFINITY ? Number.NEGATIVE_INFINITY : -found
}
