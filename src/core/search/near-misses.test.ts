import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { reachAnswer } from '@/core/reach/reach-answer'
import { defaultReachSettings, type ReachRequest, type WallFeature } from '@/core/reach/types'
import type { CutterGeometry, HolderGeometry } from '@/core/tooling'
import { searchCase } from '../../../test/support/cribs'
import { ballCutter, handHolder, neckedCutter, squareCutter } from '../../../test/support/reach-requests'
import { assemblyRequest } from './assembly-request'
import { searchReach } from './search-reach'
import { searchTables } from './search-tables'
import type {
  AssemblyParts,
  CribTooling,
  NearMiss,
  SearchChange,
  SearchExtension,
  SearchHolder,
  SearchQuestion,
} from './types'

/* Figures worked by hand from the definitions; the holder is the hand cases' one. */

const chuck = (id: string, diameterMm: number, given: Partial<HolderGeometry> = {}): SearchHolder => ({
  id,
  geometry: { ...handHolder, ...given },
  bore: { kind: 'fixed', diameterMm },
  taper: null,
})

function crib(
  cutter: CutterGeometry,
  holders: SearchHolder[],
  extensions: SearchExtension[] = [],
): CribTooling {
  return { cutters: [{ id: 'T1', geometry: cutter }], holders, collets: [], extensions }
}

function ask(tooling: CribTooling, feature: WallFeature, given: Partial<SearchQuestion> = {}) {
  const question = { feature, limit: 10, nearMissLimit: 10, ...given }
  return searchReach(searchTables(tooling, defaultReachSettings), question)
}

function onlyMiss(answer: { nearMisses: NearMiss[] }): NearMiss {
  expect(answer.nearMisses).toHaveLength(1)
  return answer.nearMisses[0]!
}

const changeOf = <Kind extends SearchChange['kind']>({ changes }: NearMiss, kind: Kind) =>
  changes.find((change): change is Extract<SearchChange, { kind: Kind }> => change.kind === kind)

describe('a cutter that reaches in nothing it may be built with', () => {
  const longGrip = chuck('chuck 07', 3.175, { minimumGripMm: 40 })
  const tooling = crib(neckedCutter, [longGrip, chuck('chuck 12', 3.175)])
  const wall: WallFeature = { kind: 'wall', depthMm: 36 }

  it('it is short of grip by what full shank needs over what is left, and reaches in another chuck', () => {
    // Full shank from 38.1875, and 1 above; 76.2 less 40 clamped leaves 36.2.
    const miss = onlyMiss(ask(tooling, wall, { masks: { holders: Uint8Array.of(1, 0) } }))
    expect(miss).toMatchObject({ holderIndex: 0, stoppedBy: 'grip', stickOutMm: 36.2 })
    expect(miss.shortfallMm).toBeCloseTo(39.1875 - 36.2, 9)
    expect(changeOf(miss, 'holder')?.option).toMatchObject({ holderIndex: 1, stickOutMm: 39.5 })
  })

  it('it is no near miss where any holder asked for makes it reach', () => {
    const answer = ask(tooling, wall)
    expect(answer.nearMisses).toEqual([])
    expect(answer.options.map(({ holderIndex }) => holderIndex)).toEqual([1])
  })

  it('it names an extension that was left out', () => {
    // A nut of the extension's own, 8 wide, goes in behind the 6 mm ball on a leaning wall; the chuck stays out.
    const extension: SearchExtension = {
      id: 'E1',
      bore: { kind: 'fixed', diameterMm: 6 },
      shankDiameterMm: 6,
      geometry: {
        projectionMm: 60,
        boreDepthMm: 60,
        minimumGripMm: 50,
        segments: [{ lengthMm: 60, noseDiameterMm: 8, spindleDiameterMm: 8 }],
      },
    }
    const tight = chuck('chuck 03', 6, { minimumGripMm: 50, boreDepthMm: 60 })
    const answer = ask(
      crib(ballCutter, [tight], [extension]),
      { kind: 'wall', depthMm: 40, draftDeg: 10 },
      {
        masks: { extensions: Uint8Array.of(0) },
      },
    )
    const miss = onlyMiss(answer)
    expect(miss).toMatchObject({ stoppedBy: 'nut', shortfallMm: 10.5 })
    expect(changeOf(miss, 'holder')).toBeUndefined()
    expect(changeOf(miss, 'extension')?.option).toMatchObject({ extensionIndex: 0, holderIndex: 0 })
  })
})

describe('an assembly its nut stops', () => {
  // OAL 80 less 55 clamped leaves 25; a nut 28 wide asks for 30.5 at depth 30.
  const tight = chuck('chuck 03', 6, { minimumGripMm: 55, boreDepthMm: 60 })
  const wall: WallFeature = { kind: 'wall', depthMm: 30, draftDeg: 10 }
  const miss = onlyMiss(ask(crib(ballCutter, [tight]), wall))

  it('it is short by the stick-out that is missing', () => {
    expect(miss).toMatchObject({ stoppedBy: 'nut', shortfallMm: 5.5, stickOutMm: 25 })
    expect(miss.stickOut).toMatchObject({ neededMm: 30.5, maximumMm: 25, part: 'nut', maximumBy: 'grip' })
  })

  it('it reaches with the widest nut that stays off the wall, on the half millimetre', () => {
    // w0 = 3(1 − sin 10°)/cos 10° = 2.5173; (ρ − w0)/tan 10° ≤ 24.5 up to ρ = 6.8373, so 2(6.8373 − 0.5) = 12.67.
    expect(changeOf(miss, 'nut')).toEqual({ kind: 'nut', nutDiameterMm: 12.5, ofNutDiameterMm: 28 })
  })

  it('it reaches with the least tilt on the half degree, and not with half a degree less', () => {
    const tilt = changeOf(miss, 'tilt')!
    const at = (tiltDeg: number) =>
      reachAnswer({ ...requestOf(crib(ballCutter, [tight]), wall, miss), feature: { ...wall, tiltDeg } })
        .verdict
    expect(at(tilt.tiltDeg)).toBe('reaches')
    expect(at(tilt.tiltDeg - 0.5)).toBe('short')
    expect(tilt.moreDeg).toBe(tilt.tiltDeg)
  })

  it('it names no draft where ten degrees more do not help', () => {
    expect(changeOf(miss, 'draft')).toBeUndefined()
  })
})

describe('an assembly the shank of which rubs', () => {
  const tooling = crib(squareCutter, [chuck('chuck 01', 3.175, { minimumGripMm: 10 })])

  it('it is short by what is below the length of cut, at the stick-out the holder needs', () => {
    const miss = onlyMiss(ask(tooling, { kind: 'wall', depthMm: 20 }))
    expect(miss).toMatchObject({ stoppedBy: 'shank', stickOutMm: 20.5, reachMm: 12.7 })
    expect(miss.shortfallMm).toBeCloseTo(7.3, 9)
  })

  it('it reaches with the draft that lets the shank by', () => {
    // The shank, 0.025 wider, is beyond the wall at 12.7 as long as tan θ < 0.025/12.7: half a degree does.
    const draft = changeOf(onlyMiss(ask(tooling, { kind: 'wall', depthMm: 20 })), 'draft')
    expect(draft).toEqual({ kind: 'draft', draftDeg: 0.5, moreDeg: 0.5, stickOutMm: 20.5 })
  })

  it('it is short of nothing less for a hole no change of angle helps', () => {
    const question = {
      feature: { kind: 'hole' as const, depthMm: 20, diameterMm: 10 },
      limit: 1,
      nearMissLimit: 1,
    }
    const miss = onlyMiss(searchReach(searchTables(tooling, defaultReachSettings), question))
    expect([miss.stoppedBy, miss.changes]).toEqual(['shank', []])
  })
})

describe('an assembly the limits of the question stop', () => {
  const tooling = crib(ballCutter, [chuck('chuck 01', 6, { boreDepthMm: 60 })])
  const wall: WallFeature = { kind: 'wall', depthMm: 10 }

  it('it is too short for the machine, and long enough with more stick-out', () => {
    // OAL 80 less 60 of bore: a stick-out of 20, 120 long.
    const miss = onlyMiss(ask(tooling, wall, { gaugeLengthMm: { shortestMm: 130.3, longestMm: 200 } }))
    expect(miss).toMatchObject({ stoppedBy: 'gaugeLength', gaugeLengthMm: 120 })
    expect(miss.shortfallMm).toBeCloseTo(10.3, 9)
    expect(miss.changes).toEqual([{ kind: 'stickOut', stickOutMm: 30.5 }])
  })

  it('it is too long for the machine, and nothing of its own helps', () => {
    const miss = onlyMiss(ask(tooling, wall, { gaugeLengthMm: { shortestMm: 0, longestMm: 118 } }))
    expect(miss).toMatchObject({ stoppedBy: 'gaugeLength', changes: [] })
    expect(miss.shortfallMm).toBeCloseTo(2, 9)
  })

  it('it sticks out too far for its diameter, and says the ratio that would do', () => {
    const miss = onlyMiss(ask(tooling, wall, { longestStickOutToDiameter: 3 }))
    expect(miss.stoppedBy).toBe('stickOutToDiameter')
    expect(miss.shortfallMm).toBeCloseTo(2, 9)
    expect(changeOf(miss, 'stickOutToDiameter')).toMatchObject({ stickOutMm: 20, stickOutToDiameter: 20 / 6 })
  })

  it('it leaves a scallop of the stepover too high for finishing, and roughs all the same', () => {
    // h = 3 − √(9 − 1.5²)... of a stepover of 3 on a 6 mm ball: 3 − √6.75 = 0.40192.
    const scallop = { stepoverMm: 3, maximumHeightMm: 0.1 }
    const miss = onlyMiss(ask(tooling, wall, { purpose: 'finishing', scallop }))
    expect(miss.stoppedBy).toBe('scallop')
    expect(miss.shortfallMm).toBeCloseTo(3 - Math.sqrt(6.75) - 0.1, 9)
    expect(ask(tooling, wall, { purpose: 'roughing', scallop }).options).toHaveLength(1)
  })

  it('it is too round for the floor when finishing, and roughs all the same', () => {
    const floor: WallFeature = { ...wall, floorRadiusMm: 1, insideCornerRadiusMm: 2.5 }
    const miss = onlyMiss(ask(tooling, floor, { purpose: 'finishing' }))
    expect(miss.shortfalls).toEqual([
      { by: 'floorRadius', shortfallMm: 2 },
      { by: 'cornerRadius', shortfallMm: 0.5 },
    ])
    expect(ask(tooling, floor, { purpose: 'roughing' }).options).toHaveLength(1)
  })
})

describe('a change, whatever the crib', () => {
  const anyCase = fc
    .constantFrom('straight' as const, 'drafted' as const, 'tilted' as const, 'obstacles' as const)
    .chain((kind) => searchCase(kind))

  it('it makes the assembly reach, and a smaller one does not', () => {
    const seen = new Set<string>()
    const bits = fc.array(fc.integer({ min: 0, max: 3 }), { minLength: 3, maxLength: 7 })
    fc.assert(
      fc.property(anyCase, bits, ({ tooling, question }, shown) => {
        const holders = Uint8Array.from(tooling.holders, (_, index) =>
          shown[index % shown.length] === 3 ? 1 : 0,
        )
        const masks = { holders }
        for (const miss of searchReach(searchTables(tooling, defaultReachSettings), { ...question, masks })
          .nearMisses) {
          const request = requestOf(tooling, question.feature, miss, question)
          expect(reachAnswer(request).verdict).not.toBe('reaches')
          for (const change of miss.changes) {
            seen.add(change.kind)
            expectChange(tooling, question, request, change)
          }
        }
      }),
      { seed: 8, numRuns: 600 },
    )
    expect([...seen]).toEqual(expect.arrayContaining(['draft', 'tilt', 'holder']))
  })
})

function expectChange(
  tooling: CribTooling,
  question: SearchQuestion,
  request: ReachRequest,
  change: SearchChange,
): void {
  const verdictOf = (given: Partial<ReachRequest>) => reachAnswer({ ...request, ...given }).verdict
  const feature = request.feature as WallFeature
  if (change.kind === 'draft') {
    expect(verdictOf({ feature: { ...feature, draftDeg: change.draftDeg } })).toBe('reaches')
    if (change.moreDeg > 0.5)
      expect(verdictOf({ feature: { ...feature, draftDeg: change.draftDeg - 0.5 } })).not.toBe('reaches')
  }
  if (change.kind === 'tilt')
    expect(verdictOf({ feature: { ...feature, tiltDeg: change.tiltDeg } })).toBe('reaches')
  if (change.kind === 'nut') {
    expect(verdictOf({ holder: withNut(request.holder, change.nutDiameterMm) })).toBe('reaches')
    if (change.nutDiameterMm + 0.5 < change.ofNutDiameterMm)
      expect(verdictOf({ holder: withNut(request.holder, change.nutDiameterMm + 0.5) })).not.toBe('reaches')
  }
  if (change.kind === 'holder' || change.kind === 'extension') {
    const other = reachAnswer(requestOf(tooling, question.feature, change.option, question))
    expect(other.verdict).toBe('reaches')
    expect(change.option.stickOutMm).toBeCloseTo(other.stickOut.usedMm, 9)
  }
}

function withNut(holder: HolderGeometry, mostMm: number): HolderGeometry {
  const narrowed = (mm: number) => Math.min(mm, mostMm)
  return {
    ...holder,
    segments: holder.segments.map((one) =>
      one.part === 'nut'
        ? {
            ...one,
            noseDiameterMm: narrowed(one.noseDiameterMm),
            spindleDiameterMm: narrowed(one.spindleDiameterMm),
          }
        : one,
    ),
  }
}

function requestOf(
  tooling: CribTooling,
  feature: SearchQuestion['feature'],
  parts: AssemblyParts,
  { clearances }: Partial<SearchQuestion> = {},
): ReachRequest {
  return assemblyRequest(
    { tooling, settings: defaultReachSettings },
    { feature, clearances: clearances ?? null },
    parts,
  )
}
