import { describe, expect, it } from 'vitest'
import { holderCheckParts } from '@/core/reach/check-parts'
import { placementOf } from '@/core/reach/placement'
import { reachAnswer } from '@/core/reach/reach-answer'
import { clearanceLowerBounds } from '@/core/reach/stick-out-bounds'
import type { HoleFeature, WallFeature } from '@/core/reach/types'
import type { CutterGeometry, HolderGeometry } from '@/core/tooling'
import {
  ballCutter,
  drillCutter,
  handHolder,
  neckedCutter,
  reachRequest,
  squareCutter,
} from '../support/reach-requests'

/* The working of every case stands in reach-hand-cases.md, under the same number. */

const wall = (depthMm: number, more: Partial<WallFeature> = {}): WallFeature => ({
  kind: 'wall',
  depthMm,
  ...more,
})
const nutOf = (diameterMm: number): HolderGeometry => ({
  ...handHolder,
  segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: diameterMm, spindleDiameterMm: diameterMm }],
})

/** Half a unit of the third decimal, to which these cases were worked. */
const toThreeDecimals = 3

describe('reach worked by hand', () => {
  it('case 1: it stops a straight wall at the length of cut, where a shank of the same diameter would rub', () => {
    const answer = reachAnswer(reachRequest({ feature: wall(12), stickOutMm: 20 }))
    expect(answer.reachMm).toBe(12.7)
    expect(answer.limitedBy).toBe('shank')
  })

  it('case 2: it lets a neck down to where the 45° transition comes within the clearance', () => {
    const answer = reachAnswer(reachRequest({ feature: wall(25), cutter: neckedCutter, stickOutMm: 45 }))
    expect(answer.reachMm).toBeCloseTo(38.1625, 9)
    expect(answer.limitedBy).toBe('transition')
    expect(answer.firstTouch.find(({ part }) => part === 'shank')?.depthMm).toBeCloseTo(38.1875, 9)
  })

  it('case 3: it asks for full shank in the grip though the nut would clear earlier', () => {
    const { stickOut, verdict } = reachAnswer(reachRequest({ feature: wall(25), cutter: neckedCutter }))
    expect(verdict).toBe('reaches')
    expect(stickOut.minimumMm).toBeCloseTo(39.1875, 9)
    expect(stickOut.requiredMm).toBe(39.5)
    expect(stickOut.boundBy).toBe('neck')
  })

  it('case 3: it puts the nut alone at 25.5 for a depth of 25', () => {
    const at = placementOf(wall(25), neckedCutter)
    const clearances = { shankMm: 0.025, holderMm: 0.5 }
    expect(clearanceLowerBounds(at, holderCheckParts(handHolder, null), clearances)).toEqual([
      { by: 'clearance', mm: 25.5 },
    ])
  })

  it('case 4: it stops an upright ball at the length of cut', () => {
    const answer = reachAnswer(reachRequest({ feature: wall(12), cutter: ballCutter, stickOutMm: 40 }))
    expect(answer.reachMm).toBe(12)
    expect(answer.limitedBy).toBe('shank')
  })

  it.each([
    [5, 39.902, 'nut'],
    [15, 41.591, 'nut'],
    [30, 162.349, 'spindle'],
  ])('case 5: it reaches further with the ball tilted %d°', (tiltDeg, reachMm, limitedBy) => {
    const answer = reachAnswer(
      reachRequest({ feature: wall(30, { tiltDeg }), cutter: ballCutter, stickOutMm: 40 }),
    )
    expect(answer.reachMm).toBeCloseTo(reachMm, toThreeDecimals)
    expect(answer.limitedBy).toBe(limitedBy)
  })

  it.each([
    [5, 30.136],
    [15, 28.804],
    [30, 22.615],
  ])('case 6: it needs less stick-out for 30 deep with the ball tilted %d°', (tiltDeg, clearMm) => {
    const holder = { ...handHolder, boreDepthMm: 70 }
    const answer = reachAnswer(reachRequest({ feature: wall(30, { tiltDeg }), cutter: ballCutter, holder }))
    expect(answer.stickOut.minimumMm).toBeCloseTo(clearMm, toThreeDecimals)
    expect(answer.stickOut.boundBy).toBe('clearance')
  })

  it('case 7: it keeps the far side of a wide nut off the floor', () => {
    const holder = { ...nutOf(50), boreDepthMm: 70 }
    const answer = reachAnswer(
      reachRequest({ feature: wall(30, { tiltDeg: 50 }), cutter: ballCutter, holder }),
    )
    expect(answer.stickOut.minimumMm).toBeCloseTo(29.223, toThreeDecimals)
    expect(answer.stickOut.boundBy).toBe('floor')
  })

  it('case 8: it stops the nut at an obstacle behind a straight wall', () => {
    const feature = wall(30, { obstacles: [{ setbackMm: 5, riseMm: 12 }] })
    const answer = reachAnswer(reachRequest({ feature, cutter: neckedCutter, stickOutMm: 45 }))
    expect(answer.reachMm).toBe(32.5)
    expect(answer.limitedBy).toBe('nut')
  })

  const obstacle = { setbackMm: 1.0735, riseMm: 30 }
  const draftCutter: CutterGeometry = { ...ballCutter, form: 'square' }

  it('case 9: it counts the upper passes, which stand nearer to an obstacle behind a leaning wall', () => {
    const feature = wall(20, { draftDeg: 10, obstacles: [obstacle] })
    const answer = reachAnswer(
      reachRequest({ feature, cutter: draftCutter, holder: nutOf(13), stickOutMm: 40 }),
    )
    expect(answer.reachMm).toBeCloseTo(9.5, 9)
    expect(answer.limitedBy).toBe('nut')
  })

  it('case 10: it needs the stick-out that clears the obstacle at every pass', () => {
    const feature = wall(20, { draftDeg: 10, obstacles: [obstacle] })
    const answer = reachAnswer(reachRequest({ feature, cutter: draftCutter, holder: nutOf(13) }))
    expect(answer.stickOut.minimumMm).toBeCloseTo(47.097, toThreeDecimals)
    expect(answer.stickOut.boundBy).toBe('obstacle')
  })

  it('case 11: it lists every part’s first touch, a face at its lowered height', () => {
    const answer = reachAnswer(reachRequest({ feature: wall(25), cutter: neckedCutter, stickOutMm: 39.5 }))
    const expected = [
      ['flute', null],
      ['neck', null],
      ['transition', 38.1625],
      ['shank', 38.1875],
      ['nut', 39],
      ['holder', 57],
      ['spindle', 139],
    ] as const
    expect(answer.firstTouch.map(({ part }) => part)).toEqual(expected.map(([part]) => part))
    for (const [index, [, depthMm]] of expected.entries()) {
      if (depthMm === null) expect(answer.firstTouch[index]?.depthMm).toBeNull()
      else expect(answer.firstTouch[index]?.depthMm).toBeCloseTo(depthMm, 9)
    }
  })

  it('case 12: it goes round the same square cutter’s run-out when none is given', () => {
    const assumed = { ...squareCutter, fluteLengthMm: null }
    const answer = reachAnswer(reachRequest({ feature: wall(12), cutter: assumed, stickOutMm: 20 }))
    expect(answer.limitedBy).toBe('runOut')
    expect(answer.reachMm).toBe(12.7)
    expect(answer.messages).toContainEqual({
      code: 'flute-length-assumed',
      values: { fluteLengthMm: 14.2875, runOutMm: 14.2875 - 12.7 },
    })
  })

  const hole = (diameterMm: number, more: Partial<HoleFeature> = {}): HoleFeature => ({
    kind: 'hole',
    depthMm: 20,
    diameterMm,
    ...more,
  })

  it('case 13: it leaves a drill room for its chips and counts off its point and break-through', () => {
    const answer = reachAnswer(reachRequest({ feature: hole(6), cutter: drillCutter, stickOutMm: 60 }))
    expect(answer.reachMm).toBeCloseTo(29.19742, 5)
    expect(answer.limitedBy).toBe('usableLength')
    expect(answer.firstTouch.find(({ part }) => part === 'runOut')?.depthMm).toBeCloseTo(38.19742, 5)
    const through = hole(6, { breakThroughMm: 1 })
    expect(reachAnswer(reachRequest({ feature: through, cutter: drillCutter })).reachMm).toBeCloseTo(
      28.19742,
      5,
    )
  })

  it('case 13: it lets run-out and shank into a hole that leaves them the clearance', () => {
    const holder = { ...handHolder, boreDepthMm: 70 }
    const answer = reachAnswer(reachRequest({ feature: hole(6.1), cutter: drillCutter, holder }))
    expect(answer.firstTouch.find(({ part }) => part === 'runOut')?.depthMm).toBeNull()
    const at = placementOf(hole(6.1), drillCutter)
    const [clearance] = clearanceLowerBounds(at, holderCheckParts(holder, null), {
      shankMm: 0.025,
      holderMm: 0.5,
    })
    expect(clearance?.mm).toBeCloseTo(22.30258, 5)
  })

  it('case 13: it refuses a hole a tenth off the drill', () => {
    const answer = reachAnswer(reachRequest({ feature: hole(6.11), cutter: drillCutter }))
    expect(answer.verdict).toBe('impossible')
    expect(answer.messages[0]?.code).toBe('hole-diameter-mismatch')
  })

  it('case 14: it says what a taper steeper than the wall leaves at its foot', () => {
    const cutter: CutterGeometry = { ...ballCutter, form: 'tapered', taperHalfAngleDeg: 5, lengthOfCutMm: 10 }
    const answer = reachAnswer(reachRequest({ feature: wall(8, { draftDeg: 3 }), cutter }))
    expect(answer.verdict).toBe('impossible')
    expect(answer.reachMm).toBe(0)
    expect(answer.uncutAtFootMm).toBeCloseTo(0.280647, 6)
  })

  it('case 15: it says what stays at the top edge of a wall lower than the corner', () => {
    const cutter: CutterGeometry = { ...ballCutter, form: 'cornerRadius', cornerRadiusMm: 2 }
    const { messages } = reachAnswer(reachRequest({ feature: wall(1), cutter }))
    const message = messages.find(({ code }) => code === 'wall-lower-than-corner')
    expect(message?.values).toEqual({ contactHeightMm: 2, leftAtTopMm: expect.closeTo(0.267949, 6) })
  })

  it('case 16: it refuses flutes that end below where the ball would touch', () => {
    const short: CutterGeometry = { ...ballCutter, lengthOfCutMm: 1.4 }
    const feature = wall(10, { draftDeg: 30 })
    expect(reachAnswer(reachRequest({ feature, cutter: short })).verdict).toBe('impossible')
    expect(reachAnswer(reachRequest({ feature, cutter: ballCutter })).maximumAxialStepMm).toBeCloseTo(10.5, 9)
  })
})
