import { describe, expect, it } from 'vitest'
import { CoreInputError } from '@/core/core-input-error'
import { defaultReachSettings } from '@/core/reach/types'
import { ballCutter, handHolder, squareCutter } from '../../../test/support/reach-requests'
import { searchReach } from './search-reach'
import { searchTables } from './search-tables'
import type { CribTooling, SearchExtension, SearchHolder, SearchQuestion, SortedOut } from './types'

const nothing: CribTooling = { cutters: [], holders: [], collets: [], extensions: [] }
const wall = { kind: 'wall', depthMm: 10 } as const

function ask(tooling: Partial<CribTooling>, question: Partial<SearchQuestion> = {}) {
  const tables = searchTables({ ...nothing, ...tooling }, defaultReachSettings)
  return { tables, ...searchReach(tables, { feature: wall, limit: 10, nearMissLimit: 10, ...question }) }
}

/** The counts that are not 0. */
const counted = (sortedOut: SortedOut) =>
  Object.fromEntries(Object.entries(sortedOut).filter(([, count]) => count > 0))

function refusalOf(act: () => unknown): { code: string; path: string } | null {
  try {
    act()
  } catch (error) {
    if (error instanceof CoreInputError) return { code: error.code, path: error.path }
    throw error
  }
  return null
}

const ball = { id: 'T1', geometry: ballCutter }
const shrink: SearchHolder = {
  id: 'H1',
  geometry: handHolder,
  bore: { kind: 'fixed', diameterMm: 6 },
  taper: null,
}
const chuck: SearchHolder = {
  id: 'H2',
  geometry: { ...handHolder, minimumGripMm: null },
  bore: { kind: 'collet', series: 'ER 20' },
  taper: null,
}
const collet = { id: 'C1', geometry: { series: 'er20', minimumMm: 5, maximumMm: 6, lengthMm: 30 } }
const bar: SearchExtension = {
  id: 'E1',
  bore: { kind: 'fixed', diameterMm: 6 },
  shankDiameterMm: 6,
  geometry: {
    projectionMm: 50,
    boreDepthMm: 40,
    minimumGripMm: 20,
    segments: [{ lengthMm: 50, noseDiameterMm: 12, spindleDiameterMm: 12 }],
  },
}

describe('a crib that is not whole', () => {
  it('it answers an empty crib with nothing', () => {
    const { options, nearMisses, considered, reachable } = ask({})
    expect([options, nearMisses, considered, reachable]).toEqual([[], [], 0, 0])
  })

  it('it offers nothing without a holder, and says that nothing holds the shank', () => {
    const { options, nearMisses, sortedOut } = ask({ cutters: [ball], collets: [collet] })
    expect([options, nearMisses, counted(sortedOut)]).toEqual([[], [], { shankNotHeld: 1 }])
  })

  it('it says which record is refused and why, throws for none, and offers the rest', () => {
    const { tables, options, sortedOut } = ask({
      cutters: [ball, { id: 'T2', geometry: { ...ballCutter, overallLengthMm: -1 } }],
      holders: [shrink, { ...shrink, id: 'H3', geometry: { ...handHolder, segments: [] } }],
      collets: [{ id: 'C2', geometry: { ...collet.geometry, maximumMm: Number.NaN } }],
      extensions: [{ ...bar, shankDiameterMm: 0 }],
    })
    expect(tables.refusals.map(({ table, index, code, path }) => [table, index, code, path])).toEqual([
      ['cutters', 1, 'not-positive', 'cutter.overallLengthMm'],
      ['holders', 1, 'segments-missing', 'holder.segments'],
      ['extensions', 0, 'not-positive', 'extension.shankDiameterMm'],
      ['collets', 0, 'not-finite', 'collet.maximumMm'],
    ])
    expect(options).toHaveLength(1)
    expect(counted(sortedOut)).toEqual({
      cutterRefused: 1,
      holderRefused: 1,
      colletRefused: 1,
      extensionRefused: 1,
    })
  })

  it('it offers nothing in a holder whose bore depth, grip or bore is not known, and counts it', () => {
    const { options, sortedOut } = ask({
      cutters: [ball],
      holders: [
        { ...shrink, geometry: { ...handHolder, boreDepthMm: null } },
        { ...shrink, id: 'H3', geometry: { ...handHolder, minimumGripMm: null } },
        { ...shrink, id: 'H4', bore: null },
      ],
    })
    expect(options).toEqual([])
    expect(counted(sortedOut)).toEqual({ holderRefused: 2, holderBoreUnknown: 1, shankNotHeld: 1 })
  })

  it('it lets a holder without a bore depth take an extension, which asks for none', () => {
    const { options } = ask({
      cutters: [ball],
      holders: [{ ...shrink, geometry: { ...handHolder, boreDepthMm: null } }],
      extensions: [bar],
    })
    expect(options).toMatchObject([{ holderIndex: 0, extensionIndex: 0, extensionColletIndex: null }])
  })

  it('it refuses settings no answer can be worked out with', () => {
    const settings = { ...defaultReachSettings, stickOutStepMm: 0 }
    expect(refusalOf(() => searchTables(nothing, settings))).toEqual({
      code: 'not-positive',
      path: 'settings.stickOutStepMm',
    })
  })
})

describe('what holds a cutter', () => {
  it('it is every collet of the chuck’s series that takes the shank, however the series is written', () => {
    const collets = [
      collet,
      { id: 'C2', geometry: { ...collet.geometry, minimumMm: 6, maximumMm: 7 } },
      { id: 'C3', geometry: { ...collet.geometry, minimumMm: 3, maximumMm: 4 } },
      { id: 'C4', geometry: { ...collet.geometry, series: 'ER25' } },
    ]
    const { options } = ask({ cutters: [ball], holders: [chuck], collets })
    expect(options.map(({ colletIndex }) => colletIndex)).toEqual([0, 1])
  })

  it('it clamps two thirds of a collet that names no grip', () => {
    // 80 less 20 of the 30 long collet leaves 60; at depth 70 on this wall the nut asks for 68.46.
    const { nearMisses } = ask(
      { cutters: [ball], holders: [chuck], collets: [collet] },
      { feature: { ...wall, depthMm: 70, draftDeg: 10 } },
    )
    expect(nearMisses).toMatchObject([{ stoppedBy: 'nut', stickOut: { maximumMm: 60 } }])
    expect(nearMisses[0]?.stickOut.neededMm).toBeCloseTo(68.457, 3)
  })

  it('it sets a side-lock where its flat is', () => {
    const sideLock = { ...shrink, geometry: { ...handHolder, sideLockInsertionMm: 33, minimumGripMm: null } }
    expect(ask({ cutters: [ball], holders: [sideLock] }).options).toMatchObject([{ stickOutMm: 47 }])
  })

  it('it is any holder for an extension whose shank is not known, only one that takes it where it is', () => {
    const wide = { ...shrink, id: 'H5', bore: { kind: 'fixed' as const, diameterMm: 20 } }
    const unknown = ask({ cutters: [ball], holders: [wide], extensions: [{ ...bar, shankDiameterMm: null }] })
    const known = ask({ cutters: [ball], holders: [wide], extensions: [bar] })
    expect([unknown.options.length, known.options.length]).toEqual([1, 0])
  })

  it('it names the collet that holds the extension, the one that costs the least rank', () => {
    const collets = [collet, { id: 'C0', geometry: collet.geometry }, { id: 'C9', geometry: collet.geometry }]
    const crib = { cutters: [ball], holders: [chuck], collets, extensions: [bar] }
    const extended = (question: Partial<SearchQuestion>) =>
      ask(crib, question).options.find(({ extensionIndex }) => extensionIndex === 0)
    expect(extended({})).toMatchObject({ extensionColletIndex: 1, colletIndex: null })
    const penalties = { collets: Float64Array.of(1, 1, 0) }
    expect(extended({ penalties })).toMatchObject({ extensionColletIndex: 2, penalty: 0 })
  })
})

describe('what is sorted out', () => {
  it('it is counted once, at the first reason', () => {
    const cutters = [
      ball,
      { id: 'T2', geometry: squareCutter },
      { id: 'T3', geometry: { ...ballCutter, cuttingDiameterMm: 20, shankDiameterMm: 6 } },
      { id: 'T4', geometry: { ...ballCutter, form: 'chamfer' as const, pointAngleDeg: 90 } },
      { id: 'T5', geometry: { ...ballCutter, lengthOfCutMm: 4, fluteLengthMm: 4 } },
    ]
    const { sortedOut } = ask(
      { cutters, holders: [shrink] },
      { feature: { ...wall, openingWidthMm: 12 }, masks: { cutters: Uint8Array.of(0, 1, 1, 1, 1) } },
    )
    expect(counted(sortedOut)).toEqual({
      cutterMasked: 1,
      shankNotHeld: 1,
      opening: 1,
      cutterForm: 1,
      cutterTouches: 1,
    })
  })
})

describe('a question that can’t be', () => {
  const tooling = { cutters: [ball], holders: [shrink] }
  const refused = (question: Partial<SearchQuestion>) => refusalOf(() => ask(tooling, question))

  it.each<[string, Partial<SearchQuestion>, string, string]>([
    ['a depth of nothing', { feature: { kind: 'wall', depthMm: 0 } }, 'not-positive', 'feature.depthMm'],
    ['draft past upright', { feature: { ...wall, draftDeg: 60 } }, 'draft-out-of-range', 'feature.draftDeg'],
    [
      'tilt between walls',
      { feature: { ...wall, tiltDeg: 5, openingWidthMm: 9 } },
      'tilt-with-closed-wall',
      'feature.tiltDeg',
    ],
    ['a mask of another crib', { masks: { holders: new Uint8Array(3) } }, 'wrong-length', 'masks.holders'],
    [
      'a penalty that is no number',
      { penalties: { cutters: Float64Array.of(Number.NaN) } },
      'not-finite',
      'penalties.cutters.0',
    ],
    [
      'a machine that takes no length',
      { gaugeLengthMm: { shortestMm: 200, longestMm: 150 } },
      'window-crossed',
      'gaugeLengthMm',
    ],
    ['half an option', { limit: 0.5 }, 'not-whole', 'limit'],
    ['no option a cutter', { perCutter: 0 }, 'not-whole', 'perCutter'],
    ['no stick-out at all', { longestStickOutToDiameter: 0 }, 'not-positive', 'longestStickOutToDiameter'],
    [
      'a stepover of nothing',
      { scallop: { stepoverMm: 0, maximumHeightMm: 1 } },
      'not-positive',
      'scallop.stepoverMm',
    ],
  ])('it refuses %s at its own field', (_, question, code, path) => {
    expect(refused(question)).toEqual({ code, path })
  })
})
