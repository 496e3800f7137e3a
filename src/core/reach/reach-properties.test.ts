import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { assembly } from '../../../test/support/assemblies'
import { reachAnswer } from './reach-answer'
import type { ReachRequest } from './types'

describe('whatever the assembly', () => {
  const kinds = ['straight', 'drafted', 'tilted', 'obstacles', 'circled', 'hole'] as const
  const options = { seed: 11, numRuns: 300 }
  const reachOf = (request: ReachRequest) => reachAnswer(request).reachMm ?? Number.POSITIVE_INFINITY

  it.each(kinds)(
    'it holds the rule at the stick-out it requires, and not a hair below a clearance bound: %s',
    (kind) => {
      fc.assert(
        fc.property(assembly(kind), (given) => {
          const request = { ...given, stickOutMm: null }
          const { stickOut, verdict } = reachAnswer(request)
          expect(verdict === 'reaches').toBe(stickOut.requiredMm !== null)
          if (stickOut.requiredMm === null) return
          const at = (stickOutMm: number) => reachAnswer({ ...request, stickOutMm }).verdict
          expect(at(stickOut.requiredMm)).toBe('reaches')
          expect(at(stickOut.minimumMm)).toBe('reaches')
          const isFixed = ['bore', 'flutes', 'neck', 'sideLock'].includes(stickOut.boundBy)
          expect(at(stickOut.minimumMm - 1e-5)).toBe(isFixed ? 'impossible' : 'short')
        }),
        options,
      )
    },
  )

  it.each(kinds)('it reaches no less with more stick-out, and no more with more clearance: %s', (kind) => {
    fc.assert(
      fc.property(assembly(kind), (given) => {
        const request = { ...given, stickOutMm: 30 }
        expect(reachOf({ ...request, stickOutMm: 33 })).toBeGreaterThanOrEqual(reachOf(request) - 1e-9)
        const clearances = { shankMm: 0.4, holderMm: 4 }
        expect(reachOf({ ...request, clearances })).toBeLessThanOrEqual(reachOf(request) + 1e-9)
      }),
      options,
    )
  })

  it.each(kinds)('it answers in finite numbers, reach the least of the first touches: %s', (kind) => {
    fc.assert(
      fc.property(assembly(kind), (request) => {
        const answer = reachAnswer(request)
        expect(JSON.stringify(answer)).toBe(JSON.stringify(reachAnswer(request)))
        const { requiredMm: _, ...figures } = answer.stickOut
        for (const figure of Object.values(figures))
          if (typeof figure === 'number') expect(Number.isFinite(figure)).toBe(true)
        const touches = answer.firstTouch.flatMap(({ depthMm }) => (depthMm === null ? [] : [depthMm]))
        const least = Math.min(...touches)
        if (answer.limitedBy === 'usableLength') expect(answer.reachMm).toBeLessThanOrEqual(least)
        else expect(answer.reachMm ?? Number.POSITIVE_INFINITY).toBe(least)
      }),
      options,
    )
  })
})
