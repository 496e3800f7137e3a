import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { defaultReachSettings, type ReachRequest } from '@/core/reach/types'
import { searchReach } from '@/core/search/search-reach'
import { searchTables } from '@/core/search/search-tables'
import type { NearMiss, SearchOption, StoppedBy } from '@/core/search/types'
import { type SearchCase, type SearchedKind, searchCase } from '../../support/cribs'
import { requestFor } from '../../support/naive-search'
import { askedDepthMm, naiveWallVerdict } from '../../support/naive-verdict'
import { PolygonTool } from '../../support/polygon-solids'
import { SampledTool, type Sampling } from '../../support/sampled-solids'
import { clampingRange } from '../../support/solids'

/*
 * The search against solids: points of the tool asked one by one whether they stand in the part, for a drill in its hole
 * polygons cut by a general geometry library. Neither can tell a hair's breadth, so that the tool made smaller by a little
 * must reach with every option, and the tool made larger must fall short with every near miss, by the amount said.
 */

const sampling: Sampling = { growMm: 0.02, stepMm: 0.2, passMm: 0.5, deepestMm: 300 }
const hairMm = 3e-4
/** Far from everything: nothing behind the nose touches. */
const farMm = 1500

const runs: Record<Exclude<SearchedKind, 'hole'>, number> = {
  straight: 150,
  drafted: 150,
  tilted: 150,
  obstacles: 50,
  circled: 100,
}

const answerTo = ({ tooling, question }: SearchCase) =>
  searchReach(searchTables(tooling, defaultReachSettings), question)

function slopeOf({ feature }: ReachRequest): number {
  return feature.kind === 'wall' ? Math.tan(((feature.draftDeg ?? 0) * Math.PI) / 180) : 0
}

function bracket(request: ReachRequest) {
  const { feature } = request
  const hasObstacles = feature.kind === 'wall' && (feature.obstacles ?? []).length > 0
  const growMm = sampling.growMm + (hasObstacles ? sampling.passMm * slopeOf(request) : 0)
  return {
    larger: new SampledTool(request, { ...sampling, growMm }),
    smaller: new SampledTool(request, { ...sampling, growMm: -growMm }),
  }
}

const touching: readonly StoppedBy[] = ['runOut', 'neck', 'transition', 'shank']
const behind: readonly StoppedBy[] = ['nut', 'holder', 'extension', 'spindle']

/** What the miss says of itself, against solids; which amounts were held to them. */
function expectMiss(request: ReachRequest, miss: NearMiss): StoppedBy[] {
  const { larger, smaller } = bracket(request)
  const depthMm = askedDepthMm(request)
  const range = clampingRange(request)
  expect(naiveWallVerdict(request, larger)).not.toBe('reaches')
  expect(miss.stickOut.maximumMm).toBeCloseTo(range.toMm, 9)
  const held: StoppedBy[] = []
  for (const { by, shortfallMm } of miss.shortfalls) {
    if (by === 'grip' || by === 'sideLock') {
      expect(shortfallMm).toBeCloseTo(range.fromMm - range.toMm, 9)
      held.push(by)
    }
    if (!larger.canLieAlongWall || !smaller.canLieAlongWall || !smaller.fitsOpening || !larger.fitsOpening)
      continue
    if (touching.includes(by)) {
      const leadMm = request.feature.kind === 'hole' ? (request.feature.breakThroughMm ?? 0) : 0
      const shortOf = (tool: SampledTool) =>
        depthMm - leadMm - Math.max(0, Math.min(depthMm, tool.reachMm(farMm)) - leadMm)
      expect(shortfallMm).toBeGreaterThanOrEqual(shortOf(smaller) - hairMm)
      expect(shortfallMm).toBeLessThanOrEqual(shortOf(larger) + sampling.stepMm + hairMm)
      held.push(by)
    }
    if (behind.includes(by)) {
      const stepMm = sampling.stepMm * (2 + tiltTangent(request))
      expect(shortfallMm).toBeGreaterThanOrEqual(smaller.clearStickOutMm(depthMm) - range.toMm - hairMm)
      expect(shortfallMm).toBeLessThanOrEqual(larger.clearStickOutMm(depthMm) - range.toMm + stepMm + hairMm)
      held.push(by)
    }
  }
  return held
}

function tiltTangent({ feature }: ReachRequest): number {
  return feature.kind === 'wall' ? Math.tan(((feature.tiltDeg ?? 0) * Math.PI) / 180) : 0
}

describe.each(['straight', 'drafted', 'tilted', 'obstacles', 'circled'] as const)('on a %s wall', (kind) => {
  it('it offers what reaches as solids, and lists as near what falls short, by the amount', () => {
    const seen = { options: 0, misses: 0, touching: 0, behind: 0 }
    fc.assert(
      fc.property(searchCase(kind, 4), (given) => {
        const { options, nearMisses } = answerTo(given)
        for (const option of options) {
          const request = {
            ...requestFor(given.tooling, given.question, option),
            stickOutMm: option.stickOutMm,
          }
          expect(naiveWallVerdict(request, bracket(request).smaller)).toBe('reaches')
          seen.options++
        }
        for (const miss of nearMisses) {
          const held = expectMiss(requestFor(given.tooling, given.question, miss), miss)
          seen.misses++
          if (held.some((by) => touching.includes(by))) seen.touching++
          if (held.some((by) => behind.includes(by))) seen.behind++
        }
      }),
      { seed: 20261204, numRuns: runs[kind], endOnFailure: true },
    )
    expect(Math.min(seen.options, seen.misses)).toBeGreaterThan(20)
    expect(Math.min(seen.touching, seen.behind)).toBeGreaterThan(0)
  })
})

describe('in a hole on its axis', () => {
  it('it offers what reaches as polygons, and lists as near what falls short', () => {
    const seen = { options: 0, misses: 0 }
    const growMm = 0.01
    const strikes = (request: ReachRequest, { stickOutMm }: SearchOption, mm: number) =>
      new PolygonTool(request, mm).strikes(askedDepthMm(request) + pointMm(request), stickOutMm)
    fc.assert(
      fc.property(searchCase('hole', 4), (given) => {
        const { options, nearMisses } = answerTo(given)
        const isDrilled = ({ cutterIndex }: SearchOption) =>
          ['drill', 'reamer', 'tap'].includes(given.tooling.cutters[cutterIndex]!.geometry.form)
        for (const option of options.filter(isDrilled)) {
          const request = requestFor(given.tooling, given.question, option)
          const { fromMm, toMm } = clampingRange(request)
          expect(option.stickOutMm).toBeGreaterThanOrEqual(fromMm - 1e-9)
          expect(option.stickOutMm).toBeLessThanOrEqual(toMm + 1e-9)
          expect(askedDepthMm(request) + pointMm(request)).toBeLessThanOrEqual(usableMm(request) + 1e-9)
          expect(strikes(request, option, -growMm)).toBe(false)
          seen.options++
        }
        for (const miss of nearMisses.filter(isDrilled)) {
          const request = requestFor(given.tooling, given.question, miss)
          const { fromMm, toMm } = clampingRange(request)
          const isShort = askedDepthMm(request) + pointMm(request) > usableMm(request)
          expect(fromMm > toMm || isShort || strikes(request, { ...miss, stickOutMm: toMm }, growMm)).toBe(
            true,
          )
          seen.misses++
        }
      }),
      { seed: 20261205, numRuns: 150, endOnFailure: true },
    )
    expect(Math.min(seen.options, seen.misses)).toBeGreaterThan(20)
  })
})

function pointMm({ cutter: { cuttingDiameterMm, pointAngleDeg } }: ReachRequest): number {
  if (pointAngleDeg == null || pointAngleDeg === 180) return 0
  return cuttingDiameterMm / 2 / Math.tan((pointAngleDeg * Math.PI) / 360)
}

function usableMm({ cutter }: ReachRequest): number {
  const chipRoomMm = cutter.form === 'drill' ? 1.5 * cutter.cuttingDiameterMm : 0
  return cutter.reachLengthMm ?? (cutter.lengthOfCutMm ?? 0) - chipRoomMm
}
