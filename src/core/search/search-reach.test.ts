import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { defaultReachSettings, type Feature } from '@/core/reach/types'
import { cribOfSize } from '../../../test/support/crib-of-size'
import { type SearchCase, type SearchedKind, searchCase } from '../../../test/support/cribs'
import { type NaiveAssembly, naiveSearch, setStickOutMm } from '../../../test/support/naive-search'
import { assemblyRequest } from './assembly-request'
import { searchReach } from './search-reach'
import { searchTables } from './search-tables'
import type { AssemblyParts, SearchAnswer } from './types'

const kinds: SearchedKind[] = ['straight', 'drafted', 'tilted', 'obstacles', 'circled', 'hole']

const keyOf = ({
  cutterIndex,
  holderIndex,
  colletIndex,
  extensionIndex,
  extensionColletIndex,
}: AssemblyParts) => [cutterIndex, holderIndex, colletIndex, extensionIndex, extensionColletIndex].join(' ')

function answerTo({ tooling, question }: SearchCase): SearchAnswer {
  return searchReach(searchTables(tooling, defaultReachSettings), question)
}

const close = (one: number, other: number) => Math.abs(one - other) <= 1e-9 * Math.max(1, Math.abs(other))

/** Options and near misses against every assembly asked one by one. */
function expectAsNaive(given: SearchCase): SearchAnswer {
  const answer = answerTo(given)
  const { assemblies, considered } = naiveSearch(given.tooling, given.question)
  const reaching = assemblies.filter(({ shortfallMm }) => shortfallMm === 0)
  expect(answer.considered).toBe(considered)
  expect(answer.reachable).toBe(reaching.length)
  expectOptions(answer, reaching)
  expectMisses(given, answer, assemblies)
  return answer
}

function expectOptions(answer: SearchAnswer, reaching: NaiveAssembly[]): void {
  const byKey = new Map(reaching.map((assembly) => [keyOf(assembly), assembly]))
  expect(new Set(answer.options.map(keyOf)).size).toBe(answer.options.length)
  for (const option of answer.options) {
    const naive = byKey.get(keyOf(option))
    expect(naive).toBeDefined()
    if (!naive) continue
    expect(naive.answer.verdict).toBe('reaches')
    expect(option.stickOutMm).toBeCloseTo(naive.answer.stickOut.usedMm, 9)
    expect(option.gaugeLengthMm).toBeCloseTo(naive.answer.gaugeLengthMm, 9)
    expect(close(option.complianceUmPerN, naive.answer.stiffness.complianceUmPerN)).toBe(true)
    expect(close(option.penalty, naive.penalty)).toBe(true)
  }
}

function expectMisses(
  { tooling, question }: SearchCase,
  answer: SearchAnswer,
  assemblies: NaiveAssembly[],
): void {
  const nearest = new Map<number, number>()
  for (const { cutterIndex, shortfallMm } of assemblies)
    nearest.set(cutterIndex, Math.min(shortfallMm, nearest.get(cutterIndex) ?? Number.POSITIVE_INFINITY))
  const short = [...nearest].filter(
    ([, shortfallMm]) => shortfallMm > 0 && shortfallMm < Number.POSITIVE_INFINITY,
  )
  expect(new Set(answer.nearMisses.map(({ cutterIndex }) => cutterIndex))).toEqual(
    new Set(short.map(([index]) => index)),
  )
  let lastMm = 0
  for (const miss of answer.nearMisses) {
    const naive = assemblies.find((one) => keyOf(one) === keyOf(miss))!
    const leastMm = nearest.get(miss.cutterIndex)!
    expect(
      naive.answer.verdict === 'reaches' &&
        question.longestStickOutToDiameter == null &&
        !question.gaugeLengthMm,
    ).toBe(false)
    expect(miss.shortfallMm).toBeCloseTo(leastMm, 8)
    expect(naive.shortfallMm).toBeCloseTo(leastMm, 8)
    expect(miss.stickOutMm).toBeCloseTo(setStickOutMm(naive), 9)
    expect(miss.shortfallMm).toBeGreaterThanOrEqual(lastMm - 1e-12)
    lastMm = miss.shortfallMm
    const request = assemblyRequest({ tooling, settings: defaultReachSettings }, question, miss)
    expect(request).toEqual(naive.request)
  }
}

describe('in a shop’s crib', () => {
  const tooling = cribOfSize({ cutters: 120, holders: 30, extensions: 4 })
  const features: Feature[] = [
    { kind: 'wall', depthMm: 6 },
    { kind: 'wall', depthMm: 45, draftDeg: 1.5, openingWidthMm: 40 },
    { kind: 'wall', depthMm: 25, draftDeg: 3, obstacles: [{ setbackMm: 6, riseMm: 20 }] },
    { kind: 'wall', depthMm: 35, draftDeg: 4, tiltDeg: 18 },
    { kind: 'hole', depthMm: 25, diameterMm: 20, breakThroughMm: 1 },
  ]

  it.each(features)(
    'it finds what every assembly asked one by one finds: $kind, $depthMm deep',
    (feature) => {
      const answer = expectAsNaive({ tooling, question: { feature, limit: 100_000, nearMissLimit: 1000 } })
      expect(answer.options.length).toBe(answer.reachable)
      expect(answer.reachable).toBeGreaterThan(100)
    },
  )
})

describe('on random cribs', () => {
  const limits = fc.record({
    longestStickOutToDiameter: fc.option(fc.double({ min: 3, max: 25, noNaN: true }), { nil: null }),
    window: fc.option(fc.tuple(fc.integer({ min: 30, max: 120 }), fc.integer({ min: 30, max: 250 })), {
      nil: null,
    }),
    purpose: fc.constantFrom(null, 'roughing' as const, 'finishing' as const),
    spindleNoseDiameterMm: fc.option(fc.constantFrom(40, 88.9, 130), { nil: null }),
  })

  const runs: Record<SearchedKind, number> = {
    straight: 120,
    drafted: 120,
    tilted: 400,
    obstacles: 160,
    circled: 120,
    hole: 350,
  }

  it.each(kinds)('it finds what every assembly asked one by one finds: %s', (kind) => {
    const seen = { options: 0, extended: 0, inCollets: 0, misses: 0 }
    fc.assert(
      fc.property(searchCase(kind), (given) => {
        const { options, nearMisses } = expectAsNaive(given)
        seen.options += options.length
        seen.extended += options.filter(({ extensionIndex }) => extensionIndex !== null).length
        seen.inCollets += options.filter(({ colletIndex }) => colletIndex !== null).length
        seen.misses += nearMisses.length
      }),
      { seed: 4, numRuns: runs[kind] },
    )
    expect(Math.min(...Object.values(seen))).toBeGreaterThan(20)
  })

  it.each(kinds)('it keeps the longest stick-out, the gauge lengths and the purpose: %s', (kind) => {
    let options = 0
    fc.assert(
      fc.property(searchCase(kind), limits, ({ tooling, question }, { window, ...rest }) => {
        const gaugeLengthMm = window && { shortestMm: window[0], longestMm: window[0] + window[1] }
        options += expectAsNaive({ tooling, question: { ...question, ...rest, gaugeLengthMm } }).options
          .length
      }),
      { seed: 5, numRuns: runs[kind] },
    )
    expect(options).toBeGreaterThan(50)
  })
})
