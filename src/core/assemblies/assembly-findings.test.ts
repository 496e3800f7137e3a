import { describe, expect, it } from 'vitest'
import { defaultReachSettings } from '../reach/types'
import { type AssemblyNow, assemblyFindings, type KeptAssembly } from './assembly-findings'
import type { AssemblyTools, PartNow } from './types'

/*
 * The necked square end mill of reach.md's hand cases in a collet chuck of A 100, nut Ø28 × 18: full shank from 38.1875,
 * so 39.5 of stick-out for any wall it reaches, and a reach of 38.1625, where the transition touches.
 */
const tools: AssemblyTools = {
  cutter: {
    form: 'square',
    cuttingDiameterMm: 3.175,
    lengthOfCutMm: 6.35,
    fluteLengthMm: 6.35,
    neckDiameterMm: 3,
    reachLengthMm: 38.1,
    shankDiameterMm: 3.175,
    overallLengthMm: 76.2,
  },
  holder: {
    gaugeLengthMm: 100,
    bore: { kind: 'collet', series: 'ER16' },
    boreDepthMm: 75,
    segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 28 }],
  },
  collet: { series: 'ER16', minimumMm: 3, maximumMm: 4, minimumGripMm: 10 },
  extension: null,
  extensionCollet: null,
}
const parts: PartNow[] = [
  { kind: 'cutter', isArchived: false, presence: null },
  { kind: 'holder', isArchived: false, presence: null },
]
const kept = (change: Partial<KeptAssembly> = {}): KeptAssembly => ({
  stickOutMm: 39.5,
  tools,
  checks: [{ id: '1', feature: { kind: 'wall', depthMm: 25 }, clearances: null }],
  measuredGaugeLengthMm: null,
  ...change,
})
const now = (change: Partial<AssemblyNow> = {}): AssemblyNow => ({
  tools,
  parts,
  settings: defaultReachSettings,
  toleranceMm: 0.05,
  ...change,
})
const withCutter = (change: Partial<AssemblyTools['cutter']>) =>
  now({ tools: { ...tools, cutter: { ...tools.cutter, ...change } } })
const withHolder = (change: Partial<AssemblyTools['holder']>) =>
  now({ tools: { ...tools, holder: { ...tools.holder, ...change } } })
const found = (keptState: KeptAssembly, nowState: AssemblyNow) =>
  assemblyFindings(keptState, nowState).findings.map(({ key, isFault }) => [key, isFault])

describe('an assembly looked at again', () => {
  it('has nothing to say where nothing changed', () => {
    expect(assemblyFindings(kept(), now())).toMatchObject({
      findings: [],
      outcomes: [{ checkId: '1', holds: true, answer: { verdict: 'reaches' } }],
    })
  })

  it('tells a changed size that still holds, and is not marked by it', () => {
    expect(found(kept(), withCutter({ overallLengthMm: 80 }))).toEqual([['sizes:cutter', false]])
  })

  it('is marked by a gauge length, a diameter or a corner radius that is no longer what was noted', () => {
    expect(found(kept(), withHolder({ gaugeLengthMm: 98 }))).toEqual([
      ['sizes:holder', false],
      ['offset:gaugeLength', true],
    ])
    expect(found(kept(), withCutter({ cuttingDiameterMm: 3.1 }))).toEqual([
      ['sizes:cutter', false],
      ['offset:diameter', true],
    ])
    expect(found(kept(), withCutter({ form: 'cornerRadius', cornerRadiusMm: 0.2 }))).toEqual([
      ['sizes:cutter', false],
      ['offset:cornerRadius', true],
    ])
  })

  it('is marked by a check that fails with the corrected size, 5 mm short of 25', () => {
    // Reach 20 + 0.0625: the 45° transition touches where it is 0.0625 thicker than the neck's clearance leaves.
    const { findings, outcomes } = assemblyFindings(kept(), withCutter({ reachLengthMm: 20 }))
    expect(outcomes).toMatchObject([{ holds: false }])
    const failing = findings.find(({ key }) => key === 'check:1')
    expect(failing).toMatchObject({ isFault: true, checkId: '1', detail: { code: 'checkFails' } })
    expect(outcomes[0]?.answer?.shortfallMm).toBeCloseTo(25 - 20.0625, 9)
  })

  it('is marked by clearances the shop sets wider', () => {
    const settings = { ...defaultReachSettings, holderClearanceMm: 15 }
    expect(found(kept(), now({ settings }))).toEqual([['check:1', true]])
    const own = kept({
      checks: [{ id: '1', feature: { kind: 'wall', depthMm: 25 }, clearances: { holderMm: 0.5 } }],
    })
    expect(found(own, now({ settings }))).toEqual([])
  })

  it('says of sizes that can no longer be checked that they cannot', () => {
    const { findings, outcomes } = assemblyFindings(kept(), withCutter({ shankDiameterMm: 0 }))
    expect(outcomes).toEqual([{ checkId: '1', holds: false, answer: null }])
    expect(findings).toContainEqual(
      expect.objectContaining({
        key: 'check:1',
        detail: expect.objectContaining({ code: 'checkImpossible' }),
      }),
    )
  })

  it('is held to the stick-out that was really measured, beyond the tolerance alone', () => {
    // Full shank is clamped from 39.1875: 139.4 measured is 39.4 of stick-out, 139.1 is 39.1.
    const measured = (measuredGaugeLengthMm: number) => found(kept({ measuredGaugeLengthMm }), now())
    expect(measured(139.45)).toEqual([])
    expect(measured(139.4)).toEqual([])
    expect(measured(139.1)).toEqual([['measured:1', true]])
    expect(measured(99)).toEqual([['measured:1', true]])
  })

  it('is marked by a part that went or was archived, and by each claim on a heap that is too small', () => {
    const gone = (held: number, claimed: number) =>
      found(kept(), now({ parts: [{ kind: 'holder', isArchived: false, presence: { held, claimed } }] }))
    expect(gone(1, 1)).toEqual([])
    expect(gone(2, 2)).toEqual([])
    expect(gone(1, 2)).toEqual([['gone:holder', true]])
    expect(gone(0, 1)).toEqual([['gone:holder', true]])
    expect(found(kept(), now({ parts: [{ kind: 'collet', isArchived: true, presence: null }] }))).toEqual([
      ['archived:collet', true],
    ])
  })
})
