import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { defaultReachSettings, type Feature, type ReachSettings } from '@/core/reach/types'
import { type SearchCase, searchCase } from '../../../test/support/cribs'
import { searchReach } from './search-reach'
import { searchTables } from './search-tables'
import type { CribTooling, SearchOption, SearchQuestion, SearchTableName } from './types'
import { searchTableNames } from './types'

const kinds = ['straight', 'drafted', 'tilted', 'obstacles', 'circled', 'hole'] as const
const anyCase = fc.constantFrom(...kinds).chain((kind) => searchCase(kind))
const options = { seed: 12, numRuns: 150 }

function answerTo({ tooling, question }: SearchCase, given: Partial<SearchQuestion> = {}) {
  return searchReach(searchTables(tooling, defaultReachSettings), { ...question, ...given })
}

/** Which assembly it is, by ids. */
function namesOf({ tooling }: Pick<SearchCase, 'tooling'>) {
  return (option: SearchOption) =>
    [
      tooling.cutters[option.cutterIndex]?.id,
      tooling.holders[option.holderIndex]?.id,
      option.colletIndex === null ? '' : tooling.collets[option.colletIndex]?.id,
      option.extensionIndex === null ? '' : tooling.extensions[option.extensionIndex]?.id,
    ].join(' ')
}

const lists = (tooling: CribTooling) => searchTableNames.map((table) => tooling[table].length)

/** For every table as many numbers as it has records, from an endless row of them. */
function forRecords(tooling: CribTooling, numbers: number[]): Record<SearchTableName, number[]> {
  const [cutters = 0, holders = 0, collets = 0, extensions = 0] = lists(tooling)
  const take = (count: number, from: number) =>
    Array.from({ length: count }, (_, index) => numbers[(index + from) % numbers.length] ?? 0)
  return {
    cutters: take(cutters, 0),
    holders: take(holders, 1),
    collets: take(collets, 2),
    extensions: take(extensions, 3),
  }
}

const bits = fc.array(fc.integer({ min: 0, max: 3 }), { minLength: 5, maxLength: 11 })

function masksOf(tooling: CribTooling, numbers: number[]) {
  const of = forRecords(tooling, numbers)
  const mask = (table: SearchTableName) => Uint8Array.from(of[table], (number) => (number > 0 ? 1 : 0))
  return {
    cutters: mask('cutters'),
    holders: mask('holders'),
    collets: mask('collets'),
    extensions: mask('extensions'),
  }
}

function penaltiesOf(tooling: CribTooling, numbers: number[]) {
  const of = forRecords(tooling, numbers)
  return {
    cutters: Float64Array.from(of.cutters),
    holders: Float64Array.from(of.holders),
    collets: Float64Array.from(of.collets),
    extensions: Float64Array.from(of.extensions),
  }
}

describe('whatever the crib', () => {
  it('it offers with a mask nothing that it does not offer without, and all of it whose parts are offered', () => {
    fc.assert(
      fc.property(anyCase, bits, (given, numbers) => {
        const masks = masksOf(given.tooling, numbers)
        const all = answerTo(given).options
        const masked = answerTo(given, { masks }).options
        const names = namesOf(given)
        const kept = all.filter(
          (option) =>
            masks.cutters[option.cutterIndex] === 1 &&
            masks.holders[option.holderIndex] === 1 &&
            (option.colletIndex === null || masks.collets[option.colletIndex] === 1) &&
            (option.extensionIndex === null || masks.extensions[option.extensionIndex] === 1),
        )
        // An extension may have lost the only collets that hold it; no other reason takes an option away.
        const lost = kept.map(names).filter((name) => !masked.map(names).includes(name))
        const held = kept.filter(({ extensionColletIndex }) => extensionColletIndex === null).map(names)
        expect(lost.filter((name) => held.includes(name))).toEqual([])
        expect(masked.map(names).filter((name) => !kept.map(names).includes(name))).toEqual([])
      }),
      options,
    )
  })

  it('it ranks by penalty first, and by it alone moves nothing in or out', () => {
    fc.assert(
      fc.property(anyCase, bits, (given, numbers) => {
        const plain = answerTo(given)
        const penalties = penaltiesOf(given.tooling, numbers)
        const ranked = answerTo(given, { penalties })
        const names = namesOf(given)
        expect(ranked.options.map(names).sort()).toEqual(plain.options.map(names).sort())
        expect(ranked.reachable).toBe(plain.reachable)
        const penaltyOf = ranked.options.map(({ penalty }) => penalty)
        expect(penaltyOf).toEqual([...penaltyOf].sort((a, b) => a - b))
        for (const [index, option] of ranked.options.entries()) {
          const before = ranked.options[index - 1]
          if (before?.penalty === option.penalty)
            expect(before.complianceUmPerN).toBeLessThanOrEqual(option.complianceUmPerN)
        }
      }),
      options,
    )
  })

  it('it shows with a limit the first of all, and with one a cutter the first of each', () => {
    const limits = fc.record({
      limit: fc.integer({ min: 0, max: 8 }),
      perCutter: fc.option(fc.integer({ min: 1, max: 3 }), { nil: null }),
      numbers: bits,
    })
    fc.assert(
      fc.property(anyCase, limits, (given, { limit, perCutter, numbers }) => {
        const penalties = penaltiesOf(given.tooling, numbers)
        const all = answerTo(given, { penalties })
        const few = answerTo(given, { penalties, limit, perCutter, nearMissLimit: limit })
        const ofCutter = new Map<number, number>()
        const expected = all.options.filter(({ cutterIndex }) => {
          const count = ofCutter.get(cutterIndex) ?? 0
          ofCutter.set(cutterIndex, count + 1)
          return count < (perCutter ?? Number.POSITIVE_INFINITY)
        })
        expect(few.options).toEqual(expected.slice(0, limit))
        expect(few.nearMisses).toEqual(all.nearMisses.slice(0, limit))
        expect([few.considered, few.reachable]).toEqual([all.considered, all.reachable])
      }),
      options,
    )
  })

  it('it takes away no option when a tool comes in', () => {
    fc.assert(
      fc.property(anyCase, anyCase, (given, more) => {
        const renamed = <Kind extends { id: string }>(records: Kind[]) =>
          records.map((record) => ({ ...record, id: `new-${record.id}` }))
        const tooling = {
          cutters: [...given.tooling.cutters, ...renamed(more.tooling.cutters)],
          holders: [...given.tooling.holders, ...renamed(more.tooling.holders)],
          collets: [...given.tooling.collets, ...renamed(more.tooling.collets)],
          extensions: [...given.tooling.extensions, ...renamed(more.tooling.extensions)],
        }
        const question = { ...given.question, limit: 20_000 }
        const before = answerTo({ tooling: given.tooling, question }).options.map(namesOf(given))
        const after = new Set(answerTo({ tooling, question }).options.map(namesOf({ tooling })))
        expect(before.filter((name) => !after.has(name))).toEqual([])
      }),
      options,
    )
  })

  it('it gives the same answer whatever the order of the records', () => {
    fc.assert(
      fc.property(anyCase, (given) => {
        const { cutters, holders, collets, extensions } = given.tooling
        const turned = {
          cutters: [...cutters].reverse(),
          holders: [...holders].reverse(),
          collets: [...collets].reverse(),
          extensions: [...extensions].reverse(),
        }
        const one = answerTo(given)
        const other = answerTo({ ...given, tooling: turned })
        const ranked = (names: (option: SearchOption) => string) => (option: SearchOption) =>
          [names(option), option.stickOutMm, option.complianceUmPerN].join(' ')
        expect(other.options.map(ranked(namesOf({ tooling: turned })))).toEqual(
          one.options.map(ranked(namesOf(given))),
        )
        expect(other.nearMisses.map(namesOf({ tooling: turned }))).toEqual(one.nearMisses.map(namesOf(given)))
      }),
      options,
    )
  })

  it('it finds the same in a crib, a feature and settings twice as large, half as compliant', () => {
    const doubledSettings: ReachSettings = {
      ...defaultReachSettings,
      stickOutStepMm: 2 * defaultReachSettings.stickOutStepMm,
      fluteToGripMm: 2 * defaultReachSettings.fluteToGripMm,
      holeToleranceMm: 2 * defaultReachSettings.holeToleranceMm,
    }
    fc.assert(
      fc.property(anyCase, (given) => {
        const one = answerTo(given)
        const other = searchReach(searchTables(doubled(given.tooling), doubledSettings), {
          ...given.question,
          feature: doubled(given.question.feature) as Feature,
          clearances: doubled(given.question.clearances),
        })
        const names = namesOf(given)
        expect(other.options.map(names)).toEqual(one.options.map(names))
        for (const [index, option] of other.options.entries()) {
          const half = one.options[index]!
          expect(option.stickOutMm).toBeCloseTo(2 * half.stickOutMm, 9)
          expect((2 * option.complianceUmPerN) / half.complianceUmPerN).toBeCloseTo(1, 9)
        }
        expect(other.nearMisses.map(names)).toEqual(one.nearMisses.map(names))
      }),
      options,
    )
  })
})

/** Every length in it twice as long; a length says so by its name. */
function doubled<Value>(value: Value): Value {
  if (Array.isArray(value)) return value.map(doubled) as Value
  if (value === null || typeof value !== 'object') return value
  const entries = Object.entries(value).map(([key, inner]) => [
    key,
    key.endsWith('Mm') && typeof inner === 'number' ? 2 * inner : doubled(inner),
  ])
  return Object.fromEntries(entries) as Value
}
