import polygonClipping, { type Polygon, type Ring } from 'polygon-clipping'
import type { ReachRequest } from '@/core/reach/types'
import { largestGood, smallestGood } from './sampled-solids'
import {
  cutterRegions,
  drillsHole,
  formRadiusMm,
  holderRegions,
  lengthOfCutMm,
  type PartSolid,
  type SolidRegion,
  wallSolid,
} from './solids'

/*
 * The second oracle: tool and part as polygons, cut by a general geometry library. The tool collides where the common
 * area is more than nothing. An obstacle passed at every height of the tip is the obstacle swept along the wall.
 */

/** A region as a polygon in the tool's own frame: radius, then height. */
interface ToolPolygon {
  points: Ring
}

const farMm = 20_000
const formPoints = 300
const deepestMm = 600

/** Common area below this is rounding. */
const nothingMm2 = 1e-7

export class PolygonTool {
  private readonly part: PartSolid
  private readonly isOnAxis: boolean
  private readonly sin: number
  private readonly cos: number
  private readonly flutes: ToolPolygon
  private readonly body: ToolPolygon[]
  private readonly guarded: ToolPolygon[]
  private readonly behind: ToolPolygon[]
  private readonly dropMm: number
  private readonly pushMm: number
  readonly canLieAlongWall: boolean

  constructor(request: ReachRequest, growMm: number) {
    const { cutter, holder, extension, settings, clearances } = request
    const shankMm = (clearances?.shankMm ?? settings.shankClearanceMm) + growMm
    const holderMm = (clearances?.holderMm ?? settings.holderClearanceMm) + growMm
    this.isOnAxis = drillsHole(request)
    this.part = wallSolid(request.feature)
    this.sin = Math.sin(this.part.tiltRad)
    this.cos = Math.cos(this.part.tiltRad)
    const cutMm = lengthOfCutMm(cutter)
    const form = (z: number) => formRadiusMm(cutter, z)
    const regions = cutterRegions(cutter, cutter.overallLengthMm)
    this.flutes = formPolygon(form, cutMm)
    this.body = regions
      .filter(({ keeps }) => keeps === 'shankClearance')
      .map((one) => regionPolygon(one, shankMm, growMm))
    this.guarded = regions.map((one) => regionPolygon(one, holderMm, holderMm))
    this.behind = holderRegions(holder, extension).map((one) => regionPolygon(one, holderMm, holderMm))
    this.dropMm = -Math.min(...this.flutes.points.map(([r, z]) => z * this.cos + r * this.sin))
    if (this.isOnAxis) {
      this.pushMm = -(request.feature.kind === 'hole' ? request.feature.diameterMm : 0) / 2
      this.canLieAlongWall = true
      return
    }
    this.pushMm = this.pushOf(this.flutes)
    const carriedOn = formPolygon(form, cutMm + 2 * cutter.cuttingDiameterMm)
    this.canLieAlongWall = this.pushOf(carriedOn) > this.pushMm - 1e-4 - Math.max(0, growMm)
  }

  get fitsOpening(): boolean {
    const { openingMm } = this.part
    if (openingMm === null || this.isOnAxis) return true
    return !meets(this.placed(this.flutes, 0, -1e-4), this.farWall(deepestMm, openingMm))
  }

  reachMm(stickOutMm: number): number {
    return largestGood(0, deepestMm, (depthMm) => !this.strikesWall(depthMm, stickOutMm))
  }

  clearStickOutMm(depthMm: number): number {
    return smallestGood(0, 3000, (stickOutMm) => !this.behindStrikes(depthMm, stickOutMm))
  }

  strikes(depthMm: number, stickOutMm: number): boolean {
    return this.strikesWall(depthMm, stickOutMm) || this.isInFloor(stickOutMm)
  }

  flutesStrike(depthMm: number): boolean {
    return this.guarded.slice(0, 1).some((one) => this.strikesObstacle(one, 0, depthMm))
  }

  /** How far the polygon goes towards the wall before the two overlap. */
  private pushOf(polygon: ToolPolygon): number {
    const wall = this.wall(farMm / 10)
    return largestGood(-500, 500, (pushMm) => !meets(this.moved(polygon, 0, pushMm), wall))
  }

  private strikesWall(depthMm: number, stickOutMm: number): boolean {
    return (
      this.body.some((one) => this.isInPart(one, 0, depthMm)) ||
      this.guarded.some((one) => this.strikesObstacle(one, 0, depthMm)) ||
      this.behind.some(
        (one) => this.isInPart(one, stickOutMm, depthMm) || this.strikesObstacle(one, stickOutMm, depthMm),
      )
    )
  }

  private behindStrikes(depthMm: number, stickOutMm: number): boolean {
    return this.behind.some(
      (one) =>
        this.isInPart(one, stickOutMm, depthMm) ||
        this.strikesObstacle(one, stickOutMm, depthMm) ||
        this.sinks(one, stickOutMm),
    )
  }

  private isInFloor(stickOutMm: number): boolean {
    return (
      this.body.some((one) => this.sinks(one, 0)) || this.behind.some((one) => this.sinks(one, stickOutMm))
    )
  }

  private isInPart(polygon: ToolPolygon, liftMm: number, depthMm: number): boolean {
    const { openingMm } = this.part
    const placed = this.placed(polygon, liftMm)
    if (meets(placed, this.wall(depthMm))) return true
    return openingMm !== null && !this.isOnAxis && meets(placed, this.farWall(depthMm, openingMm))
  }

  private sinks(polygon: ToolPolygon, liftMm: number): boolean {
    const floor: Polygon = [
      [
        [-farMm, -farMm],
        [farMm, -farMm],
        [farMm, 0],
        [-farMm, 0],
      ],
    ]
    return !this.isOnAxis && meets(this.placed(polygon, liftMm), floor)
  }

  private strikesObstacle(polygon: ToolPolygon, liftMm: number, depthMm: number): boolean {
    const { obstacles, slope } = this.part
    return obstacles.some(({ setbackMm, riseMm }) => {
      const faceMm = depthMm * slope + setbackMm
      // What is under the obstacle is solid too: a short part lowered by the clearance can't slip below it.
      const swept: Polygon = [
        [
          [setbackMm, -farMm],
          [farMm, -farMm],
          [farMm, depthMm + riseMm],
          [faceMm, depthMm + riseMm],
          [setbackMm, riseMm],
        ],
      ]
      return meets(this.placed(polygon, liftMm), swept)
    })
  }

  private wall(depthMm: number): Polygon {
    return [
      [
        [0, 0],
        [farMm, 0],
        [farMm, depthMm],
        [depthMm * this.part.slope, depthMm],
      ],
    ]
  }

  private farWall(depthMm: number, openingMm: number): Polygon {
    return [
      [
        [-openingMm, 0],
        [-farMm, 0],
        [-farMm, depthMm],
        [-openingMm - depthMm * this.part.slope, depthMm],
      ],
    ]
  }

  private placed(polygon: ToolPolygon, liftMm: number, widerMm = 0): Polygon {
    return this.moved(polygon, liftMm, this.pushMm - widerMm)
  }

  private moved({ points }: ToolPolygon, liftMm: number, pushMm: number): Polygon {
    const ring: Ring = points.map(([r, z]) => [
      -(z + liftMm) * this.sin + r * this.cos + pushMm,
      (z + liftMm) * this.cos + r * this.sin + this.dropMm,
    ])
    return [ring]
  }
}

function regionPolygon(region: SolidRegion, outMm: number, downMm: number): ToolPolygon {
  const { fromMm, toMm, radiusAt, isEndless } = region
  const isRound = region.part === 'flute' || region.part === 'runOut'
  const count = isRound ? formPoints : 1
  const right: Ring = []
  for (let index = 0; index <= count; index++) {
    const share = isRound ? 1 - Math.cos((Math.PI / 2) * (index / count)) : index
    const z = fromMm + (toMm - fromMm) * share
    right.push([radiusAt(z) + outMm, z - downMm])
  }
  return { points: closed(right, isEndless) }
}

function formPolygon(radiusAt: (z: number) => number, upToMm: number): ToolPolygon {
  const right: Ring = []
  for (let index = 0; index <= formPoints; index++) {
    const z = upToMm * (1 - Math.cos((Math.PI / 2) * (index / formPoints)))
    right.push([radiusAt(z), z])
  }
  return { points: closed(right, false) }
}

/** The other side too, or back along the axis for a face without end. */
function closed(right: Ring, isOneSided: boolean): Ring {
  const back: Ring = right.map(([r, z]) => [isOneSided ? 0 : -r, z])
  return [...right, ...back.reverse()]
}

function meets(one: Polygon, other: Polygon): boolean {
  if (!boxesMeet(one, other)) return false
  return polygonClipping
    .intersection(one, other)
    .some((polygon) => polygon.some((ring) => Math.abs(ringArea(ring)) > nothingMm2))
}

function boxesMeet([one = []]: Polygon, [other = []]: Polygon): boolean {
  for (const axis of [0, 1] as const) {
    const ofOne = one.map((point) => point[axis])
    const ofOther = other.map((point) => point[axis])
    if (Math.max(...ofOne) <= Math.min(...ofOther) || Math.max(...ofOther) <= Math.min(...ofOne)) return false
  }
  return true
}

function ringArea(ring: Ring): number {
  let twice = 0
  for (const [index, [x, y]] of ring.entries()) {
    const [nextX, nextY] = ring[(index + 1) % ring.length] ?? [x, y]
    twice += x * nextY - nextX * y
  }
  return twice / 2
}
