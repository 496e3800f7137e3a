import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { reachAnswer } from '@/core/reach/reach-answer'
import type { ReachRequest, ReachVerdict } from '@/core/reach/types'
import { assembly } from '../support/assemblies'
import { clearStickOutMm } from '../support/clear-stick-out'
import { askedDepthMm, naiveWallVerdict } from '../support/naive-verdict'
import { PolygonTool } from '../support/polygon-solids'
import { clampingRange, drillsHole } from '../support/solids'

/*
 * The closed form against polygons cut by a general geometry library. The library's areas leave a hair undecided, so the
 * tool made larger by a hundredth must not do better than the closed form says, and made smaller not worse.
 */

const seed = 20261202
const growMm = 0.01
const hairMm = 3e-4
const mostMm = 600
const runs = { straight: 40, drafted: 60, tilted: 60, obstacles: 60, circled: 30, hole: 60 }

const canStand = (tool: PolygonTool) => tool.canLieAlongWall && tool.fitsOpening

describe.each(['straight', 'drafted', 'tilted', 'obstacles', 'circled', 'hole'] as const)('%s', (kind) => {
  it('it agrees with polygons in reach, stick-out and verdict', () => {
    const judged = { reaches: 0, short: 0, impossible: 0 }
    let compared = 0
    fc.assert(
      fc.property(assembly(kind), (request) => {
        const larger = new PolygonTool(request, growMm)
        const smaller = new PolygonTool(request, -growMm)
        const answer = reachAnswer(request)
        const expected = verdictOf(request, larger)
        if (expected === verdictOf(request, smaller)) {
          judged[expected]++
          expect(answer.verdict).toBe(expected)
        }
        if (!canStand(larger) || !canStand(smaller)) return
        compared++
        expectReachBetween(request, larger, smaller)
        const depthMm = askedDepthMm(request) + pointMm(request)
        const clearMm = clearStickOutMm(request)
        expect(clearMm).toBeGreaterThanOrEqual(smaller.clearStickOutMm(depthMm) - hairMm)
        expect(clearMm).toBeLessThanOrEqual(larger.clearStickOutMm(depthMm) + hairMm)
      }),
      { seed, numRuns: runs[kind], endOnFailure: true },
    )
    expect(compared).toBeGreaterThan(runs[kind] / 3)
    expect(judged.short + judged.reaches).toBeGreaterThan(0)
    expect(judged.impossible).toBeGreaterThan(0)
  })
})

function expectReachBetween(request: ReachRequest, larger: PolygonTool, smaller: PolygonTool): void {
  const { reachMm, stickOut } = reachAnswer(request)
  const leadMm =
    pointMm(request) + (request.feature.kind === 'hole' ? (request.feature.breakThroughMm ?? 0) : 0)
  const tipDepthMm = Math.min(mostMm, reachMm === null ? mostMm : reachMm + leadMm)
  const usableMm = usableLengthMm(request)
  expect(tipDepthMm).toBeGreaterThanOrEqual(
    Math.min(mostMm, usableMm, larger.reachMm(stickOut.usedMm)) - hairMm,
  )
  if (reachMm !== 0)
    expect(tipDepthMm).toBeLessThanOrEqual(
      Math.min(mostMm, usableMm, smaller.reachMm(stickOut.usedMm)) + hairMm,
    )
}

/** What of a hole tool's tip goes beyond the full diameter. */
function pointMm(request: ReachRequest): number {
  const { cuttingDiameterMm, pointAngleDeg } = request.cutter
  if (!drillsHole(request) || pointAngleDeg == null || pointAngleDeg === 180) return 0
  return cuttingDiameterMm / 2 / Math.tan((pointAngleDeg * Math.PI) / 360)
}

function usableLengthMm(request: ReachRequest): number {
  const { cutter } = request
  if (!drillsHole(request)) return Number.POSITIVE_INFINITY
  return (
    cutter.reachLengthMm ??
    (cutter.lengthOfCutMm ?? 0) - (cutter.form === 'drill' ? 1.5 : 0) * cutter.cuttingDiameterMm
  )
}

function verdictOf(request: ReachRequest, tool: PolygonTool): ReachVerdict {
  if (!drillsHole(request) || request.feature.kind !== 'hole') return naiveWallVerdict(request, tool)
  const { cutter, stickOutMm, feature } = request
  const range = clampingRange(request)
  const usedMm = stickOutMm ?? range.toMm
  if (Math.abs(feature.diameterMm - cutter.cuttingDiameterMm) > 0.1 + 1e-9) return 'impossible'
  if (range.fromMm > range.toMm || usedMm < range.fromMm - 1e-9 || usedMm > range.toMm + 1e-9)
    return 'impossible'
  const depthMm = askedDepthMm(request) + pointMm(request)
  return depthMm > usableLengthMm(request) || tool.strikes(depthMm, usedMm) ? 'short' : 'reaches'
}
