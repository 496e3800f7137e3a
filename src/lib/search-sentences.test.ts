import { describe, expect, test } from 'vitest'
import type { NearMiss, SearchOption } from '@/core/search/types'
import { type SortedOut, sortedOutReasons } from '@/core/search/types'
import {
  changeSentence,
  nearMissSentence,
  noCutterSentence,
  type RankedOption,
  type RankingContext,
  rankSentence,
} from './search-sentences'

const names = { holder: 'H-07', collet: 'C-6', extension: null }
const stickOut: NearMiss['stickOut'] = {
  neededMm: 38.6,
  maximumMm: 35.5,
  neededBy: 'clearance',
  maximumBy: 'grip',
  part: 'nut',
}
const short = (by: NearMiss['stoppedBy'], shortfallMm: number, held = stickOut) =>
  nearMissSentence({ shortfalls: [{ by, shortfallMm }], stickOut: held }, names, 'mm')

describe('what stops a near miss', () => {
  test('it says by how much the grip is short, in what, and what would keep which part clear', () => {
    expect(short('nut', 3.1)).toBe(
      'Grip short by 3.1 mm in H-07 with C-6: 38.6 mm of stick-out would keep the nut clear, the longest that is still held is 35.5 mm.',
    )
  })

  test('it blames the flat where a side-lock sets the stick-out', () => {
    expect(short('holder', 3.1, { ...stickOut, maximumBy: 'sideLock' })).toMatch(
      /^The side-lock’s flat in H-07 with C-6 sets the stick-out 3\.1 mm too short/,
    )
  })

  test('it says of the cutter itself that no stick-out helps', () => {
    expect(short('neck', 2)).toBe(
      'The neck of the cutter itself stops it 2 mm before the depth, whatever the stick-out.',
    )
  })

  test('it says all that has to be mended, the most first', () => {
    const both = {
      shortfalls: [
        { by: 'shank', shortfallMm: 9 } as const,
        { by: 'cornerRadius', shortfallMm: 0.5 } as const,
      ],
      stickOut,
    }
    expect(nearMissSentence(both, names, 'mm')).toMatch(
      /^The shank .*\. Also: its radius is 0\.5 mm too large for the inside corner\.$/,
    )
  })

  test('it keeps a fine figure fine', () => {
    expect(short('scallop', 0.0021)).toBe('The cusp between passes would be 0.002 mm too high.')
  })
})

describe('what would help', () => {
  const option = { stickOutMm: 38.5 } as SearchOption

  test('it names the holder it would reach in, and the extension between', () => {
    expect(changeSentence({ kind: 'holder', option }, { ...names, holder: 'H-12' }, 'mm')).toBe(
      'Reaches in H-12 with C-6 at 38.5 mm stick-out; the filters leave that out.',
    )
    const extended = { holder: 'H-12', collet: null, extension: 'X-3' }
    expect(changeSentence({ kind: 'extension', option }, extended, 'mm')).toBe(
      'Reaches in X-3 in H-12 at 38.5 mm stick-out; the filters leave that out.',
    )
  })

  test('it says draft, tilt and nut with what they come to', () => {
    expect(changeSentence({ kind: 'draft', draftDeg: 2, moreDeg: 1.5, stickOutMm: 40 }, null, 'mm')).toBe(
      '1.5° more draft on the wall would do: 2°, at 40 mm stick-out.',
    )
    expect(changeSentence({ kind: 'tilt', tiltDeg: 15, moreDeg: 15, stickOutMm: 40 }, null, 'mm')).toContain(
      '15° more tilt would do',
    )
    expect(changeSentence({ kind: 'nut', nutDiameterMm: 22, ofNutDiameterMm: 28 }, null, 'mm')).toContain(
      'no wider than 22 mm',
    )
  })

  test('it never rounds a limit to one that would still refuse it', () => {
    const change = { kind: 'stickOutToDiameter', stickOutToDiameter: 6.2041, stickOutMm: 39.5 } as const
    expect(changeSentence(change, null, 'mm')).toContain('6.21 diameters')
  })
})

const thick: RankedOption = {
  complianceUmPerN: 0.1,
  stickOutMm: 40,
  gaugeLengthMm: 120,
  cuttingDiameterMm: 8,
  substrate: 'carbide',
  hasExtension: false,
  missingParts: [],
  cost: 10_000,
  builtAs: null,
}
const ranking = (rankBy: RankingContext['rankBy'], change: Partial<RankingContext> = {}): RankingContext => ({
  rankBy,
  first: thick,
  reachable: 1204,
  currency: 'EUR',
  unit: 'mm',
  ...change,
})

describe('why an option stands where it stands', () => {
  test('it says of the first what it is first of', () => {
    expect(rankSentence(thick, ranking('stiffness'))).toBe('The stiffest of the 1,204 that reach.')
    expect(rankSentence(thick, ranking('stock'))).toBe(
      'Every part is in stock. The stiffest of what can be built now.',
    )
    expect(rankSentence(thick, ranking('cost'))).toBe('The least cost of the 1,204 that reach.')
    expect(rankSentence(thick, ranking('built'))).toBe('Not built yet. The stiffest of the 1,204 that reach.')
    expect(rankSentence(thick, ranking('stiffness', { reachable: 1 }))).toBe('The only one that reaches.')
  })

  test('it says why another gives more, the weightiest reason first, two at most', () => {
    const slim = {
      ...thick,
      complianceUmPerN: 0.23,
      cuttingDiameterMm: 6,
      substrate: 'hss' as const,
      stickOutMm: 44.5,
      gaugeLengthMm: 150,
    }
    expect(rankSentence(slim, ranking('stiffness'))).toBe(
      'Bends 2.30 times as much as the first: a cutter of 6 mm, not 8 mm, high-speed steel.',
    )
    const long = { ...thick, complianceUmPerN: 0.13, stickOutMm: 44.5, gaugeLengthMm: 130 }
    expect(rankSentence(long, ranking('stiffness'))).toBe(
      'Bends 1.30 times as much as the first: 4.5 mm more stick-out, 5.5 mm longer behind it.',
    )
  })

  test('it says what is dearer, by how much, and what is not known', () => {
    const dear = { ...thick, cost: 12_550, complianceUmPerN: 0.08 }
    expect(rankSentence(dear, ranking('cost'))).toBe(
      '€25.50 more than the first. Bends 0.80 times as much as the first: it is stiffer.',
    )
    expect(rankSentence({ ...thick, cost: null }, ranking('cost'))).toMatch(
      /^What a part of it costs is not known\./,
    )
  })

  test('it says where what stands ready is', () => {
    const ready = { ...thick, builtAs: { number: 12, place: 'in M-1, pocket 4' } }
    expect(rankSentence(ready, ranking('built', { first: ready }))).toBe(
      'Stands ready as assembly 12, in M-1, pocket 4. The stiffest of what does.',
    )
  })
})

test('why no cutter suits is said with the commonest reason first', () => {
  const none = Object.fromEntries(sortedOutReasons.map((reason) => [reason, 0])) as SortedOut
  expect(noCutterSentence(none)).toBeNull()
  expect(noCutterSentence({ ...none, opening: 3, cornerRadius: 1200 })).toBe(
    'Of the cutters looked at: 1,200 too thick for the inside corner; 3 too wide for the opening.',
  )
})
