import { describe, expect, it } from 'vitest'
import {
  ballCutter,
  drillCutter,
  handHolder,
  neckedCutter,
  reachRequest,
  squareCutter,
} from '../../../test/support/reach-requests'
import type { ReachMessageCode } from './message-codes'
import { reachAnswer } from './reach-answer'
import { defaultReachSettings, type HoleFeature, type ReachRequest, type WallFeature } from './types'

const wall = (depthMm: number, more: Partial<WallFeature> = {}): WallFeature => ({
  kind: 'wall',
  depthMm,
  ...more,
})
const hole = (depthMm: number, diameterMm: number, more: Partial<HoleFeature> = {}): HoleFeature => ({
  kind: 'hole',
  depthMm,
  diameterMm,
  ...more,
})
const answerTo = (given: Partial<ReachRequest>) => reachAnswer(reachRequest(given))
const codesOf = (given: Partial<ReachRequest>) => answerTo(given).messages.map(({ code }) => code)

const thick = { ...ballCutter, shankDiameterMm: 20 }
const sharpTaper = { ...ballCutter, form: 'tapered' as const, taperHalfAngleDeg: 5 }
const sideLock = { ...handHolder, minimumGripMm: null, sideLockInsertionMm: 30 }

describe('verdict', () => {
  const cases: [string, Partial<ReachRequest>, string, ReachMessageCode | null][] = [
    ['reaches within its length of cut', { feature: wall(12) }, 'reaches', null],
    ['is short beyond it', { feature: wall(13) }, 'short', 'cutter-rubs'],
    ['reaches to the length of cut exactly', { feature: wall(12.7) }, 'reaches', null],
    [
      'does not fit a narrow opening',
      { feature: wall(5, { openingWidthMm: 3 }) },
      'impossible',
      'opening-too-narrow',
    ],
    ['fits an opening as wide as itself', { feature: wall(5, { openingWidthMm: 3.175 }) }, 'reaches', null],
    [
      'does not fit a tight corner',
      { feature: wall(5, { insideCornerRadiusMm: 1.5 }) },
      'impossible',
      'corner-too-tight',
    ],
    [
      'leaves too large a floor radius',
      { cutter: ballCutter, feature: wall(5, { floorRadiusMm: 0 }) },
      'impossible',
      'floor-radius-too-small',
    ],
    ['makes a square end', { feature: wall(5, { floorRadiusMm: 0 }) }, 'reaches', null],
    [
      'leans more than the wall',
      { cutter: sharpTaper, feature: wall(5, { draftDeg: 3 }) },
      'impossible',
      'taper-steeper-than-wall',
    ],
    [
      'has flutes too short for its ball',
      { cutter: { ...ballCutter, lengthOfCutMm: 3 }, feature: wall(5) },
      'impossible',
      'length-of-cut-below-contact',
    ],
    [
      'strikes an obstacle with its flutes',
      { feature: wall(5, { obstacles: [{ setbackMm: 0.2, riseMm: 3 }] }) },
      'impossible',
      'flutes-strike-obstacle',
    ],
    [
      'has no stick-out between flutes and grip',
      { cutter: { ...squareCutter, overallLengthMm: 30 }, feature: wall(5) },
      'impossible',
      'bounds-crossed',
    ],
    [
      'is given too short a stick-out',
      { feature: wall(5), stickOutMm: 13 },
      'impossible',
      'stick-out-breaks-bound',
    ],
    [
      'is given too long a stick-out',
      { feature: wall(5), stickOutMm: 19 },
      'impossible',
      'stick-out-breaks-bound',
    ],
    [
      'reaches with the whole length of its neck',
      { cutter: { ...neckedCutter, overallLengthMm: 62 }, feature: wall(38.1) },
      'reaches',
      null,
    ],
    [
      'needs more stick-out than its grip leaves under a wide nut',
      { cutter: ballCutter, feature: wall(60, { tiltDeg: 5 }), stickOutMm: null },
      'short',
      'needed-stick-out-over-maximum',
    ],
    [
      'is given a stick-out that would do if longer',
      { cutter: ballCutter, feature: wall(45, { tiltDeg: 5 }), stickOutMm: 42 },
      'short',
      'longer-stick-out-reaches',
    ],
    [
      'has a shank in the floor',
      { cutter: thick, feature: wall(5, { tiltDeg: 60 }) },
      'short',
      'cutter-strikes-floor',
    ],
    [
      'has a nut in the floor',
      {
        cutter: { ...ballCutter, overallLengthMm: 55 },
        holder: {
          ...handHolder,
          segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: 80, spindleDiameterMm: 80 }],
        },
        feature: wall(5, { tiltDeg: 50 }),
        stickOutMm: 30,
      },
      'short',
      'holder-strikes-floor',
    ],
    [
      'drills as deep as its flutes let chips out',
      { cutter: drillCutter, feature: hole(29, 6) },
      'reaches',
      null,
    ],
    ['drills no deeper', { cutter: drillCutter, feature: hole(30, 6) }, 'short', 'usable-length-too-short'],
    [
      'does not make another hole',
      { cutter: drillCutter, feature: hole(5, 6.2) },
      'impossible',
      'hole-diameter-mismatch',
    ],
    ['circles in a wider hole', { feature: hole(5, 8) }, 'reaches', null],
    ['does not go into a narrower hole', { feature: hole(5, 3) }, 'impossible', 'hole-too-narrow'],
    [
      'is not held by a collet of another size',
      { feature: wall(5), collet: { series: 'ER20', minimumMm: 4, maximumMm: 5 } },
      'impossible',
      'collet-range-misses-shank',
    ],
    [
      'is not held by a collet of another series',
      {
        feature: wall(5),
        bore: { kind: 'collet', series: 'ER16' },
        collet: { series: 'ER20', minimumMm: 3, maximumMm: 4 },
      },
      'impossible',
      'collet-of-other-series',
    ],
    [
      'is not held by another bore',
      { feature: wall(5), bore: { kind: 'fixed', diameterMm: 3 } },
      'impossible',
      'bore-misses-shank',
    ],
  ]

  it.each(cases)('it %s', (_, given, verdict, code) => {
    const answer = answerTo(given)
    expect(answer.verdict).toBe(verdict)
    if (code) expect(answer.messages.map((message) => message.code)).toContain(code)
    if (verdict !== 'reaches' && code !== 'longer-stick-out-reaches') {
      const keepsRequired = code === 'stick-out-breaks-bound' || code === 'holder-strikes-floor'
      if (!keepsRequired) expect(answer.stickOut.requiredMm).toBeNull()
    }
  })

  it('it names the floor only where the floor alone stops it', () => {
    expect(answerTo({ cutter: thick, feature: wall(0.5, { tiltDeg: 60 }) }).limitedBy).toBe('floor')
    expect(answerTo({ cutter: thick, feature: wall(500, { tiltDeg: 60 }) }).limitedBy).not.toBe('floor')
  })
})

describe('notes', () => {
  const notes: [ReachMessageCode, Partial<ReachRequest>][] = [
    ['length-of-cut-assumed', { cutter: { ...squareCutter, lengthOfCutMm: null } }],
    ['flute-length-assumed', { cutter: { ...squareCutter, fluteLengthMm: null } }],
    ['transition-angle-assumed', { cutter: neckedCutter }],
    ['neck-without-length', { cutter: { ...neckedCutter, reachLengthMm: null } }],
    ['corner-radius-not-used', { cutter: { ...squareCutter, form: 'faceMill', cornerRadiusMm: 0.4 } }],
    ['substrate-assumed', { cutter: { ...squareCutter, substrate: null } }],
    ['spindle-width-unknown', {}],
    ['collet-not-given', { bore: { kind: 'collet', series: 'ER20' } }],
    ['deflection-not-asked', {}],
    ['spindle-taken-as-rigid', { sideLoadN: 10 }],
    ['collet-range-position', { collet: { series: 'ER20', minimumMm: 3, maximumMm: 4 } }],
    ['depth-in-steps', { feature: wall(13) }],
    ['wall-lower-than-corner', { cutter: ballCutter, feature: wall(1) }],
    ['thicker-shank-taken-as-step', { cutter: { ...squareCutter, shankDiameterMm: 6 } }],
  ]

  it.each(notes)('it says %s', (code, given) => {
    expect(codesOf(given)).toContain(code)
  })

  it('it says nothing of what was given', () => {
    const holder = { ...handHolder, spindleNoseDiameterMm: 90 }
    expect(codesOf({ holder, sideLoadN: 10 })).toEqual(['spindle-taken-as-rigid'])
  })
})

describe('refusals', () => {
  const refused: [string, Partial<ReachRequest>, string, string][] = [
    ['a chamfer', { cutter: { ...drillCutter, form: 'chamfer' } }, 'chamfer-not-checked', 'cutter.form'],
    ['a drill on a wall', { cutter: drillCutter, feature: wall(5) }, 'hole-tool-on-wall', 'cutter.form'],
    [
      'tilt with obstacles',
      { cutter: ballCutter, feature: wall(5, { tiltDeg: 5, obstacles: [{ setbackMm: 1, riseMm: 1 }] }) },
      'tilt-with-closed-wall',
      'feature.tiltDeg',
    ],
    [
      'tilt in an opening',
      { cutter: ballCutter, feature: wall(5, { tiltDeg: 5, openingWidthMm: 40 }) },
      'tilt-with-closed-wall',
      'feature.tiltDeg',
    ],
    [
      'tilt in a corner',
      { cutter: ballCutter, feature: wall(5, { tiltDeg: 5, insideCornerRadiusMm: 40 }) },
      'tilt-with-closed-wall',
      'feature.tiltDeg',
    ],
    [
      'tilt of a square end',
      { feature: wall(5, { tiltDeg: 5 }) },
      'tilt-without-spherical-tip',
      'feature.tiltDeg',
    ],
    [
      'draft and tilt of 90',
      { cutter: ballCutter, feature: wall(5, { draftDeg: 40, tiltDeg: 50 }) },
      'tilt-out-of-range',
      'feature.tiltDeg',
    ],
    [
      'taper and tilt over 90',
      {
        cutter: { ...ballCutter, form: 'tapered', taperHalfAngleDeg: 10, cornerRadiusMm: 3 },
        feature: wall(5, { tiltDeg: 81 }),
      },
      'tilt-out-of-range',
      'feature.tiltDeg',
    ],
    ['a draft of 60', { feature: wall(5, { draftDeg: 60 }) }, 'draft-out-of-range', 'feature.draftDeg'],
    ['no depth', { feature: wall(0) }, 'not-positive', 'feature.depthMm'],
    ['a hole of no diameter', { feature: hole(5, 0) }, 'not-positive', 'feature.diameterMm'],
    [
      'an obstacle in front of the wall',
      { feature: wall(5, { obstacles: [{ setbackMm: -1, riseMm: 1 }] }) },
      'negative',
      'feature.obstacles.0.setbackMm',
    ],
    [
      'no bore depth',
      { holder: { ...handHolder, boreDepthMm: null } },
      'bore-depth-missing',
      'holder.boreDepthMm',
    ],
    ['no grip', { holder: { ...handHolder, minimumGripMm: null } }, 'grip-missing', 'holder.minimumGripMm'],
    ['a stick-out of nothing', { stickOutMm: 0 }, 'not-positive', 'stickOutMm'],
    ['a negative clearance', { clearances: { holderMm: -1 } }, 'negative', 'clearances.holderMm'],
    ['an endless side load', { sideLoadN: Number.POSITIVE_INFINITY }, 'not-finite', 'sideLoadN'],
    [
      'a step of nothing',
      { settings: { ...defaultReachSettings, stickOutStepMm: 0 } },
      'not-positive',
      'settings.stickOutStepMm',
    ],
  ]

  it.each(refused)('it refuses %s', (_, given, code, path) => {
    expect(() => answerTo(given)).toThrow(expect.objectContaining({ code, path }))
  })
})

describe('stick-out', () => {
  it('it lets a side-lock’s flat decide', () => {
    const { stickOut } = answerTo({ cutter: ballCutter, holder: sideLock, feature: wall(10) })
    expect(stickOut).toMatchObject({
      requiredMm: 50,
      minimumMm: 50,
      maximumMm: 50,
      gripMm: 30,
      boundBy: 'sideLock',
      upperBoundBy: 'sideLock',
    })
  })

  it('it takes two thirds of a collet’s length where nothing names a grip', () => {
    const collet = { series: 'ER20', minimumMm: 3, maximumMm: 4, lengthMm: 31.5 }
    const { stickOut } = answerTo({ holder: { ...handHolder, minimumGripMm: null }, collet })
    expect(stickOut.gripMm).toBeCloseTo(21, 12)
  })

  it('it takes the longer of the grips named', () => {
    const collet = { series: 'ER20', minimumMm: 3, maximumMm: 4, lengthMm: 31.5, minimumGripMm: 15 }
    expect(answerTo({ collet }).stickOut.gripMm).toBe(20)
    expect(answerTo({ collet: { ...collet, minimumGripMm: 22 } }).stickOut.gripMm).toBe(22)
  })

  it('it asks an extension alone for bore and grip', () => {
    const extension = {
      projectionMm: 60,
      boreDepthMm: 25,
      minimumGripMm: 16,
      gripStartMm: 2,
      segments: [{ lengthMm: 60, noseDiameterMm: 10, spindleDiameterMm: 12 }],
    }
    const holder = { ...handHolder, boreDepthMm: null, minimumGripMm: null }
    const answer = answerTo({ holder, extension, feature: wall(5) })
    expect(answer.stickOut).toMatchObject({ maximumMm: expect.closeTo(20.1, 12), gripMm: 16 })
    expect(answer.gaugeLengthMm).toBe(100 + 60 + answer.stickOut.usedMm)
  })

  it('it never rounds past the largest allowed', () => {
    const settings = { ...defaultReachSettings, stickOutStepMm: 10 }
    const { stickOut } = answerTo({ settings, feature: wall(5) })
    expect(stickOut.requiredMm).toBe(stickOut.maximumMm)
  })

  it('it rounds to the inch step of a shop', () => {
    const settings = { ...defaultReachSettings, stickOutStepMm: 1.27 }
    expect(answerTo({ settings, feature: wall(5) }).stickOut.requiredMm).toBeCloseTo(11 * 1.27, 9)
  })
})

describe('a hole that is circled', () => {
  it('it is a straight wall in an opening, its break-through counted off', () => {
    const round = answerTo({ feature: hole(12, 20, { breakThroughMm: 1 }) })
    const straight = answerTo({ feature: wall(12, { throughMm: 1, openingWidthMm: 20 }) })
    expect(round.verdict).toBe(straight.verdict)
    expect(round.stickOut).toEqual(straight.stickOut)
    expect(round.reachMm).toBeCloseTo((straight.reachMm ?? 0) - 1, 12)
    expect(round.shortfallMm).toBeCloseTo(straight.shortfallMm, 12)
  })
})
