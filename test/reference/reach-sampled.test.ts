import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { reachAnswer } from '@/core/reach/reach-answer'
import type { ReachRequest } from '@/core/reach/types'
import { assembly } from '../support/assemblies'
import { clearStickOutMm } from '../support/clear-stick-out'
import { askedDepthMm, naiveWallVerdict } from '../support/naive-verdict'
import { SampledTool, type Sampling } from '../support/sampled-solids'

/*
 * The closed form against points of the tool asked one by one whether they stand in the part. Sampling can't tell a
 * hair's breadth, so every answer is bracketed: the tool made larger by a little must not do better than the closed form
 * says, the tool made smaller must not do worse.
 */

const seed = 20261201
const runs = { straight: 300, drafted: 400, tilted: 400, obstacles: 70, circled: 150 }

function samplingFor(request: ReachRequest): Sampling {
  const hasObstacles = request.feature.kind === 'wall' && (request.feature.obstacles ?? []).length > 0
  return hasObstacles
    ? { growMm: 0.02, stepMm: 0.4, passMm: 0.5, deepestMm: 300 }
    : { growMm: 0.02, stepMm: 0.15, passMm: 1, deepestMm: 600 }
}

function slopeOf({ feature }: ReachRequest): number {
  return feature.kind === 'wall' ? Math.tan(((feature.draftDeg ?? 0) * Math.PI) / 180) : 0
}

function bracket(request: ReachRequest) {
  const sampling = samplingFor(request)
  const hasObstacles = request.feature.kind === 'wall' && (request.feature.obstacles ?? []).length > 0
  const growMm = sampling.growMm + (hasObstacles ? sampling.passMm * slopeOf(request) : 0)
  return {
    sampling,
    larger: new SampledTool(request, { ...sampling, growMm }),
    smaller: new SampledTool(request, { ...sampling, growMm: -growMm }),
  }
}

/** Halving stops at a ten-thousandth; a little more for the round tip's points. */
const hairMm = 3e-4

describe.each(['straight', 'drafted', 'tilted', 'obstacles', 'circled'] as const)('on a %s wall', (kind) => {
  const options = { seed, numRuns: runs[kind], endOnFailure: true }
  let sharp = 0
  let asked = 0

  it('it reaches what points of the tool reach', () => {
    fc.assert(
      fc.property(assembly(kind), (request) => {
        const { sampling, larger, smaller } = bracket(request)
        if (!canStand(larger) || !canStand(smaller)) return
        const answer = reachAnswer(request)
        const leadMm =
          kind === 'circled' && request.feature.kind === 'hole' ? (request.feature.breakThroughMm ?? 0) : 0
        const reachMm = Math.min(
          answer.reachMm === null ? Number.POSITIVE_INFINITY : answer.reachMm + leadMm,
          sampling.deepestMm,
        )
        const { usedMm } = answer.stickOut
        const leastMm = Math.min(larger.reachMm(usedMm), sampling.deepestMm)
        const mostMm = Math.min(smaller.reachMm(usedMm), sampling.deepestMm)
        asked++
        if (mostMm - leastMm < 2 * sampling.stepMm + 0.2) sharp++
        expect(reachMm).toBeGreaterThanOrEqual(leastMm - sampling.stepMm - hairMm)
        if (answer.reachMm !== 0) expect(reachMm).toBeLessThanOrEqual(mostMm + hairMm)
      }),
      options,
    )
    expect(sharp / asked).toBeGreaterThan(0.8)
  })

  it('it needs the stick-out that points of the tool need', () => {
    fc.assert(
      fc.property(assembly(kind), (request) => {
        const { sampling, larger, smaller } = bracket(request)
        if (!canStand(larger) || !canStand(smaller)) return
        const depthMm = askedDepthMm(request)
        const clearMm = clearStickOutMm(request)
        const stepMm = sampling.stepMm * (2 + tiltTangent(request))
        const mostMm = larger.clearStickOutMm(depthMm)
        expect(clearMm).toBeGreaterThanOrEqual(smaller.clearStickOutMm(depthMm) - hairMm)
        expect(clearMm).toBeLessThanOrEqual(mostMm + stepMm + hairMm)
      }),
      options,
    )
  })

  it('it judges as points of the tool judge', () => {
    const judged = { reaches: 0, short: 0, impossible: 0 }
    fc.assert(
      fc.property(assembly(kind), (request) => {
        const { larger, smaller } = bracket(request)
        const expected = naiveWallVerdict(request, larger)
        if (naiveWallVerdict(request, smaller) !== expected) return
        judged[expected]++
        expect(reachAnswer(request).verdict).toBe(expected)
      }),
      { ...options, numRuns: runs[kind] * 2 },
    )
    expect(Math.min(judged.reaches, judged.short, judged.impossible)).toBeGreaterThan(0)
  })
})

/** A tool that can't lie along the wall, or is wider than the opening, has no reach to compare. */
const canStand = (tool: SampledTool) => tool.canLieAlongWall && tool.fitsOpening

function tiltTangent({ feature }: ReachRequest): number {
  return feature.kind === 'wall' ? Math.tan(((feature.tiltDeg ?? 0) * Math.PI) / 180) : 0
}
